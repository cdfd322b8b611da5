import { Injectable } from '@nestjs/common';
import { Payments } from '../adapters/payments/payments.js';
import { FollowDispute } from './disputes/follow-dispute.js';
import { FollowRefund } from './refunds/follow-refund.js';

/** Asks how all refunds and disputes of an order's payment stand, and follows each, oldest first. */
@Injectable()
export class FollowMoneyBack {
  constructor(
    private readonly payments: Payments,
    private readonly refunds: FollowRefund,
    private readonly disputes: FollowDispute,
  ) {}

  /** @throws PaymentsUnreachable */
  async follow(order: { readonly id: string; readonly paymentIntentId: string }): Promise<void> {
    for (const refund of (await this.payments.refundsOf(order.paymentIntentId)).toReversed())
      await this.refunds.follow(order.id, refund);
    for (const dispute of (await this.payments.disputesOf(order.paymentIntentId)).toReversed())
      await this.disputes.follow(order.id, dispute);
  }
}
