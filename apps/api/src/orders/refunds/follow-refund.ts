import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { formatMoney } from '@windchest/money';
import { Clock } from '../../adapters/clock/clock.js';
import type { PaymentRefund } from '../../adapters/payments/payments.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { FlagOrder } from '../flag-order.js';
import { OrderHistory } from '../order-history.js';
import { Order } from '../order.model.js';
import { isStillLeft, spreadRefund, type RefundableOrderLine } from './plan-refund.js';
import { RefundBook } from './refund-book.js';
import { Refund } from './refund.model.js';
import { SettleRefund } from './settle-refund.js';

/**
 * Brings the shop's record of a refund to where it stands at the payment service now. Answers, events and
 * reconciliation all end here, so neither what arrives first nor how often makes a difference. A refund that the
 * shop did not ask for is noticed, spread over the lines and flagged.
 */
@Injectable()
export class FollowRefund {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    @InjectConfig() private readonly config: Config,
    private readonly book: RefundBook,
    private readonly settling: SettleRefund,
    private readonly transactions: Transactions,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  follow(orderId: string, told: PaymentRefund): Promise<void> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) return;
      const known = await this.refunds.findOne({ where: { serviceId: told.id }, transaction: tx });
      const refund = known ?? (await this.asked(tx, order, told));
      if (!refund) return this.notice(tx, order, told);
      if (!refund.serviceId) await refund.update({ serviceId: told.id }, { transaction: tx });
      if (told.state === 'succeeded') await this.succeed(tx, order, refund);
      if (told.state === 'failed' || told.state === 'cancelled')
        await this.failed(tx, order, refund, told.failure ?? `the payment service says ${told.state}`);
    }, 'read-committed');
  }

  /** The payment service refused to give anything back. */
  refuse(orderId: string, refundId: string, fault: string): Promise<void> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      const refund = await this.refunds.findByPk(refundId, { transaction: tx });
      if (order && refund?.state === 'asked') await this.failed(tx, order, refund, fault);
    }, 'read-committed');
  }

  /** One that was asked for here and whose answer was never heard. */
  private async asked(tx: Tx, order: Order, told: PaymentRefund): Promise<Refund | null> {
    const id = told.metadata['refund'];
    if (!id) return null;
    return this.refunds.findOne({ where: { id, orderId: order.id, serviceId: null }, transaction: tx });
  }

  private async succeed(tx: Tx, order: Order, refund: Refund): Promise<void> {
    if (refund.state === 'succeeded' || refund.state === 'returned') return;
    const lines = await this.book.refundableLines(tx, order.id);
    const planned = await this.book.plannedLines(tx, refund.id);
    if (isStillLeft(planned, lines)) return this.settling.settle(tx, order, refund, planned, lines);
    await this.settleSpread(tx, order, refund, lines);
    await this.flags.set(
      tx,
      order,
      'refunded-outside',
      'another refund was quicker, so this one was spread over what was left of the lines',
    );
  }

  private async notice(tx: Tx, order: Order, told: PaymentRefund): Promise<void> {
    // One under way is noticed when it has succeeded; one that failed gave nothing back.
    if (told.state !== 'succeeded') return;
    const now = this.clock.now();
    const refund = await this.refunds.create(
      {
        id: newId(),
        orderId: order.id,
        origin: 'service',
        state: 'succeeded',
        amountMinor: told.amountMinor,
        currency: told.currency,
        reason: '',
        serviceId: told.id,
        createdAt: told.createdAt,
        updatedAt: now,
        settledAt: now,
      },
      { transaction: tx },
    );
    const amount = formatMoney(
      { minor: told.amountMinor, currency: told.currency },
      this.config.WORKSHOP_LOCALE,
    );
    const detail = `${amount} at the payment service, ${told.id}`;
    // What was never handed over has no receipt to correct and no right to end.
    if (order.paidAt)
      await this.settleSpread(tx, order, refund, await this.book.refundableLines(tx, order.id));
    else await this.history.add(tx, order.id, 'refunded', detail);
    await this.flags.set(tx, order, 'refunded-outside', detail);
  }

  private async settleSpread(
    tx: Tx,
    order: Order,
    refund: Refund,
    lines: readonly RefundableOrderLine[],
  ): Promise<void> {
    const left = order.totalMinor - order.refundedMinor;
    const planned = spreadRefund(Math.min(refund.amountMinor, left), lines, order.currency);
    await this.settling.settle(tx, order, refund, planned, lines);
  }

  private async failed(tx: Tx, order: Order, refund: Refund, fault: string): Promise<void> {
    const isLate = refund.state === 'succeeded';
    if (!isLate && refund.state !== 'asked') return;
    await refund.update(
      { state: isLate ? 'returned' : 'failed', fault: fault.slice(0, 500), updatedAt: this.clock.now() },
      { transaction: tx },
    );
    await this.history.add(tx, order.id, isLate ? 'refund sent back by the bank' : 'refund failed', fault);
    await this.flags.set(tx, order, 'refund-failed', fault);
  }
}
