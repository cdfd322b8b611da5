import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled, WorkshopPlan } from '@windchest/contracts';
import { formatMoney } from '@windchest/money';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { isDuplicate } from '../../database/errors.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { smallestChargeOf } from '../../payments/smallest-charge.js';
import { followPlan } from './follow-plan.job.js';
import { PlanKits } from './plan-kits.js';
import { PlansView } from './plans-view.js';
import { PledgePlan } from './pledge-plan.model.js';

type Body = Handled<'POST /workshop/plans'>['body'];

/**
 * Making and changing plans. A new amount, and what stays after the end, hold for new pledges: each pledge
 * keeps its own copy. A change of the kits is for all, and their shelves follow.
 */
@Injectable()
export class SavePlan {
  constructor(
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly kits: PlanKits,
    private readonly view: PlansView,
    private readonly staffLog: StaffLog,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  async create(by: SignedIn, body: Body): Promise<WorkshopPlan> {
    await this.check(body);
    const id = newId();
    const now = this.clock.now();
    await unlessTaken(body.name, () =>
      this.transactions.run(async (tx) => {
        await this.plans.create(
          { id, ...columnsOf(body), currency: this.config.WORKSHOP_CURRENCY, createdAt: now, updatedAt: now },
          { transaction: tx },
        );
        await this.kits.set(tx, id, body.hasAllKits ? [] : body.kitIds);
        await this.staffLog.record(tx, by, { what: 'made a pledge plan', subject: body.name, after: body });
      }),
    );
    return this.view.one(id);
  }

  async change(by: SignedIn, planId: string, body: Body): Promise<WorkshopPlan> {
    await this.check(body);
    await unlessTaken(body.name, () =>
      this.transactions.run(async (tx) => {
        const plan = await this.plans.findByPk(planId, { transaction: tx, lock: tx.LOCK.UPDATE });
        if (!plan) throw notFound('pledge plan');
        const before = { ...bodyOf(plan), kitIds: plan.hasAllKits ? [] : await this.kits.idsOf(plan, tx) };
        const hasOtherKits = await this.kits.set(tx, planId, body.hasAllKits ? [] : body.kitIds);
        const isFollowed = !hasOtherKits && plan.hasAllKits === body.hasAllKits;
        const kitsVersion = plan.kitsVersion + (isFollowed ? 0 : 1);
        await plan.update(
          { ...columnsOf(body), kitsVersion, updatedAt: this.clock.now() },
          { transaction: tx },
        );
        if (!isFollowed)
          await this.jobs.add(tx, followPlan, { planId }, { key: `follow-plan:${planId}:${kitsVersion}` });
        await this.staffLog.record(tx, by, {
          what: 'changed a pledge plan',
          subject: body.name,
          before,
          after: body,
        });
      }),
    );
    return this.view.one(planId);
  }

  private async check({ amountMinor, kitIds }: Body): Promise<void> {
    const currency = this.config.WORKSHOP_CURRENCY;
    const least = smallestChargeOf(currency);
    if (amountMinor < least) {
      const show = (minor: number): string => formatMoney({ minor, currency }, this.config.WORKSHOP_LOCALE);
      const sentence = `The payment service charges nothing below ${show(least)}. Ask for ${show(least)} or more a month.`;
      throw new Refusal('plan-refused', sentence, { fields: { amountMinor: sentence } });
    }
    const known = new Set((await this.catalogue.kitsByIds(kitIds)).map((kit) => kit.id));
    if (kitIds.some((id) => !known.has(id)))
      throw new Refusal('plan-refused', 'One of the kits does not exist any more. Choose the kits again.', {
        fields: { kitIds: 'Choose the kits again.' },
      });
  }
}

const columnsOf = ({ name, words, amountMinor, hasAllKits, keepsAfter, isOffered }: Body) => ({
  name,
  words,
  amountMinor,
  hasAllKits,
  keepsAfter,
  isOffered,
});

const bodyOf = (plan: PledgePlan) =>
  columnsOf({ ...(plan.get({ plain: true }) as Omit<Body, 'kitIds'>), kitIds: [] });

const unlessTaken = async (name: string, work: () => Promise<void>): Promise<void> => {
  try {
    await work();
  } catch (fault) {
    if (!isDuplicate(fault, 'pledge_plans_name')) throw fault;
    throw new Refusal('already-exists', `There is a plan “${name}” already. Choose another name.`, {
      fields: { name: 'This name is taken.' },
    });
  }
};
