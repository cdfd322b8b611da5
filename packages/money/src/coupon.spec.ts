import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import {
  applyCoupon,
  fraction,
  money,
  MoneyError,
  multiply,
  parseMoney,
  percent,
  percentOf,
  subtract,
  sum,
  taxFromGross,
  type CouponLine,
} from './index.js';

type Order = {
  lines: { unit: string; pieces: number }[];
  couponPercent: string;
  subtotal: string;
  discountsMinor: number[];
  total: string;
  rate: string;
  net: string;
  tax: string;
  lineAfter: string[];
  lineNets: string[];
  sumOfLineNets: string;
};
const { order } = JSON.parse(
  readFileSync(new URL('../fixtures/money-reference.json', import.meta.url), 'utf8'),
) as { order: Order };

const eur = (text: string) => parseMoney(text, 'EUR');
const lineOf = (minor: number, isEligible = true): CouponLine => ({ price: money(minor, 'EUR'), isEligible });
const minorsOf = (amounts: { minor: number }[]) => amounts.map(({ minor }) => minor);
const someLines = fc.array(
  fc.record({ minor: fc.nat(1e9), isEligible: fc.boolean() }).map((l) => lineOf(l.minor, l.isEligible)),
  { minLength: 1, maxLength: 12 },
);

describe('a coupon of some percent', () => {
  it('works the reference order through to its tax', () => {
    const lines = order.lines.map(({ unit, pieces }): CouponLine => ({
      price: multiply(eur(unit), pieces),
      isEligible: true,
    }));
    const discounts = applyCoupon(lines, { kind: 'percent', percent: percent(order.couponPercent) });
    const after = lines.map((line, i) => subtract(line.price, discounts[i] ?? line.price));
    const rate = percent(order.rate);
    const taxed = taxFromGross(sum(after), rate);

    expect(sum(lines.map((line) => line.price))).toEqual(eur(order.subtotal));
    expect(minorsOf(discounts)).toEqual(order.discountsMinor);
    expect(after).toEqual(order.lineAfter.map(eur));
    expect(sum(after)).toEqual(eur(order.total));
    expect(taxed).toEqual({ net: eur(order.net), tax: eur(order.tax), gross: eur(order.total) });
    const lineNets = after.map((gross) => taxFromGross(gross, rate).net);
    expect(lineNets).toEqual(order.lineNets.map(eur));
    // A cent less than the net of the total: why tax is rounded once for each rate.
    expect(sum(lineNets)).toEqual(eur(order.sumOfLineNets));
  });

  it('takes a third off each line on its own', () => {
    const discounts = applyCoupon([lineOf(2400), lineOf(1000), lineOf(500, false)], {
      kind: 'percent',
      percent: fraction(1, 3),
    });
    expect(minorsOf(discounts)).toEqual([800, 333, 0]);
  });

  it('takes the half-up share of each eligible line and nothing of the others', () => {
    fc.assert(
      fc.property(someLines, fc.nat(1000), (lines, thousandths) => {
        const share = fraction(thousandths, 1000);
        const discounts = applyCoupon(lines, { kind: 'percent', percent: share });
        lines.forEach((line, i) => {
          const expected = line.isEligible ? percentOf(line.price, share).minor : 0;
          expect(discounts[i]?.minor).toBe(expected);
          expect(expected).toBeLessThanOrEqual(line.price.minor);
        });
      }),
    );
  });

  it('cannot take off more than all', () => {
    expect(() => applyCoupon([lineOf(100)], { kind: 'percent', percent: percent('101') })).toThrow(
      MoneyError,
    );
    expect(minorsOf(applyCoupon([lineOf(9999)], { kind: 'percent', percent: percent('100') }))).toEqual([
      9999,
    ]);
  });
});

describe('a coupon of a fixed amount', () => {
  it('is spread over the eligible lines by largest remainder', () => {
    const lines = [lineOf(1999), lineOf(1499), lineOf(7000, false), lineOf(502)];
    // The parts are a row of the reference: 500 over 1999, 1499 and 502.
    expect(minorsOf(applyCoupon(lines, { kind: 'amount', amount: eur('5.00') }))).toEqual([250, 187, 0, 63]);
  });

  it('never takes more than the eligible lines cost', () => {
    const lines = [lineOf(300), lineOf(200), lineOf(9000, false)];
    expect(minorsOf(applyCoupon(lines, { kind: 'amount', amount: eur('50.00') }))).toEqual([300, 200, 0]);
  });

  it('takes nothing where no line is eligible or all are free', () => {
    const coupon = { kind: 'amount', amount: eur('5.00') } as const;
    expect(minorsOf(applyCoupon([lineOf(300, false)], coupon))).toEqual([0]);
    expect(minorsOf(applyCoupon([lineOf(0)], coupon))).toEqual([0]);
    expect(applyCoupon([], coupon)).toEqual([]);
  });

  it('adds up to the amount or the cap, and leaves no line below zero', () => {
    fc.assert(
      fc.property(someLines, fc.nat(2e9), (lines, minor) => {
        const discounts = applyCoupon(lines, { kind: 'amount', amount: money(minor, 'EUR') });
        const eligible = lines.reduce((all, l) => all + (l.isEligible ? l.price.minor : 0), 0);
        expect(sum(discounts).minor).toBe(Math.min(minor, eligible));
        lines.forEach((line, i) => {
          const off = discounts[i]?.minor ?? Number.NaN;
          expect(off).toBeGreaterThanOrEqual(0);
          expect(off).toBeLessThanOrEqual(line.isEligible ? line.price.minor : 0);
        });
      }),
    );
  });

  it('refuses another currency and amounts below zero', () => {
    const lines = [lineOf(300)];
    expect(() => applyCoupon(lines, { kind: 'amount', amount: money(5, 'JPY') })).toThrow('EUR');
    expect(() => applyCoupon(lines, { kind: 'amount', amount: money(-5, 'EUR') })).toThrow('below zero');
    expect(() => applyCoupon([lineOf(-1)], { kind: 'amount', amount: eur('1') })).toThrow('below zero');
    const mixed = [...lines, { price: money(5, 'JPY'), isEligible: false }];
    expect(() => applyCoupon(mixed, { kind: 'percent', percent: percent('5') })).toThrow(MoneyError);
  });
});
