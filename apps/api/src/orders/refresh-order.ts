import { Injectable } from '@nestjs/common';
import type { BuyerOrder } from '@windchest/contracts';
import { PaymentsUnreachable } from '../adapters/payments/payments.js';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { OwnOrders } from './own-orders.js';
import { paymentUnreachable } from './payment-unreachable.js';
import { SettleOrder } from './settle-order.js';

/** The buyer is back from the payment page and the event is not here yet: ask. */
@Injectable()
export class RefreshOrder {
  constructor(
    private readonly own: OwnOrders,
    private readonly settling: SettleOrder,
    private readonly limits: RateLimits,
  ) {}

  async refresh(orderId: string, person: SignedIn | null, key: string | undefined): Promise<BuyerOrder> {
    const order = await this.own.find(orderId, person, key);
    if (order.state === 'open' && order.sessionId) {
      await this.limits.take('checkout', `refresh:${orderId}`);
      try {
        await this.settling.settle(order.sessionId);
      } catch (fault) {
        if (fault instanceof PaymentsUnreachable) throw paymentUnreachable();
        throw fault;
      }
    }
    return this.own.show(orderId, person, key);
  }
}
