import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { QuarterSummary, SummaryRow } from '@windchest/contracts';
import { isDeepStrictEqual } from 'node:util';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { UnclearOrders } from '../../orders/unclear-orders.js';
import { addUp, totalsOf } from './add-up-quarter.js';
import { isQuarterOver, quarterDays, type Quarter } from './quarter-days.js';
import { QuarterPortions } from './quarter-portions.js';
import { TaxQuarters } from './tax-quarters.js';

type ReverseChargeRow = {
  vatNumber: string;
  name: string;
  country: string;
  currency: string;
  netMinor: number;
};

/**
 * What a quarter comes to, from its receipts and credit notes by the day they were issued. A receipt settled by hand
 * counts where it was settled; everything else counts as it is written.
 */
@Injectable()
export class SummariseQuarter {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly portions: QuarterPortions,
    private readonly quarters: TaxQuarters,
    private readonly unclear: UnclearOrders,
    private readonly clock: Clock,
  ) {}

  async summarise(quarter: Quarter, tx?: Tx): Promise<QuarterSummary> {
    const { firstDay, lastDay } = quarterDays(quarter);
    const [rows, standing, reverseCharge, counts, unclear] = [
      await this.rows(quarter, tx),
      await this.quarters.standing(quarter, tx),
      await this.reverseCharge(quarter, tx),
      await this.counts(quarter, tx),
      await this.countUnclear(quarter, tx),
    ];
    return {
      ...quarter,
      from: firstDay,
      to: lastDay,
      isOver: isQuarterOver(quarter, this.clock.now()),
      closedAt: standing?.closedAt?.toISOString() ?? null,
      closedBy: standing?.closedBy ?? null,
      isAsClosed: !standing?.closedAt || isDeepStrictEqual(standing.figures, rows),
      rows,
      totals: totalsOf(rows),
      reverseCharge,
      freeReceipts: counts.free,
      settled: counts.settled,
      unclear,
      missingRates: await this.missingRates(rows, lastDay, tx),
    };
  }

  async rows(quarter: Quarter, tx?: Tx): Promise<SummaryRow[]> {
    return addUp(await this.portions.of(quarter, tx));
  }

  countUnclear(quarter: Quarter, tx?: Tx): Promise<number> {
    const { from, until } = quarterDays(quarter);
    return this.unclear.countBetween(from, until, tx);
  }

  private async reverseCharge(quarter: Quarter, tx?: Tx): Promise<QuarterSummary['reverseCharge']> {
    const rows = await selectRows<ReverseChargeRow>(
      this.database,
      `SELECT vatNumber, MAX(name) AS name, country, currency, SUM(netMinor) AS netMinor FROM (
         SELECT JSON_VALUE(r.buyer, '$.vatNumber') AS vatNumber, JSON_VALUE(r.buyer, '$.name') AS name, r.country,
                r.currency, r.total_minor AS netMinor
         FROM receipts r LEFT JOIN tax_settlements s ON s.receipt_id = r.id
         WHERE r.issued_at >= :from AND r.issued_at < :until AND COALESCE(s.tax_treatment, r.tax_treatment) = 'reverse-charge'
         UNION ALL
         SELECT JSON_VALUE(r.buyer, '$.vatNumber'), JSON_VALUE(r.buyer, '$.name'), r.country, n.currency, -n.total_minor
         FROM credit_notes n JOIN receipts r ON r.id = n.receipt_id LEFT JOIN tax_settlements s ON s.receipt_id = r.id
         WHERE n.issued_at >= :from AND n.issued_at < :until AND COALESCE(s.tax_treatment, r.tax_treatment) = 'reverse-charge'
       ) documents GROUP BY vatNumber, country, currency ORDER BY country, vatNumber`,
      { ...quarterDays(quarter) },
      tx,
    );
    return rows.map(({ vatNumber, name, country, currency, netMinor }) => ({
      vatNumber,
      name,
      country,
      net: { minor: Number(netMinor), currency },
    }));
  }

  private async counts(quarter: Quarter, tx?: Tx): Promise<{ free: number; settled: number }> {
    const [row] = await selectRows<{ free: number | string | null; settled: number | string | null }>(
      this.database,
      `SELECT SUM(r.total_minor = 0) AS free, COUNT(s.receipt_id) AS settled
       FROM receipts r LEFT JOIN tax_settlements s ON s.receipt_id = r.id AND s.country <> r.country
       WHERE r.issued_at >= :from AND r.issued_at < :until`,
      { ...quarterDays(quarter) },
      tx,
    );
    return { free: Number(row?.free ?? 0), settled: Number(row?.settled ?? 0) };
  }

  private async missingRates(rows: readonly SummaryRow[], lastDay: string, tx?: Tx): Promise<string[]> {
    const countries = rows.filter((row) => row.treatment === 'consumer').map((row) => row.country);
    if (countries.length === 0) return [];
    const known = await selectRows<{ country: string }>(
      this.database,
      'SELECT DISTINCT country FROM tax_rates WHERE country IN (:countries) AND valid_from <= :lastDay',
      { countries, lastDay },
      tx,
    );
    const names = new Set(known.map((row) => row.country));
    return [...new Set(countries)].filter((country) => !names.has(country));
  }
}
