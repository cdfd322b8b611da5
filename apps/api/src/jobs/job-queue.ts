import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import type { JobDefinition } from './job.js';
import { JobBell } from './job-bell.js';

export interface AddOptions {
  readonly runAt?: Date;
  /** A second job with the same key is not written; a key never becomes free again. */
  readonly key?: string;
}

/** Writes jobs in the transaction that causes them. */
@Injectable()
export class JobQueue {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
    private readonly bell: JobBell,
  ) {}

  async add<P extends z.ZodType>(
    tx: Tx,
    definition: JobDefinition<P>,
    payload: z.input<P>,
    options: AddOptions = {},
  ): Promise<void> {
    const now = this.clock.now();
    await touchRows(
      this.database,
      `INSERT INTO jobs (name, payload, dedupe_key, run_at, created_at) VALUES (:name, :payload, :key, :runAt, :now)
       ON DUPLICATE KEY UPDATE id = id`,
      {
        name: definition.name,
        payload: JSON.stringify(definition.payload.parse(payload)),
        key: options.key ?? null,
        runAt: options.runAt ?? now,
        now,
      },
      tx,
    );
    if (!options.runAt || options.runAt <= now) tx.afterCommit(() => this.bell.ring());
  }

  /** Jobs that were tried as often as they may be: somebody has to look. */
  async countDead(): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      `SELECT COUNT(*) AS count FROM jobs WHERE state = 'dead'`,
    );
    return Number(row?.count ?? 0);
  }
}
