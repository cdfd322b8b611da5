import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, WorkshopPlan } from '@windchest/contracts';
import { Op, type Sequelize } from 'sequelize';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import { PlanKits } from './plan-kits.js';
import { PledgePlan } from './pledge-plan.model.js';

interface Sums {
  planId: string;
  supporters: number | string;
  monthlyMinor: number | string | null;
}

/** Plans as everybody sees them, and as the workshop does. */
@Injectable()
export class PlansView {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    private readonly kits: PlanKits,
    private readonly catalogue: CatalogueReader,
  ) {}

  async offered({ page, size, search }: Handled<'GET /plans'>['query']): Promise<Answer<'GET /plans'>> {
    const { rows, count } = await this.plans.findAndCountAll({
      where: { isOffered: true, ...named(search) },
      order: [
        ['amountMinor', 'ASC'],
        ['id', 'ASC'],
      ],
      limit: size,
      offset: (page - 1) * size,
    });
    const items = await Promise.all(
      rows.map(async (plan) => ({
        ...common(plan),
        kits: await this.catalogue.shopCards(await this.kits.idsOf(plan)),
      })),
    );
    return { items, page, size, total: count };
  }

  async list({
    page,
    size,
    search,
  }: Handled<'GET /workshop/plans'>['query']): Promise<Answer<'GET /workshop/plans'>> {
    const { rows, count } = await this.plans.findAndCountAll({
      where: named(search),
      order: [
        ['isOffered', 'DESC'],
        ['amountMinor', 'ASC'],
        ['id', 'ASC'],
      ],
      limit: size,
      offset: (page - 1) * size,
    });
    return { items: await this.show(rows), page, size, total: count };
  }

  async one(planId: string): Promise<WorkshopPlan> {
    const plan = await this.plans.findByPk(planId);
    const [shown] = plan ? await this.show([plan]) : [];
    if (!shown) throw notFound('pledge plan');
    return shown;
  }

  private async show(plans: readonly PledgePlan[]): Promise<WorkshopPlan[]> {
    if (plans.length === 0) return [];
    const sums = await selectRows<Sums>(
      this.database,
      `SELECT plan_id AS planId, COUNT(*) AS supporters, SUM(IF(state = 'current', amount_minor, 0)) AS monthlyMinor
       FROM pledges WHERE plan_id IN (:ids) AND state IN ('current', 'grace', 'paused') GROUP BY plan_id`,
      { ids: plans.map((plan) => plan.id) },
    );
    const sumOf = new Map(sums.map((sum) => [sum.planId, sum]));
    return Promise.all(
      plans.map(async (plan) => ({
        ...common(plan),
        kits: await this.catalogue.kitsByIds(await this.kits.idsOf(plan)),
        isOffered: plan.isOffered,
        supporters: Number(sumOf.get(plan.id)?.supporters ?? 0),
        monthly: { minor: Number(sumOf.get(plan.id)?.monthlyMinor ?? 0), currency: plan.currency },
        areShelvesUpToDate: plan.followedVersion >= plan.kitsVersion,
        createdAt: plan.createdAt.toISOString(),
        updatedAt: plan.updatedAt.toISOString(),
      })),
    );
  }
}

const named = (search: string | undefined) =>
  search ? { name: { [Op.like]: `%${search.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%` } } : {};

const common = ({ id, name, words, amountMinor, currency, hasAllKits, keepsAfter }: PledgePlan) => ({
  id,
  name,
  words,
  amount: { minor: amountMinor, currency },
  hasAllKits,
  keepsAfter,
});
