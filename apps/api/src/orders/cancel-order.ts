import { Injectable } from '@nestjs/common';
import type { BuyerOrder } from '@windchest/contracts';
import { Payments, PaymentsUnreachable, type PaymentSession } from '../adapters/payments/payments.js';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { Refusal } from '../http/refusal.js';
import { CANCEL_ASKED, CloseOrder } from './close-order.js';
import { OrderHistory } from './order-history.js';
import type { Order } from './order.model.js';
import { OwnOrders } from './own-orders.js';
import { paymentUnreachable } from './payment-unreachable.js';
import { SettleOrder } from './settle-order.js';

/**
 * Gives up an open order. The payment page is ended first, at the payment service; only when it is ended
 * can nobody pay any more. Where somebody was quicker and paid, the order is fulfilled instead.
 */
@Injectable()
export class CancelOrder {
  constructor(
    private readonly own: OwnOrders,
    private readonly transactions: Transactions,
    private readonly payments: Payments,
    private readonly settling: SettleOrder,
    private readonly closing: CloseOrder,
    private readonly history: OrderHistory,
  ) {}

  async cancel(orderId: string, person: SignedIn | null, key: string | undefined): Promise<BuyerOrder> {
    const order = await this.own.find(orderId, person, key);
    if (order.state === 'paid' || order.state === 'refunded')
      throw new Refusal('order-is-final', `Order ${order.number} is paid and cannot be given up any more.`);
    if (order.state === 'open') await this.end(order);
    return this.own.show(orderId, person, key);
  }

  private async end(order: Order): Promise<void> {
    await this.transactions.run((tx) => this.history.add(tx, order.id, CANCEL_ASKED));
    if (!order.sessionId) {
      const isClosed = await this.closing.close(order.id, 'cancelled', { onlyWithoutSession: true });
      if (!isClosed)
        throw new Refusal('conflict', 'The payment page was opened at this very moment. Try again.');
      return;
    }
    if ((await this.endPage(order.sessionId)) === 'open')
      throw new Refusal(
        'order-is-final',
        'A payment for this order is under way. Wait until the bank has answered.',
      );
  }

  private async endPage(sessionId: string): Promise<PaymentSession['state'] | null> {
    try {
      return await this.settling.follow(await this.payments.expireSession(sessionId));
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw paymentUnreachable();
      throw fault;
    }
  }
}
