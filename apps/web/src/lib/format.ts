import { formatMoney, type Money } from '@windchest/money';

/** The workshop's language; it is one for the whole page, so a variable serves better than an argument everywhere. */
let locale = 'en-GB';

export const spokenLocale = (): string => locale;

export function speakLocale(tag: string): void {
  if (tag === locale) return;
  locale = tag;
  formats.clear();
}

const formats = new Map<string, Intl.NumberFormat>();

function numberFormat(options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = JSON.stringify(options);
  const known = formats.get(key) ?? new Intl.NumberFormat(locale, options);
  formats.set(key, known);
  return known;
}

/** The true minus sign (U+2212): as wide as a plus, and not a hyphen. */
const withTrueMinus = (text: string) => text.replace('-', '−');

/** `1,234.5`, with no more decimals than asked for. */
export const number = (value: number, decimals = 0): string =>
  withTrueMinus(numberFormat({ maximumFractionDigits: decimals }).format(value));

/** `+1.50`, `−0.12`, `0.00`: always that many decimals, always a sign unless zero. */
export const signed = (value: number, decimals = 0): string =>
  withTrueMinus(
    numberFormat({
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
      signDisplay: 'exceptZero',
    }).format(value),
  );

/** `€16.00`. Nothing is written as a number too; say "Free" where that is meant. */
export const price = (amount: Money): string => withTrueMinus(formatMoney(amount, locale));

/** `158.5 mm`. */
export const millimetres = (valueMm: number, decimals = 1): string => `${number(valueMm, decimals)} mm`;

/** `+9 cents`, `−4 cents`: hundredths of a semitone. */
export const cents = (value: number): string =>
  `${signed(value)} ${Math.abs(Math.round(value)) === 1 ? 'cent' : 'cents'}`;

/** `0.4 g`, `640 g`, `1.2 kg`. */
export const grams = (valueG: number): string =>
  valueG < 1000 ? `${number(valueG, valueG < 9.95 ? 1 : 0)} g` : `${number(valueG / 1000, 2)} kg`;

/** `1.1 MB`, in powers of ten as file managers and browsers show downloads. */
export function bytes(count: number): string {
  const units = ['B', 'kB', 'MB', 'GB', 'TB'];
  let value = count;
  let step = 0;
  while (value >= 999.5 && step < units.length - 1) {
    value /= 1000;
    step += 1;
  }
  return `${number(value, step > 0 && value < 9.95 ? 1 : 0)} ${units[step]}`;
}

/** `45 min`, `31–38 h`: a range, since nobody knows a print's length to the minute. */
export function hoursRange(lowHours: number, highHours: number): string {
  const isShort = highHours < 1;
  const decimals = highHours < 10 ? 1 : 0;
  const [low, high] = isShort
    ? [number(Math.max(5, Math.round(lowHours * 12) * 5)), number(Math.ceil(highHours * 12) * 5)]
    : [number(lowHours, decimals), number(highHours, decimals)];
  return `${low === high ? low : `${low}–${high}`} ${isShort ? 'min' : 'h'}`;
}

/** `220 × 220 × 250`, in mm. */
export const buildVolume = (bed: { xMm: number; yMm: number; zMm: number }): string =>
  [bed.xMm, bed.yMm, bed.zMm].map((side) => number(side)).join(' × ');

/** `1 plate`, `6 plates`. */
export const counted = (count: number, one: string, many: string): string =>
  `${number(count)} ${count === 1 ? one : many}`;

/** `12 Nov 2026`, of an ISO 8601 moment. */
export const date = (moment: string): string =>
  new Intl.DateTimeFormat(locale, { day: 'numeric', month: 'short', year: 'numeric' }).format(
    new Date(moment),
  );

/** `12 Nov 2026, 14:40`, in the reader's own time zone. */
export const dateTime = (moment: string): string =>
  new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
  }).format(new Date(moment));

/** `Nov 2026`, of a month such as `2026-11`. */
export const monthName = (month: string): string =>
  new Intl.DateTimeFormat(locale, { month: 'short', year: 'numeric', timeZone: 'UTC' }).format(
    new Date(`${month}-15T00:00:00Z`),
  );
