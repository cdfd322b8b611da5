import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { Op, type Sequelize } from 'sequelize';
import { keyOf } from '../../adapters/storage/storage.js';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { measureFile, renewMeasurement } from './measure-file.job.js';
import type { MeshFindings } from './measured-mesh.js';
import { MeasurementRecord } from './measurement.model.js';
import { passingFaults } from './passing-faults.js';
import { StoredFile } from './stored-file.model.js';

/** Goes up when the same bytes would measure differently, or give more; then all are measured again. */
export const MEASURER_VERSION = 3;
/** Between two meshes measured again, so that uploads and e-mails find a worker meanwhile. */
const RENEWAL_PACE_SECONDS = 0.5;

export interface MeasuringWork {
  readonly tries: number;
  readonly storageKey: string;
  readonly bytes: number;
}

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
             WHERE sha256 = :sha256 AND state = 'refused' AND (measurer_version < :version OR fault_code IN (:passingFaults))`,
            values,
            tx,
          );
    if (added + renewed > 0) return this.queue.add(tx, measureFile, { sha256, fileName });
    const [old] = await selectRows<{ sha256: string; fileName: string }>(
      this.database,
      `SELECT sha256, :fileName AS fileName FROM measurements
       WHERE sha256 = :sha256 AND state = 'measured' AND measurer_version < :version`,
      { ...values, fileName },
      tx,
    );
    if (old) await this.addRenewals(tx, [old]);
  }

  /** Used meshes that an older measurer measured, each with one of its names. */
  outdated(): Promise<{ sha256: string; fileName: string }[]> {
    return selectRows(
      this.database,
      `SELECT m.sha256, MIN(f.file_name) AS fileName FROM measurements m JOIN revision_files f ON f.sha256 = m.sha256
       WHERE m.state = 'measured' AND m.measurer_version < :version GROUP BY m.sha256`,
      { version: MEASURER_VERSION },
    );
  }

  async addRenewals(tx: Tx, meshes: readonly { sha256: string; fileName: string }[]): Promise<void> {
    for (const [at, { sha256, fileName }] of meshes.entries())
      await this.queue.add(
        tx,
        renewMeasurement,
        { sha256, fileName },
        { key: `measure-${MEASURER_VERSION}-${sha256}`, runAt: this.clock.in(at * RENEWAL_PACE_SECONDS) },
      );
  }

  /**
   * Takes a waiting file up. Counts the tries, so that a file which ends the whole process is not taken up
   * for ever.
   * @returns null where it is measured already
   */
  async begin(sha256: string): Promise<MeasuringWork | null> {
    const mine = await touchRows(
      this.database,
      `UPDATE measurements SET state = 'measuring', tries = tries + 1 WHERE sha256 = :sha256 AND state IN ('waiting', 'measuring')`,
      { sha256 },
    );
    return mine === 0 ? null : this.workOn(sha256);
  }

  /**
   * Takes a measured file up that an older measurer measured. It stays measured: what stands in a released
   * revision goes on showing what was found before.
   * @returns null where there is nothing newer to find
   */
  async beginRenewal(sha256: string): Promise<MeasuringWork | null> {
    const mine = await touchRows(
      this.database,
      `UPDATE measurements SET tries = tries + 1 WHERE sha256 = :sha256 AND state = 'measured' AND measurer_version < :version`,
      { sha256, version: MEASURER_VERSION },
    );
    return mine === 0 ? null : this.workOn(sha256);
  }

  private async workOn(sha256: string): Promise<MeasuringWork | null> {
    const [record, file] = await Promise.all([this.records.findByPk(sha256), this.stored.findByPk(sha256)]);
    if (!record || !file) return null;
    return { tries: record.tries, storageKey: keyOf('files', sha256), bytes: file.bytes };
  }

  /** Keeps what was found, and has the mesh compared with what it takes the place of. */
  async keepMeasured(sha256: string, result: MeshFindings): Promise<void> {
    await this.transactions.run(async (tx) => {
      const [kept] = await this.records.update(
        { ...this.columnsOf(result), state: 'measured', fault: null, faultCode: null },
        { where: { sha256, state: 'measuring' }, transaction: tx },
      );
      if (kept > 0) await this.comparisons.ofMeasuredFile(tx, sha256);
    });
  }

  /** @param result null where the newer measurer refuses what an older one measured: that then stands */
  async keepRenewed(sha256: string, result: MeshFindings | null): Promise<void> {
    await this.transactions.run(async (tx) => {
      const [kept] = await this.records.update(
        result ? this.columnsOf(result) : { measurerVersion: MEASURER_VERSION },
        {
          where: { sha256, state: 'measured', measurerVersion: { [Op.lt]: MEASURER_VERSION } },
          transaction: tx,
        },
      );
      if (kept > 0 && result) await this.comparisons.ofMeasuredFile(tx, sha256);
    });
  }

  private columnsOf({ preview, measurement, ...result }: MeshFindings): Partial<MeasurementRecord> {
    return {
      ...result,
      measurement: { ...measurement, previewBytes: preview.bytes },
      previewSha256: preview.sha256,
      measurerVersion: MEASURER_VERSION,
      tries: 0,
      measuredAt: this.clock.now(),
    };
  }

  /** @param fault what is wrong, to follow the file's name in a sentence */
  async keepRefused(sha256: string, faultCode: string, fault: string): Promise<void> {
    await this.records.update(
      { state: 'refused', fault, faultCode, measuredAt: this.clock.now() },
      { where: { sha256, state: 'measuring' } },
    );
  }
}
