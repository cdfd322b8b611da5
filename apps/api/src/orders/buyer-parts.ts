import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { SqlPart } from '../database/sql-part.js';

/** Buyers as parts of other rooms' queries. */
@Injectable()
export class BuyerParts {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** One column: whoever paid an order from one of these countries, by account or else by address. */
  from(countries: readonly string[]): SqlPart {
    return {
      sql: `SELECT COALESCE(CONVERT(person_id USING utf8mb4) COLLATE utf8mb4_unicode_ci, email) FROM orders
        WHERE paid_at IS NOT NULL AND declared_country IN (:buyerCountries)`,
      values: { buyerCountries: countries },
    };
  }

  async countries(): Promise<string[]> {
    const rows = await selectRows<{ one: string }>(
      this.database,
      'SELECT DISTINCT declared_country AS one FROM orders WHERE paid_at IS NOT NULL ORDER BY one',
    );
    return rows.map(({ one }) => one);
  }
}
