import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound } from '../../http/refusal.js';
import { Drafts } from '../revisions/drafts.js';
import { RevisionFile } from './revision-file.model.js';

/** Takes a file out of a draft. A part keeps its code, settings and voice and waits for another file. */
@Injectable()
export class RemoveFile {
  constructor(
    @InjectModel(RevisionFile) private readonly files: typeof RevisionFile,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly staffLog: StaffLog,
  ) {}

  async remove(person: SignedIn, revisionId: string, fileId: string): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, revisionId);
      const file = await this.files.findOne({
        where: { id: fileId, revisionId: revision.id },
        transaction: tx,
      });
      if (!file) throw notFound('file');
      await file.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'took a file out',
        subject: `${subject}: ${file.fileName}`,
        before: { fileName: file.fileName, sha256: file.sha256 },
      });
    });
  }
}
