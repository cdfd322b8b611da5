import { MoneyError } from './money-error.js';
import { compare, requireNotNegative, subtract, sum, type Money } from './money.js';

/** What was paid for a line (price less discount), and what of it went back already. */
export type RefundableLine = { readonly paid: Money; readonly refunded: readonly Money[] };

/**
 * What a refund of the line gives back: all that remains of what was paid, or the part asked for. A line
 * given back whole already gives zero, so a refund run twice pays once.
 * Throws MoneyError `refund-exceeds-paid` where more is asked for, or was given back, than was paid.
 */
export function refundOf(line: RefundableLine, asked?: Money): Money {
  requireNotNegative(line.paid, 'What was paid for the line');
  for (const amount of line.refunded) requireNotNegative(amount, 'An earlier refund');
  const remains = subtract(line.paid, sum(line.refunded, line.paid.currency));
  if (remains.minor < 0) {
    throw new MoneyError('refund-exceeds-paid', 'More was given back for this line than was paid for it.');
  }
  if (asked === undefined) return remains;
  requireNotNegative(asked, 'The refund');
  if (compare(asked, remains) > 0) {
    throw new MoneyError(
      'refund-exceeds-paid',
      'The refund is more than what remains of the line. Ask for what remains or less.',
    );
  }
  return asked;
}
