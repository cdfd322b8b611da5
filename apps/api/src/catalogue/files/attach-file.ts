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
import { Part } from '../revisions/part.model.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { isMeshKind, type FileKind } from './file-kind.js';
import { MeasurementRecords } from './measurement-records.js';
import { nextFreeCode, partFromName } from './part-from-name.js';
import { RevisionFile } from './revision-file.model.js';
import { assertRevisionFits } from './upload-limits.js';

export interface StoredContents {
  readonly sha256: string;
  readonly bytes: number;
  readonly kind: FileKind;
  readonly fileName: string;
}

/** Puts stored contents into a draft under a name; a mesh becomes a part, or the new file of one. */
@Injectable()
export class AttachFile {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    @InjectModel(Part) private readonly parts: typeof Part,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly contents: RevisionContents,
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
      const parts = await this.parts.findAll({ where: { revisionId: revision.id }, transaction: tx });
      const old = await this.fileToReplace(tx, revision.id, stored, parts);
      if (
        old?.sha256 === stored.sha256 &&
        old.fileName === stored.fileName &&
        this.hasItsPart(old, stored, parts)
      )
        return old.id;

      const before = old && { fileName: old.fileName, sha256: old.sha256 };
      await this.assertFits(tx, revision.id, stored, old);
      const file = await this.keepFile(tx, revision.id, stored, old);
      if (isMeshKind(stored.kind)) {
        await this.keepPart(tx, file, stored, parts);
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

  /** The file of the same name; else, for a mesh named by a code, the file of the part with that code. */
  private async fileToReplace(
    tx: Tx,
    revisionId: string,
    stored: StoredContents,
    parts: readonly Part[],
  ): Promise<RevisionFile | null> {
    const sameName = await this.files.findOne({
      where: { revisionId, fileName: stored.fileName },
      transaction: tx,
    });
    if (sameName || !isMeshKind(stored.kind)) return sameName;
    const { code } = partFromName(stored.fileName);
    const fileId = parts.find((part) => part.code === code)?.fileId;
    return fileId ? this.files.findByPk(fileId, { transaction: tx }) : null;
  }

  private hasItsPart(file: RevisionFile, stored: StoredContents, parts: readonly Part[]): boolean {
    return !isMeshKind(stored.kind) || parts.some((part) => part.fileId === file.id);
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

  private async keepPart(
    tx: Tx,
    file: RevisionFile,
    stored: StoredContents,
    parts: readonly Part[],
  ): Promise<void> {
    if (parts.some((part) => part.fileId === file.id)) return;
    const { code, name } = partFromName(stored.fileName);
    const updatedAt = this.clock.now();
    const known = parts.find((part) => part.code === code);
    if (known) {
      await known.update({ fileId: file.id, updatedAt }, { transaction: tx });
      return;
    }
    await this.parts.create(
      {
        id: newId(),
        revisionId: file.revisionId,
        fileId: file.id,
        code: code ?? nextFreeCode(parts.map((part) => part.code)),
        name,
        quantity: 1,
        orientation: 'may-turn',
        createdAt: updatedAt,
        updatedAt,
      },
      { transaction: tx },
    );
  }
}
