import { randomUUID } from 'node:crypto';
import type { WorkshopOrder } from '@windchest/contracts';
import { putKitOnSale, type KitOnSale } from './kit-on-sale.js';
import {
  startPaymentShop,
  type CheckoutAnswer,
  type CheckoutOptions,
  type PaymentShop,
} from './payment-shop.js';
import { signInAs } from './sign-in.js';
import type { Browser } from './test-app.js';

export type RefundWish = { orderLineId: string; amountMinor: number; keepsEntitlement: boolean };

/** A shop with two kits on sale, and a bookkeeper in it who gives money back. */
export interface RefundingShop extends PaymentShop {
  readonly knot: KitOnSale;
  readonly plover: KitOnSale;
  readonly bookkeeper: Browser;
  /** Buys both kits and pays; the news has arrived. */
  buyBoth(options?: CheckoutOptions): Promise<CheckoutAnswer & { email: string }>;
  /** Delivers all events there are and works on them. */
  deliver(): Promise<void>;
  show(orderId: string): Promise<WorkshopOrder>;
  askRefund(orderId: string, wish: object, attempt?: string): ReturnType<Browser['post']>;
}

export const startRefundingShop = async (): Promise<RefundingShop> => {
  const shop = await startPaymentShop();
  const knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
  const plover = await putKitOnSale(shop, { name: 'Plover', priceMinor: 1999 });
  const bookkeeper = await signInAs(shop, 'bookkeeper', 'ines@workshop.example');
  const deliver = async () => {
    await shop.control('/webhooks/flush');
    await shop.drain();
  };
  return {
    ...shop,
    knot,
    plover,
    bookkeeper,
    deliver,
    buyBoth: async (options = {}) => {
      const email = options.email ?? `buyer-${randomUUID().slice(0, 8)}@mail.example`;
      const placed = await shop.checkout([knot.licenceId, plover.licenceId], { ...options, email });
      await shop.pay(placed.paymentUrl);
      await deliver();
      return { ...placed, email };
    },
    show: async (orderId) =>
      (await bookkeeper.get(`/api/workshop/orders/${orderId}`).expect(200)).body as WorkshopOrder,
    askRefund: (orderId, wish, attempt = randomUUID()) =>
      bookkeeper
        .post(`/api/workshop/orders/${orderId}/refunds`)
        .send({ reason: 'Does not fit the hand.', attempt, ...wish }),
  };
};
