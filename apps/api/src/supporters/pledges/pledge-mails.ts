import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { PledgeMessage } from '@windchest/emails';
import { People } from '../../accounts/people.js';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../../config/config.js';
import type { Tx } from '../../database/transactions.js';
import { MailOutbox } from '../../mails/mail-outbox.js';
import { PlanKits } from '../plans/plan-kits.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import type { PledgeNews } from './consequences.js';
import type { PaidMonth } from './pledge-steps.js';
import type { Pledge } from './pledge.model.js';

/** Tells a supporter what becomes of the pledge; each occasion once, by its key. */
@Injectable()
export class PledgeMails {
  constructor(
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    @InjectConfig() private readonly config: Config,
    private readonly kits: PlanKits,
    private readonly catalogue: CatalogueReader,
    private readonly people: People,
    private readonly mails: MailOutbox,
  ) {}

  async paid(tx: Tx, pledge: Pledge, month: PaidMonth, isFirst: boolean): Promise<void> {
    const money = (minor: number) => ({ minor, currency: month.currency });
    const receipt = {
      ...this.about(month.name, month.planName),
      amount: money(month.amountMinor),
      receiptNumber: month.facts.receiptNumber ?? '',
      tax: (month.facts.tax ?? [])
        .filter((line) => line.taxMinor > 0)
        .map((line) => ({ rateLabel: `VAT ${line.ratePercent} %`, amount: money(line.taxMinor) })),
    };
    const message: PledgeMessage = isFirst
      ? {
          template: 'pledge-began',
          ...receipt,
          kits: await this.kitNames(tx, pledge),
          nextPaymentAt: month.periodEnd.toISOString(),
          shelfLink: `${this.config.BASE_URL}/shelf`,
        }
      : {
          template: 'pledge-receipt',
          ...receipt,
          periodStart: month.periodStart.toISOString(),
          periodEnd: month.periodEnd.toISOString(),
        };
    await this.add(tx, pledge, month.email, message, `pledge-paid:${month.paymentId}`);
  }

  async tell(tx: Tx, pledge: Pledge, { kind, about }: PledgeNews): Promise<void> {
    await this.send(tx, pledge, `${kind}:${about}`, (base) => messageOf(kind, pledge, base, this.config));
  }

  /** The supporter just asked for it. */
  async paused(tx: Tx, pledge: Pledge, restsFrom: Date, nextPaymentAt: Date): Promise<void> {
    await this.send(tx, pledge, `paused:${nextPaymentAt.toISOString()}`, (base) => ({
      template: 'pledge-paused',
      ...base,
      amount: amountOf(pledge),
      restsFrom: restsFrom.toISOString(),
      nextPaymentAt: nextPaymentAt.toISOString(),
      keeps: pledge.keepsAfter,
    }));
  }

  async planChanges(tx: Tx, pledge: Pledge, next: PledgePlan, from: Date): Promise<void> {
    await this.send(tx, pledge, `plan:${next.id}:${from.toISOString()}`, (base) => ({
      template: 'pledge-plan-changes',
      ...base,
      nextPlan: next.name,
      amount: { minor: next.amountMinor, currency: next.currency },
      from: from.toISOString(),
    }));
  }

  private async send(
    tx: Tx,
    pledge: Pledge,
    occasion: string,
    write: (base: ReturnType<PledgeMails['about']>) => PledgeMessage | null,
  ): Promise<void> {
    const person = await this.people.byId(pledge.personId, tx);
    const plan = await this.plans.findByPk(pledge.planId, { transaction: tx });
    if (!person || !plan) return;
    const message = write(this.about(person.name, plan.name));
    if (message) await this.add(tx, pledge, person.email, message, `pledge:${pledge.id}:${occasion}`);
  }

  private about(name: string, plan: string) {
    return { ...(name ? { name } : {}), plan, pledgeLink: `${this.config.BASE_URL}/account/pledge` };
  }

  private async add(tx: Tx, pledge: Pledge, to: string, message: PledgeMessage, key: string): Promise<void> {
    await this.mails.add(tx, { to, key, about: `pledge:${pledge.id}`, message });
  }

  private async kitNames(tx: Tx, pledge: Pledge): Promise<string[]> {
    const plan = await this.plans.findByPk(pledge.planId, { transaction: tx, rejectOnEmpty: true });
    const kits = await this.catalogue.kitsByIds(await this.kits.idsOf(plan, tx));
    return kits.filter((kit) => kit.newestRevisionId !== null).map((kit) => kit.name);
  }
}

const amountOf = ({ amountMinor, currency, nextAmountMinor }: Pledge) => ({
  minor: nextAmountMinor ?? amountMinor,
  currency,
});

const messageOf = (
  kind: PledgeNews['kind'],
  pledge: Pledge,
  base: { plan: string; pledgeLink: string },
  { BASE_URL }: Config,
): PledgeMessage | null => {
  const { keepsAfter: keeps, graceUntil, settleUrl, endsAt, pausedUntil } = pledge;
  const supportLink = `${BASE_URL}/support`;
  switch (kind) {
    case 'payment-failed':
    case 'grace-ends-soon':
      return graceUntil
        ? {
            template: `pledge-${kind}`,
            ...base,
            amount: amountOf(pledge),
            graceUntil: graceUntil.toISOString(),
            ...(settleUrl ? { settleLink: settleUrl } : {}),
          }
        : null;
    case 'lapsed':
    case 'ended':
      return { template: `pledge-${kind}`, ...base, keeps, supportLink };
    case 'will-end':
      return endsAt ? { template: 'pledge-will-end', ...base, endsAt: endsAt.toISOString(), keeps } : null;
    case 'pause-ends-soon':
      return pausedUntil
        ? {
            template: 'pledge-resumes-soon',
            ...base,
            amount: amountOf(pledge),
            nextPaymentAt: pausedUntil.toISOString(),
          }
        : null;
  }
};
