import { countryCodes } from './country-codes.js';

export interface CountryOption {
  value: string;
  label: string;
}

/** The region of a language tag: `AT` of `de-AT`. */
const regionOf = (tag: string): string | undefined => {
  try {
    return new Intl.Locale(tag).region;
  } catch {
    return undefined;
  }
};

/** All countries by name, before them the likely ones: where the browser seems to be, where the workshop is. */
export function countryOptions(
  locale: string,
  likely: { languages: readonly string[]; workshopCountry: string | undefined },
): CountryOption[] {
  const names = new Intl.DisplayNames(locale, { type: 'region' });
  const byName = countryCodes
    .map((value) => ({ value, label: names.of(value) ?? value }))
    .sort((a, b) => a.label.localeCompare(b.label, locale));
  const first = new Set([...likely.languages.map(regionOf), likely.workshopCountry]);
  const known = [...first].flatMap((code) => byName.find(({ value }) => value === code) ?? []);
  return [...known, ...byName.filter(({ value }) => !first.has(value))];
}
