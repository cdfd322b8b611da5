import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { Op, type Sequelize } from 'sequelize';
import type { z } from 'zod';
import { touchRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import { HandlesJob, type JobHandler } from '../../jobs/job.js';
import { GiveRights } from '../pledges/give-rights.js';
import { Pledge } from '../pledges/pledge.model.js';
import { followPlan } from './follow-plan.job.js';
import { PledgePlan } from './pledge-plan.model.js';

const PORTION = 100;

/** Lets the shelves of a plan's supporters follow its kits, one supporter a transaction; run again it starts over. */
@Injectable()
@HandlesJob(followPlan)
export class FollowPlan implements JobHandler<typeof followPlan.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly transactions: Transactions,
    private readonly rights: GiveRights,
  ) {}

  async handle({ planId }: z.output<typeof followPlan.payload>): Promise<void> {
    const plan = await this.plans.findByPk(planId);
    if (!plan) return;
    let last = '';
    for (;;) {
      const portion = await this.pledges.findAll({
        attributes: ['id'],
        where: { planId, state: ['current', 'grace', 'paused'], id: { [Op.gt]: last } },
        order: [['id', 'ASC']],
        limit: PORTION,
      });
      for (const { id } of portion) await this.followOne(id, planId);
      if (portion.length < PORTION) break;
      last = portion.at(-1)!.id;
    }
    // A change made meanwhile has a job of its own.
    await touchRows(
      this.database,
      'UPDATE pledge_plans SET followed_version = :version WHERE id = :planId AND followed_version < :version',
      { planId, version: plan.kitsVersion },
    );
  }

  private followOne(id: string, planId: string): Promise<void> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (pledge?.planId === planId) await this.rights.give(tx, pledge);
    }, 'read-committed');
  }
}
