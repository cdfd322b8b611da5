import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { isDuplicate } from '../../database/errors.js';
import { Clock } from '../../adapters/clock/clock.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { RevisionFile } from '../files/revision-file.model.js';
import { Drafts } from './drafts.js';
import { PartVariant } from './part-variant.model.js';
import { Part } from './part.model.js';

/** Changing a draft: its words and specification, its parts; throwing it away. */
@Injectable()
export class ChangeRevision {
  constructor(
    @InjectModel(Part) private readonly parts: typeof Part,
    @InjectModel(PartVariant) private readonly variants: typeof PartVariant,
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly comparisons: QueueComparisons,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async change(
    person: SignedIn,
    { params, body }: Handled<'PATCH /workshop/revisions/:revisionId'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
      const before = Object.fromEntries(Object.keys(body).map((key) => [key, revision.get(key) as unknown]));
      await revision.update(body, { transaction: tx });
      await this.staffLog.record(tx, person, { what: 'changed a revision', subject, before, after: body });
    });
  }

  async throwAway(person: SignedIn, revisionId: string): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, revisionId);
      await revision.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'threw a draft away',
        subject,
        before: { assemblyNotes: revision.assemblyNotes, changeNotes: revision.changeNotes },
      });
    });
  }

  async changePart(
    person: SignedIn,
    { params, body }: Handled<'PUT /workshop/revisions/:revisionId/parts/:partId'>,
  ): Promise<void> {
    try {
      await this.transactions.run(async (tx) => {
        const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
        const part = await this.parts.findOne({
          where: { id: params.partId, revisionId: revision.id },
          transaction: tx,
        });
        if (!part) throw notFound('part');
        const before = Object.fromEntries(Object.keys(body).map((key) => [key, part.get(key) as unknown]));
        await part.update({ ...body, updatedAt: this.clock.now() }, { transaction: tx });
        // Under another code it follows another part.
        if (body.code !== before['code']) await this.comparisons.ofDraft(tx, revision.id);
        await this.staffLog.record(tx, person, {
          what: `changed part ${part.code}`,
          subject,
          before,
          after: body,
        });
      });
    } catch (fault) {
      if (!isDuplicate(fault, 'parts_code')) throw fault;
      const sentence = `Another part of this revision has the code ${body.code}. Choose a free one.`;
      throw new Refusal('already-exists', sentence, { fields: { code: 'Another part has this code.' } });
    }
  }

  /** The part goes with its files. */
  async dropPart(person: SignedIn, revisionId: string, partId: string): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, revisionId);
      const part = await this.parts.findOne({
        where: { id: partId, revisionId: revision.id },
        transaction: tx,
      });
      if (!part) throw notFound('part');
      const variants = await this.variants.findAll({ where: { partId: part.id }, transaction: tx });
      const fileIds = [part.fileId, ...variants.map((one) => one.fileId)].filter((id) => id !== null);
      await part.destroy({ transaction: tx });
      await this.files.destroy({ where: { id: fileIds }, transaction: tx });
      await this.staffLog.record(tx, person, {
        what: `dropped part ${part.code}`,
        subject,
        before: { code: part.code, name: part.name, quantity: part.quantity },
      });
    });
  }
}
