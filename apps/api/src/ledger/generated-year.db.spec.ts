import { PaymentBalance } from '../adapters/payments/reconciliation.js';
import { Payments } from '../adapters/payments/payments.js';
import { selectRows } from '../database/rows.js';
import { LiveYear } from '../testing/generated-year/live-year.js';
import { SimulatedPayments } from '../testing/generated-year/simulated-payments.js';
import { modelQuarter } from '../testing/generated-year/year-model.js';
import { planYear, type YearPlan } from '../testing/generated-year/year-plan.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { compareBooks, isDifference } from './books/compare-books.js';
import { Movements, type Movement } from './books/movements.js';
import { SummariseQuarter } from './tax/summarise-quarter.js';

/** `npm run year -w @windchest/api` lives a year of 20,000 orders with these very checks. */
const COUNT = Number(process.env['WINDCHEST_YEAR_ORDERS'] ?? '160');
const SEED = Number(process.env['WINDCHEST_YEAR_SEED'] ?? '20261112');
const YEAR = 2027;
const HOUR_MS = 3_600_000;

describe(`a year of ${COUNT} orders made by chance`, () => {
  let shop: TestApp;
  let payments: SimulatedPayments;
  let plan: YearPlan;
  let year: LiveYear;
  beforeAll(async () => {
    shop = await startTestApp({}, (clock) => {
      payments = new SimulatedPayments(clock);
      return [
        [Payments, payments],
        [PaymentBalance, payments],
      ];
    });
    plan = planYear(SEED, COUNT, YEAR);
    year = new LiveYear(shop, payments, plan);
    const startedMs = performance.now();
    let told = 0;
    await year.live((part) => {
      if (COUNT < 1000 || Math.floor(part * 20) === told) return;
      told = Math.floor(part * 20);
      process.stderr.write(`${told * 5} % after ${Math.round((performance.now() - startedMs) / 1000)} s\n`);
    });
    // Whatever is in flight at the end of December is over in January.
    shop.clock.stopAt(new Date(Date.UTC(YEAR + 1, 0, 15)));
  }, 3 * HOUR_MS);
  afterAll(() => shop.stop());

  const models = () => year.orders.map((order) => order.model);
  const read = <Row extends object>(sql: string) => selectRows<Row>(shop.database, sql);

  it('has each order at the price, the tax and the country it should have', async () => {
    const rows = await read<Record<string, unknown> & { id: string }>(
      `SELECT o.id, o.state, o.total_minor AS total, o.refunded_minor AS refunded, o.tax_treatment AS treatment,
              JSON_CONTAINS(o.flags, '"location-unclear"') AS isUnclear, r.country,
              JSON_VALUE(r.tax, '$[0].netMinor') AS net, JSON_VALUE(r.tax, '$[0].ratePercent') AS rate
       FROM orders o LEFT JOIN receipts r ON r.order_id = o.id`,
    );
    const found = new Map(
      rows.map(({ id, ...row }) => [id, { ...row, net: row['net'] === null ? null : Number(row['net']) }]),
    );
    expect(rows).toHaveLength(COUNT);
    for (const { id, model } of year.orders) {
      const isPaid = model.paidAt !== null;
      const state = isPaid ? (model.left === 0 && model.total > 0 ? 'refunded' : 'paid') : model.plan.end;
      expect({ id, ...found.get(id) }).toEqual({
        id,
        state,
        total: model.total,
        refunded: model.refunded,
        treatment: model.treatment,
        isUnclear: Number(model.isUnclear),
        country: isPaid ? model.country : null,
        net: isPaid ? model.net : null,
        rate: isPaid ? String(model.rate / 10) : null,
      });
    }
  });

  it('has as much on its receipts, less its credit notes, as the payment service moved', async () => {
    const sums = await read<{ currency: string; minor: string | number }>(
      `SELECT currency, SUM(minor) AS minor FROM (
         SELECT currency, total_minor AS minor FROM receipts
         UNION ALL SELECT currency, -CAST(total_minor AS SIGNED) FROM credit_notes) documents GROUP BY currency`,
    );
    const moved = payments.book.reduce((sum, entry) => sum + entry.amountMinor, 0);
    const expected = models().reduce((sum, order) => sum + (order.paidAt ? order.left : 0), 0);
    expect(sums.map((sum) => [sum.currency, Number(sum.minor)])).toEqual([['EUR', expected]]);
    expect(moved).toBe(expected);
    expect(expected).toBeGreaterThan(0);
  });

  it.each([1, 2, 3, 4])(
    'comes in quarter %i to what each country and rate should, to the cent',
    async (quarter) => {
      const summary = await shop.app
        .get(SummariseQuarter, { strict: false })
        .summarise({ year: YEAR, quarter });
      const byKey = (a: { key: string }, b: { key: string }) => a.key.localeCompare(b.key, 'en');
      const rows = summary.rows
        .map(({ treatment, country, ratePercent, receipts, creditNotes, net, tax, gross }) => ({
          key: `${treatment} ${country} ${ratePercent}`,
          of: [receipts, creditNotes, net.minor, tax.minor, gross.minor],
        }))
        .sort(byKey);
      const expected = modelQuarter(models(), quarter)
        .map(({ treatment, country, ratePercent, receipts, creditNotes, net, tax }) => ({
          key: `${treatment} ${country} ${ratePercent}`,
          of: [receipts, creditNotes, net, tax, net + tax],
        }))
        .sort(byKey);
      expect(rows).toEqual(expected);
      expect(rows.length).toBeGreaterThan(3);
      const { gross } = summary.totals[0] ?? { gross: { minor: 0 } };
      expect(gross.minor).toBe(expected.reduce((sum, { of }) => sum + (of[4] ?? 0), 0));
    },
  );

  it.each([
    ['receipts', () => models().filter((order) => order.paidAt).length],
    ['credit_notes', () => models().reduce((sum, order) => sum + order.credits.length, 0)],
  ])('numbers its %s without a gap', async (table, count) => {
    const rows = await read<{ number: number }>(
      `SELECT number FROM ${table} WHERE year = ${YEAR} ORDER BY number`,
    );
    expect(rows.map((row) => row.number)).toEqual(Array.from({ length: count() }, (_, n) => n + 1));
    expect(rows.length).toBeGreaterThan(0);
  });

  it('gives each line of a paid order the right it should have, and no other line one', async () => {
    const rows = await read<{ lineId: string; state: string; source: string; email: string }>(
      'SELECT order_line_id AS lineId, state, source, email FROM entitlements',
    );
    const found = new Map(rows.map(({ lineId, ...row }) => [lineId, row]));
    const expected = year.orders
      .filter(({ model }) => model.paidAt)
      .flatMap(({ model, lineIds }) =>
        lineIds.map((lineId, at) => ({
          lineId,
          state: model.lines[at]?.right,
          source: model.plan.giftTo ? 'gift' : 'purchase',
          email: model.plan.giftTo ?? model.plan.email,
        })),
      );
    expect(rows).toHaveLength(expected.length);
    for (const { lineId, ...right } of expected)
      expect({ lineId, ...found.get(lineId) }).toEqual({ lineId, ...right });
    expect(new Set(expected.map((one) => one.state))).toEqual(new Set(['active', 'ended']));
  });

  it('redeems no coupon too often, nor for one buyer, and holds none at the end', async () => {
    for (const { code, cap, perBuyer, minBasketMinor } of plan.coupons) {
      const used = models().filter((order) => order.coupon?.code === code && order.paidAt);
      const [row] = await read<{ held: number; redeemed: number }>(
        `SELECT held, redeemed FROM coupons WHERE code = '${code}'`,
      );
      expect([code, row]).toEqual([code, { held: 0, redeemed: used.length }]);
      if (cap !== null) expect(used.length).toBeLessThanOrEqual(cap);
      const byBuyer = new Map<string, number>();
      for (const { plan: planned } of used) byBuyer.set(planned.email, (byBuyer.get(planned.email) ?? 0) + 1);
      if (perBuyer !== null) expect(Math.max(0, ...byBuyer.values())).toBeLessThanOrEqual(perBuyer);
      if (minBasketMinor !== null) expect(year.refusedCoupons.get(code) ?? 0).toBeGreaterThan(0);
    }
  });

  it('agrees with the payment service’s own book, movement by movement', async () => {
    const movements: Movement[] = [];
    for await (const one of shop.app.get(Movements, { strict: false }).all({})) movements.push(one);
    const rows = compareBooks(movements, payments.book, {
      from: new Date(Date.UTC(YEAR, 0, 1)),
      until: new Date(Date.UTC(YEAR + 1, 0, 1)),
    });
    expect(rows.filter(isDifference)).toEqual([]);
    expect(rows).toHaveLength(payments.book.length);
  });
});
