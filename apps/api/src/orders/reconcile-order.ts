import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { PaymentsUnreachable } from '../adapters/payments/payments.js';
import { HandlesJob, TryLater, type JobHandler } from '../jobs/job.js';
import { CloseOrder } from './close-order.js';
import { FollowMoneyBack } from './follow-money-back.js';
import { FulfilOrder } from './fulfil-order.js';
import { nextMoneyLook } from './next-money-look.js';
import { Order } from './order.model.js';
import { FIRST_LOOK_SECONDS, reconcileOrder } from './reconcile-order.job.js';
import { SettleOrder } from './settle-order.js';

const LONGEST_WAIT_SECONDS = 6 * 3600;
/** After a page's end its last event and a slow clock get this long. */
const AFTER_END_SECONDS = 5;

/** Asks the payment service itself, in growing intervals, until the order is final. */
@Injectable()
@HandlesJob(reconcileOrder)
export class ReconcileOrder implements JobHandler<typeof reconcileOrder.payload> {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly settling: SettleOrder,
    private readonly fulfilling: FulfilOrder,
    private readonly closing: CloseOrder,
    private readonly moneyBack: FollowMoneyBack,
    private readonly clock: Clock,
  ) {}

  async handle({ orderId }: z.output<typeof reconcileOrder.payload>): Promise<void> {
    const order = await this.orders.findByPk(orderId);
    if (!order) return;
    if (order.paidAt && order.paymentIntentId)
      return this.lookAtMoney({ id: orderId, paymentIntentId: order.paymentIntentId, paidAt: order.paidAt });
    if (order.state !== 'open' || order.flags.includes('amount-differs')) return;
    if (order.totalMinor === 0) return this.fulfilling.fulfil(orderId, null);
    if (!order.sessionId) return this.endIfForgotten(order);
    try {
      await this.settling.settle(order.sessionId);
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(this.nextLook(order));
      throw fault;
    }
    // Whatever that led to, the next look finds out; an order that ended unpaid ends the job there.
    const after = await this.orders.findByPk(orderId);
    if (after && (after.state === 'open' || after.paymentIntentId)) throw new TryLater(this.nextLook(after));
  }

  /** Events of refunds and disputes may be lost for good, too. */
  private async lookAtMoney(order: { id: string; paymentIntentId: string; paidAt: Date }): Promise<void> {
    const seconds = nextMoneyLook(order.paidAt, this.clock.now());
    try {
      await this.moneyBack.follow(order);
    } catch (fault) {
      if (!(fault instanceof PaymentsUnreachable)) throw fault;
    }
    if (seconds !== null) throw new TryLater(seconds);
  }

  /** The checkout broke off before there was a page to pay on, and the time to go on with it is over. */
  private async endIfForgotten(order: Order): Promise<void> {
    const now = this.clock.now();
    if (order.payUntil && order.payUntil > now) throw new TryLater(this.nextLook(order));
    const isClosed = await this.closing.close(order.id, 'expired', {
      why: 'no payment page was ever opened',
      onlyWithoutSession: true,
    });
    if (!isClosed) throw new TryLater(FIRST_LOOK_SECONDS);
  }

  /** A quarter of the order's age, at least a minute, but soon after the page's end. */
  private nextLook(order: Order): number {
    const now = this.clock.now().getTime();
    const age = (now - order.createdAt.getTime()) / 1000;
    const wait = Math.min(Math.max(FIRST_LOOK_SECONDS, age / 4), LONGEST_WAIT_SECONDS);
    const toEnd = ((order.payUntil?.getTime() ?? 0) - now) / 1000 + AFTER_END_SECONDS;
    return Math.ceil(toEnd > 0 ? Math.min(wait, toEnd) : wait);
  }
}
