import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { SalesFigures } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';
import { OrdersReader } from '../../orders/orders-reader.js';

interface MonthRow {
  month: string;
  orders: number | string;
  grossMinor: number | string;
  refundedMinor: number | string;
}
interface CountryRow {
  country: string;
  orders: number | string;
  grossMinor: number | string;
}

/** Sales as the workshop looks at them: whole months up to this one, in UTC, in the workshop's currency. */
@Injectable()
export class ListSales {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly orders: OrdersReader,
    private readonly clock: Clock,
  ) {}

  async figures(months: number): Promise<SalesFigures> {
    const currency = this.config.WORKSHOP_CURRENCY;
    const money = (minor: number | string) => ({ minor: Number(minor), currency });
    const now = this.clock.now();
    const from = new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() - months + 1, 1));
    const [byMonth, byCountry, byKit] = await Promise.all([
      this.byMonth(from, currency),
      this.byCountry(from, currency),
      this.orders.salesByKit(from, currency),
    ]);
    const known = new Map(byMonth.map((row) => [row.month, row]));
    return {
      months: monthsFrom(from, months).map((month) => {
        const row = known.get(month);
        return {
          month,
          orders: Number(row?.orders ?? 0),
          gross: money(row?.grossMinor ?? 0),
          refunded: money(row?.refundedMinor ?? 0),
        };
      }),
      countries: byCountry.map(({ country, orders, grossMinor }) => ({
        country,
        orders: Number(orders),
        gross: money(grossMinor),
      })),
      kits: byKit.map(({ kitId, name, sold, grossMinor }) => ({
        kitId,
        name,
        sold,
        gross: money(grossMinor),
      })),
    };
  }

  private byMonth(from: Date, currency: string): Promise<MonthRow[]> {
    return selectRows<MonthRow>(
      this.database,
      `SELECT month, SUM(orders) AS orders, SUM(grossMinor) AS grossMinor, SUM(refundedMinor) AS refundedMinor FROM (
         SELECT DATE_FORMAT(issued_at, '%Y-%m') AS month, 1 AS orders, total_minor AS grossMinor, 0 AS refundedMinor
         FROM receipts WHERE issued_at >= :from AND currency = :currency
         UNION ALL
         SELECT DATE_FORMAT(issued_at, '%Y-%m'), 0, 0, total_minor
         FROM credit_notes WHERE issued_at >= :from AND currency = :currency
       ) documents GROUP BY month`,
      { from, currency },
    );
  }

  /** As receipts are counted: where one was settled by hand, there. */
  private byCountry(from: Date, currency: string): Promise<CountryRow[]> {
    return selectRows<CountryRow>(
      this.database,
      `SELECT COALESCE(s.country, r.country) AS country, COUNT(*) AS orders, SUM(r.total_minor) AS grossMinor
       FROM receipts r LEFT JOIN tax_settlements s ON s.receipt_id = r.id
       WHERE r.issued_at >= :from AND r.currency = :currency
       GROUP BY COALESCE(s.country, r.country) ORDER BY grossMinor DESC, country`,
      { from, currency },
    );
  }
}

const monthsFrom = (from: Date, count: number): string[] =>
  Array.from({ length: count }, (_, at) =>
    new Date(Date.UTC(from.getUTCFullYear(), from.getUTCMonth() + at, 1)).toISOString().slice(0, 7),
  );
