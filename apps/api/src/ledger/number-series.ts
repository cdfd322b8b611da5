import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';

/**
 * Numbers without gaps, by series and year. The row stays locked until the transaction ends: a number taken
 * by one that is undone is given to the next. So take it late.
 */
@Injectable()
export class NumberSeries {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** The transaction must run at `read-committed`, or the row's lock would fail it under load. */
  async next(tx: Tx, series: string, year: number): Promise<number> {
    // One statement makes the year's first row or locks it, so two first comers do not lock each other out.
    await touchRows(
      this.database,
      `INSERT INTO number_series (series, year, last_number) VALUES (:series, :year, 1)
       ON DUPLICATE KEY UPDATE last_number = last_number + 1`,
      { series, year },
      tx,
    );
    const [row] = await selectRows<{ number: number }>(
      this.database,
      'SELECT last_number AS number FROM number_series WHERE series = :series AND year = :year FOR UPDATE',
      { series, year },
      tx,
    );
    if (!row) throw new Error(`The series ${series} of ${year} has lost its row.`);
    return row.number;
  }
}
