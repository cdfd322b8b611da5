import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled, Pledge as PledgeAnswer, PledgeDeed } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { RateLimits } from '../../http/rate-limits.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import { deedsOf } from './deeds.js';
import { LookAtPledge } from './look-at-pledge.js';
import { lookAtPledge } from './look-at-pledge.job.js';
import { OwnPledges } from './own-pledges.js';
import { paymentAfter } from './payment-days.js';
import { PledgeHistory } from './pledge-history.js';
import { PledgeMails } from './pledge-mails.js';
import { PledgeView } from './pledge-view.js';
import { Pledge } from './pledge.model.js';

const PASS_ON_SECONDS = 10;

/**
 * What a supporter does with a pledge. The wish is written down first, with a job that passes it on; then the
 * payment service is told at once. Where it cannot be reached the wish stands all the same.
 */
@Injectable()
export class ChangePledge {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    private readonly transactions: Transactions,
    private readonly own: OwnPledges,
    private readonly view: PledgeView,
    private readonly looking: LookAtPledge,
    private readonly mails: PledgeMails,
    private readonly history: PledgeHistory,
    private readonly jobs: JobQueue,
    private readonly limits: RateLimits,
    private readonly clock: Clock,
  ) {}

  end(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    return this.wish(pledgeId, person, 'end', async (tx, pledge) => {
      await pledge.update({ endWish: 'end' }, { transaction: tx });
      await this.history.add(tx, pledge.id, 'end asked for', `it was ${pledge.state}`);
    });
  }

  keep(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    return this.wish(pledgeId, person, 'keep', async (tx, pledge) => {
      await pledge.update({ endWish: 'keep' }, { transaction: tx });
      await this.history.add(tx, pledge.id, 'end taken back');
    });
  }

  pause(pledgeId: string, person: SignedIn, months: number): Promise<PledgeAnswer> {
    return this.wish(pledgeId, person, 'pause', async (tx, pledge) => {
      const first = (await this.view.firstPayments([pledgeId], tx)).get(pledgeId);
      if (!pledge.nextPaymentAt || !pledge.paidUntil || !first)
        throw new Refusal('pledge-cannot', 'The next payment is not known yet. Try again in a minute.');
      const pausedUntil = paymentAfter(pledge.nextPaymentAt, months, first);
      await pledge.update({ pauseWish: 'pause', pausedUntil }, { transaction: tx });
      await this.history.add(tx, pledge.id, 'pause asked for', `until ${pausedUntil.toISOString()}`);
      await this.mails.paused(tx, pledge, pledge.paidUntil, pausedUntil);
    });
  }

  resume(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    return this.wish(pledgeId, person, 'resume', async (tx, pledge) => {
      await pledge.update({ pauseWish: 'resume', pausedUntil: null }, { transaction: tx });
      await this.history.add(tx, pledge.id, 'pause taken back');
    });
  }

  changePlan(
    { params, body }: Handled<'PUT /pledges/:pledgeId/plan'>,
    person: SignedIn,
  ): Promise<PledgeAnswer> {
    return this.wish(params.pledgeId, person, 'change-plan', async (tx, pledge) => {
      if (body.planId === pledge.planId) return this.stay(tx, pledge);
      const plan = await this.plans.findByPk(body.planId, { transaction: tx });
      if (!plan?.isOffered || plan.currency !== pledge.currency)
        throw new Refusal('plan-refused', 'This plan is not offered any more. Choose another one.');
      // A pause may be dropped later: whatever is paid after the month that runs is of the new plan.
      const from = pledge.periodEnd;
      if (!from)
        throw new Refusal('pledge-cannot', 'The next payment is not known yet. Try again in a minute.');
      await pledge.update(
        {
          nextPlanId: plan.id,
          nextAmountMinor: plan.amountMinor,
          nextKeepsAfter: plan.keepsAfter,
          nextPlanFrom: from,
          amountWish: plan.amountMinor,
        },
        { transaction: tx },
      );
      await this.history.add(tx, pledge.id, 'plan chosen', `${plan.name} from ${from.toISOString()}`);
      await this.mails.planChanges(tx, pledge, plan, pledge.pausedUntil ?? from);
    });
  }

  keepPlan(pledgeId: string, person: SignedIn): Promise<PledgeAnswer> {
    return this.wish(pledgeId, person, 'keep-plan', (tx, pledge) => this.stay(tx, pledge));
  }

  private async stay(tx: Tx, pledge: Pledge): Promise<void> {
    if (!pledge.nextPlanId) return;
    await pledge.update(
      {
        nextPlanId: null,
        nextAmountMinor: null,
        nextKeepsAfter: null,
        nextPlanFrom: null,
        amountWish: pledge.amountMinor,
      },
      { transaction: tx },
    );
    await this.history.add(tx, pledge.id, 'plan kept');
  }

  private async wish(
    pledgeId: string,
    person: SignedIn,
    deed: PledgeDeed,
    write: (tx: Tx, pledge: Pledge) => Promise<void>,
  ): Promise<PledgeAnswer> {
    await this.own.find(pledgeId, person);
    await this.limits.take('checkout', `pledge:${person.id}`);
    await this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!pledge) throw notFound('pledge');
      if (!deedsOf(pledge).includes(deed)) throw cannot(deed);
      await write(tx, pledge);
      await pledge.update({ updatedAt: this.clock.now() }, { transaction: tx });
      await this.jobs.add(tx, lookAtPledge, { pledgeId }, { runAt: this.clock.in(PASS_ON_SECONDS) });
    }, 'read-committed');
    try {
      await this.looking.look(pledgeId);
    } catch (fault) {
      // The job passes the wish on as soon as somebody answers there.
      if (!(fault instanceof PaymentsUnreachable)) throw fault;
    }
    return this.own.show(pledgeId, person);
  }
}

const sentences: Partial<Record<PledgeDeed, string>> = {
  'change-plan': 'The plan can be changed while the pledge is paid and goes on.',
  'keep-plan': 'No other plan is chosen.',
  pause: 'A pledge can be paused while it is paid and goes on.',
  resume: 'This pledge is not paused.',
  end: 'This pledge has an end already.',
  keep: 'The end cannot be taken back any more. Begin a new pledge.',
};
const cannot = (deed: PledgeDeed): Refusal =>
  new Refusal('pledge-cannot', sentences[deed] ?? 'This cannot be done with the pledge as it stands now.');
