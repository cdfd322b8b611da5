import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import {
  add,
  formatPercent,
  fraction,
  money,
  MoneyError,
  parseMoney,
  percent,
  percentOf,
  subtract,
} from './index.js';

type CouponRow = { currency: string; price: string; percent: string; discount: string; after?: string };
type FeeRow = { gross: string; percent: string; fixed: string; fee: string; payout: string };
const reference = JSON.parse(
  readFileSync(new URL('../fixtures/money-reference.json', import.meta.url), 'utf8'),
) as { coupon: { rows: CouponRow[] }; cardFee: { rows: FeeRow[] } };

describe('a share', () => {
  it('is read exactly from how a percentage is written', () => {
    expect(percent('33.333')).toEqual({ numerator: 33_333, denominator: 100_000 });
    expect(percent('25.5')).toEqual({ numerator: 51, denominator: 200 });
    expect(percent(' 15 ')).toEqual({ numerator: 3, denominator: 20 });
    expect(percent('0')).toEqual({ numerator: 0, denominator: 1 });
  });

  it.each(['', '15 %', '-5', '1e2', '.5', '5.', '12,5', 'NaN', '0.12345678901'])('is not "%s"', (text) => {
    expect(() => percent(text)).toThrow(MoneyError);
    expect(() => percent(text)).toThrow(`"${text}"`);
  });

  it.each([
    [1, 0],
    [-1, 3],
    [1.5, 3],
    [1, -3],
    [2 ** 53, 3],
  ])('is not %p/%p', (numerator, denominator) => {
    expect(() => fraction(numerator, denominator)).toThrow(MoneyError);
    expect(() => percentOf(money(100, 'EUR'), { numerator, denominator })).toThrow(MoneyError);
  });

  it('is written for a reader with three decimals at most', () => {
    expect(formatPercent(percent('25.5'), 'en-GB')).toBe('25.5%');
    expect(formatPercent(fraction(1, 3), 'en-GB')).toBe('33.333%');
    expect(formatPercent(percent('8.1'), 'de-CH')).toBe('8.1%');
  });
});

describe('a share of an amount', () => {
  it.each(reference.coupon.rows)('takes $percent % of $price $currency half-up: $discount', (row) => {
    const price = parseMoney(row.price, row.currency);
    const discount = percentOf(price, percent(row.percent));
    expect(discount).toEqual(parseMoney(row.discount, row.currency));
    if (row.after !== undefined) {
      expect(subtract(price, discount)).toEqual(parseMoney(row.after, row.currency));
    }
  });

  it.each(reference.cardFee.rows)('reckons the fee of $gross at $percent % and $fixed: $fee', (row) => {
    const gross = parseMoney(row.gross, 'EUR');
    const fee = add(percentOf(gross, percent(row.percent)), parseMoney(row.fixed, 'EUR'));
    expect(fee).toEqual(parseMoney(row.fee, 'EUR'));
    expect(subtract(gross, fee)).toEqual(parseMoney(row.payout, 'EUR'));
  });

  it('gives exactly 8.00 for a third of 24.00, where 33.333 % gives the same only by rounding', () => {
    const price = parseMoney('24.00', 'EUR');
    expect(percentOf(price, fraction(1, 3))).toEqual(parseMoney('8.00', 'EUR'));
    expect(percentOf(parseMoney('24000.00', 'EUR'), fraction(1, 3))).toEqual(parseMoney('8000.00', 'EUR'));
    expect(percentOf(parseMoney('24000.00', 'EUR'), percent('33.333'))).toEqual(parseMoney('7999.92', 'EUR'));
  });

  it('rounds an amount below zero as its opposite', () => {
    fc.assert(
      fc.property(fc.nat(1e9), fc.nat(10_000), (minor, hundredths) => {
        const share = fraction(hundredths, 10_000);
        const taken = percentOf(money(minor, 'EUR'), share).minor;
        expect(percentOf(money(-minor, 'EUR'), share).minor).toBe(taken === 0 ? 0 : -taken);
      }),
    );
  });

  it('is within half a unit of the exact share, also where the product passes 2^53', () => {
    fc.assert(
      fc.property(
        fc.maxSafeNat(),
        fc.nat(1_000_000),
        fc.integer({ min: 1_000_000, max: 2_000_000 }),
        (minor, numerator, denominator) => {
          const taken = percentOf(money(minor, 'EUR'), { numerator, denominator });
          const twiceTheError =
            2n * (BigInt(taken.minor) * BigInt(denominator) - BigInt(minor) * BigInt(numerator));
          expect(twiceTheError > -BigInt(denominator) && twiceTheError <= BigInt(denominator)).toBe(true);
        },
      ),
    );
  });
});
