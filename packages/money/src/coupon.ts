import { MoneyError } from './money-error.js';
import { add, compare, requireNotNegative, sum, zero, type Money } from './money.js';
import { percentOf, requirePercent, type Percent } from './percent.js';
import { spread } from './spread.js';

/** One line of a basket: its full price (all pieces of it), and whether the coupon is for this kit. */
export type CouponLine = { readonly price: Money; readonly isEligible: boolean };

/** What a coupon takes off: a share of each eligible line, or an amount off all of them together. */
export type CouponWorth =
  | { readonly kind: 'percent'; readonly percent: Percent }
  | { readonly kind: 'amount'; readonly amount: Money };

function requireDiscountShare(share: Percent): void {
  requirePercent(share);
  if (share.numerator > share.denominator) {
    throw new MoneyError('bad-percent', 'A coupon cannot take off more than 100 %.');
  }
}

/**
 * The discount of each line, in the order of the lines; zero where the coupon is not for the line. A
 * percentage is rounded half-up line by line. An amount is capped by the sum of the eligible lines and
 * spread over them by largest remainder, weighed by price, so no line falls below zero.
 * Throws MoneyError `bad-percent` (above 100 %), `negative-amount`, `mixed-currencies`.
 */
export function applyCoupon(lines: readonly CouponLine[], coupon: CouponWorth): Money[] {
  for (const line of lines) requireNotNegative(line.price, 'The price of a line');
  // A basket is of one currency, also where the coupon touches a single line of it.
  if (lines.length > 0) sum(lines.map((line) => line.price));

  if (coupon.kind === 'percent') {
    requireDiscountShare(coupon.percent);
    return lines.map((line) =>
      line.isEligible ? percentOf(line.price, coupon.percent) : zero(line.price.currency),
    );
  }

  requireNotNegative(coupon.amount, 'The amount of a coupon');
  const { currency } = coupon.amount;
  const bases = lines.map((line) => (line.isEligible ? line.price : zero(line.price.currency)));
  const eligible = bases.reduce(add, zero(currency));
  const off = compare(coupon.amount, eligible) > 0 ? eligible : coupon.amount;
  if (eligible.minor === 0) return bases;
  return spread(
    off,
    bases.map((base) => base.minor),
  );
}
