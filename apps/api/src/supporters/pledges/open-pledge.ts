import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsRefused, PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Subscriptions, type PledgePage } from '../../adapters/payments/subscriptions.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { RateLimits } from '../../http/rate-limits.js';
import { Refusal } from '../../http/refusal.js';
import { isStillWorthOpening, payUntil } from '../../payments/pay-until.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import { GiveUpPledge } from './give-up-pledge.js';
import { PledgeHistory } from './pledge-history.js';
import { Pledge } from './pledge.model.js';
import { PlacePledge } from './place-pledge.js';
import { serviceAway } from './service-away.js';

type Body = Handled<'POST /pledges'>['body'];

/**
 * From plan to payment page: the pledge is written, then its page is opened and noted, each in a step that can be
 * done again. The address is shown only once it is noted, so nobody pays on a page the shop does not know.
 */
@Injectable()
export class OpenPledge {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly subscriptions: Subscriptions,
    private readonly placing: PlacePledge,
    private readonly givingUp: GiveUpPledge,
    private readonly history: PledgeHistory,
    private readonly limits: RateLimits,
    private readonly clock: Clock,
  ) {}

  async open(body: Body, person: SignedIn): Promise<Answer<'POST /pledges'>> {
    if (!person.isVerified)
      throw new Refusal(
        'address-not-verified',
        'Confirm your e-mail address first: open the link we mailed you, or ask for a new one in your account.',
      );
    await this.limits.take('checkout', `pledge:${person.id}`);
    const pledge = await this.placed(body, person);
    if (pledge.state !== 'opening')
      throw new Refusal('pledge-cannot', 'This page was used already. Reload it and go on from there.');
    try {
      const paymentUrl = await this.pageOf(pledge, person);
      return { pledgeId: pledge.id, paymentUrl };
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw serviceAway();
      if (!(fault instanceof PaymentsRefused)) throw fault;
      await this.givingUp.end(pledge.id, `The payment service refused to open a page: ${fault.message}`);
      throw new Refusal(
        'payment-refused',
        'The payment service refused this pledge, so it was ended and nothing is charged. Start again.',
      );
    }
  }

  /** One that is still open makes way; one that is under way does not. */
  private async placed(body: Body, person: SignedIn): Promise<Pledge> {
    const first = await this.placing.place(body, person);
    if (first.isPlaced) return first.pledge;
    if (first.pledge.state === 'opening') {
      await this.givingUp.giveUp(first.pledge);
      const second = await this.placing.place(body, person);
      if (second.isPlaced) return second.pledge;
    }
    throw new Refusal('pledge-exists', 'You pledge already. Open your pledge to change its plan.');
  }

  private async pageOf(pledge: Pledge, person: SignedIn): Promise<string> {
    if (pledge.sessionId && pledge.paymentUrl) return pledge.paymentUrl;
    const plan = await this.plans.findByPk(pledge.planId, { rejectOnEmpty: true });
    const now = this.clock.now();
    const until =
      pledge.payUntil && isStillWorthOpening(pledge.payUntil, now, this.config.CHECKOUT_MINUTES)
        ? pledge.payUntil
        : payUntil(now, this.config.CHECKOUT_MINUTES);
    const customerId = await this.subscriptions.ensureCustomer(person.email, person.name || null, person.id);
    const page = await this.subscriptions.openPledgePage({
      pledgeId: pledge.id,
      customerId,
      planName: plan.name,
      amountMinor: pledge.amountMinor,
      currency: pledge.currency,
      successUrl: `${this.config.BASE_URL}/account/pledge`,
      cancelUrl: `${this.config.BASE_URL}/support`,
      expiresAt: until,
      metadata: { plan: plan.id },
      idempotencyKey: `open-pledge-${pledge.id}-${Math.ceil(until.getTime() / 1000)}`,
    });
    const noted = await this.note(pledge.id, customerId, page);
    if (noted.sessionId !== page.id) await this.drop(page);
    if (noted.state !== 'opening' || !noted.paymentUrl)
      throw new Refusal('pledge-cannot', 'This pledge was ended in the meantime. Start again.');
    return noted.paymentUrl;
  }

  private note(pledgeId: string, customerId: string, page: PledgePage): Promise<Pledge> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, {
        transaction: tx,
        lock: tx.LOCK.UPDATE,
        rejectOnEmpty: true,
      });
      if (pledge.state !== 'opening' || pledge.sessionId) return pledge;
      await pledge.update(
        {
          customerId,
          sessionId: page.id,
          paymentUrl: page.url,
          payUntil: page.expiresAt,
          updatedAt: this.clock.now(),
        },
        { transaction: tx },
      );
      await this.history.add(tx, pledgeId, 'payment page opened', `until ${page.expiresAt.toISOString()}`);
      return pledge;
    }, 'read-committed');
  }

  /** Nobody has seen this page; it would end by itself, but there is no reason to leave it open. */
  private async drop(page: PledgePage): Promise<void> {
    await this.subscriptions.expirePage(page.id).catch(() => undefined);
  }
}
