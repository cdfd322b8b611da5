import { randomUUID } from 'node:crypto';
import { People } from '../../accounts/people.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { CancelOrder } from '../../orders/cancel-order.js';
import { FollowMoneyBack } from '../../orders/follow-money-back.js';
import { OpenCheckout } from '../../orders/open-checkout.js';
import { AskForRefund } from '../../orders/refunds/ask-for-refund.js';
import { CarryOutRefund } from '../../orders/refunds/carry-out-refund.js';
import { SettleOrder } from '../../orders/settle-order.js';
import { selectRows } from '../../database/rows.js';
import { makeCoupon } from '../coupons.js';
import { putKitOnSale, type KitOnSale } from '../kit-on-sale.js';
import { makePerson } from '../sign-in.js';
import type { TestApp } from '../test-app.js';
import type { SimulatedPayments } from './simulated-payments.js';
import { ModelOrder } from './year-model.js';
import { plannedKits, type Aftermath, type PlannedOrder, type YearPlan } from './year-plan.js';

interface LiveOrder {
  readonly model: ModelOrder;
  readonly id: string;
  readonly intentId: string | null;
  readonly lineIds: readonly string[];
}
interface Happening {
  readonly at: Date;
  readonly run: () => Promise<void>;
}

const HOUR_MS = 3_600_000;
/** What happens in the same few hours happens at once, so that the rooms are also raced. */
const WINDOW_MS = 6 * HOUR_MS;
const AT_ONCE = 12;

/** Lives a planned year through the services of the rooms, and keeps a model of what it should come to beside it. */
export class LiveYear {
  readonly orders: LiveOrder[] = [];
  /** Of the plan, by code: how often it was refused. */
  readonly refusedCoupons = new Map<string, number>();
  private readonly kits: KitOnSale[] = [];
  private readonly people = new Map<string, SignedIn>();
  private readonly ahead: Happening[] = [];
  private bookkeeper: SignedIn | null = null;

  constructor(
    private readonly shop: TestApp,
    private readonly payments: SimulatedPayments,
    private readonly plan: YearPlan,
  ) {}

  async live(onProgress: (part: number) => void = () => undefined): Promise<void> {
    await this.furnish();
    for (const order of this.plan.orders) this.ahead.push({ at: order.at, run: () => this.order(order) });
    let done = 0;
    for (;;) {
      this.ahead.sort((a, b) => a.at.getTime() - b.at.getTime());
      const [first] = this.ahead;
      if (!first) return;
      const windowEnd = Math.floor(first.at.getTime() / WINDOW_MS) * WINDOW_MS + WINDOW_MS;
      const batch = this.ahead.splice(0, AT_ONCE).filter((one) => {
        if (one.at.getTime() < windowEnd) return true;
        this.ahead.push(one);
        return false;
      });
      this.shop.clock.stopAt(new Date(windowEnd - HOUR_MS));
      await Promise.all(batch.map((one) => one.run()));
      done += batch.length;
      onProgress(done / (done + this.ahead.length));
    }
  }

  private get now(): Date {
    return this.shop.clock.now();
  }

  private async furnish(): Promise<void> {
    this.shop.clock.stopAt(new Date(Date.UTC(this.plan.year, 0, 1, 1)));
    for (const kit of plannedKits) this.kits.push(await putKitOnSale(this.shop, { ...kit }));
    for (const coupon of this.plan.coupons) await makeCoupon(this.shop, { ...coupon, isAnnounced: false });
    const bookkeeper = await makePerson(this.shop, 'bookkeeper');
    this.bookkeeper = await this.signedIn(bookkeeper.email);
    for (const email of this.plan.accounts) {
      await makePerson(this.shop, 'buyer', email);
      this.people.set(email, await this.signedIn(email));
    }
  }

  private async signedIn(email: string): Promise<SignedIn> {
    const person = await this.shop.app.get(People, { strict: false }).byEmail(email);
    if (!person) throw new Error(`Nobody has the address ${email}.`);
    return { id: person.id, email, name: person.name, role: person.role, isVerified: true };
  }

  private async order(plan: PlannedOrder): Promise<void> {
    const opened = await this.open(plan);
    const coupon = this.plan.coupons.find((one) => one.code === opened.couponCode) ?? null;
    const model = new ModelOrder(plan, coupon);
    const [row] = await selectRows<{ sessionId: string | null }>(
      this.shop.database,
      'SELECT session_id AS sessionId FROM orders WHERE id = :id',
      { id: opened.orderId },
    );
    const sessionId = row?.sessionId ?? null;
    const lines = await selectRows<{ id: string }>(
      this.shop.database,
      'SELECT id FROM order_lines WHERE order_id = :id ORDER BY position',
      { id: opened.orderId },
    );
    const intentId = await this.finish(plan, model, opened, sessionId);
    const live = { model, id: opened.orderId, intentId, lineIds: lines.map((line) => line.id) };
    this.orders.push(live);
    if (intentId) this.lookAhead(live, plan.after);
  }

