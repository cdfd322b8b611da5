import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../../adapters/clock/clock.js';
import { Storage } from '../../adapters/storage/storage.js';
import { HandlesJob, type Finish, type JobHandler } from '../../jobs/job.js';
import { LedgerExport } from './ledger-export.model.js';
import { WorkProgress } from './work-progress.js';
import { writeYearExport } from './write-year-export.job.js';
import { YearFiles } from './year-files.js';
import { zipFiles } from './zip-files.js';

/** May run again after a crash: it then writes the zip anew. */
@Injectable()
@HandlesJob(writeYearExport)
export class WriteYearExport implements JobHandler<typeof writeYearExport.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(LedgerExport) private readonly exports: typeof LedgerExport,
    private readonly storage: Storage,
    private readonly files: YearFiles,
    private readonly clock: Clock,
  ) {}

  async handle({ exportId }: z.output<typeof writeYearExport.payload>): Promise<Finish | void> {
    const asked = await this.exports.findByPk(exportId);
    if (!asked || asked.state === 'done') return;
    await asked.update({ state: 'running', fault: null });
    const progress = new WorkProgress(this.database, 'ledger_exports', exportId);
    try {
      // Receipts are as many again as orders, about; the last percents are for what comes after them.
      const expected = (await this.files.count(asked.year)) * 1.5 + 100;
      let lines = 0;
      const zip = await zipFiles(this.storage, this.files.of(asked.year), {
        date: this.clock.now(),
        onLine: () => progress.show((++lines / expected) * 100),
      });
      await progress.settle();
      return async (tx) => {
        await asked.update(
          {
            state: 'done',
            percent: 100,
            storageKey: zip.key,
            sha256: zip.sha256,
            bytes: zip.bytes,
            finishedAt: this.clock.now(),
          },
          { transaction: tx },
        );
      };
    } catch (fault) {
      await progress.settle();
      // Shown as failed until a later try goes through.
      await asked.update({ state: 'failed', fault: (fault as Error).message.slice(0, 500) });
      throw fault;
    }
  }
}
