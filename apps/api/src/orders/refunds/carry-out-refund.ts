import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { z } from 'zod';
import { Clock } from '../../adapters/clock/clock.js';
import {
  Payments,
  PaymentsRefused,
  PaymentsUnreachable,
  type PaymentRefund,
} from '../../adapters/payments/payments.js';
import { HandlesJob, TryLater, type JobHandler } from '../../jobs/job.js';
import { Order } from '../order.model.js';
import { carryOutRefund } from './carry-out-refund.job.js';
import { FollowRefund } from './follow-refund.js';
import { Refund } from './refund.model.js';

const UNREACHED_SECONDS = 30;
const FIRST_LOOK_SECONDS = 60;
const LONGEST_WAIT_SECONDS = 6 * 3600;

/** Asks the payment service for a refund, once, and asks how it stands until it is settled. */
@Injectable()
@HandlesJob(carryOutRefund)
export class CarryOutRefund implements JobHandler<typeof carryOutRefund.payload> {
  constructor(
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly payments: Payments,
    private readonly following: FollowRefund,
    private readonly clock: Clock,
  ) {}

  async handle({ refundId }: z.output<typeof carryOutRefund.payload>): Promise<void> {
    const refund = await this.refunds.findByPk(refundId);
    if (refund?.state !== 'asked') return;
    const order = await this.orders.findByPk(refund.orderId);
    if (!order?.paymentIntentId) return;
    try {
      await this.following.follow(order.id, await this.refundOf(order.paymentIntentId, refund, order));
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(UNREACHED_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      await this.following.refuse(order.id, refundId, fault.message);
    }
    const after = await this.refunds.findByPk(refundId);
    if (after?.state === 'asked') throw new TryLater(this.nextLook(after));
  }

  /**
   * An idempotency key is forgotten after a day, and a process may be down for longer: so what was made for this
   * refund before is looked for first.
   */
  private async refundOf(paymentIntentId: string, refund: Refund, order: Order): Promise<PaymentRefund> {
    if (refund.serviceId) return this.payments.findRefund(refund.serviceId);
    const made = await this.payments.refundsOf(paymentIntentId);
    return (
      made.find((one) => one.metadata['refund'] === refund.id) ??
      this.payments.refund({
        paymentIntentId,
        amountMinor: refund.amountMinor,
        idempotencyKey: `refund-${refund.id}`,
        metadata: { order: order.id, number: order.number, refund: refund.id },
      })
    );
  }

  /** A quarter of its age, at least a minute: a bank may take days. */
  private nextLook(refund: Refund): number {
    const age = (this.clock.now().getTime() - refund.createdAt.getTime()) / 1000;
    return Math.ceil(Math.min(Math.max(FIRST_LOOK_SECONDS, age / 4), LONGEST_WAIT_SECONDS));
  }
}
