import { currencyExponent } from './currency-exponents.js';
import { MoneyError } from './money-error.js';

/** An amount in whole minor units (cents for EUR, yen for JPY) of an ISO 4217 currency. */
export type Money = { readonly minor: number; readonly currency: string };

/** Makes a checked amount. Throws MoneyError `not-a-safe-integer` or `unknown-currency`. */
export function money(minor: number, currency: string): Money {
  currencyExponent(currency);
  if (!Number.isSafeInteger(minor)) {
    throw new MoneyError(
      'not-a-safe-integer',
      `${minor} is not a whole number of minor units of ${currency} between −(2^53 − 1) and 2^53 − 1.`,
    );
  }
  // Adding zero turns −0 into 0, which would else fail strict comparison and print a minus.
  return { minor: minor + 0, currency };
}

/** Back from exact arithmetic; beyond 2^53 − 1 it throws rather than lose units. */
export function moneyFromBigInt(minor: bigint, currency: string): Money {
  return money(Number(minor), currency);
}

/** Nothing, in a currency. */
export const zero = (currency: string): Money => money(0, currency);

function requireSameCurrency(a: Money, b: Money): void {
  if (a.currency !== b.currency) {
    throw new MoneyError(
      'mixed-currencies',
      `${a.currency} and ${b.currency} cannot be reckoned together. Use one currency.`,
    );
  }
}

/** a + b, of one currency. Throws MoneyError `mixed-currencies`, `not-a-safe-integer`. */
export function add(a: Money, b: Money): Money {
  requireSameCurrency(a, b);
  return moneyFromBigInt(exactMinor(a) + exactMinor(b), a.currency);
}

/** a − b, of one currency; may be below zero. Throws MoneyError `mixed-currencies`, `not-a-safe-integer`. */
export function subtract(a: Money, b: Money): Money {
  requireSameCurrency(a, b);
  return moneyFromBigInt(exactMinor(a) - exactMinor(b), a.currency);
}

/**
 * The sum of amounts of one currency. `currency` says what an empty list is a sum of; without it an empty
 * list throws MoneyError `nothing-to-sum`.
 */
export function sum(amounts: readonly Money[], currency?: string): Money {
  const first = currency === undefined ? amounts[0] : zero(currency);
  if (first === undefined) {
    throw new MoneyError('nothing-to-sum', 'An empty list has no currency. Name the currency of the sum.');
  }
  const total = amounts.reduce((running, amount) => {
    requireSameCurrency(first, amount);
    return running + exactMinor(amount);
  }, 0n);
  return moneyFromBigInt(total, first.currency);
}

/** The amount times a whole number of pieces. Throws MoneyError `not-a-safe-integer`. */
export function multiply(amount: Money, pieces: number): Money {
  if (!Number.isSafeInteger(pieces)) {
    throw new MoneyError('not-a-safe-integer', `${pieces} is not a whole number of pieces.`);
  }
  return moneyFromBigInt(exactMinor(amount) * BigInt(pieces), amount.currency);
}

/** Below zero, zero or above as a is less than, equal to or more than b; of one currency. */
export function compare(a: Money, b: Money): -1 | 0 | 1 {
  requireSameCurrency(a, b);
  return a.minor < b.minor ? -1 : a.minor > b.minor ? 1 : 0;
}

/** Same amount of the same currency. */
export const isSameMoney = (a: Money, b: Money): boolean => a.currency === b.currency && a.minor === b.minor;

/** The minor units as a BigInt, checked: amounts may come from a row or a request, not from `money()`. */
export function exactMinor(amount: Money): bigint {
  return BigInt(money(amount.minor, amount.currency).minor);
}

/** Throws MoneyError `negative-amount`, naming what the amount is (`'The price'`). */
export function requireNotNegative(amount: Money, what: string): void {
  if (exactMinor(amount) < 0n) {
    throw new MoneyError('negative-amount', `${what} is below zero. Write zero or more.`);
  }
}
