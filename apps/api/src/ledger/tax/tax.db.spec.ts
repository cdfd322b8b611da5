import { selectRows } from '../../database/rows.js';
import { signInAs } from '../../testing/sign-in.js';
import { startSoldShop, unclearBuyer, type SoldShop } from '../../testing/sold-shop.js';
import type { Browser } from '../../testing/test-app.js';

type Amount = { minor: number; currency: string };
type Row = {
  treatment: string;
  country: string;
  ratePercent: string;
  net: Amount;
  tax: Amount;
  gross: Amount;
};

describe('tax', () => {
  let sold: SoldShop;
  let shop: SoldShop['shop'];
  let bookkeeper: Browser;
  let orders: SoldShop['orders'];
  const get: SoldShop['get'] = (path, query) => sold.get(path, query);
  beforeAll(async () => {
    sold = await startSoldShop();
    ({ shop, bookkeeper, orders } = sold);
  });
  afterAll(() => shop.stop());

  const quarter = () => {
    const now = shop.clock.now();
    return { year: now.getUTCFullYear(), quarter: Math.floor(now.getUTCMonth() / 3) + 1 };
  };

  describe('tax rates', () => {
    it('are listed by country, the ones that are missing told of', async () => {
      const finland = await get('rates', { search: 'finl' });
      expect(finland).toMatchObject({
        total: 1,
        items: [{ country: 'FI', current: { ratePercent: '25.5', validFrom: '2024-09-01' }, receipts: 1 }],
      });
      expect((await get('rates')).total).toBe(27);
      expect(await get('rates/missing')).toMatchObject([{ country: 'US', receipts: 1 }]);
      // Entered as nothing, it is known.
      await enter({ country: 'US', ratePercent: '0', validFrom: '2020-01-01' });
      expect(await get('rates/missing')).toEqual([]);
    });

    const enter = (body: object) =>
      bookkeeper
        .post('/api/workshop/ledger/rates')
        .send({ source: 'A letter of the tax office', ...body })
        .expect(204);

    it('hold from a day on and change no receipt', async () => {
      const before = await selectRows(shop.database, 'SELECT id, tax FROM receipts ORDER BY id');
      const tomorrow = new Date(shop.clock.now().getTime() + 86_400_000).toISOString().slice(0, 10);
      await enter({ country: 'IT', ratePercent: '23.000', validFrom: tomorrow });
      await enter({ country: 'IT', ratePercent: '21', validFrom: '2025-01-01' });
      const { items } = await get('rates', { search: 'italy' });
      expect(items[0]).toMatchObject({
        current: { ratePercent: '21' },
        next: { ratePercent: '23', validFrom: tomorrow },
      });
      const changes = await get('rates/changes', { country: 'IT' });
      expect(changes.items).toMatchObject([
        { validFrom: '2025-01-01', before: '22', after: '21', who: 'Test bookkeeper (bookkeeper)' },
        { validFrom: tomorrow, before: null, after: '23' },
      ]);
      expect(await selectRows(shop.database, 'SELECT id, tax FROM receipts ORDER BY id')).toEqual(before);

      await bookkeeper.delete(`/api/workshop/ledger/rates/IT/electronic-service/${tomorrow}`).expect(204);
      const held = await bookkeeper
        .delete('/api/workshop/ledger/rates/IT/electronic-service/2025-01-01')
        .expect(409);
      expect(held.body.detail).toContain('holds already');
      expect((await get('rates', { search: 'italy' })).items[0].next).toBeNull();
      await bookkeeper
        .post('/api/workshop/ledger/rates')
        .send({ country: 'IT', ratePercent: '22,5' })
        .expect(422);
    });
  });

  describe('a quarter', () => {
    const path = () => `quarters/${quarter().year}/${quarter().quarter}`;
    /** Straight from the tables, with nothing of the summary's own arithmetic. */
    const independent = async () => {
      const read = (table: string) =>
        selectRows<{ tax: { netMinor: number; taxMinor: number }[]; total_minor: number }>(
          shop.database,
          `SELECT tax, total_minor FROM ${table}`,
        );
      const sum = (rows: { tax: { netMinor: number; taxMinor: number }[]; total_minor: number }[]) =>
        rows.reduce(
          (all, row) => ({
            net: all.net + row.tax.reduce((net, one) => net + one.netMinor, 0),
            tax: all.tax + row.tax.reduce((tax, one) => tax + one.taxMinor, 0),
            gross: all.gross + row.total_minor,
          }),
          { net: 0, tax: 0, gross: 0 },
        );
      const [sold, back] = [sum(await read('receipts')), sum(await read('credit_notes'))];
      return { net: sold.net - back.net, tax: sold.tax - back.tax, gross: sold.gross - back.gross };
    };
    const line = (rows: Row[], treatment: string, country: string) =>
      rows
        .filter((row) => row.treatment === treatment && row.country === country)
        .map((row) => [row.ratePercent, row.net.minor, row.tax.minor, row.gross.minor]);

    it('adds up to its receipts less its credit notes, to the cent, on the page and as CSV', async () => {
      const summary = await get(path());
      const expected = await independent();
      expect(summary.totals).toEqual([
        {
          net: { minor: expected.net, currency: 'EUR' },
          tax: { minor: expected.tax, currency: 'EUR' },
          gross: { minor: expected.gross, currency: 'EUR' },
        },
      ]);
      // 24.00 at 19 % is 20.17 net, the 10.00 of it that went back 8.40. 24.00 less German tax: 20.17.
      expect(line(summary.rows, 'consumer', 'DE')).toEqual([['19', 1177, 223, 1400]]);
      expect(line(summary.rows, 'reverse-charge', 'DE')).toEqual([['0', 2017, 0, 2017]]);
      expect(line(summary.rows, 'consumer', 'US')).toEqual([['0', 2400, 0, 2400]]);
      expect(summary).toMatchObject({
        unclear: 1,
        missingRates: [],
        closedAt: null,
        isOver: false,
        reverseCharge: [{ vatNumber: 'DE123456789', name: 'Reed Works', net: { minor: 2017 } }],
      });

      const csv = (await bookkeeper.get(`/api/workshop/ledger/${path()}/summary.csv`).expect(200)).text;
      const records = csv
        .trim()
        .split('\r\n')
        .slice(1)
        .map((record) => record.split(','));
      const column = (at: number) =>
        records.reduce((sum, record) => sum + Math.round(Number(record[at]) * 100), 0);
      expect([column(8), column(9), column(10)]).toEqual([expected.net, expected.tax, expected.gross]);
      expect((await get('quarters')).items).toMatchObject([
        { ...quarter(), receipts: 6, creditNotes: 1, unclear: 1 },
      ]);
    });

    it('counts a receipt where it was settled, while the receipt stays as it is', async () => {
      const { items } = await get('locations');
      expect(items).toMatchObject([
        { declared: 'FR', billing: 'AT', card: 'ES', country: 'FR', ratePercent: '20', settled: null },
      ]);
      const { receiptId, orderId } = items[0];
      const before = await selectRows(shop.database, 'SELECT * FROM receipts WHERE id = :receiptId', {
        receiptId,
      });
      const settle = (country: string, reason = 'The card’s bank confirmed it.') =>
        bookkeeper.post(`/api/workshop/ledger/locations/${receiptId}`).send({ country, reason });
      await settle('ES', ' ').expect(422);
      const settled = await settle('ES').expect(200);
      expect(settled.body).toMatchObject({ country: 'ES', ratePercent: '21', settled: { country: 'ES' } });
      expect((await get('locations')).total).toBe(0);
      expect((await get('locations', { state: 'settled' })).items).toMatchObject([
        { receiptId, country: 'ES' },
      ]);
      const order = (await bookkeeper.get(`/api/workshop/orders/${orderId}`).expect(200)).body;
      expect(order).toMatchObject({ country: 'ES', flags: [] });
      expect(
        await selectRows(shop.database, 'SELECT * FROM receipts WHERE id = :receiptId', { receiptId }),
      ).toEqual(before);
      // 19.99 / 1.21 = 16.52 (Python decimal, ROUND_HALF_UP); a third of it goes back afterwards.
      const summary = await get(path());
      expect(line(summary.rows, 'consumer', 'FR')).toEqual([]);
      expect(line(summary.rows, 'consumer', 'ES')).toEqual([['21', 1652, 347, 1999]]);
      expect(summary).toMatchObject({
        settled: 1,
        unclear: 0,
        totals: [{ gross: { minor: (await independent()).gross } }],
      });
      await sold.giveBack('dunlin', 1999);
      expect(line((await get(path())).rows, 'consumer', 'ES')).toEqual([['21', 0, 0, 0]]);

      const clear = await selectRows<{ id: string }>(
        shop.database,
        'SELECT id FROM receipts WHERE order_id = :id',
        {
          id: orders['wren'],
        },
      );
      await bookkeeper
        .post(`/api/workshop/ledger/locations/${clear[0]?.id}`)
        .send({ country: 'FR', reason: 'Why not.' })
        .expect(409);
      await bookkeeper.delete(`/api/workshop/orders/${orderId}/flags/location-unclear`).expect(409);
    });
  });

  it('is closed quarter by quarter, and stands from then on', async () => {
    const { year, quarter: number } = quarter();
    const path = `quarters/${year}/${number}`;
    const close = (browser: Browser) => browser.post(`/api/workshop/ledger/${path}/close`);
    expect((await close(bookkeeper).expect(409)).body.detail).toContain('is not over');
    await sold.buy('brent', sold.knot, unclearBuyer);

    shop.clock.advance(100 * 86_400);
    const later = await signInAs(shop, 'bookkeeper');
    expect((await close(later).expect(409)).body.detail).toContain('1 receipt');
    const [open] = (await later.get('/api/workshop/ledger/locations').expect(200)).body.items;
    const settle = () =>
      later
        .post(`/api/workshop/ledger/locations/${open.receiptId}`)
        .send({ country: 'FR', reason: 'The buyer sent a bill of their rent.' });
    await settle().expect(200);
    const { body: closed } = await close(later).expect(200);
    expect(closed).toMatchObject({
      closedBy: 'Test bookkeeper (bookkeeper)',
      isAsClosed: true,
      isOver: true,
    });
    expect((await settle().expect(409)).body.code).toBe('quarter-is-closed');
    expect((await close(later).expect(409)).body.code).toBe('quarter-is-closed');
    // Money that goes back now counts in the quarter it goes back in.
    expect((await later.get(`/api/workshop/ledger/${path}`).expect(200)).body).toMatchObject({
      rows: closed.rows,
      isAsClosed: true,
    });
  });
});
