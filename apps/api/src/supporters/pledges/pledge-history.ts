import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows, touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import type { PledgeFlag } from './pledge-record.js';
import type { Pledge } from './pledge.model.js';

export interface PledgeHistoryEntry {
  readonly at: Date;
  readonly what: string;
  readonly detail: string;
}

/** What happened to a pledge, written in the transaction in which it happens. */
@Injectable()
export class PledgeHistory {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
  ) {}

  async add(tx: Tx, pledgeId: string, what: string, detail = ''): Promise<void> {
    await touchRows(
      this.database,
      'INSERT INTO pledge_history (pledge_id, at, what, detail) VALUES (:pledgeId, :at, :what, :detail)',
      { pledgeId, at: this.clock.now(), what: what.slice(0, 60), detail: detail.slice(0, 500) },
      tx,
    );
  }

  /** Marks a pledge for staff to look at, once for each flag. Its row must be locked by this transaction. */
  async flag(tx: Tx, pledge: Pledge, flag: PledgeFlag, detail: string): Promise<void> {
    if (pledge.flags.includes(flag)) return;
    await pledge.update({ flags: [...pledge.flags, flag] }, { transaction: tx });
    await this.add(tx, pledge.id, `flagged ${flag}`, detail);
  }

  list(pledgeId: string): Promise<PledgeHistoryEntry[]> {
    return selectRows<PledgeHistoryEntry>(
      this.database,
      'SELECT at, what, detail FROM pledge_history WHERE pledge_id = :pledgeId ORDER BY id',
      { pledgeId },
    );
  }
}
