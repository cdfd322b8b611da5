import fc from 'fast-check';
import {
  applyCoupon,
  fraction,
  money,
  percent,
  refundOf,
  spread,
  sum,
  taxFromGross,
  taxOfRefund,
  type Money,
} from './index.js';

const eur = (minor: number): Money => money(minor, 'EUR');

describe('the tax of a refund', () => {
  it('is that of the receipt where all goes back at once', () => {
    // 19.99 with 22 % in it: 16.39 and 3.60 (Python decimal, ROUND_HALF_UP, with VAT as the rest).
    const paid = taxFromGross(eur(1999), percent('22'));
    expect(taxOfRefund(paid, eur(0), eur(1999), percent('22'))).toEqual(paid);
    expect(paid).toMatchObject({ net: eur(1639), tax: eur(360) });
  });

  it('makes up in the last part what rounding took from the first', () => {
    // Three parts of 3.33 at 19 %: each alone has 2.80 net, 8.40 together, but 9.99 has 8.39 (same source).
    const rate = percent('19');
    const paid = taxFromGross(eur(999), rate);
    const parts = [0, 333, 666].map((before) => taxOfRefund(paid, eur(before), eur(333), rate).net.minor);
    expect(parts).toEqual([280, 280, 279]);
  });

  it('refuses more than was paid at the rate', () => {
    const paid = taxFromGross(eur(100), percent('19'));
    expect(() => taxOfRefund(paid, eur(60), eur(41), percent('19'))).toThrow('More would go back');
    expect(() => taxOfRefund(paid, eur(0), eur(-1), percent('19'))).toThrow('below zero');
  });

  it('adds up to what was paid by line and by rate, however an order under a coupon is parted', () => {
    const line = fc.record({
      price: fc.integer({ min: 1, max: 50_000 }),
      rate: fc.constantFrom('19', '25.5', '0'),
    });
    fc.assert(
      fc.property(
        fc.array(line, { minLength: 1, maxLength: 5 }),
        fc.constantFrom(fraction(1, 3), fraction(15, 100), fraction(1, 7)),
        fc.array(fc.record({ at: fc.nat(4), asks: fc.nat(30_000), isOutside: fc.boolean() }), {
          maxLength: 12,
        }),
        (lines, off, turns) => {
          const prices = lines.map(({ price }) => eur(price));
          const discounts = applyCoupon(
            prices.map((price) => ({ price, isEligible: true })),
            { kind: 'percent', percent: off },
          );
          const paid = prices.map((price, at) => eur(price.minor - (discounts[at]?.minor ?? 0)));
          const rates = [...new Set(lines.map(({ rate }) => rate))];
          const grossOf = (amounts: readonly Money[], rate: string) =>
            sum(
              amounts.filter((_, at) => lines[at]?.rate === rate),
              'EUR',
            );
          const splits = new Map(
            rates.map((rate) => [rate, taxFromGross(grossOf(paid, rate), percent(rate))]),
          );
          const backByLine = paid.map((): Money[] => []);
          const taxBack = new Map(rates.map((rate) => [rate, { net: 0, tax: 0 }]));

          const giveBack = (amounts: readonly Money[]) => {
            for (const rate of rates) {
              const before = grossOf(
                backByLine.map((parts) => sum(parts, 'EUR')),
                rate,
              );
              const split = taxOfRefund(splits.get(rate)!, before, grossOf(amounts, rate), percent(rate));
              expect(split.net.minor).toBeGreaterThanOrEqual(0);
              expect(split.tax.minor).toBeGreaterThanOrEqual(0);
              const so = taxBack.get(rate)!;
              taxBack.set(rate, { net: so.net + split.net.minor, tax: so.tax + split.tax.minor });
            }
            amounts.forEach((amount, at) => backByLine[at]!.push(amount));
          };
          const remains = () =>
            paid.map((amount, at) => refundOf({ paid: amount, refunded: backByLine[at]! }));

          for (const { at, asks, isOutside } of turns) {
            const left = remains();
            const whole = sum(left, 'EUR');
            if (whole.minor === 0) break;
            if (isOutside) {
              const amount = eur(Math.min(Math.max(1, asks), whole.minor));
              giveBack(
                spread(
                  amount,
                  left.map(({ minor }) => minor),
                ),
              );
            } else {
              const index = at % paid.length;
              const part = refundOf(
                { paid: paid[index]!, refunded: backByLine[index]! },
                eur(Math.min(asks, left[index]!.minor)),
              );
              giveBack(left.map((_, line) => (line === index ? part : eur(0))));
            }
          }
          giveBack(remains());

          expect(backByLine.map((parts) => sum(parts, 'EUR'))).toEqual(paid);
          for (const rate of rates) {
            const { net, tax } = splits.get(rate)!;
            expect(taxBack.get(rate)).toEqual({ net: net.minor, tax: tax.minor });
          }
        },
      ),
      { numRuns: 300 },
    );
  });
});
