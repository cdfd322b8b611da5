import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { Drafts } from '../revisions/drafts.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { isMeshKind, type FileKind } from './file-kind.js';
import { MeasurementRecords } from './measurement-records.js';
import { MeshPlaces, type Places } from './mesh-places.js';
import { RevisionFile } from './revision-file.model.js';
import { assertRevisionFits } from './upload-limits.js';

export interface StoredContents {
  readonly sha256: string;
  readonly bytes: number;
  readonly kind: FileKind;
  readonly fileName: string;
}

/** Puts stored contents into a draft under a name; a mesh becomes a part, the new file of one, or one of its clearances. */
@Injectable()
export class AttachFile {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly contents: RevisionContents,
    private readonly places: MeshPlaces,
    private readonly measurements: MeasurementRecords,
    private readonly comparisons: QueueComparisons,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  /** @returns the id of the file in the revision */
  attach(person: SignedIn, revisionId: string, stored: StoredContents): Promise<string> {
    return this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, revisionId);
      await this.keepStored(tx, stored);
      const places = await this.places.of(tx, revision.id);
      const old = await this.fileToReplace(tx, revision.id, stored, places);
      if (
        old?.sha256 === stored.sha256 &&
        old.fileName === stored.fileName &&
        (!isMeshKind(stored.kind) || this.places.has(old.id, places))
      )
        return old.id;

      const before = old && { fileName: old.fileName, sha256: old.sha256 };
      await this.assertFits(tx, revision.id, stored, old);
      const file = await this.keepFile(tx, revision.id, stored, old);
      if (isMeshKind(stored.kind)) {
        await this.places.keep(tx, file, places);
        await this.measurements.want(tx, stored.sha256, stored.fileName);
        await this.comparisons.ofSentFile(tx, revision.id, stored.sha256);
      }
      await this.staffLog.record(tx, person, {
        what: old ? 'replaced a file' : 'added a file',
        subject: `${subject}: ${stored.fileName}`,
        before,
        after: { fileName: stored.fileName, sha256: stored.sha256, bytes: stored.bytes },
      });
      return file.id;
    });
  }

  private async keepStored(tx: Tx, stored: StoredContents): Promise<void> {
    await touchRows(
      this.database,
      `INSERT INTO stored_files (sha256, bytes, kind, created_at) VALUES (:sha256, :bytes, :kind, :now)
       ON DUPLICATE KEY UPDATE sha256 = sha256`,
      { ...stored, now: this.clock.now() },
      tx,
    );
  }

  /** The file of the same name; else, for a mesh named by a code, the file of that part in that clearance. */
  private async fileToReplace(
    tx: Tx,
    revisionId: string,
    stored: StoredContents,
    places: Places,
  ): Promise<RevisionFile | null> {
    const sameName = await this.files.findOne({
      where: { revisionId, fileName: stored.fileName },
      transaction: tx,
    });
    if (sameName || !isMeshKind(stored.kind)) return sameName;
    const fileId = this.places.fileIdFor(stored.fileName, places);
    return fileId ? this.files.findByPk(fileId, { transaction: tx }) : null;
  }

  private async assertFits(
    tx: Tx,
    revisionId: string,
    stored: StoredContents,
    old: RevisionFile | null,
  ): Promise<void> {
    const others = (await this.contents.filesOf(revisionId, tx)).filter((file) => file.id !== old?.id);
    const total = others.reduce((sum, file) => sum + file.bytes, stored.bytes);
    assertRevisionFits(stored.fileName, total, this.config.MAX_REVISION_BYTES);
  }

  private keepFile(
    tx: Tx,
    revisionId: string,
    { sha256, fileName }: StoredContents,
    old: RevisionFile | null,
  ): Promise<RevisionFile> {
    const createdAt = this.clock.now();
    return old
      ? old.update({ sha256, fileName, createdAt }, { transaction: tx })
      : this.files.create({ id: newId(), revisionId, sha256, fileName, createdAt }, { transaction: tx });
  }
}
