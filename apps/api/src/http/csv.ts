/** What programs of tables take for the beginning of a formula. */
const FORMULA = /^[=+\-@\t\r]/;
const NEEDS_QUOTES = /[",\r\n]/;

/**
 * One cell by RFC 4180. Text that a program of tables would run as a formula gets an apostrophe in front,
 * so that an address such as `=HYPERLINK(…)` stays text; numbers of our own are handed over as numbers.
 */
export const csvCell = (value: string | number | null): string => {
  if (typeof value === 'number') return String(value);
  const text = value ?? '';
  const safe = FORMULA.test(text) ? `'${text}` : text;
  return NEEDS_QUOTES.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
};

/** A record with the line end that RFC 4180 asks for. */
export const csvRecord = (cells: readonly (string | number | null)[]): string =>
  `${cells.map(csvCell).join(',')}\r\n`;
