import { randomUUID } from 'node:crypto';
import { selectRows } from '../database/rows.js';
import { putKitOnSale, type KitOnSale } from './kit-on-sale.js';
import { startPaymentShop, type CheckoutOptions, type PaymentShop } from './payment-shop.js';
import { signInAs } from './sign-in.js';
import type { Browser } from './test-app.js';

/** A shop with a handful of paid orders, and its bookkeeper at the ledger. */
export interface SoldShop {
  readonly shop: PaymentShop;
  readonly knot: KitOnSale;
  readonly curlew: KitOnSale;
  readonly bookkeeper: Browser;
  /** By the name before the buyer's `@`. */
  readonly orders: Readonly<Record<string, string>>;
  /** An answer of the ledger, by its path below `/workshop/ledger/`. */
  get(path: string, query?: object): Promise<Answer>;
  buy(name: string, kit: KitOnSale, options: PaidCheckout): Promise<void>;
  giveBack(name: string, amountMinor: number): Promise<void>;
}
// Answers are compared with what they should be, so their types would say it twice.
// eslint-disable-next-line @typescript-eslint/no-explicit-any
export type Answer = any;
export interface PaidCheckout extends CheckoutOptions {
  /** Where the billing address and the card are from, where not from the buyer's country. */
  readonly paidFrom?: readonly [billing: string, card: string];
}

/** Declared in France, paid from Austria with a card of Spain. */
export const unclearBuyer: PaidCheckout = { country: 'FR', paidFrom: ['AT', 'ES'] };

/** Consumers of four countries, a business under reverse charge, one nobody knows where, and a part given back. */
export const startSoldShop = async (): Promise<SoldShop> => {
  const shop = await startPaymentShop({}, { webhooks: false });
  const knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 1999 });
  const curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
  const bookkeeper = await signInAs(shop, 'bookkeeper');
  const orders: Record<string, string> = {};

  const buy = async (name: string, kit: KitOnSale, { paidFrom, ...options }: PaidCheckout): Promise<void> => {
    const placed = await shop.checkout([kit.licenceId], { email: `${name}@mail.example`, ...options });
    await shop.pay(placed.paymentUrl, ...(paidFrom ?? [options.country ?? 'DE']));
    await shop
      .browser()
      .post(`/api/orders/${placed.orderId}/refresh`)
      .query({ key: placed.orderKey })
      .expect(200);
    orders[name] = placed.orderId;
  };
  const giveBack = async (name: string, amountMinor: number): Promise<void> => {
    const [line] = await selectRows<{ id: string }>(
      shop.database,
      'SELECT id FROM order_lines WHERE order_id = :orderId',
      { orderId: orders[name] },
    );
    await bookkeeper
      .post(`/api/workshop/orders/${orders[name]}/refunds`)
      .send({
        lines: [{ orderLineId: line?.id, amountMinor, keepsEntitlement: true }],
        reason: 'A present from the workshop.',
        attempt: randomUUID(),
      })
      .expect(202);
    await shop.drain();
  };
  await buy('wren', knot, { country: 'IT' });
  await buy('tern', knot, { country: 'FI' });
  await buy('stint', curlew, { country: 'DE' });
  await buy('ruff', curlew, { country: 'US' });
  await buy('reedworks', curlew, {
    country: 'DE',
    business: { name: 'Reed Works', address: 'Deichweg 3', vatNumber: 'DE123456789' },
  });
  await buy('dunlin', knot, unclearBuyer);
  await giveBack('stint', 1000);
  return {
    shop,
    knot,
    curlew,
    bookkeeper,
    orders,
    buy,
    giveBack,
    get: async (path, query = {}) =>
      (await bookkeeper.get(`/api/workshop/ledger/${path}`).query(query).expect(200)).body as Answer,
  };
};