  private async open(plan: PlannedOrder) {
    const body = (couponCode: string | null) => ({
      items: plan.kits.map((kit) => ({ licenceId: this.kits[kit]?.licenceId ?? '' })),
      ...(couponCode ? { couponCode } : {}),
      email: plan.email,
      country: plan.country,
      ...(plan.business
        ? { business: { name: 'A business', address: 'Quay 1', vatNumber: plan.business.vatNumber } }
        : {}),
      ...(plan.giftTo ? { gift: { email: plan.giftTo, giver: 'A friend', greeting: 'For you.' } } : {}),
      hasConsented: true as const,
      attempt: randomUUID(),
    });
    const checkout = this.shop.app.get(OpenCheckout, { strict: false });
    const person = plan.isSignedIn ? (this.people.get(plan.email) ?? null) : null;
    try {
      const opened = await checkout.open(body(plan.couponCode), person, '203.0.113.1');
      return { ...opened, couponCode: plan.couponCode };
    } catch (fault) {
      if (!(fault instanceof Refusal) || !fault.code.startsWith('coupon-')) throw fault;
      const code = plan.couponCode ?? '';
      this.refusedCoupons.set(code, (this.refusedCoupons.get(code) ?? 0) + 1);
      return { ...(await checkout.open(body(null), person, '203.0.113.1')), couponCode: null };
    }
  }

  /** @returns the payment where there was one */
  private async finish(
    plan: PlannedOrder,
    model: ModelOrder,
    opened: { orderId: string; orderKey: string },
    sessionId: string | null,
  ): Promise<string | null> {
    if (model.total === 0) {
      model.pay(this.now);
      return null;
    }
    if (!sessionId) throw new Error('An order over money has no payment page.');
    const settling = this.shop.app.get(SettleOrder, { strict: false });
    if (plan.end === 'cancelled') {
      await this.shop.app.get(CancelOrder, { strict: false }).cancel(opened.orderId, null, opened.orderKey);
      return null;
    }
    if (plan.end === 'expired') {
      await settling.follow(await this.payments.expireSession(sessionId));
      return null;
    }
    const intentId = this.payments.pay(sessionId, plan.billing, plan.card);
    model.pay(this.now);
    // Told twice, as it happens: by the event and by the browser.
    await Promise.all([settling.settle(sessionId), settling.settle(sessionId)]);
    return intentId;
  }

  private lookAhead(order: LiveOrder, after: readonly Aftermath[]): void {
    const later = (hours: number, run: () => Promise<void>): void => {
      this.ahead.push({ at: new Date(this.now.getTime() + hours * HOUR_MS), run });
    };
    for (const what of after) {
      if (what.kind === 'refund') later(what.hours, () => this.refund(order, what));
      if (what.kind === 'refund-outside')
        later(what.hours, () => this.refundOutside(order, what.thousandths));
      if (what.kind === 'dispute')
        later(what.hours, async () => {
          const disputeId = await this.dispute(order);
          if (disputeId) later(what.endHours - what.hours, () => this.decide(order, disputeId, what.end));
        });
    }
  }

  private async refund(order: LiveOrder, what: Aftermath & { kind: 'refund' }): Promise<void> {
    const { model } = order;
    if (model.left === 0 || !this.bookkeeper) return;
    const common = { reason: 'Asked for it.', attempt: randomUUID() };
    const asking = this.shop.app.get(AskForRefund, { strict: false });
    let asked: { id: string };
    if (what.whole) {
      const whole = { keepsEntitlement: what.keeps };
      asked = await asking.ask(order.id, { whole, ...common }, this.bookkeeper);
      model.refundAll(what.keeps, this.now);
    } else {
      const at = model.lines.findIndex(
        (line, index) => index >= what.line % model.lines.length && line.total > 0,
      );
      const line = model.lines[at];
      const amountMinor = line ? Math.floor((line.total * what.thousandths) / 1000) : 0;
      if (!line || amountMinor === 0) return;
      const lines = [{ orderLineId: order.lineIds[at] ?? '', amountMinor, keepsEntitlement: what.keeps }];
      asked = await asking.ask(order.id, { lines, ...common }, this.bookkeeper);
      model.refundLine(at, amountMinor, what.keeps, this.now);
    }
    await this.shop.app.get(CarryOutRefund, { strict: false }).handle({ refundId: asked.id });
  }

  private async refundOutside(order: LiveOrder, thousandths: number): Promise<void> {
    const amount = Math.max(1, Math.floor((order.model.left * thousandths) / 1000));
    this.payments.giveBack(order.intentId ?? '', amount);
    order.model.credit(amount, this.now);
    await this.follow(order);
  }

  private async dispute(order: LiveOrder): Promise<string | null> {
    if (order.model.left === 0) return null;
    const disputeId = this.payments.dispute(order.intentId ?? '', order.model.left);
    order.model.turn('active', 'suspended');
    await this.follow(order);
    return disputeId;
  }

  private async decide(order: LiveOrder, disputeId: string, end: 'won' | 'lost'): Promise<void> {
    this.payments.decide(disputeId, end);
    if (end === 'won') order.model.turn('suspended', 'active');
    else order.model.lose(this.now);
    await this.follow(order);
  }

  /** News of money that moved at the payment service, which comes twice. */
  private async follow({ id, intentId }: LiveOrder): Promise<void> {
    const following = this.shop.app.get(FollowMoneyBack, { strict: false });
    for (let times = 0; times < 2; times++) await following.follow({ id, paymentIntentId: intentId ?? '' });
  }
}
