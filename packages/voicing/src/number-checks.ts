import { VoicingError } from './voicing-error.js';

/** Refuses what is not a finite number above zero; returns it otherwise. */
export function positive(value: number, field: string): number {
  if (!(Number.isFinite(value) && value > 0)) {
    throw new VoicingError('bad-number', `${field} must be a number above zero, not ${value}.`, field);
  }
  return value;
}

/** Refuses what is not a finite number of zero or more; returns it otherwise. */
export function zeroOrMore(value: number, field: string): number {
  if (!(Number.isFinite(value) && value >= 0)) {
    throw new VoicingError('bad-number', `${field} must be zero or more, not ${value}.`, field);
  }
  return value;
}

/** Refuses what lies outside `low..high` (both allowed), with a hint at the mend; returns it otherwise. */
export function within(value: number, low: number, high: number, field: string, hint: string): number {
  if (!Number.isFinite(value)) {
    throw new VoicingError('bad-number', `${field} must be a number, not ${value}.`, field);
  }
  if (value < low || value > high) {
    throw new VoicingError('out-of-range', `${field} is ${value}, outside ${low} to ${high}: ${hint}`, field);
  }
  return value;
}

/** Refuses a mode number that is not 1, 2, 3 …; returns it otherwise. */
export function modeNumber(mode: number): number {
  if (!(Number.isInteger(mode) && mode >= 1)) {
    throw new VoicingError('bad-number', `mode must be a whole number from 1 up, not ${mode}.`, 'mode');
  }
  return mode;
}
