import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { People } from '../../accounts/people.js';
import { Clock } from '../../adapters/clock/clock.js';
import type { Tx } from '../../database/transactions.js';
import { PlanKits } from '../plans/plan-kits.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import { PledgePayment } from './pledge-payment.model.js';
import { PledgeRightsSteps } from './pledge-steps.js';
import type { Pledge } from './pledge.model.js';
import { rightsOf } from './rights.js';

/** Lets the shelf follow how a pledge stands, and which kits its plan has. */
@Injectable()
export class GiveRights {
  constructor(
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    private readonly kits: PlanKits,
    private readonly people: People,
    private readonly steps: PledgeRightsSteps,
    private readonly clock: Clock,
  ) {}

  /** The pledge's row must be locked by this transaction. */
  async give(tx: Tx, pledge: Pledge): Promise<void> {
    if (!pledge.beganAt) return;
    const [plan, person, last] = [
      await this.plans.findByPk(pledge.planId, { transaction: tx, rejectOnEmpty: true }),
      await this.people.byId(pledge.personId, tx),
      await this.payments.findOne({
        where: { pledgeId: pledge.id },
        order: [['periodStart', 'DESC']],
        transaction: tx,
      }),
    ];
    if (!person) return;
    const at = pledge.rightsUntil ?? this.clock.now();
    const rights = rightsOf(pledge, last !== null && last.disputeState !== null, at);
    await pledge.update({ rightsUntil: rights.isWhole ? null : at }, { transaction: tx });
    await this.steps.run(tx, {
      pledgeId: pledge.id,
      personId: pledge.personId,
      email: person.email,
      kitIds: await this.kits.idsOf(plan, tx),
      hasAllKits: plan.hasAllKits,
      rights,
      paidUntil: pledge.paidUntil,
    });
  }
}
