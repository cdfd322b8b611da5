import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { readPaymentEvent, type PaymentEventFacts } from '../adapters/payments/payment-event.js';
import { PaymentsRefused, PaymentsUnreachable } from '../adapters/payments/payments.js';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { HandlesJob, TryLater, type Finish, type JobHandler } from '../jobs/job.js';
import { CloseOrder } from './close-order.js';
import { FollowMoneyBack } from './follow-money-back.js';
import { handlePaymentEvent } from './handle-payment-event.job.js';
import { OrderHistory } from './order-history.js';
import { Order } from './order.model.js';
import { SettleOrder } from './settle-order.js';

/** How long an event about money may wait for the order whose payment it names. */
const PATIENCE_SECONDS = 3600;
const AGAIN_SECONDS = 30;
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/**
 * Works on one event. An event is a hint to ask how things stand, not the news itself: what it says of a page, a
 * refund or a dispute may be late or out of order, so the payment service is asked anew.
 */
@Injectable()
@HandlesJob(handlePaymentEvent)
export class HandlePaymentEvent implements JobHandler<typeof handlePaymentEvent.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly settling: SettleOrder,
    private readonly closing: CloseOrder,
    private readonly moneyBack: FollowMoneyBack,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  async handle({ eventId }: z.output<typeof handlePaymentEvent.payload>): Promise<Finish | void> {
    const [event] = await selectRows<EventRow>(
      this.database,
      `SELECT id, type, subject_id AS subjectId, payload, received_at AS receivedAt, handled_at AS handledAt
       FROM payment_events WHERE id = :eventId`,
      { eventId },
    );
    if (!event || event.handledAt) return;
    const facts = readPaymentEvent(event.type, event.subjectId, event.payload);
    try {
      if (facts.pageKind === 'order' || event.type === 'payment_intent.succeeded')
        return await this.followPage(event, facts);
      if (isAboutMoneyBack(event.type, facts)) return await this.followMoneyBack(event, facts);
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      return this.done(event.id, `the payment service knows no such thing: ${fault.message}`);
    }
    return this.done(event.id, 'nothing to do');
  }

  private async followPage(event: EventRow, facts: PaymentEventFacts): Promise<Finish> {
    const order = await this.orderOf(facts);
    const sessionId = facts.pageKind ? facts.subjectId : order?.sessionId;
    if (!sessionId) return this.done(event.id, 'no order here');
    const state = await this.settling.settle(sessionId);
    // A payment that was under way for days and failed leaves its page complete and unpaid for ever.
    if (order && state === 'open' && event.type === 'checkout.session.async_payment_failed')
      await this.closing.close(order.id, 'expired', { why: 'the payment failed' });
    return this.done(event.id, state ? `the page is ${state}` : 'no order here');
  }

  private async followMoneyBack(event: EventRow, facts: PaymentEventFacts): Promise<Finish> {
    let order = await this.orderOf(facts);
    // The news of the payment itself may be late, or lost.
    if (order && !order.paidAt && order.sessionId) {
      await this.settling.settle(order.sessionId);
      order = await this.orderOf(facts);
    }
    const paymentIntentId = order?.paymentIntentId ?? facts.paymentIntentId;
    if (!order || !paymentIntentId) {
      if (event.receivedAt > this.clock.in(-PATIENCE_SECONDS)) throw new TryLater(AGAIN_SECONDS);
      return this.done(event.id, 'no order here');
    }
    if (facts.paymentIntentId && facts.paymentIntentId !== paymentIntentId)
      return this.noteStray(event.id, order, facts);
    await this.moneyBack.follow({ id: order.id, paymentIntentId });
    return this.done(event.id, `followed on ${order.number}`);
  }

  /** Money of another payment that names this order, such as one that came after its end. */
  private noteStray(eventId: string, order: Order, facts: PaymentEventFacts): Finish {
    return async (tx) => {
      await this.markHandled(tx, eventId, `another payment of ${order.number}`);
      const what = `another payment: ${facts.subject} ${facts.subjectId ?? ''}`;
      await this.orders.findByPk(order.id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!(await this.history.has(tx, order.id, what.slice(0, 60))))
        await this.history.add(tx, order.id, what, facts.paymentIntentId ?? '');
    };
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

  private done(eventId: string, outcome: string): Finish {
    return async (tx) => {
      await this.markHandled(tx, eventId, outcome);
    };
  }

  private async markHandled(tx: Tx, eventId: string, outcome: string): Promise<boolean> {
    const marked = await touchRows(
      this.database,
      'UPDATE payment_events SET handled_at = :now, outcome = :outcome WHERE id = :eventId AND handled_at IS NULL',
      { now: this.clock.now(), outcome: outcome.slice(0, 200), eventId },
      tx,
    );
    return marked === 1;
  }
}

const isAboutMoneyBack = (type: string, { subject }: PaymentEventFacts): boolean =>
  subject === 'refund' || subject === 'dispute' || type === 'charge.refunded';

interface EventRow {
  readonly id: string;
  readonly type: string;
  readonly subjectId: string | null;
  readonly payload: unknown;
  readonly receivedAt: Date;
  readonly handledAt: Date | null;
}
