import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { ProductKind } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { SalesTax } from '../orders/sales-tax.js';
import { rateText } from './rate-text.js';

/** Rates by country and kind of product, from a table with dates. Not tax advice: ask a licensed adviser. */
@Injectable()
export class TaxRates implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly salesTax: SalesTax,
  ) {}

  onModuleInit(): void {
    this.salesTax.registerRates((country, kind, on, tx) => this.knownRateOn(country, kind, on, tx));
  }

  /** @returns the rate in percent as decimal text, `25.5`; null where nobody has entered one */
  async knownRateOn(country: string, kind: ProductKind, on: Date, tx?: Tx): Promise<string | null> {
    const [row] = await selectRows<{ rate: string | number }>(
      this.database,
      `SELECT rate_percent AS rate FROM tax_rates
       WHERE country = :country AND product_kind = :kind AND valid_from <= :day ORDER BY valid_from DESC LIMIT 1`,
      { country, kind, day: on.toISOString().slice(0, 10) },
      tx,
    );
    return row ? rateText(row.rate) : null;
  }

  /** The same as it is charged: `0` for a country without a rate, which does not mean that there is no tax there. */
  async rateOn(country: string, kind: ProductKind, on: Date, tx?: Tx): Promise<string> {
    return (await this.knownRateOn(country, kind, on, tx)) ?? '0';
  }
}
