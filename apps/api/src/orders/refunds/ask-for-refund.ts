import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled, WorkshopRefund } from '@windchest/contracts';
import { formatMoney } from '@windchest/money';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { Dispute } from '../disputes/dispute.model.js';
import { OrderHistory } from '../order-history.js';
import { Order } from '../order.model.js';
import { carryOutRefund } from './carry-out-refund.job.js';
import { planRefund, type PlannedLine } from './plan-refund.js';
import { RefundBook } from './refund-book.js';
import { Refund } from './refund.model.js';
import { RefundView } from './refund-view.js';

type Body = Handled<'POST /workshop/orders/:orderId/refunds'>['body'];

/**
 * Writes down that money is to go back, with the job that asks the payment service for it, in one transaction.
 * What is written counts as gone from the lines at once, so two refunds never ask for the same money.
 */
@Injectable()
export class AskForRefund {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    @InjectModel(Dispute) private readonly disputes: typeof Dispute,
    @InjectConfig() private readonly config: Config,
    private readonly book: RefundBook,
    private readonly view: RefundView,
    private readonly transactions: Transactions,
    private readonly history: OrderHistory,
    private readonly staffLog: StaffLog,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  async ask(orderId: string, body: Body, person: SignedIn): Promise<WorkshopRefund> {
    const refund = await this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) throw notFound('order');
      // The order's lock lets the same attempt, sent twice at once, find what the first of them wrote.
      const known = await this.refunds.findOne({ where: { attempt: body.attempt }, transaction: tx });
      if (known) return this.sameAgain(known, orderId);
      await this.refuseWhereNothingGoes(tx, order);
      const lines = planRefund(body, await this.book.refundableLines(tx, orderId), {
        currency: order.currency,
        locale: this.config.WORKSHOP_LOCALE,
      });
      return this.write(tx, order, body, lines, person);
    }, 'read-committed');
    return this.view.one(refund);
  }

  private sameAgain(known: Refund, orderId: string): Refund {
    if (known.orderId === orderId) return known;
    throw new Refusal('conflict', 'This form was used for another order. Reload the page and ask again.');
  }

  private async refuseWhereNothingGoes(tx: Tx, order: Order): Promise<void> {
    if (order.state === 'refunded')
      throw new Refusal('order-is-final', `All that was paid for order ${order.number} went back already.`);
    if (order.state !== 'paid' || !order.paymentIntentId)
      throw new Refusal('order-is-final', `Nothing was paid for order ${order.number} that could go back.`);
    const inDispute = await this.disputes.count({
      where: { orderId: order.id, state: 'open' },
      transaction: tx,
    });
    if (inDispute > 0)
      throw new Refusal(
        'conflict',
        'The payment is in dispute, and the payment service gives nothing back until that is decided.',
      );
  }

  private async write(
    tx: Tx,
    order: Order,
    { attempt, reason }: Body,
    lines: readonly PlannedLine[],
    person: SignedIn,
  ): Promise<Refund> {
    const now = this.clock.now();
    const amountMinor = lines.reduce((sum, line) => sum + line.amountMinor, 0);
    const refund = await this.refunds.create(
      {
        id: newId(),
        orderId: order.id,
        attempt,
        origin: 'workshop',
        state: 'asked',
        amountMinor,
        currency: order.currency,
        reason,
        askedBy: `${person.name} (${person.role})`,
        createdAt: now,
        updatedAt: now,
      },
      { transaction: tx },
    );
    await this.book.writeLines(tx, refund.id, lines);
    await this.jobs.add(
      tx,
      carryOutRefund,
      { refundId: refund.id },
      { key: `carry-out-refund:${refund.id}` },
    );
    const amount = formatMoney({ minor: amountMinor, currency: order.currency }, this.config.WORKSHOP_LOCALE);
    await this.history.add(tx, order.id, 'refund asked for', `${amount}: ${reason}`);
    await this.staffLog.record(tx, person, {
      what: 'asked for a refund',
      subject: `order ${order.number}`,
      after: { amount, reason, lines },
    });
    return refund;
  }
}
