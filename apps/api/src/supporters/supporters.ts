import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { SupporterRow } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { Pledge } from './pledges/pledge.model.js';
import { ListSupporters, type SupporterFilter } from './workshop/list-supporters.js';

/** What other rooms may ask about supporters. */
@Injectable()
export class Supporters {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly listing: ListSupporters,
  ) {}

  /** Whether a person pledges now: paid, or within the grace days. A pledge that rests does not count. */
  async isCurrent(personId: string, tx?: Tx): Promise<boolean> {
    const count = await this.pledges.count({
      where: { personId, state: ['current', 'grace'] },
      transaction: tx ?? null,
    });
    return count > 0;
  }

  /** All supporters a query finds, newest first, read in small portions. */
  matching(query: SupporterFilter): AsyncGenerator<SupporterRow> {
    return this.listing.all(query);
  }

  async countFlagged(): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      'SELECT COUNT(*) AS count FROM pledges WHERE JSON_LENGTH(flags) > 0',
    );
    return Number(row?.count ?? 0);
  }
}
