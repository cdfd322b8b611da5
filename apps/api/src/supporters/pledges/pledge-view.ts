import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Pledge as PledgeAnswer } from '@windchest/contracts';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { Clock } from '../../adapters/clock/clock.js';
import type { Tx } from '../../database/transactions.js';
import { PlanKits } from '../plans/plan-kits.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import { deedsOf, isEnding } from './deeds.js';
import { paymentAfter } from './payment-days.js';
import { PledgePayment } from './pledge-payment.model.js';
import { Pledge } from './pledge.model.js';

/** Pledges as their supporters see them. */
@Injectable()
export class PledgeView {
  constructor(
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectModel(PledgePayment) private readonly paymentRows: typeof PledgePayment,
    private readonly kits: PlanKits,
    private readonly catalogue: CatalogueReader,
    private readonly clock: Clock,
  ) {}

  async one(pledge: Pledge): Promise<PledgeAnswer> {
    const [shown] = await this.many([pledge]);
    if (!shown) throw new Error('A pledge was shown as nothing.');
    return shown;
  }

  async many(pledges: readonly Pledge[]): Promise<PledgeAnswer[]> {
    const planIds = pledges.flatMap((one) => [one.planId, ...(one.nextPlanId ? [one.nextPlanId] : [])]);
    const plans = await this.plans.findAll({ where: { id: [...new Set(planIds)] } });
    const kitsOf = new Map(
      await Promise.all(
        plans.map(
          async (plan) => [plan.id, await this.catalogue.kitsByIds(await this.kits.idsOf(plan))] as const,
        ),
      ),
    );
    const nameOf = new Map(plans.map((plan) => [plan.id, plan.name]));
    const firstPayments = await this.firstPayments(pledges.map(({ id }) => id));
    const now = this.clock.now();
    return pledges.map((pledge) => {
      const isPayable = pledge.state === 'opening' && pledge.payUntil !== null && pledge.payUntil > now;
      const ends = isEnding(pledge) ? (pledge.endsAt ?? pledge.paidUntil) : null;
      return {
        id: pledge.id,
        state: pledge.state,
        plan: { id: pledge.planId, name: nameOf.get(pledge.planId) ?? '' },
        amount: { minor: pledge.amountMinor, currency: pledge.currency },
        keepsAfter: pledge.keepsAfter,
        kits: (kitsOf.get(pledge.planId) ?? []).map(({ slug, name, colour }) => ({ slug, name, colour })),
        nextPlan: nextPlanOf(pledge, nameOf),
        beganAt: iso(pledge.beganAt),
        paidUntil: iso(pledge.paidUntil),
        nextPaymentAt: ends ? null : iso(pledge.pausedUntil ?? pledge.nextPaymentAt),
        endsAt: iso(ends),
        pausedUntil: iso(pledge.pausedUntil),
        resumesAt: deedsOf(pledge).includes('resume') ? iso(pledge.periodEnd) : null,
        graceUntil: iso(pledge.graceUntil),
        settleUrl: pledge.state === 'grace' ? pledge.settleUrl : null,
        paymentUrl: isPayable ? pledge.paymentUrl : null,
        cardLast4: pledge.cardLast4,
        endedAt: iso(pledge.endedAt),
        deeds: deedsOf(pledge),
        pauses: deedsOf(pledge).includes('pause')
          ? pausesOf(pledge.nextPaymentAt, firstPayments.get(pledge.id))
          : [],
      };
    });
  }

  /** The day of a pledge's first payment says on which day of a month the others are. */
  async firstPayments(pledgeIds: readonly string[], tx?: Tx): Promise<Map<string, Date>> {
    const rows = await this.paymentRows.findAll({
      attributes: ['pledgeId', 'periodStart'],
      where: { pledgeId: [...pledgeIds] },
      order: [['periodStart', 'DESC']],
      transaction: tx ?? null,
    });
    return new Map(rows.map((row) => [row.pledgeId, row.periodStart]));
  }

  async payments(
    pledgeId: string,
    { page, size }: { page: number; size: number },
  ): Promise<Answer<'GET /pledges/:pledgeId/payments'>> {
    const { rows, count } = await this.paymentRows.findAndCountAll({
      where: { pledgeId },
      order: [['periodStart', 'DESC']],
      limit: size,
      offset: (page - 1) * size,
    });
    const plans = await this.plans.findAll({ where: { id: [...new Set(rows.map((row) => row.planId))] } });
    return {
      items: rows.map((row) => {
        const money = (minor: number) => ({ minor, currency: row.currency });
        return {
          id: row.id,
          planName: plans.find((plan) => plan.id === row.planId)?.name ?? '',
          amount: money(row.amountMinor),
          paidAt: row.paidAt.toISOString(),
          periodStart: row.periodStart.toISOString(),
          periodEnd: row.periodEnd.toISOString(),
          receiptNumber: row.receiptNumber,
          tax: (row.tax ?? []).map((line) => ({
            ratePercent: line.ratePercent,
            net: money(line.netMinor),
            tax: money(line.taxMinor),
          })),
        };
      }),
      page,
      size,
      total: count,
    };
  }
}

export const pausesOf = (
  nextPaymentAt: Date | null,
  firstPayment: Date | undefined,
): PledgeAnswer['pauses'] =>
  nextPaymentAt && firstPayment
    ? PAUSE_MONTHS.map((months) => ({
        months,
        nextPaymentAt: paymentAfter(nextPaymentAt, months, firstPayment).toISOString(),
      }))
    : [];
const PAUSE_MONTHS = [1, 2, 3] as const;

const iso = (moment: Date | null): string | null => moment?.toISOString() ?? null;

const nextPlanOf = (pledge: Pledge, nameOf: ReadonlyMap<string, string>): PledgeAnswer['nextPlan'] =>
  pledge.nextPlanId && pledge.nextPlanFrom
    ? {
        id: pledge.nextPlanId,
        name: nameOf.get(pledge.nextPlanId) ?? '',
        amount: { minor: pledge.nextAmountMinor ?? pledge.amountMinor, currency: pledge.currency },
        from: (pledge.pausedUntil ?? pledge.nextPlanFrom).toISOString(),
      }
    : null;
