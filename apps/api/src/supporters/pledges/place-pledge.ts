import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { pledgeConsentText, type Handled } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { isDuplicate } from '../../database/errors.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { payUntil } from '../../payments/pay-until.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import { LIVE_STATES } from './follow-pledge.js';
import { FIRST_LOOK_SECONDS, lookAfterPledge } from './look-at-pledge.job.js';
import { PledgeHistory } from './pledge-history.js';
import { Pledge } from './pledge.model.js';

type Body = Handled<'POST /pledges'>['body'];

/** Writes a pledge that opens, with the job that looks after it; the same attempt finds what it made before. */
@Injectable()
export class PlacePledge {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly history: PledgeHistory,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  /** @returns the pledge placed, or the one of this person that stands in its way */
  async place(body: Body, person: SignedIn): Promise<{ pledge: Pledge; isPlaced: boolean }> {
    const known = await this.pledges.findOne({ where: { attempt: body.attempt } });
    if (known) return { pledge: sameAgain(known, body, person), isPlaced: true };
    const plan = await this.plans.findByPk(body.planId);
    if (!plan?.isOffered)
      throw new Refusal('plan-refused', 'This plan is not offered any more. Choose another one.');
    try {
      const placed = await this.transactions.run(
        (tx) => this.write(tx, body, person, plan),
        'read-committed',
      );
      return { pledge: placed, isPlaced: true };
    } catch (fault) {
      if (isDuplicate(fault, 'pledges_attempt')) return this.place(body, person);
      if (!isDuplicate(fault, 'pledges_live_person')) throw fault;
      const other = await this.pledges.findOne({
        where: { personId: person.id, state: [...LIVE_STATES] },
      });
      return other ? { pledge: other, isPlaced: false } : this.place(body, person);
    }
  }

  private async write(tx: Tx, body: Body, person: SignedIn, plan: PledgePlan): Promise<Pledge> {
    const now = this.clock.now();
    const pledge = await this.pledges.create(
      {
        id: newId(),
        personId: person.id,
        planId: plan.id,
        amountMinor: plan.amountMinor,
        currency: plan.currency,
        keepsAfter: plan.keepsAfter,
        state: 'opening',
        attempt: body.attempt,
        declaredCountry: body.country,
        flags: [],
        consentText: pledgeConsentText,
        consentAt: now,
        payUntil: payUntil(now, this.config.CHECKOUT_MINUTES),
        looks: 0,
        followedLook: 0,
        createdAt: now,
        updatedAt: now,
      },
      { transaction: tx },
    );
    await this.history.add(
      tx,
      pledge.id,
      'opening',
      `${plan.name}, ${plan.amountMinor} minor units of ${plan.currency}`,
    );
    await this.jobs.add(
      tx,
      lookAfterPledge,
      { pledgeId: pledge.id },
      { runAt: this.clock.in(FIRST_LOOK_SECONDS), key: `look-after-pledge:${pledge.id}` },
    );
    return pledge;
  }
}

const sameAgain = (pledge: Pledge, body: Body, person: SignedIn): Pledge => {
  if (
    pledge.personId !== person.id ||
    pledge.planId !== body.planId ||
    pledge.declaredCountry !== body.country
  )
    throw new Refusal('conflict', 'This page was used for another pledge. Reload it and go on from there.');
  return pledge;
};
