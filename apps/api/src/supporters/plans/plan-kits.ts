import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { KitInShopSteps } from '../../catalogue/kits/kit-in-shop-steps.js';
import type { Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { followPlan } from './follow-plan.job.js';
import { PledgePlanKit } from './pledge-plan-kit.model.js';
import { PledgePlan } from './pledge-plan.model.js';

/** Which kits a plan includes, now. */
@Injectable()
export class PlanKits implements OnModuleInit {
  constructor(
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectModel(PledgePlanKit) private readonly planKits: typeof PledgePlanKit,
    private readonly catalogue: CatalogueReader,
    private readonly inShop: KitInShopSteps,
    private readonly jobs: JobQueue,
  ) {}

  onModuleInit(): void {
    this.inShop.register({ name: 'pledge-plans', order: 20, run: (tx) => this.letAllPlansFollow(tx) });
  }

  async idsOf({ id, hasAllKits }: Pick<PledgePlan, 'id' | 'hasAllKits'>, tx?: Tx): Promise<string[]> {
    if (hasAllKits) return (await this.catalogue.kitsInShop(tx)).map((kit) => kit.id);
    const pairs = await this.planKits.findAll({
      where: { planId: id },
      order: [['kitId', 'ASC']],
      transaction: tx ?? null,
    });
    return pairs.map((pair) => pair.kitId);
  }

  /** @returns whether the kits are others than before */
  async set(tx: Tx, planId: string, kitIds: readonly string[]): Promise<boolean> {
    const before = await this.planKits.findAll({ where: { planId }, transaction: tx });
    const [old, wanted] = [new Set(before.map((pair) => pair.kitId)), new Set(kitIds)];
    if (old.size === wanted.size && [...wanted].every((id) => old.has(id))) return false;
    await this.planKits.destroy({ where: { planId }, transaction: tx });
    await this.planKits.bulkCreate(
      [...wanted].map((kitId) => ({ planId, kitId })),
      { transaction: tx },
    );
    return true;
  }

  private async letAllPlansFollow(tx: Tx): Promise<void> {
    const plans = await this.plans.findAll({ where: { hasAllKits: true }, transaction: tx });
    for (const { id } of plans) await this.jobs.add(tx, followPlan, { planId: id });
  }
}
