import { Payments } from '../adapters/payments/payments.js';
import { selectRows } from '../database/rows.js';
import { makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { sessionIdOf, startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { CloseOrder } from './close-order.js';
import { FulfilOrder } from './fulfil-order.js';
import { OrderPaidSteps } from './order-paid-steps.js';

describe('fulfilling an order', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let fulfilling: FulfilOrder;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    fulfilling = shop.app.get(FulfilOrder, { strict: false });
  });
  afterAll(() => shop.stop());

  const paidOrder = async (couponCode?: string) => {
    const placed = await shop.checkout([knot.licenceId], couponCode ? { couponCode } : {});
    await shop.pay(placed.paymentUrl);
    const session = await shop.app.get(Payments, { strict: false }).session(sessionIdOf(placed.paymentUrl));
    return { orderId: placed.orderId, payment: { session, cardCountry: 'DE' } };
  };
  const count = async (sql: string, orderId: string): Promise<number> =>
    Number((await selectRows<{ n: number }>(shop.database, sql, { orderId }))[0]?.n);
  const tracesOf = async (orderId: string) => ({
    paid: await count(
      `SELECT COUNT(*) AS n FROM order_history WHERE order_id = :orderId AND what = 'paid'`,
      orderId,
    ),
    receipts: await count('SELECT COUNT(*) AS n FROM receipts WHERE order_id = :orderId', orderId),
    mails: await count(`SELECT COUNT(*) AS n FROM mails WHERE about = CONCAT('order:', :orderId)`, orderId),
  });

  it('happens once, and fails for nobody, when many ask for it at the same moment', async () => {
    const { id } = await makeCoupon(shop, { code: 'MANY', cap: 5 });
    const { orderId, payment } = await paidOrder('MANY');
    await Promise.all(Array.from({ length: 8 }, () => fulfilling.fulfil(orderId, payment)));
    await fulfilling.fulfil(orderId, payment);
    expect(await tracesOf(orderId)).toEqual({ paid: 1, receipts: 1, mails: 1 });
    const [coupon] = await selectRows(shop.database, 'SELECT held, redeemed FROM coupons WHERE id = :id', {
      id,
    });
    expect(coupon).toEqual({ held: 0, redeemed: 1 });
  });

  it('leaves no trace when any of its steps fails, and the receipt’s number goes to the next', async () => {
    const steps = shop.app.get(OrderPaidSteps, { strict: false });
    const { orderId, payment } = await paidOrder();
    steps.register({ name: 'breaks', order: 99, run: () => Promise.reject(new Error('broken step')) });
    await expect(fulfilling.fulfil(orderId, payment)).rejects.toThrow('broken step');
    expect(await tracesOf(orderId)).toEqual({ paid: 0, receipts: 0, mails: 0 });
    steps.register({ name: 'breaks', order: 99, run: () => Promise.resolve() });
    await fulfilling.fulfil(orderId, payment);
    const numbers = await selectRows<{ number: number }>(
      shop.database,
      'SELECT number FROM receipts ORDER BY number',
    );
    expect(numbers.map((row) => row.number)).toEqual(numbers.map((_, index) => index + 1));
  });

  it('does not wake up an order that has ended, and tells staff of the money', async () => {
    const { orderId, payment } = await paidOrder();
    await shop.app.get(CloseOrder, { strict: false }).close(orderId, 'cancelled');
    await fulfilling.fulfil(orderId, payment);
    await fulfilling.fulfil(orderId, payment);
    const [order] = await selectRows<{ state: string; flags: unknown }>(
      shop.database,
      'SELECT state, flags FROM orders WHERE id = :orderId',
      { orderId },
    );
    expect(order?.state).toBe('cancelled');
    expect(JSON.stringify(order?.flags)).toContain('paid-after-end');
    expect(await tracesOf(orderId)).toEqual({ paid: 0, receipts: 0, mails: 0 });
  });

  it('refuses a payment that names another order', async () => {
    const [one, other] = [await paidOrder(), await paidOrder()];
    await fulfilling.fulfil(one.orderId, other.payment);
    const [order] = await selectRows<{ state: string; flags: unknown }>(
      shop.database,
      'SELECT state, flags FROM orders WHERE id = :orderId',
      { orderId: one.orderId },
    );
    expect(order?.state).toBe('open');
    expect(JSON.stringify(order?.flags)).toContain('amount-differs');
  });
});
