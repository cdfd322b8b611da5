import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Comparison as MeshComparison } from '@windchest/meshes';
import { Op, type Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows, touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { passingFaults } from '../files/passing-faults.js';
import { compareMeshes } from './compare-meshes.job.js';
import { MeshComparisonRecord } from './mesh-comparison.model.js';

/** Goes up when the same two meshes would compare differently; pairs are then compared again as they are used. */
const COMPARATOR_VERSION = 1;

export interface MeshPair {
  readonly beforeSha: string;
  readonly afterSha: string;
}
export type KnownComparison =
  | { readonly state: 'waiting' }
  | { readonly state: 'failed'; readonly fault: string }
  | { readonly state: 'compared'; readonly result: MeshComparison };

/** What is known of a pair of meshes at this moment. */
export type Knowledge = (pair: MeshPair) => KnownComparison;

/** What came of comparing two meshes: once for each pair, wherever it occurs. */
@Injectable()
export class MeshComparisons {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(MeshComparisonRecord) private readonly records: typeof MeshComparisonRecord,
    private readonly queue: JobQueue,
    private readonly clock: Clock,
  ) {}

  /** What is known of some pairs, and which of them nobody has asked for yet. */
  async known(pairs: readonly MeshPair[], tx?: Tx): Promise<{ of: Knowledge; unasked: MeshPair[] }> {
    const rows = pairs.length > 0 ? await this.rowsOf(pairs, tx) : [];
    const byPair = new Map(rows.map((row) => [nameOf(row), row]));
    return {
      of: (pair) => toKnown(byPair.get(nameOf(pair))),
      unasked: pairs.filter(
        (pair) => (byPair.get(nameOf(pair))?.comparatorVersion ?? 0) < COMPARATOR_VERSION,
      ),
    };
  }

  /**
   * Has pairs compared that are not yet. An earlier comparator's result stands until the new one is there.
   * @param isAnew tries those again that failed through no fault of the files
   */
  async want(tx: Tx, pairs: readonly MeshPair[], { isAnew = false } = {}): Promise<void> {
    // One order for all, so that two who want the same pairs do not wait for each other.
    for (const pair of [...pairs].sort((a, b) => (nameOf(a) < nameOf(b) ? -1 : 1))) {
      const values = { ...pair, version: COMPARATOR_VERSION, now: this.clock.now(), passingFaults, isAnew };
      const added = await touchRows(
        this.database,
        `INSERT INTO mesh_comparisons (before_sha, after_sha, comparator_version, created_at)
         VALUES (:beforeSha, :afterSha, :version, :now) ON DUPLICATE KEY UPDATE before_sha = before_sha`,
        values,
        tx,
      );
      const renewed =
        added === 1
          ? 0
          : await touchRows(
              this.database,
              `UPDATE mesh_comparisons SET state = 'waiting', tries = 0, comparator_version = :version, fault = NULL, fault_code = NULL
               WHERE before_sha = :beforeSha AND after_sha = :afterSha
                 AND (comparator_version < :version OR (:isAnew AND state = 'failed' AND fault_code IN (:passingFaults)))`,
              values,
              tx,
            );
      if (added + renewed > 0) await this.queue.add(tx, compareMeshes, pair);
    }
  }

  /**
   * Takes a waiting pair up, counts the tries, and says how many triangles both have.
   * @returns null where it is compared already
   */
  async begin(pair: MeshPair): Promise<{ tries: number; triangles: number } | null> {
    const mine = await touchRows(
      this.database,
      `UPDATE mesh_comparisons SET state = 'comparing', tries = tries + 1
       WHERE before_sha = :beforeSha AND after_sha = :afterSha AND state IN ('waiting', 'comparing')`,
      { ...pair },
    );
    if (mine === 0) return null;
    const [row] = await selectRows<{ tries: number; triangles: number | string | null }>(
      this.database,
      `SELECT c.tries, (SELECT SUM(JSON_VALUE(m.measurement, '$.triangles')) FROM measurements m
         WHERE m.sha256 IN (c.before_sha, c.after_sha)) AS triangles
       FROM mesh_comparisons c WHERE c.before_sha = :beforeSha AND c.after_sha = :afterSha`,
      { ...pair },
    );
    return row ? { tries: Number(row.tries), triangles: Number(row.triangles ?? 0) } : null;
  }

  async keepCompared(pair: MeshPair, result: MeshComparison): Promise<void> {
    await this.records.update(
      { result, state: 'compared', fault: null, faultCode: null, comparedAt: this.clock.now() },
      { where: { ...pair, state: 'comparing' } },
    );
  }

  /** @param fault why, to follow "because" in a sentence */
  async keepFailed(pair: MeshPair, faultCode: string, fault: string): Promise<void> {
    await this.records.update(
      { state: 'failed', fault, faultCode, comparedAt: this.clock.now() },
      { where: { ...pair, state: 'comparing' } },
    );
  }

  private rowsOf(pairs: readonly MeshPair[], tx?: Tx): Promise<MeshComparisonRecord[]> {
    return this.records.findAll({
      where: {
        beforeSha: { [Op.in]: [...new Set(pairs.map((pair) => pair.beforeSha))] },
        afterSha: { [Op.in]: [...new Set(pairs.map((pair) => pair.afterSha))] },
      },
      transaction: tx ?? null,
    });
  }
}

const nameOf = ({ beforeSha, afterSha }: MeshPair): string => `${beforeSha} ${afterSha}`;

const toKnown = (row: MeshComparisonRecord | undefined): KnownComparison => {
  if (row?.result) return { state: 'compared', result: row.result };
  if (row?.state === 'failed') return { state: 'failed', fault: row.fault ?? '' };
  return { state: 'waiting' };
};
