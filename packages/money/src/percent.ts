import { MoneyError } from './money-error.js';
import { exactMinor, moneyFromBigInt, type Money } from './money.js';
import { roundHalfUp } from './rounding.js';

/**
 * An exact share of a whole, numerator / denominator: 15 % is 3/20, a third is 1/3. Kept as a ratio because
 * "a third off" has no finite decimal, and a float has no exact 2.9 %.
 */
export type Percent = { readonly numerator: number; readonly denominator: number };

const greatestCommonDivisor = (a: bigint, b: bigint): bigint =>
  b === 0n ? a : greatestCommonDivisor(b, a % b);

/** Checks a share that came from a row or a request. Throws MoneyError `bad-percent`. */
export function requirePercent({ numerator, denominator }: Percent): void {
  const isGood =
    Number.isSafeInteger(numerator) && Number.isSafeInteger(denominator) && numerator >= 0 && denominator > 0;
  if (!isGood) {
    throw new MoneyError(
      'bad-percent',
      `${numerator}/${denominator} is not a share: both must be whole numbers, the first not below zero, the second above it.`,
    );
  }
}

/** An exact share in lowest terms: `fraction(1, 3)` is a third. Throws MoneyError `bad-percent`. */
export function fraction(numerator: number, denominator: number): Percent {
  requirePercent({ numerator, denominator });
  const divisor = Number(greatestCommonDivisor(BigInt(numerator), BigInt(denominator)));
  return { numerator: numerator / divisor, denominator: denominator / divisor };
}

/**
 * Reads a percentage as it is written, exactly: `percent('25.5')` is 51/200. A point, no sign, at most ten
 * decimals. Throws MoneyError `bad-percent`.
 */
export function percent(text: string): Percent {
  const match = /^(\d{1,5})(?:\.(\d{1,10}))?$/.exec(text.trim());
  if (!match) {
    throw new MoneyError(
      'bad-percent',
      `"${text}" is not a percentage. Write digits with a point, such as 15 or 33.333.`,
    );
  }
  const [, whole = '0', decimals = ''] = match;
  return fraction(Number(whole + decimals), 10 ** (decimals.length + 2));
}

/** The share of an amount, half-up to the minor unit, exactly. Throws MoneyError `bad-percent`. */
export function percentOf(amount: Money, share: Percent): Money {
  requirePercent(share);
  const product = exactMinor(amount) * BigInt(share.numerator);
  return moneyFromBigInt(roundHalfUp(product, BigInt(share.denominator)), amount.currency);
}
