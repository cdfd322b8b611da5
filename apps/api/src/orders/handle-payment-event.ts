import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { PaymentsRefused, PaymentsUnreachable } from '../adapters/payments/payments.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import { HandlesJob, TryLater, type Finish, type JobHandler } from '../jobs/job.js';
import { CloseOrder } from './close-order.js';
import { FlagOrder } from './flag-order.js';
import { handlePaymentEvent } from './handle-payment-event.job.js';
import { OrderHistory } from './order-history.js';
import { Order } from './order.model.js';
import { factsOf, type EventFacts } from './payment-event-facts.js';
import { SettleOrder } from './settle-order.js';

/** How long an event about money may wait for the order whose payment it names. */
const PATIENCE_SECONDS = 3600;
const AGAIN_SECONDS = 30;

/**
 * Works on one event. An event is a hint to ask how things stand, not the news itself: what it says of a
 * page may be late or out of order, so the payment service is asked anew. Refunds and disputes are noted on
 * the order and flagged, once each.
 */
@Injectable()
@HandlesJob(handlePaymentEvent)
export class HandlePaymentEvent implements JobHandler<typeof handlePaymentEvent.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly transactions: Transactions,
    private readonly settling: SettleOrder,
    private readonly closing: CloseOrder,
    private readonly flags: FlagOrder,
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
    const facts = factsOf(event.type, event.subjectId, event.payload);
    if (facts.kind === 'page') return this.followPage(event, facts);
    if (facts.kind === 'money-back') return this.noteOnOrder(event, facts);
    return this.done(event.id, 'nothing to do');
  }

  private async followPage(event: EventRow, facts: EventFacts): Promise<Finish> {
    const order = await this.orderOf(facts);
    const sessionId = facts.sessionId ?? order?.sessionId;
    if (!sessionId) return this.done(event.id, 'no order here');
    try {
      const state = await this.settling.settle(sessionId);
      // A payment that was under way for days and failed leaves its page complete and unpaid for ever.
      if (order && state === 'open' && event.type === 'checkout.session.async_payment_failed')
        await this.closing.close(order.id, 'expired', { why: 'the payment failed' });
      return this.done(event.id, state ? `the page is ${state}` : 'no order here');
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      return this.done(event.id, `the payment service knows no such page: ${fault.message}`);
    }
  }

  private async noteOnOrder(event: EventRow, facts: EventFacts): Promise<Finish | void> {
    const order = await this.orderOf(facts);
    if (!order) {
      if (event.receivedAt > this.clock.in(-PATIENCE_SECONDS)) throw new TryLater(AGAIN_SECONDS);
      return this.done(event.id, 'no order here');
    }
    await this.transactions.run(async (tx) => {
      const locked = await this.orders.findByPk(order.id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!locked || !(await this.markHandled(tx, event.id, `noted on ${order.number}`))) return;
      await this.history.add(tx, order.id, event.type, facts.text);
      await this.flags.set(tx, locked, facts.flag ?? 'disputed', facts.text);
    }, 'read-committed');
  }

  private orderOf({ orderId, sessionId, paymentIntentId }: EventFacts): Promise<Order | null> {
    if (orderId) return this.orders.findByPk(orderId);
    if (sessionId) return this.orders.findOne({ where: { sessionId } });
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

interface EventRow {
  readonly id: string;
  readonly type: string;
  readonly subjectId: string | null;
  readonly payload: unknown;
  readonly receivedAt: Date;
  readonly handledAt: Date | null;
}
