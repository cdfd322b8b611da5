/** Bad input to a calculation; the message names the value at fault and what is expected. */
export class PlatesError extends Error {
  override readonly name = 'PlatesError';
}

/** @throws PlatesError unless the value is a finite number above 0. */
export function requirePositive(what: string, value: number): void {
  if (!(value > 0 && Number.isFinite(value))) {
    throw new PlatesError(`${what} is ${value}; give a number above 0.`);
  }
}

/** @throws PlatesError unless the value is a finite number of 0 or more. */
export function requireNotNegative(what: string, value: number): void {
  if (!(value >= 0 && Number.isFinite(value))) {
    throw new PlatesError(`${what} is ${value}; give 0 or a number above it.`);
  }
}

/** @throws PlatesError unless the value is a whole number of at least `least`. */
export function requireWhole(what: string, value: number, least: number): void {
  if (!Number.isInteger(value) || value < least) {
    throw new PlatesError(`${what} is ${value}; give a whole number of at least ${least}.`);
  }
}
