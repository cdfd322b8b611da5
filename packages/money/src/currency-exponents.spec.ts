import { readFileSync } from 'node:fs';
import { currencyCodes, currencyExponent, isCurrencyCode, MoneyError } from './index.js';

const reference = JSON.parse(
  readFileSync(new URL('../fixtures/money-reference.json', import.meta.url), 'utf8'),
) as { minorUnits: { values: Record<string, number> } };

describe('the exponents of ISO 4217', () => {
  it.each(Object.entries(reference.minorUnits.values))('gives %s its %i digits', (code, exponent) => {
    expect(currencyExponent(code)).toBe(exponent);
  });

  it('does not follow Intl where Intl departs from ISO', () => {
    const digitsOfIntl = (currency: string): number | undefined =>
      new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits;
    for (const [code, exponent] of [
      ['HUF', 2],
      ['MGA', 2],
      ['IQD', 3],
    ] as const) {
      expect(digitsOfIntl(code)).toBe(0);
      expect(currencyExponent(code)).toBe(exponent);
    }
  });

  it('lists each code once, in three capital letters', () => {
    expect(new Set(currencyCodes).size).toBe(currencyCodes.length);
    expect(currencyCodes.filter((code) => !/^[A-Z]{3}$/.test(code))).toEqual([]);
    expect(currencyCodes.length).toBe(166);
  });

  it.each(['eur', 'EURO', '', 'XAU', 'constructor'])('refuses "%s" and names it', (code) => {
    expect(isCurrencyCode(code)).toBe(false);
    expect(() => currencyExponent(code)).toThrow(MoneyError);
    expect(() => currencyExponent(code)).toThrow(`"${code}"`);
  });
});
