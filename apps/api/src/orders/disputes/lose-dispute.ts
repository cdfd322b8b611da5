import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import type { Tx } from '../../database/transactions.js';
import type { Order } from '../order.model.js';
import { spreadRefund } from '../refunds/plan-refund.js';
import { RefundBook } from '../refunds/refund-book.js';
import { Refund } from '../refunds/refund.model.js';
import { SettleRefund } from '../refunds/settle-refund.js';
import { DisputeSteps } from './dispute-steps.js';
import type { Dispute } from './dispute.model.js';

/**
 * A lost dispute in the books: what the bank kept went back like a refund, with a credit note, and all rights of
 * the order end.
 */
@Injectable()
export class LoseDispute {
  constructor(
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    private readonly book: RefundBook,
    private readonly settling: SettleRefund,
    private readonly steps: DisputeSteps,
    private readonly clock: Clock,
  ) {}

  async lose(tx: Tx, order: Order, dispute: Dispute): Promise<void> {
    const left = order.totalMinor - order.refundedMinor;
    // A bank's own charges and another day's rate may make the dispute more than what was paid.
    const amountMinor = Math.min(dispute.amountMinor, left);
    if (order.paidAt && amountMinor > 0) {
      const now = this.clock.now();
      const refund = await this.refunds.create(
        {
          id: newId(),
          orderId: order.id,
          origin: 'dispute',
          state: 'succeeded',
          amountMinor,
          currency: order.currency,
          reason: `dispute ${dispute.serviceId}`,
          serviceId: dispute.serviceId,
          createdAt: now,
          updatedAt: now,
          settledAt: now,
        },
        { transaction: tx },
      );
      const lines = await this.book.refundableLines(tx, order.id);
      const planned = spreadRefund(amountMinor, lines, order.currency).map((line) => ({
        ...line,
        keepsEntitlement: false,
      }));
      await this.settling.settle(tx, order, refund, planned, lines);
    }
    await this.steps.run(tx, { orderId: order.id, rights: 'end' });
  }
}
