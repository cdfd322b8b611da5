import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { PaymentsRefused, PaymentsUnreachable } from '../adapters/payments/payments.js';
import { Transactions } from '../database/transactions.js';
import { TryLater } from '../jobs/job.js';
import { PaymentEventHandlers, type StoredPaymentEvent } from '../payments/payment-event-handlers.js';
import { CloseOrder } from './close-order.js';
import { FlagOrder } from './flag-order.js';
import { OrderHistory } from './order-history.js';
import { Order } from './order.model.js';
import { factsOf, type EventFacts } from './payment-event-facts.js';
import { SettleOrder } from './settle-order.js';

/** How long an event about money may wait for the order whose payment it names. */
const PATIENCE_SECONDS = 3600;
const AGAIN_SECONDS = 30;

/**
 * Works on events of orders. An event is a hint to ask how things stand, not the news itself: what it says of
 * a page may be late or out of order, so the payment service is asked anew. Refunds and disputes are noted on
 * the order and flagged, once each.
 */
@Injectable()
export class HandlePaymentEvent implements OnModuleInit {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly events: PaymentEventHandlers,
    private readonly transactions: Transactions,
    private readonly settling: SettleOrder,
    private readonly closing: CloseOrder,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    // The last room to be asked: money that no other room knows may be of an order that is not written yet.
    this.events.register({ name: 'orders', order: 90, handle: (event) => this.handle(event) });
  }

  private async handle(event: StoredPaymentEvent): Promise<string | null> {
    const facts = factsOf(event.type, event.subjectId, event.payload);
    if (facts.kind === 'page') return this.followPage(event, facts);
    return facts.kind === 'money-back' ? this.noteOnOrder(event, facts) : null;
  }

  private async followPage(event: StoredPaymentEvent, facts: EventFacts): Promise<string> {
    const order = await this.orderOf(facts);
    const sessionId = facts.sessionId ?? order?.sessionId;
    if (!sessionId) return 'no order here';
    try {
      const state = await this.settling.settle(sessionId);
      // A payment that was under way for days and failed leaves its page complete and unpaid for ever.
      if (order && state === 'open' && event.type === 'checkout.session.async_payment_failed')
        await this.closing.close(order.id, 'expired', { why: 'the payment failed' });
      return state ? `the page is ${state}` : 'no order here';
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      return `the payment service knows no such page: ${fault.message}`;
    }
  }

  private async noteOnOrder(event: StoredPaymentEvent, facts: EventFacts): Promise<string> {
    const order = await this.orderOf(facts);
    if (!order) {
      if (event.receivedAt > this.clock.in(-PATIENCE_SECONDS)) throw new TryLater(AGAIN_SECONDS);
      return 'no order here';
    }
    const outcome = `noted on ${order.number}`;
    await this.transactions.run(async (tx) => {
      const locked = await this.orders.findByPk(order.id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!locked || !(await this.events.markHandled(tx, event.id, outcome))) return;
      await this.history.add(tx, order.id, event.type, facts.text);
      await this.flags.set(tx, locked, facts.flag ?? 'disputed', facts.text);
    }, 'read-committed');
    return outcome;
  }

  private orderOf({ orderId, sessionId, paymentIntentId }: EventFacts): Promise<Order | null> {
    if (orderId) return this.orders.findByPk(orderId);
    if (sessionId) return this.orders.findOne({ where: { sessionId } });
    return paymentIntentId ? this.orders.findOne({ where: { paymentIntentId } }) : Promise.resolve(null);
  }
}
