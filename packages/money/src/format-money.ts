import { currencyExponent } from './currency-exponents.js';
import { MoneyError } from './money-error.js';
import { exactMinor, type Money } from './money.js';
import { requirePercent, type Percent } from './percent.js';

/** The plain decimal form for exports and machines: `24.00`, `-0.05`, `985`. The opposite of parseMoney. */
export function decimalText(amount: Money): `${number}` {
  const exponent = currencyExponent(amount.currency);
  const minor = exactMinor(amount);
  const digits = (minor < 0n ? -minor : minor).toString().padStart(exponent + 1, '0');
  const whole = digits.slice(0, digits.length - exponent);
  const decimals = exponent === 0 ? '' : `.${digits.slice(-exponent)}`;
  return `${minor < 0n ? '-' : ''}${whole}${decimals}` as `${number}`;
}

const formats = new Map<string, Intl.NumberFormat>();

function formatFor(locale: string, key: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const known = formats.get(`${locale} ${key}`);
  if (known) return known;
  try {
    const made = new Intl.NumberFormat(locale, options);
    formats.set(`${locale} ${key}`, made);
    return made;
  } catch {
    throw new MoneyError('bad-locale', `"${locale}" is not a language tag. Write one such as en-GB.`);
  }
}

/**
 * The amount as a reader of that language writes it, with the digits ISO 4217 gives the currency (Intl's own
 * choice differs for HUF, IQD and others). Handed over as text, since a float would lose large amounts' last
 * digits. Throws MoneyError `bad-locale`, `unknown-currency`.
 */
export function formatMoney(amount: Money, locale: string): string {
  const digits = currencyExponent(amount.currency);
  return formatFor(locale, amount.currency, {
    style: 'currency',
    currency: amount.currency,
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).format(decimalText(amount));
}

/** The share as a percentage for a reader, to three decimals at most: `25.5%`, `33.333%`. */
export function formatPercent(share: Percent, locale: string): string {
  requirePercent(share);
  return formatFor(locale, '%', { style: 'percent', maximumFractionDigits: 3 }).format(
    share.numerator / share.denominator,
  );
}
