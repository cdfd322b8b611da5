import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { SummaryRow } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows, touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { Refusal } from '../../http/refusal.js';
import { quarterName, type Quarter } from './quarter-days.js';

export interface StandingQuarter {
  readonly closedAt: Date | null;
  readonly closedBy: string | null;
  readonly figures: readonly SummaryRow[] | null;
}

/** Which quarters are closed. Their rows are what settling a receipt and closing a quarter wait for each other at. */
@Injectable()
export class TaxQuarters {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async standing({ year, quarter }: Quarter, tx?: Tx): Promise<StandingQuarter | null> {
    const [row] = await selectRows<StandingQuarter & { figures: unknown }>(
      this.database,
      `SELECT closed_at AS closedAt, closed_by AS closedBy, figures FROM tax_quarters
       WHERE year = :year AND quarter = :quarter`,
      { year, quarter },
      tx,
    );
    if (!row) return null;
    const figures = typeof row.figures === 'string' ? (JSON.parse(row.figures) as unknown) : row.figures;
    return { ...row, figures: figures as StandingQuarter['figures'] };
  }

  /**
   * Locks a quarter's row until the transaction ends; best at `read-committed`.
   * @throws Refusal `quarter-is-closed`
   */
  async lockOpen(tx: Tx, quarter: Quarter): Promise<void> {
    // Makes the row or locks the one there is, so that two first comers do not lock each other out.
    await touchRows(
      this.database,
      `INSERT INTO tax_quarters (year, quarter) VALUES (:year, :quarter) ON DUPLICATE KEY UPDATE year = year`,
      { ...quarter },
      tx,
    );
    const [row] = await selectRows<{ closedAt: Date | null }>(
      this.database,
      'SELECT closed_at AS closedAt FROM tax_quarters WHERE year = :year AND quarter = :quarter FOR UPDATE',
      { ...quarter },
      tx,
    );
    if (row?.closedAt)
      throw new Refusal(
        'quarter-is-closed',
        `${quarterName(quarter)} is closed. What is put right now belongs into the quarter it is put right in: ask a licensed adviser how.`,
      );
  }

  async close(
    tx: Tx,
    { year, quarter }: Quarter,
    by: string,
    at: Date,
    figures: readonly SummaryRow[],
  ): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE tax_quarters SET closed_at = :at, closed_by = :by, figures = :figures
       WHERE year = :year AND quarter = :quarter AND closed_at IS NULL`,
      { year, quarter, by, at, figures: JSON.stringify(figures) },
      tx,
    );
  }
}
