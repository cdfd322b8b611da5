import { randomUUID } from 'node:crypto';
import { jest } from '@jest/globals';
import { startFakeStripe, type FakeStripe } from '@windchest/fake-stripe';
import { Payments, PaymentsUnreachable } from '../adapters/payments/payments.js';
import { selectRows } from '../database/rows.js';
import { makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { checkoutBody, startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { PlaceOrder } from './place-order.js';

const stateOf = async (shop: PaymentShop, attempt: string): Promise<string | undefined> => {
  const [order] = await selectRows<{ state: string }>(
    shop.database,
    'SELECT state FROM orders WHERE attempt = :attempt',
    { attempt },
  );
  return order?.state;
};
const placesOf = async (shop: PaymentShop, code: string) => {
  const sql = 'SELECT held, redeemed FROM coupons WHERE code = :code';
  return (await selectRows<{ held: number; redeemed: number }>(shop.database, sql, { code }))[0];
};

describe('a checkout that breaks off', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let gauge: KitOnSale;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    gauge = await putKitOnSale(shop, { name: 'Gauge', priceMinor: 0 });
  });
  afterEach(() => jest.restoreAllMocks());
  afterAll(() => shop.stop());

  /** The payment service does what it is asked once, but its answer is lost on the way. */
  const loseAnswer = (method: 'openSession' | 'expireSession'): void => {
    const payments = shop.app.get(Payments, { strict: false });
    const real = payments[method].bind(payments) as (argument: never) => Promise<never>;
    jest.spyOn(payments, method).mockImplementationOnce((async (argument: never) => {
      await real(argument);
      throw new PaymentsUnreachable('the answer was lost');
    }) as never);
  };
  const sessions = async (): Promise<number> => {
    const answer = await fetch(`${shop.stripe.url}/control/state`);
    const state = (await answer.json()) as { sessions: Record<string, number> };
    return Object.values(state.sessions).reduce((sum, n) => sum + n, 0);
  };

  it('after its page was opened and before it was noted finds the same page again', async () => {
    const body = checkoutBody([knot.licenceId]);
    const before = await sessions();
    loseAnswer('openSession');
    await shop.browser().post('/api/checkout').send(body).expect(502);
    const opened = await shop.browser().post('/api/checkout').send(body).expect(201);
    expect(opened.body.paymentUrl).toMatch(/\/pay\/cs_/);
    expect(await sessions()).toBe(before + 1);
  });

  it('for a free kit is finished by the job that looks after the order', async () => {
    const body = checkoutBody([gauge.licenceId]);
    await shop.app.get(PlaceOrder, { strict: false }).place(body as never, null);
    expect(await stateOf(shop, body.attempt)).toBe('open');
    shop.clock.advance(61);
    await shop.drain();
    expect(await stateOf(shop, body.attempt)).toBe('paid');
    expect(shop.mailer.sent.filter((mail) => mail.to === body.email)).toHaveLength(1);
  });

  it('while it is given up ends as given up', async () => {
    await makeCoupon(shop, { code: 'GIVENUP', cap: 1 });
    const attempt = randomUUID();
    const placed = await shop.checkout([knot.licenceId], { attempt, couponCode: 'GIVENUP' });
    loseAnswer('expireSession');
    const cancel = shop
      .browser()
      .post(`/api/orders/${placed.orderId}/cancel`)
      .query({ key: placed.orderKey });
    expect((await cancel.expect(502)).body.code).toBe('payment-unreachable');
    shop.clock.advance(61);
    await shop.drain();
    expect(await stateOf(shop, attempt)).toBe('cancelled');
    expect(await placesOf(shop, 'GIVENUP')).toEqual({ held: 0, redeemed: 0 });
  });
});

describe('a payment service that cannot be reached', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let back: FakeStripe | undefined;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    await shop.stripe.stop();
  });
  afterAll(async () => {
    await back?.stop();
    await shop.stop();
  });

  it('leaves the order as it is; the same attempt goes on once it is back; a forgotten one ends', async () => {
    await makeCoupon(shop, { code: 'TWO', cap: 2 });
    const patient = checkoutBody([knot.licenceId], { couponCode: 'TWO' });
    const forgetful = checkoutBody([knot.licenceId], { couponCode: 'TWO' });
    for (const body of [patient, forgetful]) {
      const down = await shop.browser().post('/api/checkout').send(body).expect(502);
      expect(down.body.code).toBe('payment-unreachable');
      expect(await stateOf(shop, body.attempt)).toBe('open');
    }
    expect(await placesOf(shop, 'TWO')).toEqual({ held: 2, redeemed: 0 });

    // So late that a page with the end first planned would be too short for the service.
    shop.clock.advance(20 * 60);
    await shop.drain();
    back = await startFakeStripe({ port: shop.stripe.port, seed: 2 });
    const opened = await shop.browser().post('/api/checkout').send(patient).expect(201);
    expect(opened.body.paymentUrl).toMatch(/\/pay\/cs_/);
    await shop.pay(opened.body.paymentUrl as string);
    shop.clock.advance(40 * 60);
    await shop.drain();
    expect(await stateOf(shop, patient.attempt)).toBe('paid');
    expect(await stateOf(shop, forgetful.attempt)).toBe('expired');
    expect(await placesOf(shop, 'TWO')).toEqual({ held: 0, redeemed: 1 });
  });
});

describe('a payment service that refuses an order', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  beforeAll(async () => {
    // The service wants pages of half an hour or more.
    shop = await startPaymentShop({ CHECKOUT_MINUTES: '5' }, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
  });
  afterAll(() => shop.stop());

  it('ends the order at once, and the place of its coupon is free again', async () => {
    await makeCoupon(shop, { code: 'SINGLE', cap: 1 });
    const body = checkoutBody([knot.licenceId], { couponCode: 'SINGLE' });
    const refused = await shop.browser().post('/api/checkout').send(body).expect(402);
    expect(refused.body.code).toBe('payment-refused');
    expect(await stateOf(shop, body.attempt)).toBe('cancelled');
    expect(await placesOf(shop, 'SINGLE')).toEqual({ held: 0, redeemed: 0 });
  });
});
