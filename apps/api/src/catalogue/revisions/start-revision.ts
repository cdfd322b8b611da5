import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { RevisionFile } from '../files/revision-file.model.js';
import { Kit } from '../kits/kit.model.js';
import { firstRevision } from './first-revision.js';
import { PartVariant } from './part-variant.model.js';
import { Part } from './part.model.js';
import { isFinal, labelOf, Revision } from './revision.model.js';

/**
 * Starts the next revision of a kit. The mark goes up when printed parts of the last one no longer
 * interchange, else the issue; parts, files, notes and specification are carried over, change notes and
 * reprint marks are not, for they are about the step itself.
 */
@Injectable()
export class StartRevision {
  constructor(
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    @InjectModel(Part) private readonly parts: typeof Part,
    @InjectModel(PartVariant) private readonly variants: typeof PartVariant,
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    private readonly transactions: Transactions,
    private readonly comparisons: QueueComparisons,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  start(
    person: SignedIn,
    { params, body }: Handled<'POST /workshop/kits/:kitId/revisions'>,
  ): Promise<string> {
    return this.transactions.run(async (tx) => {
      const kit = await this.kits.findByPk(params.kitId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!kit) throw notFound('kit');
      const earlier = await this.revisions.findAll({
        where: { kitId: kit.id },
        order: [
          ['mark', 'DESC'],
          ['issue', 'DESC'],
        ],
        transaction: tx,
      });
      const open = earlier.find((one) => !isFinal(one));
      if (open)
        throw new Refusal(
          'conflict',
          `${open.label} is still a draft. Release it or throw it away before starting another revision.`,
        );
      const base = body.from ? earlier.find((one) => one.id === body.from) : earlier[0];
      if (body.from && !base) throw notFound('revision of this kit');
      const number = nextNumber(earlier[0], body.step);
      const now = this.clock.now();
      const id = newId();
      await this.revisions.create(
        {
          id,
          kitId: kit.id,
          ...number,
          state: 'draft',
          basedOnId: base?.id ?? null,
          ...(base ? carriedOver(base) : firstRevision),
          changeNotes: '',
          createdAt: now,
          updatedAt: now,
        },
        { transaction: tx },
      );
      if (base) await this.carryContents(tx, base.id, id);
      // Carried over from an older revision, parts may differ from those of the last one.
      await this.comparisons.ofDraft(tx, id);
      await kit.update({ updatedAt: now }, { transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'started a revision',
        subject: `${kit.name} ${labelOf(number)}`,
        after: { step: body.step, from: base?.label ?? null },
      });
      return id;
    });
  }

  private async carryContents(tx: Tx, fromId: string, toId: string): Promise<void> {
    const now = this.clock.now();
    const fileIds = new Map<string, string>();
    const files = await this.files.findAll({ where: { revisionId: fromId }, transaction: tx });
    await this.files.bulkCreate(
      files.map(({ id, sha256, fileName }) => {
        fileIds.set(id, newId());
        return { id: fileIds.get(id), revisionId: toId, sha256, fileName, createdAt: now };
      }),
      { transaction: tx },
    );
    const partIds = new Map<string, string>();
    const parts = await this.parts.findAll({ where: { revisionId: fromId }, transaction: tx });
    await this.parts.bulkCreate(
      parts.map(({ id, fileId, code, name, quantity, orientation, printSpec, voice, isGauge }) => ({
        id: partIds.set(id, newId()).get(id),
        revisionId: toId,
        fileId: fileId === null ? null : (fileIds.get(fileId) ?? null),
        code,
        name,
        quantity,
        orientation,
        printSpec,
        voice,
        isGauge,
        createdAt: now,
        updatedAt: now,
      })),
      { transaction: tx },
    );
    const variants = await this.variants.findAll({ where: { revisionId: fromId }, transaction: tx });
    await this.variants.bulkCreate(
      variants.map(({ partId, clearance, fileId }) => ({
        id: newId(),
        revisionId: toId,
        partId: partIds.get(partId),
        clearance,
        fileId: fileIds.get(fileId),
      })),
      { transaction: tx },
    );
  }
}

const nextNumber = (last: Revision | undefined, step: 'issue' | 'mark'): { mark: number; issue: number } => {
  if (!last) return { mark: 1, issue: 0 };
  return step === 'mark' ? { mark: last.mark + 1, issue: 0 } : { mark: last.mark, issue: last.issue + 1 };
};

const carriedOver = (base: Revision): Partial<Revision> => ({
  assemblyNotes: base.assemblyNotes,
  cautions: base.cautions,
  printSpec: base.printSpec,
  hardware: base.hardware,
  buildVolume: base.buildVolume,
  declaredCents: base.declaredCents,
  room: base.room,
});
