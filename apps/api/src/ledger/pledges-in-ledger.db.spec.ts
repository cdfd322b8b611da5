import { execFileSync } from 'node:child_process';
import { SupporterCheck } from '../coupons/supporter-check.js';
import { putKitOnSale } from '../testing/kit-on-sale.js';
import { startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { daysGoBy, hearAll, makePlan, pledgeAs } from '../testing/pledges.js';
import { signInAs } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';

describe('pledges in the ledger', () => {
  let shop: PaymentShop;
  let bookkeeper: Browser;
  let stint: Browser;
  let pledgeId: string;
  let number: string;
  beforeAll(async () => {
    shop = await startPaymentShop();
    const knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    const plan = await makePlan(shop, { name: 'Spring tide', kitIds: [knot.kitId] });
    bookkeeper = await signInAs(shop, 'bookkeeper');
    stint = await signInAs(shop, 'buyer', 'stint@mail.example');
    // Three pieces of evidence, and no two of them agree.
    pledgeId = await pledgeAs(shop, stint, plan.id, {
      country: 'FR',
      paidFrom: { billing: 'AT', card: 'ES' },
    });
    await hearAll(shop);
    ({ number } = await get(`supporters/${pledgeId}`));
  });
  afterAll(() => shop.stop());

  const get = async (path: string, query: object = {}) =>
    (await bookkeeper.get(`/api/workshop/${path}`).query(query).expect(200)).body;
  const receipts = () => get('receipts', { search: number, sort: 'number', order: 'asc' });
  const settle = (receiptId: string, reason = 'A bill of the rent.') =>
    bookkeeper.post(`/api/workshop/ledger/locations/${receiptId}`).send({ country: 'ES', reason });

  it('a month has a receipt in the one series, as PDF for supporter and workshop', async () => {
    const { items } = await receipts();
    // 9.00 / 1.20 = 7.50 (Python decimal, ROUND_HALF_UP): counted where it was declared.
    expect(items).toMatchObject([
      {
        orderId: null,
        pledge: { pledgeId },
        orderNumber: number,
        country: 'FR',
        net: { minor: 750 },
        tax: { minor: 150 },
      },
    ]);
    const path = `${pledgeId}/payments/${items[0].pledge.paymentId}/receipt.pdf`;
    const answer = await stint
      .get(`/api/pledges/${path}`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
    const text = execFileSync('pdftotext', ['-layout', '-', '-'], {
      input: answer.body as Buffer,
      encoding: 'utf8',
    }).replaceAll(/\s+/g, ' ');
    for (const said of [`Receipt ${items[0].number}`, `Pledge ${number}.`, 'Spring tide', '€9.00', 'paid on'])
      expect(text).toContain(said);
    await bookkeeper.get(`/api/workshop/supporters/${path}`).expect(200);
  });

  it('a country no two pieces of evidence agree on is settled once, for the months to come too', async () => {
    const { items, total } = await get('ledger/locations', { search: number });
    expect(total).toBe(1);
    expect(items[0]).toMatchObject({ orderId: null, pledgeId, declared: 'FR', billing: 'AT', card: 'ES' });
    const [year, quarter] = quarterOf(shop.clock.now());
    expect(await get(`ledger/quarters/${year}/${quarter}`)).toMatchObject({ unclear: 1 });
    expect(await get(`supporters/${pledgeId}`)).toMatchObject({ flags: ['location-unclear'] });
    await bookkeeper.delete(`/api/workshop/supporters/${pledgeId}/flags/location-unclear`).expect(409);

    const settled = await settle(items[0].receiptId).expect(200);
    // 9.00 / 1.21 = 7.44 (Python decimal, ROUND_HALF_UP).
    expect(settled.body).toMatchObject({ country: 'ES', ratePercent: '21', pledgeId });
    const summary = await get(`ledger/quarters/${year}/${quarter}`);
    expect(summary).toMatchObject({ unclear: 0, settled: 1 });
    expect(summary.rows).toMatchObject([{ country: 'ES', net: { minor: 744 }, tax: { minor: 156 } }]);
    expect(await get(`supporters/${pledgeId}`)).toMatchObject({ flags: [], country: 'ES' });
    const { body: log } = await (await signInAs(shop, 'owner')).get('/api/workshop/log').expect(200);
    expect(log.items[0]).toMatchObject({
      what: 'settled the country of a pledge',
      subject: `pledge ${number}`,
    });

    await daysGoBy(shop, 31, 0.1);
    const written = await receipts();
    expect(written.items[1]).toMatchObject({ country: 'ES', net: { minor: 744 } });
    expect((await settle(written.items[1].id).expect(409)).body.detail).toContain(number);
    expect((await get('ledger/locations', { search: number })).total).toBe(0);
  });

  it('stand among payments and sales, agree with the payment service, and go with the year', async () => {
    const payments = await get('ledger/payments', { kind: 'pledge', search: number });
    expect(payments).toMatchObject({
      total: 2,
      items: [{ subject: number, email: 'stint@mail.example', amount: { minor: 900 }, state: 'paid' }, {}],
    });
    const day = (moment: Date) => moment.toISOString().slice(0, 10);
    const asked = await bookkeeper
      .post('/api/workshop/ledger/reconciliations')
      .send({ from: day(shop.clock.in(-40 * 86_400)), to: day(shop.clock.now()) })
      .expect(202);
    await shop.drain();
    expect(await get(`ledger/reconciliations/${asked.body.id}`)).toMatchObject({
      state: 'done',
      differences: 0,
      sums: [{ kind: 'payment', count: 2, here: { minor: 1800 } }],
    });
    const { months } = await get('ledger/sales', { months: 3 });
    expect(months.at(-1)).toMatchObject({ orders: 0, pledged: { minor: 900 }, gross: { minor: 900 } });
  });

  it('whoever pledges is a supporter to the coupons', async () => {
    const check = shop.app.get(SupporterCheck, { strict: false });
    const { body } = await stint.get('/api/session').expect(200);
    expect(await check.isSupporter(body.person.id)).toBe(true);
    const nobody = await signInAs(shop, 'buyer', 'dotterel@mail.example');
    const { body: other } = await nobody.get('/api/session').expect(200);
    expect(await check.isSupporter(other.person.id)).toBe(false);
  });
});

const quarterOf = (now: Date): [year: number, quarter: number] => [
  now.getUTCFullYear(),
  Math.floor(now.getUTCMonth() / 3) + 1,
];
