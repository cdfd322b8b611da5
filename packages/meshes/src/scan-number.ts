const MAX_EXACT_MANTISSA = 2 ** 53;
/** Powers of ten that a double holds exactly. */
const EXACT_POWERS = Array.from({ length: 23 }, (_, exponent) => Number(`1e${exponent}`));

/**
 * Reads one decimal number from ASCII bytes, exactly rounded: up to 15 digits and a power of ten up to 22
 * one division or product of two exact doubles is correctly rounded (Clinger, "How to read floating point
 * numbers accurately", 1990); longer ones go through the language's own parser.
 *
 * @returns the number; NaN or an infinity where that is written; null where it is no number.
 */
export function scanNumber(bytes: Uint8Array, start: number, end: number): number | null {
  let at = start;
  const isNegative = bytes[at] === 45;
  if (isNegative || bytes[at] === 43) at += 1;
  let mantissa = 0;
  let digits = 0;
  let exponent = 0;
  for (; at < end && isDigit(bytes[at]!); at += 1, digits += 1) mantissa = mantissa * 10 + bytes[at]! - 48;
  if (at < end && bytes[at] === 46) {
    at += 1;
    for (; at < end && isDigit(bytes[at]!); at += 1, digits += 1, exponent -= 1) {
      mantissa = mantissa * 10 + bytes[at]! - 48;
    }
  }
  if (digits === 0) return nameOfNonFinite(bytes, start, end);
  if (at < end && (bytes[at]! | 32) === 101) {
    at += 1;
    const isSmall = bytes[at] === 45;
    if (isSmall || bytes[at] === 43) at += 1;
    const first = at;
    let written = 0;
    for (; at < end && isDigit(bytes[at]!); at += 1) written = Math.min(9999, written * 10 + bytes[at]! - 48);
    if (at === first) return null;
    exponent += isSmall ? -written : written;
  }
  // “1.#QNAN” starts like a number.
  if (at !== end) return nameOfNonFinite(bytes, start, end);
  const size = scale(mantissa, exponent, bytes, start, end, isNegative);
  return isNegative ? -size : size;
}

function scale(
  mantissa: number,
  exponent: number,
  bytes: Uint8Array,
  start: number,
  end: number,
  isNegative: boolean,
): number {
  const power = EXACT_POWERS[Math.abs(exponent)];
  if (mantissa < MAX_EXACT_MANTISSA && power !== undefined) {
    return exponent < 0 ? mantissa / power : mantissa * power;
  }
  const value = Number(String.fromCharCode(...bytes.subarray(start, Math.min(end, start + 400))));
  return isNegative ? -value : value;
}

function nameOfNonFinite(bytes: Uint8Array, start: number, end: number): number | null {
  if (end - start > 12) return null;
  const word = String.fromCharCode(...bytes.subarray(start, end)).toLowerCase();
  if (/^[+-]?(nan|1\.#(qnan|ind|snan))(\(.*\))?$/.test(word)) return NaN;
  if (/^[+-]?inf(inity)?$/.test(word)) return word.startsWith('-') ? -Infinity : Infinity;
  return null;
}

function isDigit(byte: number): boolean {
  return byte >= 48 && byte <= 57;
}
