import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';

/** All that is sold so far: files handed over by a network. */
export type ProductKind = 'electronic-service';

/** Rates by country and kind of product, from a table with dates. Not tax advice: ask a licensed adviser. */
@Injectable()
export class TaxRates {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /**
   * @returns the rate in percent as decimal text, `25.5`; `0` for a country that is not in the table, which
   * means that the shop does not know a tax to charge there, not that there is none
   */
  async rateOn(country: string, kind: ProductKind, on: Date, tx?: Tx): Promise<string> {
    const [row] = await selectRows<{ rate: string | number }>(
      this.database,
      `SELECT rate_percent AS rate FROM tax_rates
       WHERE country = :country AND product_kind = :kind AND valid_from <= :day ORDER BY valid_from DESC LIMIT 1`,
      { country, kind, day: on.toISOString().slice(0, 10) },
      tx,
    );
    // DECIMAL comes as `25.500`.
    return row
      ? String(row.rate)
          .replace(/(\.\d*?)0+$/, '$1')
          .replace(/\.$/, '')
      : '0';
  }
}
