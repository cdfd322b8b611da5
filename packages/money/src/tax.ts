import { exactMinor, moneyFromBigInt, subtract, add, type Money } from './money.js';
import { percentOf, requirePercent, type Percent } from './percent.js';
import { roundHalfUp } from './rounding.js';

/** An amount parted into what is the seller's and what is the tax; `net + tax` is `gross`, always. */
export type TaxSplit = { readonly net: Money; readonly tax: Money; readonly gross: Money };

/*
 * Directive 2006/112/EC does not fix whether tax is rounded by line or by total, and the two differ by a
 * cent now and then. The rule of the house: add up all lines of one rate, then round once. So give these
 * functions the sum of a rate, not a line.
 */

/**
 * The tax inside a tax-inclusive amount: net = gross / (1 + rate) half-up to the minor unit, tax = the rest.
 * Throws MoneyError `bad-percent`.
 */
export function taxFromGross(gross: Money, rate: Percent): TaxSplit {
  requirePercent(rate);
  const denominator = BigInt(rate.denominator);
  const net = moneyFromBigInt(
    roundHalfUp(exactMinor(gross) * denominator, denominator + BigInt(rate.numerator)),
    gross.currency,
  );
  return { net, tax: subtract(gross, net), gross };
}

/** The tax on top of a tax-exclusive amount, half-up to the minor unit. Throws MoneyError `bad-percent`. */
export function taxFromNet(net: Money, rate: Percent): TaxSplit {
  const tax = percentOf(net, rate);
  return { net, tax, gross: add(net, tax) };
}
