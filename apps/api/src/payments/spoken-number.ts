import { randomInt } from 'node:crypto';

/** Crockford's base 32: no I, L, O and U, so that a number read out or written down stays the same. */
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/** What people call an order or a pledge by: `W-7K2M9Q`. Unique by its table, not by itself. */
export const newSpokenNumber = (letter: 'W' | 'P'): string =>
  `${letter}-${Array.from({ length: 6 }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')}`;
