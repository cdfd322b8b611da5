import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows } from '../../database/rows.js';
import { UnclearOrders } from '../../orders/unclear-orders.js';
import { isQuarterOver, quarterDays } from './quarter-days.js';

interface Row {
  year: number;
  quarter: number;
  receipts: number | string;
  creditNotes: number | string;
  closedAt: Date | null;
  found: number | string;
}

/** Quarters in which anything was issued, newest first. */
@Injectable()
export class ListQuarters {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly unclear: UnclearOrders,
    private readonly clock: Clock,
  ) {}

  async page({
    page,
    size,
  }: Handled<'GET /workshop/ledger/quarters'>['query']): Promise<Answer<'GET /workshop/ledger/quarters'>> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT d.year, d.quarter, SUM(d.kind = 'receipt') AS receipts, SUM(d.kind = 'credit') AS creditNotes,
              MAX(q.closed_at) AS closedAt, COUNT(*) OVER () AS found
       FROM (SELECT YEAR(issued_at) AS year, QUARTER(issued_at) AS quarter, 'receipt' AS kind FROM receipts WHERE total_minor > 0
             UNION ALL SELECT YEAR(issued_at), QUARTER(issued_at), 'credit' FROM credit_notes) d
       LEFT JOIN tax_quarters q ON q.year = d.year AND q.quarter = d.quarter
       GROUP BY d.year, d.quarter ORDER BY d.year DESC, d.quarter DESC LIMIT :limit OFFSET :offset`,
      { limit: size, offset: (page - 1) * size },
    );
    const now = this.clock.now();
    const items = await Promise.all(
      rows.map(async ({ year, quarter, receipts, creditNotes, closedAt }) => {
        const { from, until } = quarterDays({ year, quarter });
        return {
          year,
          quarter,
          receipts: Number(receipts),
          creditNotes: Number(creditNotes),
          unclear: await this.unclear.countBetween(from, until),
          isOver: isQuarterOver({ year, quarter }, now),
          closedAt: closedAt?.toISOString() ?? null,
        };
      }),
    );
    return { items, page, size, total: Number(rows[0]?.found ?? 0) };
  }
}
