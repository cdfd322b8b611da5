import Stripe from 'stripe';
import { selectRows } from '../database/rows.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import {
  sessionIdOf,
  startPaymentShop,
  type CheckoutAnswer,
  type PaymentShop,
} from '../testing/payment-shop.js';
import { signInAs } from '../testing/sign-in.js';

describe('events of the payment service', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  beforeAll(async () => {
    shop = await startPaymentShop();
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
  });
  afterAll(() => shop.stop());

  const count = async (sql: string, values: Record<string, unknown> = {}): Promise<number> =>
    Number((await selectRows<{ n: number | string }>(shop.database, sql, values))[0]?.n ?? 0);
  const show = async (orderId: string) => {
    const workshop = await signInAs(shop, 'bookkeeper');
    return (await workshop.get(`/api/workshop/orders/${orderId}`).expect(200)).body;
  };
  const delivered = async () => {
    await shop.control('/webhooks/flush');
    await shop.drain();
  };

  describe('that are forged, stale or altered', () => {
    const body = JSON.stringify({
      id: 'evt_forged',
      object: 'event',
      type: 'checkout.session.completed',
      created: 1,
      data: { object: { id: 'cs_forged' } },
    });
    const header = (options: { secret?: string; timestamp?: number } = {}) =>
      new Stripe('sk_test_x').webhooks.generateTestHeaderString({
        payload: body,
        secret: shop.stripe.webhookSecret,
        ...options,
      });
    const post = (payload: string, signature?: string) =>
      fetch(`${shop.url}/api/payments/webhook`, {
        method: 'POST',
        headers: {
          'content-type': 'application/json',
          ...(signature ? { 'stripe-signature': signature } : {}),
        },
        body: payload,
      });

    it('are refused and leave no trace', async () => {
      const old = Math.floor(Date.now() / 1000) - 400;
      const tries: [string, string | undefined][] = [
        [body, undefined],
        [body, 't=1,v1=abc'],
        [body, header({ secret: 'whsec_somebody_else' })],
        [body, header({ timestamp: old })],
        [body.replace('cs_forged', 'cs_another'), header()],
        [`${body} `, header()],
      ];
      for (const [payload, signature] of tries) {
        const answer = await post(payload, signature);
        expect(answer.status).toBe(400);
        expect(((await answer.json()) as { code: string }).code).toBe('signature-refused');
      }
      expect(await count('SELECT COUNT(*) AS n FROM payment_events')).toBe(0);
    });

    it('are taken where the signature is right, and an unknown page is nobody’s', async () => {
      expect((await post(body, header())).status).toBe(200);
      expect((await post(body, header())).status).toBe(200);
      await shop.drain();
      expect(await count('SELECT COUNT(*) AS n FROM payment_events WHERE handled_at IS NOT NULL')).toBe(1);
    });
  });

  it('make an order paid', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    await shop.pay(placed.paymentUrl);
    await delivered();
    expect(await show(placed.orderId)).toMatchObject({ state: 'paid', flags: [] });
  });

  it('end an order whose page has ended', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    await shop.control(`/sessions/${sessionIdOf(placed.paymentUrl)}/expire`);
    await delivered();
    expect((await show(placed.orderId)).state).toBe('expired');
  });

  it('do nothing while a payment fails, and the page stays good', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    const session = sessionIdOf(placed.paymentUrl);
    await shop.control(`/sessions/${session}/pay`, { outcome: 'decline' });
    await delivered();
    expect((await show(placed.orderId)).state).toBe('open');
    await shop.control(`/sessions/${session}/pay`, { country: 'DE' });
    await delivered();
    expect((await show(placed.orderId)).state).toBe('paid');
  });

  it('of another amount hand nothing over and show the order to the workshop', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    // As if the order and its page did not say the same.
    await shop.database.query('UPDATE orders SET total_minor = 901 WHERE id = ?', {
      replacements: [placed.orderId],
    });
    await shop.pay(placed.paymentUrl);
    await delivered();
    expect(await show(placed.orderId)).toMatchObject({
      state: 'open',
      flags: ['amount-differs'],
      receiptNumber: null,
      mails: [],
    });
  });
});

describe('a storm of events', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  const ORDERS = 24;
  beforeAll(async () => {
    shop = await startPaymentShop();
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
  });
  afterAll(() => shop.stop());

  it('five times each, shuffled, some lost, some before the browser: one fulfilment, receipt and mail each', async () => {
    const placed: CheckoutAnswer[] = [];
    for (let n = 0; n < ORDERS; n++)
      placed.push(await shop.checkout([knot.licenceId], { email: `buyer-${n}@mail.example` }));
    const third = ORDERS / 3;

    await shop.control('/webhooks', { duplicates: 4, shuffle: true, seed: 7 });
    for (const { paymentUrl } of placed.slice(0, 2 * third)) await shop.pay(paymentUrl);
    await shop.control('/webhooks', { lose: 1 });
    for (const { paymentUrl } of placed.slice(2 * third)) await shop.pay(paymentUrl);
    // Browsers come back while events arrive and several workers run, all at the same time.
    const comeBack = placed
      .slice(third)
      .filter((_, index) => index % 2 === 0)
      .map(({ orderId, orderKey }) =>
        shop.browser().post(`/api/orders/${orderId}/refresh`).query({ key: orderKey }).expect(200),
      );
    await Promise.all([
      shop.control('/webhooks/flush'),
      ...comeBack,
      shop.drain(),
      shop.drain(),
      shop.drain(),
    ]);
    await Promise.all([shop.drain(), shop.drain()]);
    shop.clock.advance(61);
    await Promise.all([shop.drain(), shop.drain()]);

    const events = await selectRows<{ id: string; handled: number }>(
      shop.database,
      'SELECT id, handled_at IS NOT NULL AS handled FROM payment_events',
    );
    expect(events.length).toBeGreaterThan(third);
    expect(events.filter((event) => Number(event.handled) === 0)).toEqual([]);

    const orders = await selectRows<{ state: string; receipt: string }>(
      shop.database,
      'SELECT state, receipt_number AS receipt FROM orders',
    );
    expect(orders.map((order) => order.state)).toEqual(Array(ORDERS).fill('paid'));
    const receipts = await selectRows<{ number: number; label: string }>(
      shop.database,
      'SELECT number, label FROM receipts ORDER BY number',
    );
    expect(receipts.map((receipt) => receipt.number)).toEqual(
      Array.from({ length: ORDERS }, (_, n) => n + 1),
    );
    expect(orders.map((order) => order.receipt).sort()).toEqual(receipts.map((receipt) => receipt.label));
    const paid = await selectRows<{ n: number }>(
      shop.database,
      `SELECT COUNT(*) AS n FROM order_history WHERE what = 'paid' GROUP BY order_id`,
    );
    expect(paid.map((row) => Number(row.n))).toEqual(Array(ORDERS).fill(1));
    const mailed = shop.mailer.sent.map((mail) => mail.to).sort();
    expect(mailed).toEqual(placed.map((_, n) => `buyer-${n}@mail.example`).sort());
    const dead = await selectRows(shop.database, `SELECT name, last_error FROM jobs WHERE state = 'dead'`);
    expect(dead).toEqual([]);
  }, 600_000);
});
