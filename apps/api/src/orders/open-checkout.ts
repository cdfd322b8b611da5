import { Injectable } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { FulfilOrder } from './fulfil-order.js';
import { OpenPayment } from './open-payment.js';
import { PlaceOrder } from './place-order.js';

/**
 * From basket to payment page: the order is written, then its page is opened at the payment service, each
 * in a step that can be done again. An attempt that broke off anywhere goes on where it stopped.
 */
@Injectable()
export class OpenCheckout {
  constructor(
    private readonly placing: PlaceOrder,
    private readonly payment: OpenPayment,
    private readonly fulfilling: FulfilOrder,
    private readonly tokens: LinkTokens,
    private readonly limits: RateLimits,
  ) {}

  async open(
    body: Handled<'POST /checkout'>['body'],
    person: SignedIn | null,
    network: string,
  ): Promise<Answer<'POST /checkout'>> {
    await this.limits.take('checkout', network);
    const order = await this.placing.place(body, person);
    const orderKey = this.tokens.tokenOf('order-key', order.id);
    if (order.state !== 'open') return { orderId: order.id, orderKey, paymentUrl: null };
    if (order.totalMinor === 0) {
      await this.fulfilling.fulfil(order.id, null);
      return { orderId: order.id, orderKey, paymentUrl: null };
    }
    return { orderId: order.id, orderKey, paymentUrl: await this.payment.open(order) };
  }
}
