import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { keyOf } from '../../adapters/storage/storage.js';
import { Clock } from '../../adapters/clock/clock.js';
import { touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { measureFile } from './measure-file.job.js';
import type { MeshFindings } from './measured-mesh.js';
import { MeasurementRecord } from './measurement.model.js';
import { passingFaults } from './passing-faults.js';
import { StoredFile } from './stored-file.model.js';

/** Goes up when the same bytes would measure differently; files are then measured again as they are used. */
const MEASURER_VERSION = 2;

/** What is known of each mesh, by its hash: the same bytes are measured once, wherever they are used. */
@Injectable()
export class MeasurementRecords {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(MeasurementRecord) private readonly records: typeof MeasurementRecord,
    @InjectModel(StoredFile) private readonly stored: typeof StoredFile,
    private readonly transactions: Transactions,
    private readonly queue: JobQueue,
    private readonly comparisons: QueueComparisons,
    private readonly clock: Clock,
  ) {}

  /** Has a stored mesh measured unless it is already, or cannot be. */
  async want(tx: Tx, sha256: string, fileName: string): Promise<void> {
    const now = this.clock.now();
    const values = { sha256, version: MEASURER_VERSION, now, passingFaults };
    const added = await touchRows(
      this.database,
      `INSERT INTO measurements (sha256, state, measurer_version, created_at) VALUES (:sha256, 'waiting', :version, :now)
       ON DUPLICATE KEY UPDATE sha256 = sha256`,
      values,
      tx,
    );
    const renewed =
      added === 1
        ? 0
        : await touchRows(
            this.database,
            `UPDATE measurements SET state = 'waiting', tries = 0, measurer_version = :version, fault = NULL, fault_code = NULL
             WHERE sha256 = :sha256 AND (measurer_version < :version OR (state = 'refused' AND fault_code IN (:passingFaults)))`,
            values,
            tx,
          );
    if (added + renewed > 0) await this.queue.add(tx, measureFile, { sha256, fileName });
  }

  /**
   * Takes a waiting file up. Counts the tries, so that a file which ends the whole process is not taken up
   * for ever.
   * @returns null where it is measured already
   */
  async begin(sha256: string): Promise<{ tries: number; storageKey: string; bytes: number } | null> {
    const mine = await touchRows(
      this.database,
      `UPDATE measurements SET state = 'measuring', tries = tries + 1 WHERE sha256 = :sha256 AND state IN ('waiting', 'measuring')`,
      { sha256 },
    );
    if (mine === 0) return null;
    const [record, file] = await Promise.all([this.records.findByPk(sha256), this.stored.findByPk(sha256)]);
    if (!record || !file) return null;
    return { tries: record.tries, storageKey: keyOf('files', sha256), bytes: file.bytes };
  }

  /** Keeps what was found, and has the mesh compared with what it takes the place of. */
  async keepMeasured(sha256: string, result: MeshFindings): Promise<void> {
    await this.transactions.run(async (tx) => {
      const [kept] = await this.records.update(
        { ...result, state: 'measured', fault: null, faultCode: null, measuredAt: this.clock.now() },
        { where: { sha256, state: 'measuring' }, transaction: tx },
      );
      if (kept > 0) await this.comparisons.ofMeasuredFile(tx, sha256);
    });
  }

  /** @param fault what is wrong, to follow the file's name in a sentence */
  async keepRefused(sha256: string, faultCode: string, fault: string): Promise<void> {
    await this.records.update(
      { state: 'refused', fault, faultCode, measuredAt: this.clock.now() },
      { where: { sha256, state: 'measuring' } },
    );
  }
}
