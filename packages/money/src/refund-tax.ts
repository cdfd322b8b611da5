import { MoneyError } from './money-error.js';
import { add, compare, isSameMoney, requireNotNegative, subtract, zero, type Money } from './money.js';
import type { Percent } from './percent.js';
import { taxFromGross, type TaxSplit } from './tax.js';

/**
 * The tax within a part of a sale that goes back. Each part takes the tax of all that has gone back with it less
 * the tax of all that had before, so that the parts of a sale given back whole add up to its net and its tax to the
 * last cent, however it was parted; a part alone is at most one minor unit off what it would be by itself.
 * `paid` is the split on the receipt, for all lines of one rate. Throws MoneyError `refund-exceeds-paid`.
 */
export function taxOfRefund(paid: TaxSplit, before: Money, refund: Money, rate: Percent): TaxSplit {
  requireNotNegative(before, 'What went back before');
  requireNotNegative(refund, 'The refund');
  const after = add(before, refund);
  if (compare(after, paid.gross) > 0) {
    throw new MoneyError(
      'refund-exceeds-paid',
      'More would go back at this rate of tax than was paid at it.',
    );
  }
  const netUpTo = (gross: Money): Money => {
    if (isSameMoney(gross, paid.gross)) return paid.net;
    return gross.minor === 0 ? zero(gross.currency) : taxFromGross(gross, rate).net;
  };
  const net = subtract(netUpTo(after), netUpTo(before));
  return { net, tax: subtract(refund, net), gross: refund };
}
