import { strFromU8, unzipSync } from 'fflate';
import { selectRows } from '../../database/rows.js';
import { startSoldShop, type SoldShop } from '../../testing/sold-shop.js';
import type { Browser } from '../../testing/test-app.js';

describe('the books', () => {
  let sold: SoldShop;
  let shop: SoldShop['shop'];
  let bookkeeper: Browser;
  let orders: SoldShop['orders'];
  const get: SoldShop['get'] = (path, query) => sold.get(path, query);
  beforeAll(async () => {
    sold = await startSoldShop();
    ({ shop, bookkeeper, orders } = sold);
    const [receipt] = await selectRows<{ id: string }>(
      shop.database,
      'SELECT id FROM receipts WHERE order_id = :orderId',
      { orderId: orders['dunlin'] },
    );
    await bookkeeper
      .post(`/api/workshop/ledger/locations/${receipt?.id}`)
      .send({ country: 'ES', reason: 'The card’s bank confirmed it.' })
      .expect(200);
    await sold.giveBack('dunlin', 1999);
  });
  afterAll(() => shop.stop());

  it('list payments and what went back, filtered and as CSV', async () => {
    const all = await get('payments');
    expect(all.total).toBe(8);
    expect(await get('payments', { kind: 'refund' })).toMatchObject({
      total: 2,
      items: [{ amount: { minor: -1999 }, state: 'succeeded' }, { amount: { minor: -1000 } }],
    });
    expect(await get('payments', { search: 'stint' })).toMatchObject({ total: 2 });
    const yesterday = new Date(shop.clock.now().getTime() - 86_400_000).toISOString().slice(0, 10);
    expect((await get('payments', { to: yesterday })).total).toBe(0);
    const csv = (await bookkeeper.get('/api/workshop/ledger/payments.csv').expect(200)).text;
    expect(csv.trim().split('\r\n')).toHaveLength(9);
    expect(csv).toContain(',-19.99,EUR,succeeded,');
  });

  it('tell sales by month, by country and by kit', async () => {
    const sales = await get('sales', { months: 3 });
    expect(sales.months).toHaveLength(3);
    expect(sales.months.at(-1)).toMatchObject({
      orders: 6,
      gross: { minor: 12814 },
      refunded: { minor: 2999 },
    });
    expect(sales.countries[0]).toMatchObject({ country: 'DE', orders: 2, gross: { minor: 4417 } });
    expect(sales.kits).toMatchObject([
      { kitId: sold.curlew.kitId, sold: 3, gross: { minor: 6817 } },
      { kitId: sold.knot.kitId, sold: 3, gross: { minor: 5997 } },
    ]);
  });

  describe('held against the payment service', () => {
    const compare = async () => {
      const today = shop.clock.now().toISOString().slice(0, 10);
      const asked = await bookkeeper
        .post('/api/workshop/ledger/reconciliations')
        .send({ from: today, to: today })
        .expect(202);
      expect(asked.body).toMatchObject({ state: 'waiting', percent: 0 });
      await shop.drain();
      const path = `reconciliations/${asked.body.id}`;
      return { ...(await get(path)), path };
    };

    it('agree when all is well', async () => {
      const done = await compare();
      expect(done).toMatchObject({ state: 'done', percent: 100, differences: 0, fault: null });
      const sum = (kind: string) => done.sums.find((one: { kind: string }) => one.kind === kind);
      expect(sum('payment')).toMatchObject({ here: { minor: 12814 }, there: { minor: 12814 }, count: 6 });
      expect(sum('refund')).toMatchObject({ here: { minor: -2999 }, there: { minor: -2999 }, count: 2 });
      expect(sum('payment').fees.minor).toBeGreaterThan(0);
      expect((await get(`${done.path}/rows`)).total).toBe(8);
    });

    it('name every difference, on either side', async () => {
      await shop.database.query('UPDATE orders SET total_minor = total_minor + 1 WHERE id = ?', {
        replacements: [orders['wren']],
      });
      await shop.database.query("UPDATE orders SET payment_intent_id = 'pi_elsewhere' WHERE id = ?", {
        replacements: [orders['tern']],
      });
      const done = await compare();
      const { items } = await get(`${done.path}/rows`);
      const differing = items.filter((row: { verdict: string }) => row.verdict !== 'agrees');
      expect(differing.map((row: { verdict: string }) => row.verdict).sort()).toEqual(
        expect.arrayContaining(['amount-differs', 'missing-here', 'missing-there']),
      );
      expect(done.differences).toBe(differing.length);
      expect(differing.find((row: { verdict: string }) => row.verdict === 'amount-differs')).toMatchObject({
        orderId: orders['wren'],
        here: { minor: 2000 },
        there: { minor: 1999 },
      });
      const missing = await get(`${done.path}/rows`, { verdict: 'missing-there' });
      expect(missing).toMatchObject({ total: 1, items: [{ orderId: orders['tern'], there: null }] });
      await bookkeeper
        .post('/api/workshop/ledger/reconciliations')
        .send({ from: '2026-02-01', to: '2026-01-01' })
        .expect(422);
    });
  });

  it('leave as a zip of a year, with everything in it', async () => {
    const year = shop.clock.now().getUTCFullYear();
    const asked = await bookkeeper.post('/api/workshop/ledger/exports').send({ year }).expect(202);
    await bookkeeper.get(`/api/workshop/ledger/exports/${asked.body.id}/file`).expect(404);
    await shop.drain();
    const done = await get(`exports/${asked.body.id}`);
    expect(done).toMatchObject({ state: 'done', percent: 100, year });
    const answer = await bookkeeper
      .get(`/api/workshop/ledger/exports/${asked.body.id}/file`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
    expect(answer.headers['content-type']).toBe('application/zip');
    const files = unzipSync(new Uint8Array(answer.body as Buffer));
    const records = (name: string) =>
      strFromU8(files[name] ?? new Uint8Array())
        .trim()
        .split('\r\n');
    expect(Object.keys(files).sort()).toEqual([
      'READ-ME.txt',
      'credit-notes.csv',
      'disputes.csv',
      'order-lines.csv',
      'orders.csv',
      'receipts.csv',
      'refunds.csv',
      'settled-countries.csv',
      'tax-rates.csv',
    ]);
    expect(records('orders.csv')).toHaveLength(7);
    expect(records('order-lines.csv')).toHaveLength(7);
    expect(records('receipts.csv')).toHaveLength(7);
    expect(records('credit-notes.csv')).toHaveLength(3);
    expect(records('refunds.csv').join()).toContain('A present from the workshop.');
    expect(records('settled-countries.csv')[1]).toContain(',FR,ES,21,EUR,16.52,3.47,');
    expect(records('orders.csv').join()).toContain(
      ',reverse-charge,Reed Works,DE123456789,no,EUR,20.17,0.00,20.17,0.00,',
    );
    expect(records('READ-ME.txt').join()).toContain('licensed adviser');
    await bookkeeper
      .post('/api/workshop/ledger/exports')
      .send({ year: year + 1 })
      .expect(422);
  });
});
