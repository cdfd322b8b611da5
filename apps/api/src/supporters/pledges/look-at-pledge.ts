import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { PledgeState } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsRefused } from '../../adapters/payments/payments.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { touchRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import { AskService } from './ask-service.js';
import { FollowPledge } from './follow-pledge.js';
import type { PledgeRecord } from './pledge-record.js';
import { Pledge } from './pledge.model.js';
import { standingOf } from './standing.js';
import { missingDeeds } from './wishes.js';

/** A deed may bring another to light, such as a cancellation that came too late. */
const MOST_ROUNDS = 3;

/**
 * Brings a pledge and the payment service into agreement: what was wished here is passed on, and what stands there
 * is followed. Events, jobs and the supporter's own clicks all end here.
 *
 * Each look takes a number before it asks. Whoever comes with a lower number than one already followed is dropped:
 * the higher number was asked later, so it saw all that the lower one was called for.
 */
@Injectable()
export class LookAtPledge {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly service: AskService,
    private readonly following: FollowPledge,
    private readonly clock: Clock,
  ) {}

  /**
   * @returns how the pledge stands, or null where there is none
   * @throws PaymentsUnreachable
   */
  async look(pledgeId: string): Promise<PledgeState | null> {
    await this.adoptCard(pledgeId);
    for (let round = 1; ; round++) {
      const look = await this.takeNumber(pledgeId);
      const pledge = look === null ? null : await this.pledges.findByPk(pledgeId);
      if (look === null || !pledge) return null;
      if (!pledge.sessionId && !pledge.subscriptionId) return pledge.state;
      const record = pledge.get({ plain: true }) as PledgeRecord;
      const view = await this.service.view(record);
      const now = this.clock.now();
      const standing = standingOf(record, view, now, this.config.PLEDGE_GRACE_DAYS);
      const deeds = missingDeeds(record, view, standing, now);
      if (deeds.length === 0 || round === MOST_ROUNDS || !view.subscriptionId)
        return this.following.follow(pledgeId, look, view);
      for (const deed of deeds)
        await this.service.perform(view.subscriptionId, deed, `${deed.kind}-${pledgeId}-${look}`);
    }
  }

  private takeNumber(pledgeId: string): Promise<number | null> {
    return this.transactions.run(async (tx) => {
      const taken = await touchRows(
        this.database,
        'UPDATE pledges SET looks = looks + 1 WHERE id = :pledgeId',
        { pledgeId },
        tx,
      );
      if (taken === 0) return null;
      const pledge = await this.pledges.findByPk(pledgeId, { attributes: ['looks'], transaction: tx });
      return pledge?.looks ?? null;
    }, 'read-committed');
  }

  private async adoptCard(pledgeId: string): Promise<void> {
    const pledge = await this.pledges.findByPk(pledgeId, { attributes: ['cardPageId'] });
    if (!pledge?.cardPageId) return;
    try {
      if ((await this.service.adoptCard(pledge.cardPageId)) === 'open') return;
    } catch (fault) {
      if (!(fault instanceof PaymentsRefused)) throw fault;
    }
    // Another page may have been opened meanwhile; that one stays to be looked at.
    await touchRows(
      this.database,
      'UPDATE pledges SET card_page_id = NULL WHERE id = :pledgeId AND card_page_id = :cardPageId',
      { pledgeId, cardPageId: pledge.cardPageId },
    );
  }
}
