import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsRefused, PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Subscriptions } from '../../adapters/payments/subscriptions.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { RateLimits } from '../../http/rate-limits.js';
import { Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { deedsOf } from './deeds.js';
import { lookAtPledge } from './look-at-pledge.job.js';
import { OwnPledges } from './own-pledges.js';
import { PledgeHistory } from './pledge-history.js';
import { Pledge } from './pledge.model.js';
import { serviceAway } from './service-away.js';

/** In case neither event nor browser comes back from the page. */
const LOOK_AFTER_SECONDS = 900;

/** Opens the payment service's page for another card. Only the page opened last counts; earlier ones are closed. */
@Injectable()
export class ChangeCard {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly subscriptions: Subscriptions,
    private readonly own: OwnPledges,
    private readonly history: PledgeHistory,
    private readonly jobs: JobQueue,
    private readonly limits: RateLimits,
    private readonly clock: Clock,
  ) {}

  async open(
    pledgeId: string,
    person: SignedIn,
    attempt: string,
  ): Promise<Answer<'POST /pledges/:pledgeId/card'>> {
    const pledge = await this.own.find(pledgeId, person);
    const { customerId, subscriptionId, currency } = pledge;
    if (!customerId || !subscriptionId || !deedsOf(pledge).includes('card'))
      throw new Refusal('pledge-cannot', 'This pledge is over, and no card is needed for it.');
    await this.limits.take('checkout', `pledge:${person.id}`);
    const back = `${this.config.BASE_URL}/account/pledge`;
    try {
      const page = await this.subscriptions.openCardPage({
        customerId,
        pledgeId,
        subscriptionId,
        currency,
        successUrl: back,
        cancelUrl: back,
        idempotencyKey: `card-${pledgeId}-${attempt}`,
      });
      if (!page.url) throw new Refusal('pledge-cannot', 'This page was used already. Ask for another one.');
      const earlier = await this.note(pledgeId, page.id);
      if (earlier) await this.subscriptions.expirePage(earlier);
      return { url: page.url };
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw serviceAway();
      if (!(fault instanceof PaymentsRefused)) throw fault;
      throw new Refusal(
        'payment-refused',
        'The payment service opened no page for another card. Try again later.',
      );
    }
  }

  /** @returns the page that counted until now */
  private note(pledgeId: string, cardPageId: string): Promise<string | null> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, {
        transaction: tx,
        lock: tx.LOCK.UPDATE,
        rejectOnEmpty: true,
      });
      if (pledge.cardPageId === cardPageId) return null;
      const earlier = pledge.cardPageId;
      await pledge.update({ cardPageId, updatedAt: this.clock.now() }, { transaction: tx });
      await this.history.add(tx, pledgeId, 'page for another card opened');
      await this.jobs.add(tx, lookAtPledge, { pledgeId }, { runAt: this.clock.in(LOOK_AFTER_SECONDS) });
      return earlier;
    }, 'read-committed');
  }
}
