import { selectRows } from '../database/rows.js';
import { makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import {
  checkoutBody,
  startPaymentShop,
  type CheckoutAnswer,
  type CheckoutOptions,
  type PaymentShop,
} from '../testing/payment-shop.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';

/** The shop of these tests is in Ireland, the default. */
const reedWorks = {
  name: 'Reed Works GmbH',
  address: 'Deichweg 3\n26506 Norden',
  vatNumber: 'DE 123 456 789',
};

describe('a checkout for a business or for somebody else', () => {
  let shop: PaymentShop;
  let curlew: KitOnSale;
  let knot: KitOnSale;
  let gauge: KitOnSale;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    gauge = await putKitOnSale(shop, { name: 'Gauge', priceMinor: 0 });
    await makeCoupon(shop, { code: 'WINDFALL' });
    await makeCoupon(shop, { code: 'FIVE', off: { kind: 'amount', minor: 500 } });
  });
  afterAll(() => shop.stop());

  const quote = async (body: object) =>
    (
      await shop
        .browser()
        .post('/api/basket/quote')
        .send({ items: [{ licenceId: curlew.licenceId }, { licenceId: knot.licenceId }], ...body })
        .expect(200)
    ).body;
  const refresh = async ({ orderId, orderKey }: CheckoutAnswer) =>
    (await shop.browser().post(`/api/orders/${orderId}/refresh`).query({ key: orderKey }).expect(200)).body;
  const buy = async (licenceIds: string[], options: CheckoutOptions, payCountry = options.country) => {
    const placed = await shop.checkout(licenceIds, options);
    if (placed.paymentUrl) await shop.pay(placed.paymentUrl, payCountry);
    return { ...placed, order: await refresh(placed) };
  };
  const receiptOf = async (orderId: string) => {
    const [row] = await selectRows<Record<string, unknown>>(
      shop.database,
      'SELECT total_minor, country, tax_treatment, tax, buyer FROM receipts WHERE order_id = :orderId',
      { orderId },
    );
    return row;
  };
  const mailsTo = (email: string) => shop.mailer.sent.filter((mail) => mail.to === email);

  it('says before the payment what tax lies within the price', async () => {
    // Python decimal: 33.00 / 1.19 = 27.731…; 33.00 / 1.23 = 26.829…
    expect(await quote({})).toMatchObject({ tax: null, total: { minor: 3300 } });
    expect((await quote({ country: 'DE' })).tax).toEqual({
      country: 'DE',
      treatment: 'consumer',
      ratePercent: '19',
      net: { minor: 2773, currency: 'EUR' },
      tax: { minor: 527, currency: 'EUR' },
    });
    expect((await quote({ country: 'US' })).tax).toMatchObject({ ratePercent: null, tax: { minor: 0 } });
    const home = await quote({ country: 'IE', business: { vatNumber: '' } });
    expect(home.tax).toMatchObject({ treatment: 'domestic-business', tax: { minor: 617 } });
    expect((await quote({ country: 'DE', business: { vatNumber: 'DE1' } })).tax.treatment).toBe('consumer');
  });

  it('takes the tax off for a business elsewhere in the Union, line by line, and off a coupon too', async () => {
    const business = { vatNumber: 'DE123456789' };
    // 24.00 / 1.19 = 20.17 and 9.00 / 1.19 = 7.56; a third of each: 6.72 and 2.52.
    expect(await quote({ country: 'DE', business, couponCode: 'WINDFALL' })).toMatchObject({
      lines: [
        { price: { minor: 2017 }, discount: { minor: 672 }, total: { minor: 1345 } },
        { price: { minor: 756 }, discount: { minor: 252 }, total: { minor: 504 } },
      ],
      total: { minor: 1849 },
      tax: { treatment: 'reverse-charge', tax: { minor: 0 }, net: { minor: 1849 } },
    });
    // 5.00 / 1.19 = 4.20, spread over 20.17 and 7.56: 3.05 and 1.15.
    const fixed = await quote({ country: 'DE', business, couponCode: 'FIVE' });
    expect(fixed.lines.map((line: { discount: { minor: number } }) => line.discount.minor)).toEqual([
      305, 115,
    ]);
  });

  it('writes a reverse charge into order, receipt and mail', async () => {
    const email = 'office@reedworks.example';
    const { order, orderId } = await buy([curlew.licenceId], {
      email,
      country: 'DE',
      business: reedWorks,
    });
    expect(order).toMatchObject({
      state: 'paid',
      total: { minor: 2017 },
      taxTreatment: 'reverse-charge',
      business: { ...reedWorks, vatNumber: 'DE123456789' },
      tax: [{ ratePercent: '0', net: { minor: 2017 }, tax: { minor: 0 } }],
    });
    expect(await receiptOf(orderId)).toMatchObject({
      total_minor: 2017,
      country: 'DE',
      tax_treatment: 'reverse-charge',
      tax: [{ country: 'DE', ratePercent: '0', netMinor: 2017, taxMinor: 0 }],
      buyer: {
        name: 'Reed Works GmbH',
        address: ['Deichweg 3', '26506 Norden'],
        vatNumber: 'DE123456789',
      },
    });
    await shop.drain();
    expect(mailsTo(email)[0]?.text).toContain('Reverse charge');
  });

  it('keeps the country of a business where the evidence says otherwise, and flags it', async () => {
    const bookkeeper = await signInAs(shop, 'bookkeeper');
    const { orderId } = await buy([curlew.licenceId], { country: 'DE', business: reedWorks }, 'IE');
    const { body } = await bookkeeper.get(`/api/workshop/orders/${orderId}`).expect(200);
    expect(body).toMatchObject({ country: 'DE', flags: ['location-unclear'] });
    expect(await receiptOf(orderId)).toMatchObject({ country: 'DE', tax_treatment: 'reverse-charge' });
  });

  it('refuses a number that has not the form of the country’s, and says which field', async () => {
    const body = checkoutBody([knot.licenceId], {
      country: 'FR',
      business: { ...reedWorks, vatNumber: 'DE123456789' },
    });
    const refused = await shop.browser().post('/api/checkout').send(body).expect(422);
    expect(refused.body.fields['business.vatNumber']).toContain('begins with DE');
  });

  it('charges a business at home the tax, one abroad none, and a consumer without a rate none', async () => {
    const home = await buy([knot.licenceId], { country: 'IE', business: { ...reedWorks, vatNumber: '' } });
    expect(home.order).toMatchObject({ total: { minor: 900 }, tax: [{ ratePercent: '23' }] });
    const abroad = await buy([knot.licenceId], {
      country: 'CH',
      business: { ...reedWorks, vatNumber: 'CHE-123.456.789' },
    });
    expect(abroad.order).toMatchObject({ total: { minor: 900 }, taxTreatment: 'business-abroad' });
    const consumer = await buy([knot.licenceId], { country: 'US' });
    expect(consumer.order.tax).toEqual([
      { ratePercent: '0', net: { minor: 900, currency: 'EUR' }, tax: { minor: 0, currency: 'EUR' } },
    ]);
    const free = await buy([gauge.licenceId], { country: 'DE', business: reedWorks });
    expect(free.order).toMatchObject({ state: 'paid', taxTreatment: 'consumer' });
    expect(await receiptOf(free.orderId)).toMatchObject({ total_minor: 0, tax_treatment: 'consumer' });
  });

  it('is one order for the same attempt only while business and gift are the same too', async () => {
    const body = checkoutBody([knot.licenceId], { country: 'DE', business: reedWorks });
    const first = await shop.browser().post('/api/checkout').send(body).expect(201);
    const again = await shop.browser().post('/api/checkout').send(body).expect(201);
    expect(again.body.orderId).toBe(first.body.orderId);
    await shop
      .browser()
      .post('/api/checkout')
      .send({ ...body, business: undefined })
      .expect(409);
  });

  describe('a gift', () => {
    const gift = {
      email: 'sanderling@mail.example',
      giver: 'Marlow',
      greeting: 'For the long evenings. <b>Play</b> it loud.',
    };

    it('goes to the one it is for, with a link of their own; the buyer has the receipt and no files', async () => {
      const giver = await makePerson(shop, 'buyer');
      const browser = shop.browser();
      await browser
        .post('/api/session')
        .send({ email: giver.email, passphrase: TEST_PASSPHRASE })
        .expect(200);
      const placed = await shop.checkout([curlew.licenceId, knot.licenceId], {
        browser,
        email: giver.email,
        gift,
      });
      await shop.pay(placed.paymentUrl);
      expect(await refresh(placed)).toMatchObject({
        state: 'paid',
        gift,
        receiptNumber: expect.any(String) as string,
      });
      await shop.drain();

      const [given, ...others] = mailsTo(gift.email);
      expect(others).toEqual([]);
      expect(given?.subject).toBe('Marlow gives you Curlew and Knot');
      expect(given?.text).toContain('For the long evenings.');
      expect(given?.html).not.toContain('<b>Play</b>');
      expect(given?.text).not.toMatch(/€|Receipt/);
      const [bought] = mailsTo(giver.email);
      expect(bought?.text).toContain(gift.email);
      expect(bought?.text).not.toContain('/collect/');

      expect((await browser.get('/api/shelf/owned').expect(200)).body).toEqual([]);
      const token = /\/collect\/([A-Za-z0-9_-]{43})/.exec(given?.text ?? '')?.[1] ?? '';
      const { body } = await shop.browser().get(`/api/collect/${token}`).expect(200);
      expect(body).toMatchObject({ state: 'open', kits: [{ name: 'Curlew' }, { name: 'Knot' }] });

      // A fresh link goes to the one who holds the right, whoever of the staff sends it.
      const helper = await signInAs(shop, 'helper');
      await helper.post(`/api/workshop/orders/${placed.orderId}/link`).expect(202);
      await shop.drain();
      expect(mailsTo(gift.email)).toHaveLength(2);
      expect(mailsTo(giver.email)).toHaveLength(1);
    });

    it('stands on the shelf of the one it is for once the address is proved', async () => {
      const person = await makePerson(shop, 'buyer', gift.email);
      const browser = shop.browser();
      await browser
        .post('/api/session')
        .send({ email: person.email, passphrase: TEST_PASSPHRASE })
        .expect(200);
      const { body } = await browser.get('/api/shelf').expect(200);
      expect(body.items.map((item: { source: string }) => item.source)).toEqual(['gift', 'gift']);
      const kit = (await browser.get(`/api/shelf/${curlew.slug}`).expect(200)).body;
      expect(kit.orderId).toBeNull();
      // One that comes later is on it at once.
      const other = await putKitOnSale(shop, { name: 'Teal', priceMinor: 500 });
      await buy([other.licenceId], { gift });
      expect((await browser.get('/api/shelf/owned').expect(200)).body).toContain(other.slug);
    });

    it('ends with its refund', async () => {
      const { orderId } = await buy([curlew.licenceId], {
        email: 'giver@mail.example',
        gift: { ...gift, email: 'turnstone@mail.example' },
      });
      const bookkeeper = await signInAs(shop, 'bookkeeper');
      await bookkeeper
        .post(`/api/workshop/orders/${orderId}/refunds`)
        .send({
          whole: { keepsEntitlement: false },
          reason: 'Sent to the wrong one.',
          attempt: crypto.randomUUID(),
        })
        .expect((answer) => expect(answer.status).toBeLessThan(300));
      await shop.drain();
      const [right] = await selectRows<{ state: string; source: string; email: string }>(
        shop.database,
        'SELECT state, source, email FROM entitlements WHERE order_id = :orderId',
        { orderId },
      );
      expect(right).toEqual({ state: 'ended', source: 'gift', email: 'turnstone@mail.example' });
      expect(mailsTo('giver@mail.example').at(-1)?.text).toContain('the right of turnstone@mail.example');
    });

    it('is refused to oneself, for nothing, and with addresses of web pages in its line', async () => {
      const refusal = async (options: CheckoutOptions, licenceId = curlew.licenceId) =>
        (
          await shop
            .browser()
            .post('/api/checkout')
            .send(checkoutBody([licenceId], options))
            .expect(422)
        ).body;
      expect(
        await refusal({ email: 'a@mail.example', gift: { ...gift, email: 'A@mail.example' } }),
      ).toMatchObject({
        code: 'gift-refused',
        fields: { 'gift.email': expect.stringContaining('your own') as string },
      });
      expect((await refusal({ gift }, gauge.licenceId)).code).toBe('gift-refused');
      const spam = await refusal({ gift: { ...gift, greeting: 'Look at https://x.example' } });
      expect(spam.fields['gift.greeting']).toContain('words alone');
    });
  });
});
