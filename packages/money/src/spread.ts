import { MoneyError } from './money-error.js';
import { exactMinor, moneyFromBigInt, type Money } from './money.js';

function requireWeights(weights: readonly number[]): bigint {
  let whole = 0n;
  for (const weight of weights) {
    if (!Number.isSafeInteger(weight) || weight < 0) {
      throw new MoneyError('bad-weights', `${weight} is not a weight. Use whole numbers, zero or more.`);
    }
    whole += BigInt(weight);
  }
  return whole;
}

/**
 * Parts a total over weights so that the parts add up to it: each gets the whole units of its exact share,
 * and the units left over go one each to the largest fractional parts, ties to the earlier line. A weight
 * of zero gets nothing. A total below zero is parted as its opposite would be.
 * Method: largest remainder (Hamilton). Throws MoneyError `bad-weights`, also where there is something to
 * part and no weight to part it by.
 */
export function spread(total: Money, weights: readonly number[]): Money[] {
  const whole = requireWeights(weights);
  const minor = exactMinor(total);
  if (whole === 0n) {
    if (minor !== 0n) {
      throw new MoneyError(
        'bad-weights',
        'All weights are zero: there is nothing to spread the amount over.',
      );
    }
    return weights.map(() => moneyFromBigInt(0n, total.currency));
  }
  const magnitude = minor < 0n ? -minor : minor;
  const shares = weights.map((weight, line) => {
    const product = magnitude * BigInt(weight);
    return { line, units: product / whole, remainder: product % whole };
  });
  let leftOver = magnitude - shares.reduce((given, share) => given + share.units, 0n);
  const byRemainder = shares.toSorted((a, b) =>
    a.remainder === b.remainder ? a.line - b.line : a.remainder > b.remainder ? -1 : 1,
  );
  for (const share of byRemainder) {
    if (leftOver === 0n) break;
    share.units += 1n;
    leftOver -= 1n;
  }
  return shares.map(({ units }) => moneyFromBigInt(minor < 0n ? -units : units, total.currency));
}
