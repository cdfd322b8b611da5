import { spokenLocale } from './format.js';

// Apart from the other formats: these are the workshop's alone, and the shop's first page need not carry them.

/** `Germany`, of `DE`. */
export const countryName = (code: string): string => {
  try {
    return new Intl.DisplayNames(spokenLocale(), { type: 'region' }).of(code) ?? code;
  } catch {
    return code;
  }
};

/** `Nov 2026`, of `2026-11`. */
export const month = (yearAndMonth: string): string =>
  new Intl.DateTimeFormat(spokenLocale(), { month: 'short', year: 'numeric', timeZone: 'UTC' }).format(
    new Date(`${yearAndMonth}-01T00:00:00Z`),
  );

/** `12 Nov 2026`, of a day without a time, which is the same day everywhere. */
export const day = (isoDay: string): string =>
  new Intl.DateTimeFormat(spokenLocale(), {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(new Date(`${isoDay}T00:00:00Z`));
