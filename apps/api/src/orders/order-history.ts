import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';

export interface HistoryEntry {
  readonly at: Date;
  readonly what: string;
  readonly detail: string;
}

/** What happened to an order, written in the transaction in which it happens. */
@Injectable()
export class OrderHistory {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
  ) {}

  async add(tx: Tx, orderId: string, what: string, detail = ''): Promise<void> {
    await touchRows(
      this.database,
      'INSERT INTO order_history (order_id, at, what, detail) VALUES (:orderId, :at, :what, :detail)',
      { orderId, at: this.clock.now(), what: what.slice(0, 60), detail: detail.slice(0, 500) },
      tx,
    );
  }

  list(orderId: string): Promise<HistoryEntry[]> {
    return selectRows<HistoryEntry>(
      this.database,
      'SELECT at, what, detail FROM order_history WHERE order_id = :orderId ORDER BY id',
      { orderId },
    );
  }

  async has(tx: Tx, orderId: string, what: string): Promise<boolean> {
    const rows = await selectRows(
      this.database,
      'SELECT 1 AS found FROM order_history WHERE order_id = :orderId AND what = :what LIMIT 1',
      { orderId, what },
      tx,
    );
    return rows.length > 0;
  }
}
