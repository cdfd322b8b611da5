import { currencyExponent } from './currency-exponents.js';
import { MoneyError } from './money-error.js';
import { money, type Money } from './money.js';

/**
 * Reads an amount in major units as a form or a file gives it: `24`, `24.00`, `-0.5`. A point, no groups:
 * `1,234` is a thousand to one reader and one and a bit to another, so it is refused rather than guessed.
 * Throws MoneyError `bad-amount-text`, `too-many-decimals`, `unknown-currency`, `not-a-safe-integer`.
 */
export function parseMoney(text: string, currency: string): Money {
  const exponent = currencyExponent(currency);
  const match = /^(-?)(\d+)(?:\.(\d+))?$/.exec(text.trim());
  if (!match) {
    throw new MoneyError(
      'bad-amount-text',
      `"${text}" is not an amount. Write digits with a point and no spaces or commas, such as ${exampleOf(exponent)}.`,
    );
  }
  const [, sign = '', whole = '0', decimals = ''] = match;
  if (decimals.length > exponent) {
    throw new MoneyError(
      'too-many-decimals',
      exponent === 0
        ? `${currency} has no decimals. Write a whole number.`
        : `${currency} has ${exponent} decimals; "${text}" has ${decimals.length}.`,
    );
  }
  return money(Number(`${sign}${whole}${decimals.padEnd(exponent, '0')}`), currency);
}

const exampleOf = (exponent: number): string => (exponent === 0 ? '24' : `24.${'0'.repeat(exponent)}`);
