import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import {
  Payments,
  PaymentsRefused,
  PaymentsUnreachable,
  type PaymentSession,
} from '../adapters/payments/payments.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { touchRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { CloseOrder } from './close-order.js';
import { OrderHistory } from './order-history.js';
import { OrderLine } from './order-line.model.js';
import { Order } from './order.model.js';
import { isStillWorthOpening, payUntil } from '../payments/pay-until.js';
import { paymentUnreachable } from './payment-unreachable.js';

/**
 * Opens the payment page of an open order and notes it. The page's address is shown only once it is noted,
 * so a page that was opened but never noted cannot be paid by anybody.
 */
@Injectable()
export class OpenPayment {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly payments: Payments,
    private readonly closing: CloseOrder,
    private readonly history: OrderHistory,
    private readonly tokens: LinkTokens,
    private readonly clock: Clock,
  ) {}

  /**
   * @returns the address of the payment page
   * @throws Refusal `payment-unreachable`, after which the same attempt may be made again; `payment-refused`
   */
  async open(order: Order): Promise<string | null> {
    if (order.sessionId) return order.paymentUrl;
    const until = await this.lastMoment(order);
    const session = await this.openAt(order, until);
    const noted = await this.note(order.id, session);
    if (noted.sessionId !== session.id) await this.drop(session);
    if (noted.state !== 'open')
      throw new Refusal(
        'order-is-final',
        `Order ${noted.number} was ended in the meantime. Go back to the basket.`,
      );
    return noted.paymentUrl;
  }

  /** The page's end, moved on where so much time went by that the service would refuse it. */
  private async lastMoment(order: Order): Promise<Date> {
    const now = this.clock.now();
    if (order.payUntil && isStillWorthOpening(order.payUntil, now, this.config.CHECKOUT_MINUTES))
      return order.payUntil;
    const later = payUntil(now, this.config.CHECKOUT_MINUTES);
    await touchRows(
      this.database,
      `UPDATE orders SET pay_until = :later, updated_at = :now WHERE id = :id AND state = 'open' AND session_id IS NULL`,
      { later, now, id: order.id },
    );
    return later;
  }

  private async openAt(order: Order, expiresAt: Date): Promise<PaymentSession> {
    const lines = await this.lines.findAll({ where: { orderId: order.id }, order: [['position', 'ASC']] });
    const page = `${this.config.BASE_URL}/orders/${order.id}#key=${this.tokens.tokenOf('order-key', order.id)}`;
    try {
      return await this.payments.openSession({
        orderId: order.id,
        orderNumber: order.number,
        currency: order.currency,
        lines: lines.map((line) => ({
          name: `${line.kitName} ${line.revisionLabel}`,
          description: line.licenceName,
          amountMinor: line.totalMinor,
        })),
        email: order.email,
        successUrl: page,
        cancelUrl: page,
        expiresAt,
      });
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw paymentUnreachable();
      if (!(fault instanceof PaymentsRefused)) throw fault;
      await this.closing.close(order.id, 'cancelled', {
        why: `The payment service refused to open a page: ${fault.message}`,
        onlyWithoutSession: true,
      });
      throw new Refusal(
        'payment-refused',
        'The payment service refused this order, so it was ended and nothing is charged. Check the e-mail address and start again.',
      );
    }
  }

  private note(orderId: string, session: PaymentSession): Promise<Order> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) throw new Error('An order vanished while its payment page was opened.');
      if (order.state !== 'open' || order.sessionId) return order;
      await order.update(
        {
          sessionId: session.id,
          paymentUrl: session.url,
          payUntil: session.expiresAt,
          updatedAt: this.clock.now(),
        },
        { transaction: tx },
      );
      await this.history.add(tx, orderId, 'payment page opened', `until ${session.expiresAt.toISOString()}`);
      return order;
    }, 'read-committed');
  }

  /** Nobody has seen this page; it would end by itself, but there is no reason to leave it open. */
  private async drop(session: PaymentSession): Promise<void> {
    await this.payments.expireSession(session.id).catch(() => undefined);
  }
}
