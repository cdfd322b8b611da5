import fc from 'fast-check';
import { currencyCodes, decimalText, formatMoney, money, MoneyError, parseMoney } from './index.js';

/** Intl parts with no-break spaces; the sentence a reader sees is the same. */
const plain = (text: string): string => text.replace(/[\u00a0\u202f]/g, ' ');

describe('an amount written for a reader', () => {
  it.each([
    [2400, 'EUR', 'en-GB', '€24.00'],
    [2400, 'EUR', 'de-DE', '24,00 €'],
    [-5, 'GBP', 'en-GB', '-£0.05'],
    [985, 'JPY', 'en-GB', 'JP¥985'],
    [4955, 'BHD', 'en-GB', 'BHD 4.955'],
    [123456789, 'EUR', 'en-GB', '€1,234,567.89'],
  ])('shows %i minor units of %s in %s as %s', (minor, currency, locale, text) => {
    expect(plain(formatMoney(money(minor, currency), locale))).toBe(text);
  });

  it('shows the digits of ISO where Intl would drop them', () => {
    expect(plain(formatMoney(money(123450, 'HUF'), 'en-GB'))).toBe('HUF 1,234.50');
    expect(plain(formatMoney(money(1234, 'IQD'), 'en-GB'))).toBe('IQD 1.234');
  });

  it('keeps every digit of the largest amounts', () => {
    expect(formatMoney(money(Number.MAX_SAFE_INTEGER, 'EUR'), 'en-GB')).toBe('€90,071,992,547,409.91');
  });

  it('names a language tag that is none', () => {
    expect(() => formatMoney(money(1, 'EUR'), 'not a tag')).toThrow('"not a tag"');
  });
});

describe('an amount written for machines', () => {
  it.each([
    [5, 'EUR', '0.05'],
    [-5, 'EUR', '-0.05'],
    [2400, 'EUR', '24.00'],
    [985, 'JPY', '985'],
    [7, 'KWD', '0.007'],
  ])('shows %i of %s as %s', (minor, currency, text) => {
    expect(decimalText(money(minor, currency))).toBe(text);
  });

  it('is read back to the same amount, in every currency', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), fc.constantFrom(...currencyCodes), (minor, currency) => {
        const amount = money(minor, currency);
        expect(parseMoney(decimalText(amount), currency)).toEqual(amount);
      }),
    );
  });
});

describe('reading an amount', () => {
  it.each([
    ['24.00', 'EUR', 2400],
    ['24', 'EUR', 2400],
    [' 24.5 ', 'EUR', 2450],
    ['-0.01', 'EUR', -1],
    ['007', 'JPY', 7],
    ['1.234', 'BHD', 1234],
    ['-0', 'EUR', 0],
  ])('reads %p of %s as %i minor units', (text, currency, minor) => {
    expect(parseMoney(text, currency)).toEqual({ minor, currency });
  });

  it.each(['', '24,00', '1,234.00', '1 000', '€24', '1e3', '.5', '5.', '--5', '0x10', 'NaN'])(
    'refuses %p and says how to write it',
    (text) => {
      expect(() => parseMoney(text, 'EUR')).toThrow(`"${text}" is not an amount`);
      expect(() => parseMoney(text, 'EUR')).toThrow('such as 24.00');
    },
  );

  it('refuses more decimals than the currency has', () => {
    expect(() => parseMoney('1.005', 'EUR')).toThrow('EUR has 2 decimals; "1.005" has 3.');
    expect(() => parseMoney('1.0', 'JPY')).toThrow('JPY has no decimals');
  });

  it('refuses amounts beyond 2^53 rather than round them', () => {
    expect(() => parseMoney('90071992547409.93', 'EUR')).toThrow(MoneyError);
  });
});
