import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { SupporterRow } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { SupporterCheck } from '../coupons/supporter-check.js';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { OwnPledges } from './pledges/own-pledges.js';
import { Pledge } from './pledges/pledge.model.js';
import { ListSupporters, type SupporterFilter } from './workshop/list-supporters.js';

/** What other rooms may ask about supporters. */
@Injectable()
export class Supporters implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly listing: ListSupporters,
    private readonly own: OwnPledges,
    private readonly supporterCheck: SupporterCheck,
  ) {}

  onModuleInit(): void {
    this.supporterCheck.register((personId, tx) => this.isCurrent(personId, tx));
  }

  /** Whether a person pledges now: paid, or within the grace days. A pledge that rests does not count. */
  async isCurrent(personId: string, tx?: Tx): Promise<boolean> {
    const count = await this.pledges.count({
      where: { personId, state: ['current', 'grace'] },
      transaction: tx ?? null,
    });
    return count > 0;
  }

  /** @throws Refusal `not-found`, alike where there is no such pledge and where it is not theirs */
  async mustBeOwn(pledgeId: string, person: SignedIn): Promise<void> {
    await this.own.find(pledgeId, person);
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
