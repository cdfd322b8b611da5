import { Transactions } from '../database/transactions.js';
import { selectRows } from '../database/rows.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { signInAs } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';
import { NumberSeries } from './number-series.js';
import { TaxRates } from './tax-rates.js';

describe('the ledger', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let workshop: Browser;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot, "the small one"', priceMinor: 1999 });
    workshop = await signInAs(shop, 'bookkeeper');
  });
  afterAll(() => shop.stop());

  it('knows each rate from the day it holds', async () => {
    const rates = shop.app.get(TaxRates, { strict: false });
    const rate = (country: string, day: string) =>
      rates.rateOn(country, 'electronic-service', new Date(`${day}T12:00:00Z`));
    // npm sales-tax 2.23.0, and its changes of 2024 and 2025.
    expect(await rate('FI', '2026-12-01')).toBe('25.5');
    expect(await rate('EE', '2025-06-30')).toBe('22');
    expect(await rate('EE', '2025-07-01')).toBe('24');
    expect(await rate('RO', '2025-07-31')).toBe('19');
    expect(await rate('RO', '2025-08-01')).toBe('21');
    expect(await rate('AT', '2026-12-01')).toBe('20');
    expect(await rate('US', '2026-12-01')).toBe('0');
  });

  it('has a standard rate for each of the 27 countries of the Union', async () => {
    const rows = await selectRows<{ country: string; rate: string }>(
      shop.database,
      `SELECT country, MAX(rate_percent) AS rate FROM tax_rates GROUP BY country`,
    );
    expect(rows).toHaveLength(27);
    // 15 % is the lowest standard rate the Union allows: Directive 2006/112/EC, art. 97.
    for (const { rate } of rows) expect(Number(rate)).toBeGreaterThanOrEqual(15);
  });

  it('numbers without a gap, also where a transaction is undone', async () => {
    const numbers = shop.app.get(NumberSeries, { strict: false });
    const transactions = shop.app.get(Transactions, { strict: false });
    const take = (isUndone: boolean) =>
      transactions
        .run(async (tx) => {
          const number = await numbers.next(tx, 'test', 2026);
          if (isUndone) throw new Error('undone');
          return number;
        }, 'read-committed')
        .catch(() => null);
    const taken = await Promise.all(Array.from({ length: 30 }, (_, n) => take(n % 3 === 0)));
    const kept = taken.filter((number) => number !== null).sort((a, b) => a - b);
    expect(kept).toEqual(Array.from({ length: 20 }, (_, n) => n + 1));
  });

  it('begins each year and series anew', async () => {
    const numbers = shop.app.get(NumberSeries, { strict: false });
    const transactions = shop.app.get(Transactions, { strict: false });
    const next = (series: string, year: number) =>
      transactions.run((tx) => numbers.next(tx, series, year), 'read-committed');
    expect(await next('anew', 2026)).toBe(1);
    expect(await next('anew', 2026)).toBe(2);
    expect(await next('anew', 2027)).toBe(1);
    expect(await next('other', 2026)).toBe(1);
  });

  it('writes a receipt whose net and tax add up to what was paid', async () => {
    const placed = await shop.checkout([knot.licenceId], { country: 'IT' });
    await shop.pay(placed.paymentUrl, 'IT');
    await shop
      .browser()
      .post(`/api/orders/${placed.orderId}/refresh`)
      .query({ key: placed.orderKey })
      .expect(200);
    const [receipt] = await selectRows<{ tax: string | object; total_minor: number; country: string }>(
      shop.database,
      'SELECT * FROM receipts WHERE order_id = :orderId',
      { ...placed },
    );
    // 19.99 with 22 % in it: 16.39 and 3.60 (Python decimal, ROUND_HALF_UP, with VAT as the rest).
    const tax: unknown = typeof receipt?.tax === 'string' ? JSON.parse(receipt.tax) : receipt?.tax;
    expect(tax).toEqual([{ country: 'IT', ratePercent: '22', netMinor: 1639, taxMinor: 360 }]);
    expect(receipt).toMatchObject({ total_minor: 1999, country: 'IT' });
  });

  describe('the orders of the workshop', () => {
    beforeAll(async () => {
      await shop.checkout([knot.licenceId], { email: '+cmd@mail.example', country: 'FR' });
      for (let n = 0; n < 3; n++) await shop.checkout([knot.licenceId], { email: `brent-${n}@mail.example` });
    });

    it('are found by number, address and receipt, filtered, sorted and paged', async () => {
      const list = async (query: object) =>
        (await workshop.get('/api/workshop/orders').query(query).expect(200)).body;
      const paid = await list({ state: 'paid' });
      expect(paid).toMatchObject({ total: 1, items: [{ kits: [knot.name], country: 'IT' }] });
      const { number, receiptNumber } = paid.items[0];
      expect((await list({ search: number.toLowerCase() })).items).toHaveLength(1);
      expect((await list({ search: receiptNumber })).items).toMatchObject([{ number }]);
      const brents = await list({ search: 'brent', size: 2, sort: 'placedAt', order: 'asc' });
      expect(brents).toMatchObject({ total: 3, size: 2, page: 1 });
      expect(brents.items.map((order: { email: string }) => order.email)).toEqual([
        'brent-0@mail.example',
        'brent-1@mail.example',
      ]);
      expect((await list({ search: 'brent', size: 2, page: 2 })).items).toHaveLength(1);
      await shop.database.query(`UPDATE orders SET flags = '["disputed"]' WHERE number = ?`, {
        replacements: [number],
      });
      expect(await list({ flagged: '1' })).toMatchObject({
        total: 1,
        items: [{ number, flags: ['disputed'] }],
      });
      expect((await list({ flagged: '1', search: 'brent' })).total).toBe(0);
    });

    it('leave as CSV, quoted, with no cell that runs as a formula', async () => {
      const answer = await workshop.get('/api/workshop/orders.csv').expect(200);
      expect(answer.headers['content-type']).toContain('text/csv');
      expect(answer.headers['content-disposition']).toContain('orders.csv');
      const lines = answer.text.split('\r\n');
      expect(lines).toHaveLength(7);
      expect(lines[0]).toMatch(/^number,state,placed_at,paid_at,email,/);
      expect(answer.text).toContain(",'+cmd@mail.example,FR,");
      expect(answer.text).toContain('"Knot, ""the small one""",EUR,19.99,0.00,19.99');
      const few = await workshop.get('/api/workshop/orders.csv').query({ search: 'brent' }).expect(200);
      expect(few.text.split('\r\n')).toHaveLength(5);
    });
  });
});
