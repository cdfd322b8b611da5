import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { Coupons } from '../coupons/coupons.js';
import { Transactions } from '../database/transactions.js';
import { OrderHistory } from './order-history.js';
import { Order } from './order.model.js';

export const CANCEL_ASKED = 'giving up asked for';

/**
 * Ends an open order that was not paid, and gives its coupon's place back. Call it only when the payment
 * page is closed for good at the payment service, or where there never was one.
 */
@Injectable()
export class CloseOrder {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly transactions: Transactions,
    private readonly coupons: Coupons,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  /** @returns false where the order was final already, or got a payment page that the caller did not know of */
  close(
    orderId: string,
    state: 'cancelled' | 'expired',
    { why = '', onlyWithoutSession = false }: { why?: string; onlyWithoutSession?: boolean } = {},
  ): Promise<boolean> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order || order.state !== 'open' || (onlyWithoutSession && order.sessionId)) return false;
      // The event of the page's end may be here before the one who asked for it.
      const wasAsked = await this.history.has(tx, orderId, CANCEL_ASKED);
      const end = wasAsked ? 'cancelled' : state;
      const now = this.clock.now();
      await order.update({ state: end, closedAt: now, updatedAt: now }, { transaction: tx });
      await this.coupons.giveBack(tx, orderId);
      await this.history.add(tx, orderId, end, why);
      return true;
    }, 'read-committed');
  }
}
