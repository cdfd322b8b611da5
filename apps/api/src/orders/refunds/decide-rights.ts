import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled, WorkshopRefund } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { Dispute } from '../disputes/dispute.model.js';
import { FlagOrder } from '../flag-order.js';
import { OrderHistory } from '../order-history.js';
import { OrderLine } from '../order-line.model.js';
import { Order } from '../order.model.js';
import { LineRightSteps, type LineRight } from './line-right-steps.js';
import { RefundLine } from './refund-line.model.js';
import { Refund } from './refund.model.js';
import { RefundView } from './refund-view.js';

/** Staff decide which rights end with a refund, also afterwards: that of one begun at the payment service above all. */
@Injectable()
export class DecideRights {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly orderLines: typeof OrderLine,
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    @InjectModel(RefundLine) private readonly refundLines: typeof RefundLine,
    @InjectModel(Dispute) private readonly disputes: typeof Dispute,
    private readonly steps: LineRightSteps,
    private readonly view: RefundView,
    private readonly transactions: Transactions,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async decide(
    { params, body }: Handled<'PUT /workshop/orders/:orderId/refunds/:refundId/entitlements'>,
    person: SignedIn,
  ): Promise<WorkshopRefund> {
    const refund = await this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(params.orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      const found = await this.refunds.findOne({
        where: { id: params.refundId, orderId: params.orderId },
        transaction: tx,
      });
      if (!order || !found) throw notFound('refund of this order');
      if (found.state !== 'succeeded' && found.state !== 'returned')
        throw new Refusal(
          'conflict',
          'Rights are decided once the payment service has confirmed the refund.',
        );
      await this.write(tx, order, found, body.lines, person);
      return found;
    }, 'read-committed');
    return this.view.one(refund);
  }

  private async write(
    tx: Tx,
    order: Order,
    refund: Refund,
    lines: readonly { orderLineId: string; keepsEntitlement: boolean }[],
    person: SignedIn,
  ): Promise<void> {
    const before = await this.refundLines.findAll({ where: { refundId: refund.id }, transaction: tx });
    if (lines.some((line) => !before.some((one) => one.orderLineId === line.orderLineId)))
      throw new Refusal('validation-failed', 'One of the lines is not of this refund. Reload the page.');
    const isInDispute =
      (await this.disputes.count({ where: { orderId: order.id, state: 'open' }, transaction: tx })) > 0;
    const rights: LineRight[] = lines.map(({ orderLineId, keepsEntitlement }) => ({
      orderLineId,
      right: keepsEntitlement ? (isInDispute ? 'suspended' : 'active') : 'ended',
    }));
    for (const { orderLineId, keepsEntitlement } of lines)
      await this.refundLines.update(
        { keepsEntitlement },
        { where: { refundId: refund.id, orderLineId }, transaction: tx },
      );
    await this.steps.run(tx, rights);
    await refund.update({ updatedAt: this.clock.now() }, { transaction: tx });
    const names = await this.orderLines.findAll({ where: { orderId: order.id }, transaction: tx });
    const told = lines.map(({ orderLineId, keepsEntitlement }) => {
      const kit = names.find((one) => one.id === orderLineId)?.kitName ?? '';
      return `${kit} ${keepsEntitlement ? 'stays' : 'ends'}`;
    });
    await this.history.add(tx, order.id, 'rights decided', told.join(', '));
    await this.flags.drop(tx, order, 'refunded-outside', `by ${person.name}`);
    await this.staffLog.record(tx, person, {
      what: 'decided on rights after a refund',
      subject: `order ${order.number}`,
      before: before.map(({ orderLineId, keepsEntitlement }) => ({ orderLineId, keepsEntitlement })),
      after: lines,
    });
  }
}
