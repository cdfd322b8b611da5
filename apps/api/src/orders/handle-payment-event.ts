import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { readPaymentEvent, type PaymentEventFacts } from '../adapters/payments/payment-event.js';
import { PaymentsRefused, PaymentsUnreachable } from '../adapters/payments/payments.js';
import { Transactions } from '../database/transactions.js';
import { TryLater } from '../jobs/job.js';
import { PaymentEventHandlers, type StoredPaymentEvent } from '../payments/payment-event-handlers.js';
import { CloseOrder } from './close-order.js';
import { FollowMoneyBack } from './follow-money-back.js';
import { OrderHistory } from './order-history.js';
import { Order } from './order.model.js';
import { SettleOrder } from './settle-order.js';

/** How long an event about money may wait for the order whose payment it names. */
const PATIENCE_SECONDS = 3600;
const AGAIN_SECONDS = 30;
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/**
 * Works on events of orders. An event is a hint to ask how things stand, not the news itself: what it says of a
 * page, a refund or a dispute may be late or out of order, so the payment service is asked anew.
 */
@Injectable()
export class HandlePaymentEvent implements OnModuleInit {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly events: PaymentEventHandlers,
    private readonly transactions: Transactions,
    private readonly settling: SettleOrder,
    private readonly closing: CloseOrder,
    private readonly moneyBack: FollowMoneyBack,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    // The last room to be asked: money that no other room knows may be of an order that is not written yet.
    this.events.register({ name: 'orders', order: 90, handle: (event) => this.handle(event) });
  }

  private async handle(event: StoredPaymentEvent): Promise<string | null> {
    const facts = readPaymentEvent(event.type, event.subjectId, event.payload);
    try {
      if (facts.pageKind === 'order' || event.type === 'payment_intent.succeeded')
        return await this.followPage(event, facts);
      return isAboutMoneyBack(event.type, facts) ? await this.followMoneyBack(event, facts) : null;
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      return `the payment service knows no such thing: ${fault.message}`;
    }
  }

  private async followPage(event: StoredPaymentEvent, facts: PaymentEventFacts): Promise<string> {
    const order = await this.orderOf(facts);
    const sessionId = facts.pageKind ? facts.subjectId : order?.sessionId;
    if (!sessionId) return 'no order here';
    const state = await this.settling.settle(sessionId);
    // A payment that was under way for days and failed leaves its page complete and unpaid for ever.
    if (order && state === 'open' && event.type === 'checkout.session.async_payment_failed')
      await this.closing.close(order.id, 'expired', { why: 'the payment failed' });
    return state ? `the page is ${state}` : 'no order here';
  }

  private async followMoneyBack(event: StoredPaymentEvent, facts: PaymentEventFacts): Promise<string> {
    let order = await this.orderOf(facts);
    // The news of the payment itself may be late, or lost.
    if (order && !order.paidAt && order.sessionId) {
      await this.settling.settle(order.sessionId);
      order = await this.orderOf(facts);
    }
    const paymentIntentId = order?.paymentIntentId ?? facts.paymentIntentId;
    if (!order || !paymentIntentId) {
      if (event.receivedAt > this.clock.in(-PATIENCE_SECONDS)) throw new TryLater(AGAIN_SECONDS);
      return 'no order here';
    }
    if (facts.paymentIntentId && facts.paymentIntentId !== paymentIntentId)
      return this.noteStray(event.id, order, facts);
    await this.moneyBack.follow({ id: order.id, paymentIntentId });
    return `followed on ${order.number}`;
  }

  /** Money of another payment that names this order, such as one that came after its end. */
  private async noteStray(eventId: string, order: Order, facts: PaymentEventFacts): Promise<string> {
    const outcome = `another payment of ${order.number}`;
    await this.transactions.run(async (tx) => {
      await this.orders.findByPk(order.id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!(await this.events.markHandled(tx, eventId, outcome))) return;
      const what = `another payment: ${facts.subject} ${facts.subjectId ?? ''}`;
      if (!(await this.history.has(tx, order.id, what.slice(0, 60))))
        await this.history.add(tx, order.id, what, facts.paymentIntentId ?? '');
    }, 'read-committed');
    return outcome;
  }

  private orderOf({
    orderId,
    subject,
    subjectId,
    paymentIntentId,
  }: PaymentEventFacts): Promise<Order | null> {
    if (orderId && UUID.test(orderId)) return this.orders.findByPk(orderId);
    if (subject === 'page' && subjectId) return this.orders.findOne({ where: { sessionId: subjectId } });
    return paymentIntentId ? this.orders.findOne({ where: { paymentIntentId } }) : Promise.resolve(null);
  }
}

const isAboutMoneyBack = (type: string, { subject }: PaymentEventFacts): boolean =>
  subject === 'refund' || subject === 'dispute' || type === 'charge.refunded';
