import fc from 'fast-check';
import {
  add,
  compare,
  isSameMoney,
  money,
  MoneyError,
  multiply,
  subtract,
  sum,
  zero,
  type MoneyErrorCode,
} from './index.js';

const eur = (minor: number) => money(minor, 'EUR');
const minor = fc.integer({ min: -1e12, max: 1e12 });

function codeOf(run: () => unknown): MoneyErrorCode | undefined {
  try {
    run();
  } catch (error) {
    if (error instanceof MoneyError) return error.code;
    throw error;
  }
  return undefined;
}

describe('an amount', () => {
  it.each([0.5, Number.NaN, Number.POSITIVE_INFINITY, 2 ** 53])('is never %p minor units', (value) => {
    expect(codeOf(() => eur(value))).toBe('not-a-safe-integer');
  });

  it('has no minus zero', () => {
    expect(Object.is(eur(-0).minor, 0)).toBe(true);
    expect(Object.is(multiply(eur(0), -3).minor, 0)).toBe(true);
  });

  it('is checked even where it was not made by money()', () => {
    expect(codeOf(() => add({ minor: 1.5, currency: 'EUR' }, eur(1)))).toBe('not-a-safe-integer');
    expect(codeOf(() => add({ minor: 1, currency: 'ABC' }, { minor: 1, currency: 'ABC' }))).toBe(
      'unknown-currency',
    );
  });
});

describe('reckoning with amounts', () => {
  it('refuses two currencies', () => {
    const yen = money(100, 'JPY');
    for (const run of [
      () => add(eur(1), yen),
      () => subtract(eur(1), yen),
      () => compare(eur(1), yen),
      () => sum([eur(1), yen]),
      () => sum([yen], 'EUR'),
    ]) {
      expect(codeOf(run)).toBe('mixed-currencies');
    }
  });

  it('throws rather than lose units beyond 2^53', () => {
    expect(codeOf(() => add(eur(Number.MAX_SAFE_INTEGER), eur(1)))).toBe('not-a-safe-integer');
    expect(codeOf(() => multiply(eur(Number.MAX_SAFE_INTEGER), 2))).toBe('not-a-safe-integer');
  });

  it('passes through sums beyond 2^53 when the end is within', () => {
    const most = eur(Number.MAX_SAFE_INTEGER);
    expect(sum([most, most, eur(-Number.MAX_SAFE_INTEGER)])).toEqual(most);
  });

  it('sums an empty list only when told the currency', () => {
    expect(sum([], 'EUR')).toEqual(zero('EUR'));
    expect(codeOf(() => sum([]))).toBe('nothing-to-sum');
  });

  it('takes away what it added, whatever the amounts', () => {
    fc.assert(
      fc.property(minor, minor, (a, b) => {
        expect(subtract(add(eur(a), eur(b)), eur(b))).toEqual(eur(a));
      }),
    );
  });

  it('sums to the same in any order', () => {
    fc.assert(
      fc.property(fc.array(minor, { minLength: 1 }), (values) => {
        expect(sum(values.map(eur))).toEqual(sum(values.toReversed().map(eur)));
      }),
    );
  });

  it('orders and compares', () => {
    expect([compare(eur(1), eur(2)), compare(eur(2), eur(2)), compare(eur(3), eur(2))]).toEqual([-1, 0, 1]);
    expect(isSameMoney(eur(2), eur(2))).toBe(true);
    expect(isSameMoney(eur(2), money(2, 'USD'))).toBe(false);
  });
});
