import { buildVolume } from '../../lib/format.js';
import type { Fits } from './kit-list-query.js';

/** `220 × 220 × 250`, of the address’s `220x220x250`. */
export function fitsWords(fits: Fits): string {
  const [xMm = 0, yMm = 0, zMm = 0] = fits.split('x').map(Number);
  return buildVolume({ xMm, yMm, zMm });
}
