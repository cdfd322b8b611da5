import { randomUUID } from 'node:crypto';
import { consentText } from '@windchest/contracts';
import { selectRows } from '../database/rows.js';
import { couponBody, makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import {
  checkoutBody,
  sessionIdOf,
  startPaymentShop,
  type CheckoutAnswer,
  type PaymentShop,
} from '../testing/payment-shop.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';

describe('a checkout', () => {
  let shop: PaymentShop;
  let curlew: KitOnSale;
  let knot: KitOnSale;
  let gauge: KitOnSale;
  beforeAll(async () => {
    // Without events: here the browser and the job that looks after orders ask by themselves.
    shop = await startPaymentShop({}, { webhooks: false });
    curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    gauge = await putKitOnSale(shop, { name: 'Gauge', priceMinor: 0 });
  });
  afterAll(() => shop.stop());

  const orderOf = async ({ orderId, orderKey }: CheckoutAnswer) =>
    (await shop.browser().get(`/api/orders/${orderId}`).query({ key: orderKey }).expect(200)).body;
  const refresh = async ({ orderId, orderKey }: CheckoutAnswer) =>
    (await shop.browser().post(`/api/orders/${orderId}/refresh`).query({ key: orderKey }).expect(200)).body;
  const mailsTo = (email: string) => shop.mailer.sent.filter((mail) => mail.to === email);

  it('prices on the server, opens a page for that amount, and is paid, numbered and mailed', async () => {
    await makeCoupon(shop, { code: 'WINDFALL' });
    const email = 'wren@mail.example';
    const placed = await shop.checkout([curlew.licenceId, knot.licenceId], { email, couponCode: 'windfall' });
    expect(await orderOf(placed)).toMatchObject({
      state: 'open',
      paymentUrl: placed.paymentUrl,
      subtotal: { minor: 3300 },
      discount: { minor: 1100 },
      total: { minor: 2200, currency: 'EUR' },
      couponCode: 'WINDFALL',
      receiptNumber: null,
    });
    const page = await (await fetch(placed.paymentUrl ?? '')).text();
    expect(page).toContain('Curlew Mk 1.4');
    expect(page).toContain('€22.00');

    await shop.pay(placed.paymentUrl);
    const paid = await refresh(placed);
    expect(paid).toMatchObject({ state: 'paid', payUntil: null, paymentUrl: null });
    expect(paid.number).toMatch(/^W-[0-9A-HJKMNP-TV-Z]{6}$/);
    expect(paid.receiptNumber).toMatch(/^\d{4}-\d{6}$/);
    // 19 % in Germany: 22.00 / 1.19 = 18.487…
    expect(paid.tax).toEqual([
      {
        ratePercent: '19',
        net: { minor: 1849, currency: 'EUR' },
        tax: { minor: 351, currency: 'EUR' },
      },
    ]);
    await shop.drain();
    const [mail, ...others] = mailsTo(email);
    expect(others).toEqual([]);
    expect(mail?.subject).toMatch(/Curlew/);
    for (const part of [paid.number, paid.receiptNumber, 'VAT 19', '€22.00', 'Coupon WINDFALL'])
      expect(mail?.text.replaceAll('\u00a0', ' ')).toContain(part);
    expect(mail?.text).toContain(`/orders/${placed.orderId}#key=${placed.orderKey}`);
  });

  it('keeps the words the buyer agreed to, and the hash of the key alone', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    const [row] = await selectRows<{ consent_text: string; key_hash: string }>(
      shop.database,
      'SELECT * FROM orders WHERE id = :orderId',
      { ...placed },
    );
    expect(row?.consent_text).toBe(consentText);
    expect(JSON.stringify(row)).not.toContain(placed.orderKey);
  });

  it('made twice with the same attempt is one order, also at the same moment', async () => {
    const body = checkoutBody([knot.licenceId], { email: 'dunlin@mail.example' });
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => shop.browser().post('/api/checkout').send(body).expect(201)),
    );
    const [first, ...others] = answers.map((answer) => answer.body as CheckoutAnswer);
    expect(first?.paymentUrl).toMatch(/\/pay\/cs_/);
    for (const other of others) expect(other).toEqual(first);
    const rows = await selectRows(shop.database, 'SELECT id FROM orders WHERE attempt = :attempt', {
      attempt: body.attempt,
    });
    expect(rows).toHaveLength(1);
  });

  it('refuses the attempt of another order', async () => {
    const body = checkoutBody([knot.licenceId]);
    await shop.browser().post('/api/checkout').send(body).expect(201);
    const other = { ...body, email: 'somebody@mail.example' };
    expect((await shop.browser().post('/api/checkout').send(other).expect(409)).body.code).toBe('conflict');
  });

  it('refuses what is no longer sold, a basket without consent, and an empty one', async () => {
    const gone = await shop
      .browser()
      .post('/api/checkout')
      .send(checkoutBody([randomUUID()]))
      .expect(409);
    expect(gone.body.code).toBe('basket-has-gone');
    const silent = { ...checkoutBody([knot.licenceId]), hasConsented: false };
    const refused = await shop.browser().post('/api/checkout').send(silent).expect(422);
    expect(refused.body.fields).toHaveProperty('hasConsented');
    await shop.browser().post('/api/checkout').send(checkoutBody([])).expect(422);
  });

  it('needs no payment for a free kit and goes the same way otherwise', async () => {
    const email = 'plover@mail.example';
    const placed = await shop.checkout([gauge.licenceId], { email });
    expect(placed.paymentUrl).toBeNull();
    const order = await orderOf(placed);
    expect(order).toMatchObject({ state: 'paid', total: { minor: 0 } });
    expect(order.receiptNumber).toMatch(/^\d{4}-\d{6}$/);
    await shop.drain();
    expect(mailsTo(email)).toHaveLength(1);
    expect(await shop.checkout([gauge.licenceId], { email })).not.toEqual(placed);
  });

  it('redeems a coupon that makes a kit free', async () => {
    const { id } = await makeCoupon(shop, {
      code: 'PRESENT',
      cap: 1,
      off: { kind: 'fraction', numerator: 1, denominator: 1 },
    });
    await shop.checkout([knot.licenceId], { couponCode: 'PRESENT' });
    const maker = await signInAs(shop, 'maker');
    const { body } = await maker.get(`/api/workshop/coupons/${id}`).expect(200);
    expect(body).toMatchObject({ held: 0, redeemed: 1, left: 0, takenOff: { minor: 900 } });
    const late = await shop
      .browser()
      .post('/api/checkout')
      .send(checkoutBody([knot.licenceId], { couponCode: 'PRESENT' }))
      .expect(409);
    expect(late.body.code).toBe('coupon-is-used-up');
  });

  it('holds a place of the coupon until it is given up; the page is closed at the payment service', async () => {
    const { id } = await makeCoupon(shop, { code: 'ONLYONE', cap: 1 });
    const first = await shop.checkout([curlew.licenceId], { couponCode: 'ONLYONE' });
    const maker = await signInAs(shop, 'maker');
    const tooLow = await maker
      .put(`/api/workshop/coupons/${id}`)
      .send(couponBody({ code: 'ONLYONE', cap: 1, isActive: true }))
      .expect(200);
    expect(tooLow.body).toMatchObject({ held: 1, left: 0 });

    const cancel = () =>
      shop.browser().post(`/api/orders/${first.orderId}/cancel`).query({ key: first.orderKey });
    expect((await cancel().expect(200)).body.state).toBe('cancelled');
    expect((await cancel().expect(200)).body.state).toBe('cancelled');
    expect((await fetch(first.paymentUrl ?? '')).status).toBe(410);
    const second = await shop.checkout([curlew.licenceId], { couponCode: 'ONLYONE' });
    await shop.pay(second.paymentUrl);
    expect((await refresh(second)).state).toBe('paid');
    const after = await maker.get(`/api/workshop/coupons/${id}`).expect(200);
    expect(after.body).toMatchObject({ held: 0, redeemed: 1, left: 0, takenOff: { minor: 800 } });
  });

  it('keeps a coupon’s number at or above what is held and redeemed', async () => {
    const { id } = await makeCoupon(shop, { code: 'SHRINK', cap: 5 });
    await shop.checkout([curlew.licenceId], { couponCode: 'SHRINK' });
    await shop.checkout([curlew.licenceId], { couponCode: 'SHRINK' });
    const maker = await signInAs(shop, 'maker');
    const set = (cap: number) =>
      maker.put(`/api/workshop/coupons/${id}`).send(couponBody({ code: 'SHRINK', cap }));
    expect((await set(1).expect(422)).body).toMatchObject({
      code: 'coupon-refused',
      fields: { cap: expect.stringContaining('2 places') as string },
    });
    expect((await set(2).expect(200)).body.left).toBe(0);
  });

  it('counts the uses of a coupon by address and by person', async () => {
    await makeCoupon(shop, { code: 'ONCE', perBuyer: 1 });
    const email = 'turnstone@mail.example';
    const { id } = await makePerson(shop, 'buyer', email);
    const first = await shop.checkout([knot.licenceId], { couponCode: 'ONCE', email });
    const refused = (browser = shop.browser(), address = email) =>
      browser
        .post('/api/checkout')
        .send(checkoutBody([knot.licenceId], { couponCode: 'ONCE', email: address }));
    const again = await refused().expect(409);
    expect(again.body.code).toBe('coupon-buyer-limit');
    expect(again.body.detail).toMatch(/open order/);
    await shop.pay(first.paymentUrl);
    await refresh(first);
    const browser = shop.browser();
    await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    const [place] = await selectRows<{ personId: string }>(
      shop.database,
      'SELECT person_id AS personId FROM orders WHERE id = :orderId',
      { ...first },
    );
    expect(place?.personId).toBe(id);
    expect((await refused(browser).expect(409)).body.code).toBe('coupon-buyer-limit');
    expect((await refused(shop.browser(), 'other@mail.example')).status).toBe(201);
  });

  it('given up too late is paid all the same', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    await shop.pay(placed.paymentUrl);
    const answer = await shop
      .browser()
      .post(`/api/orders/${placed.orderId}/cancel`)
      .query({ key: placed.orderKey })
      .expect(200);
    expect(answer.body.state).toBe('paid');
    const again = await shop
      .browser()
      .post(`/api/orders/${placed.orderId}/cancel`)
      .query({ key: placed.orderKey })
      .expect(409);
    expect(again.body.code).toBe('order-is-final');
  });

  it('is found paid by the job that looks after it when neither browser nor event come', async () => {
    const placed = await shop.checkout([knot.licenceId]);
    await shop.pay(placed.paymentUrl);
    await shop.drain();
    expect((await orderOf(placed)).state).toBe('open');
    shop.clock.advance(61);
    await shop.drain();
    expect((await orderOf(placed)).state).toBe('paid');
  });

  it('ends with its page, and the place of its coupon is free again', async () => {
    await makeCoupon(shop, { code: 'SLEEPY', cap: 1 });
    const placed = await shop.checkout([knot.licenceId], { couponCode: 'SLEEPY' });
    await shop.control(`/sessions/${sessionIdOf(placed.paymentUrl)}/expire`);
    shop.clock.advance(61);
    await shop.drain();
    expect(await orderOf(placed)).toMatchObject({ state: 'expired', paymentUrl: null });
    await shop.checkout([knot.licenceId], { couponCode: 'SLEEPY' });
  });

  it('tells where the buyer is by two agreeing pieces of evidence, or is flagged', async () => {
    const workshop = await signInAs(shop, 'bookkeeper');
    const pay = async (declared: string, billing: string, card: string) => {
      const placed = await shop.checkout([knot.licenceId], { country: declared });
      await shop.pay(placed.paymentUrl, billing, card);
      await refresh(placed);
      return (await workshop.get(`/api/workshop/orders/${placed.orderId}`).expect(200)).body;
    };
    // 9.00 at 20 %: 7.50; at 19 %: 7.563 -> 7.56.
    expect(await pay('DE', 'FR', 'FR')).toMatchObject({
      country: 'FR',
      flags: [],
      tax: [{ ratePercent: '20', net: { minor: 750 } }],
    });
    expect(await pay('DE', 'FR', 'AT')).toMatchObject({
      country: 'DE',
      flags: ['location-unclear'],
      tax: [{ ratePercent: '19', net: { minor: 756 } }],
    });
    expect(await pay('US', 'US', 'US')).toMatchObject({
      country: 'US',
      flags: [],
      tax: [{ ratePercent: '0', net: { minor: 900 }, tax: { minor: 0 } }],
    });
  });

  it('shows the workshop all that happened', async () => {
    const placed = await shop.checkout([knot.licenceId], { email: 'godwit@mail.example' });
    await shop.pay(placed.paymentUrl);
    await refresh(placed);
    await shop.drain();
    const workshop = await signInAs(shop, 'bookkeeper');
    const { body } = await workshop.get(`/api/workshop/orders/${placed.orderId}`).expect(200);
    expect(body.history.map((entry: { what: string }) => entry.what)).toEqual([
      'placed',
      'payment page opened',
      'paid',
    ]);
    expect(body).toMatchObject({
      consentText,
      downloads: 0,
      paymentSessionId: sessionIdOf(placed.paymentUrl),
      paymentIntentId: expect.stringMatching(/^pi_/) as string,
      mails: [{ state: 'sent', subject: expect.stringContaining('Knot') as string }],
    });
  });
});
