/** What programs of tables take for the beginning of a formula. */
const FORMULA = /^[=+\-@\t\r]/;
const NEEDS_QUOTES = /[",\r\n]/;

/** A number of our own, written as it stands: `-12.00` is no formula. */
export interface OwnNumber {
  readonly digits: `${number}`;
}
export type CsvValue = string | number | OwnNumber | null;

export const csvNumber = (digits: `${number}`): OwnNumber => ({ digits });

/**
 * One cell by RFC 4180. Text that a program of tables would run as a formula gets an apostrophe in front,
 * so that an address such as `=HYPERLINK(…)` stays text; numbers of our own are handed over as numbers.
 */
export const csvCell = (value: CsvValue): string => {
  if (typeof value === 'number') return String(value);
  if (typeof value === 'object' && value !== null) return value.digits;
  const text = value ?? '';
  const safe = FORMULA.test(text) ? `'${text}` : text;
  return NEEDS_QUOTES.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
};

/** A record with the line end that RFC 4180 asks for. */
export const csvRecord = (cells: readonly CsvValue[]): string => `${cells.map(csvCell).join(',')}\r\n`;
