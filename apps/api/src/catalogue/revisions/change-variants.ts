import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { clearanceSigns, type Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { isMeshKind } from '../files/file-kind.js';
import { MeshPlaces, type Places } from '../files/mesh-places.js';
import { RevisionFile } from '../files/revision-file.model.js';
import { StoredFile } from '../files/stored-file.model.js';
import { Drafts } from './drafts.js';
import { PartVariant } from './part-variant.model.js';
import { Part } from './part.model.js';

/** A draft's parts in further clearances: a mesh of the draft becomes one, or goes with it. */
@Injectable()
export class ChangeVariants {
  constructor(
    @InjectModel(Part) private readonly parts: typeof Part,
    @InjectModel(PartVariant) private readonly variants: typeof PartVariant,
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    @InjectModel(StoredFile) private readonly stored: typeof StoredFile,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly places: MeshPlaces,
    private readonly comparisons: QueueComparisons,
    private readonly staffLog: StaffLog,
  ) {}

  async give(
    person: SignedIn,
    { params, body }: Handled<'PUT /workshop/revisions/:revisionId/parts/:partId/variants/:clearance'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
      const places = await this.places.of(tx, revision.id);
      const part = partOf(places, params.partId);
      const file = await this.meshOf(tx, revision.id, body.fileId);
      const old = places.variants.find((one) => one.partId === part.id && one.clearance === params.clearance);
      if (old?.fileId === file.id) return;
      const left = await this.takeFromItsPlace(tx, file, part, places);
      await this.places.keepVariant(tx, part, params.clearance, file.id);
      if (old) await this.files.destroy({ where: { id: old.fileId }, transaction: tx });
      await this.comparisons.ofDraft(tx, revision.id);
      await this.staffLog.record(tx, person, {
        what: `gave ${part.code} the clearance ${clearanceSigns[params.clearance]}`,
        subject,
        ...(left ? { before: { part: left } } : {}),
        after: { fileName: file.fileName, sha256: file.sha256 },
      });
    });
  }

  async take(
    person: SignedIn,
    { params }: Handled<'DELETE /workshop/revisions/:revisionId/parts/:partId/variants/:clearance'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
      const places = await this.places.of(tx, revision.id);
      const part = partOf(places, params.partId);
      const variant = places.variants.find(
        (one) => one.partId === part.id && one.clearance === params.clearance,
      );
      if (!variant) throw notFound('clearance of this part');
      const file = await this.files.findByPk(variant.fileId, { transaction: tx });
      // The variant goes with its file.
      await file?.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: `took the clearance ${clearanceSigns[params.clearance]} of ${part.code} out`,
        subject,
        before: { fileName: file?.fileName ?? '', sha256: file?.sha256 ?? '' },
      });
    });
  }

  private async meshOf(tx: Tx, revisionId: string, fileId: string): Promise<RevisionFile> {
    const file = await this.files.findOne({ where: { id: fileId, revisionId }, transaction: tx });
    if (!file) throw notFound('file');
    const stored = await this.stored.findByPk(file.sha256, { transaction: tx });
    if (!stored || !isMeshKind(stored.kind))
      throw new Refusal('bad-request', `“${file.fileName}” is not a mesh. Choose an STL or 3MF file.`);
    return file;
  }

  /** A mesh was a part by itself until now: that part is dropped. @returns its code */
  private async takeFromItsPlace(
    tx: Tx,
    file: RevisionFile,
    part: Part,
    { parts, variants }: Places,
  ): Promise<string | null> {
    await this.variants.destroy({ where: { fileId: file.id }, transaction: tx });
    const owner = parts.find((one) => one.fileId === file.id);
    if (!owner) return null;
    if (owner.id === part.id)
      throw new Refusal(
        'bad-request',
        `“${file.fileName}” is ${part.code} itself, its clearance 0. Choose or send another file.`,
      );
    if (variants.some((one) => one.partId === owner.id))
      throw new Refusal(
        'conflict',
        `“${file.fileName}” is ${owner.code}, which comes in clearances of its own. Take those out first.`,
      );
    await this.parts.destroy({ where: { id: owner.id }, transaction: tx });
    return owner.code;
  }
}

const partOf = ({ parts }: Places, partId: string): Part => {
  const part = parts.find((one) => one.id === partId);
  if (!part) throw notFound('part');
  return part;
};
