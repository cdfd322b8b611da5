import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { People } from '../accounts/people.js';
import { Clock } from '../adapters/clock/clock.js';
import type { PaymentSession } from '../adapters/payments/payments.js';
import { Coupons } from '../coupons/coupons.js';
import { Transactions, type Tx } from '../database/transactions.js';
import { FlagOrder } from './flag-order.js';
import { placeOf } from './order-country.js';
import { OrderHistory } from './order-history.js';
import { OrderLine } from './order-line.model.js';
import { OrderPaidMail } from './order-paid-mail.js';
import { OrderPaidSteps, type PaidOrder } from './order-paid-steps.js';
import { Order } from './order.model.js';

export interface Payment {
  readonly session: PaymentSession;
  readonly cardCountry: string | null;
}

/**
 * Everything that follows from a payment, in one transaction: paid, coupon redeemed, receipt numbered,
 * entitlements given, e-mail queued. The locked state of the order makes it happen once, however often and
 * from wherever this is called.
 */
@Injectable()
export class FulfilOrder {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly coupons: Coupons,
    private readonly steps: OrderPaidSteps,
    private readonly mail: OrderPaidMail,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  /** @param payment as the payment service tells it; null where nothing was to pay */
  fulfil(orderId: string, payment: Payment | null): Promise<void> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) throw new Error('A payment names an order that does not exist.');
      if (order.state !== 'open') return this.lookAtLateMoney(tx, order, payment);
      const fault = faultOf(order, payment);
      if (fault) return this.flags.set(tx, order, 'amount-differs', fault);
      await this.markPaid(tx, order, payment);
      await this.coupons.redeem(tx, order.id);
      await this.handOver(tx, order, payment);
    }, 'read-committed');
  }

  /**
   * A page is noted before its address is shown, and an order ends only after its page, so no money should
   * come to a final order but what made it paid. Should it come all the same, staff must hear of it.
   */
  private async lookAtLateMoney(tx: Tx, order: Order, payment: Payment | null): Promise<void> {
    if (!payment || (order.paidAt && order.sessionId === payment.session.id)) return;
    await this.flags.set(tx, order, 'paid-after-end', paidText(payment));
  }

  private async markPaid(tx: Tx, order: Order, payment: Payment | null): Promise<void> {
    const now = this.clock.now();
    await order.update(
      {
        state: 'paid',
        paidAt: now,
        closedAt: now,
        updatedAt: now,
        personId: order.personId ?? (await this.people.verifiedIdByEmail(order.email, tx)),
        ...(payment
          ? {
              sessionId: payment.session.id,
              paymentIntentId: payment.session.paymentIntentId,
              paymentCountry: payment.session.billingCountry,
              cardCountry: payment.cardCountry,
            }
          : {}),
      },
      { transaction: tx },
    );
    await this.history.add(tx, order.id, 'paid', paidText(payment));
    const { isClear } = placeOf(order);
    // Where nothing was paid there is no tax, and nothing to prove.
    if (payment && !isClear)
      await this.flags.set(
        tx,
        order,
        'location-unclear',
        `declared ${order.declaredCountry}, billing ${order.paymentCountry ?? 'unknown'}, card ${order.cardCountry ?? 'unknown'}`,
      );
  }

  private async handOver(tx: Tx, order: Order, payment: Payment | null): Promise<void> {
    const lines = await this.lines.findAll({
      where: { orderId: order.id },
      order: [['position', 'ASC']],
      transaction: tx,
    });
    const { country } = placeOf(order);
    const paid: PaidOrder = {
      ...(order.get({ plain: true }) as Omit<PaidOrder, 'lines' | 'country' | 'billing' | 'facts'>),
      lines: lines.map((line) => line.get({ plain: true })),
      country,
      billing: payment && { name: payment.session.billingName, lines: payment.session.billingLines },
      facts: {},
    };
    await this.steps.run(tx, paid);
    const { receiptNumber = null, tax = null } = paid.facts;
    await order.update({ receiptNumber, tax }, { transaction: tx });
    const person = order.personId ? await this.people.byId(order.personId, tx) : null;
    await this.mail.queue(tx, paid, person?.name);
  }
}

const paidText = (payment: Payment | null): string =>
  payment
    ? `${payment.session.amountMinor} minor units of ${payment.session.currency} by ${payment.session.paymentIntentId ?? payment.session.id}`
    : 'nothing to pay';

/** What the payment service says was paid must be what the order asks; the browser is asked nothing. */
const faultOf = (order: Order, payment: Payment | null): string | null => {
  if (!payment) return order.totalMinor === 0 ? null : 'nothing was paid';
  const { session } = payment;
  if (session.orderId !== order.id) return `the payment is for order ${session.orderId ?? 'unknown'}`;
  if (order.sessionId && order.sessionId !== session.id) return `paid on another page, ${paidText(payment)}`;
  if (session.amountMinor !== order.totalMinor || session.currency !== order.currency)
    return `${order.totalMinor} ${order.currency} asked, ${paidText(payment)}`;
  return null;
};
