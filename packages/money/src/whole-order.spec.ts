import fc from 'fast-check';
import {
  applyCoupon,
  currencyExponent,
  decimalText,
  fraction,
  money,
  parseMoney,
  percentOf,
  refundOf,
  spread,
  subtract,
  sum,
  taxFromGross,
  taxFromNet,
  type CouponWorth,
} from './index.js';

/** ISO 4217: no decimals, two, three and four. */
const currency = fc.constantFrom('JPY', 'KRW', 'ISK', 'EUR', 'HUF', 'MGA', 'BHD', 'KWD', 'IQD', 'CLF', 'UYW');
const rate = fc.nat(30_000).map((thousandths) => fraction(thousandths, 100_000));
const share = fc
  .tuple(fc.nat(10_000), fc.integer({ min: 1, max: 10_000 }))
  .map(([a, b]) => fraction(Math.min(a, b), Math.max(a, b)));
const lines = fc.array(fc.record({ minor: fc.nat(1e8), isEligible: fc.boolean() }), {
  minLength: 1,
  maxLength: 8,
});
const worth = fc.oneof(
  share.map((percent) => ({ kind: 'percent', percent }) as const),
  fc.nat(2e8).map((minor) => ({ kind: 'amount', minor }) as const),
);

describe('every currency, whatever its decimals', () => {
  it('is reckoned in its minor units alike', () => {
    fc.assert(
      fc.property(currency, fc.nat(1e12), rate, fc.array(fc.nat(1e6), { minLength: 1 }), (code, n, r, w) => {
        const weights = w.some((one) => one > 0) ? w : [1];
        const minorsIn = (unit: string) => [
          percentOf(money(n, unit), r).minor,
          taxFromGross(money(n, unit), r).net.minor,
          taxFromNet(money(n, unit), r).gross.minor,
          ...spread(money(n, unit), weights).map((part) => part.minor),
        ];
        expect(minorsIn(code)).toEqual(minorsIn('EUR'));
      }),
    );
  });

  it('is written with as many decimals as ISO 4217 gives it', () => {
    fc.assert(
      fc.property(currency, fc.maxSafeInteger(), (code, n) => {
        const text = decimalText(money(n, code));
        expect(text.split('.')[1]?.length ?? 0).toBe(currencyExponent(code));
        expect(parseMoney(text, code).minor).toBe(n);
      }),
    );
  });

  // Python decimal, ROUND_HALF_UP: 985 yen with 10 % in it, 4.955 dinar of three decimals with 5 % in it.
  it.each([
    ['JPY', '985', '10', '895', '90'],
    ['BHD', '4.955', '5', '4.719', '0.236'],
    ['EUR', '9.85', '10', '8.95', '0.90'],
  ])('parts %s %s at %s %% into %s and %s', (code, gross, percent, net, tax) => {
    expect(taxFromGross(parseMoney(gross, code), fraction(Number(percent), 100))).toMatchObject({
      net: parseMoney(net, code),
      tax: parseMoney(tax, code),
    });
  });
});

describe('an order from its prices to its last refund', () => {
  it('loses and gains no unit on the way', () => {
    fc.assert(
      fc.property(currency, lines, worth, rate, fc.nat(100), (code, priced, off, taxRate, part) => {
        const coupon: CouponWorth =
          off.kind === 'amount' ? { kind: 'amount', amount: money(off.minor, code) } : off;
        const prices = priced.map((line) => money(line.minor, code));
        const discounts = applyCoupon(
          priced.map((line, at) => ({ price: prices[at] ?? money(0, code), isEligible: line.isEligible })),
          coupon,
        );
        const paid = prices.map((price, at) => subtract(price, discounts[at] ?? price));
        for (const amount of [...discounts, ...paid]) expect(amount.minor).toBeGreaterThanOrEqual(0);
        expect(sum(paid).minor + sum(discounts).minor).toBe(sum(prices).minor);

        const receipt = taxFromGross(sum(paid), taxRate);
        expect(receipt.net.minor + receipt.tax.minor).toBe(sum(paid).minor);

        // Given back in two steps, part of each line and then the rest.
        const first = paid.map((line) =>
          refundOf({ paid: line, refunded: [] }, percentOf(line, fraction(part, 100))),
        );
        const rest = paid.map((line, at) => refundOf({ paid: line, refunded: [first[at] ?? line] }));
        expect(sum([...first, ...rest])).toEqual(sum(paid));
      }),
    );
  });

  it('gives the whole of a tax back with the whole of a refund', () => {
    fc.assert(
      fc.property(currency, fc.nat(1e9), rate, (code, minor, taxRate) => {
        const sale = taxFromGross(money(minor, code), taxRate);
        const credit = taxFromGross(money(-minor, code), taxRate);
        expect([sale.net.minor + credit.net.minor, sale.tax.minor + credit.tax.minor]).toEqual([0, 0]);
      }),
    );
  });
});

describe('a share that ends on half a unit', () => {
  it('goes up, always', () => {
    fc.assert(
      fc.property(fc.nat(1e9), fc.integer({ min: 1, max: 1e6 }), (whole, denominator) => {
        // (2·whole + 1) / 2 exactly, made from a share with another denominator.
        const amount = money(2 * whole + 1, 'EUR');
        expect(percentOf(amount, { numerator: denominator, denominator: 2 * denominator }).minor).toBe(
          whole + 1,
        );
      }),
    );
  });
});
