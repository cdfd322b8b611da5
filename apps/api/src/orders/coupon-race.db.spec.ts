import { selectRows } from '../database/rows.js';
import { makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import {
  checkoutBody,
  sessionIdOf,
  startPaymentShop,
  type CheckoutAnswer,
  type PaymentShop,
} from '../testing/payment-shop.js';

const PEOPLE = 400;
const CAP = 150;

describe('a coupon for the first 150', () => {
  let shop: PaymentShop;
  let curlew: KitOnSale;
  beforeAll(async () => {
    shop = await startPaymentShop({ DB_POOL: '20' });
    curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
    await makeCoupon(shop, { code: 'WINDFALL', cap: CAP });
  });
  afterAll(() => shop.stop());

  type Outcome = { status: number; body: CheckoutAnswer & { code?: string } };
  const arrive = async (): Promise<Outcome> => {
    const answer = await fetch(`${shop.url}/api/checkout`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', 'x-windchest': '1' },
      body: JSON.stringify(checkoutBody([curlew.licenceId], { couponCode: 'WINDFALL' })),
    });
    return { status: answer.status, body: (await answer.json()) as Outcome['body'] };
  };
  const arriveTogether = async (people: number) => {
    const outcomes = await Promise.all(Array.from({ length: people }, arrive));
    const told = outcomes.filter((one) => one.status !== 201);
    return {
      placed: outcomes.filter((one) => one.status === 201).map((one) => one.body),
      told: [...new Set(told.map((one) => `${one.status} ${one.body.code}`))],
    };
  };
  const standing = async () => {
    const [coupon] = await selectRows<{ held: number; redeemed: number }>(
      shop.database,
      'SELECT held, redeemed FROM coupons',
    );
    const places = await selectRows<{ state: string; n: number }>(
      shop.database,
      'SELECT state, COUNT(*) AS n FROM coupon_places GROUP BY state',
    );
    return { ...coupon, places: Object.fromEntries(places.map(({ state, n }) => [state, Number(n)])) };
  };

  it('gives 400 people who come at once exactly 150 places, and each place that comes back to somebody else', async () => {
    const { placed, told } = await arriveTogether(PEOPLE);
    expect(placed).toHaveLength(CAP);
    expect(told).toEqual(['409 coupon-is-used-up']);
    expect(await standing()).toEqual({ held: CAP, redeemed: 0, places: { held: CAP } });

    // Twenty give up, twenty more let their page run out, the rest pay: all at the same time.
    const [givingUp, fallingAsleep, paying] = [placed.slice(0, 20), placed.slice(20, 40), placed.slice(40)];
    const giveUp = ({ orderId, orderKey }: CheckoutAnswer) =>
      shop.browser().post(`/api/orders/${orderId}/cancel`).query({ key: orderKey }).expect(200);
    await Promise.all([
      ...givingUp.map(giveUp),
      ...fallingAsleep.map(({ paymentUrl }) => shop.control(`/sessions/${sessionIdOf(paymentUrl)}/expire`)),
      ...paying.map(({ paymentUrl }) => shop.pay(paymentUrl)),
    ]);
    await shop.control('/webhooks/flush');
    await Promise.all([shop.drain(), shop.drain(), shop.drain()]);
    const half = CAP - 40;
    expect(await standing()).toEqual({
      held: 0,
      redeemed: half,
      places: { redeemed: half, 'given-back': 40 },
    });

    const second = await arriveTogether(100);
    expect(second.placed).toHaveLength(40);
    expect(second.told).toEqual(['409 coupon-is-used-up']);
    await Promise.all(second.placed.map(({ paymentUrl }) => shop.pay(paymentUrl)));
    await shop.control('/webhooks/flush');
    await Promise.all([shop.drain(), shop.drain()]);
    expect(await standing()).toEqual({
      held: 0,
      redeemed: CAP,
      places: { redeemed: CAP, 'given-back': 40 },
    });
    const paid = await selectRows<{ n: number }>(
      shop.database,
      `SELECT COUNT(*) AS n FROM orders WHERE state = 'paid' AND total_minor = 1600`,
    );
    expect(Number(paid[0]?.n)).toBe(CAP);
  }, 600_000);

  it('for each buyer once stays so when one buyer comes many times at once', async () => {
    await makeCoupon(shop, { code: 'EACHONCE', perBuyer: 1 });
    const email = 'hasty@mail.example';
    const answers = await Promise.all(
      Array.from({ length: 12 }, () =>
        shop
          .browser()
          .post('/api/checkout')
          .send(checkoutBody([curlew.licenceId], { couponCode: 'EACHONCE', email })),
      ),
    );
    const codes = answers.map((answer) => (answer.status === 201 ? 'placed' : (answer.body.code as string)));
    expect(codes.sort()).toEqual([...Array(11).fill('coupon-buyer-limit'), 'placed']);
    const [coupon] = await selectRows(shop.database, `SELECT held FROM coupons WHERE code = 'EACHONCE'`);
    expect(coupon).toEqual({ held: 1 });
  });
});
