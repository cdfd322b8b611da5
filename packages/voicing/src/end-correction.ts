import { positive, zeroOrMore } from './number-checks.js';

/**
 * End correction of a pipe whose end lies in an endless flat wall, in bore radii: 0.8216.
 * Source: Y. Nomura, I. Yamamura, S. Inawashiro, J. Phys. Soc. Jpn 15, 510 (1960) (from memory); L. V. King 1936.
 * Rayleigh's rigid piston, 8 / 3π = 0.8488, is an upper bound of it.
 */
export const FLANGED_END_RADII = 0.8216;

/** Rayleigh's bound: the end correction of a rigid piston in an endless wall, in radii (Theory of Sound II). */
export const PISTON_END_RADII = 8 / (3 * Math.PI);

export type PipeEnd = { boreMm: number; wallMm: number; flanged?: boolean };

/**
 * How much longer than it is a round pipe sounds at one open end, in mm.
 *
 * Unflanged, with wall: `a (0.821 − 0.135 a/b − 0.073 (a/b)⁴)` for inner radius a and outer radius b. Source:
 * the fit of G. P. Scavone's thesis (1997) between the known ends: a thin wall (a/b = 1) gives 0.613 a, the
 * value of H. Levine & J. Schwinger, Phys. Rev. 73, 383 (1948); an endless one (a/b → 0) 0.821 a. `flanged`
 * takes the endless wall itself, 0.8216 a.
 *
 * Assumes a square-cut end in free air with nothing near it, and a wavelength long against the bore
 * (2π a / λ under 0.5: beyond, the correction shrinks). A mouth that is blown has a larger one.
 * @throws VoicingError `bad-number` for a bore not above zero or a wall under zero
 */
export function endCorrectionMm({ boreMm, wallMm, flanged = false }: PipeEnd): number {
  const innerMm = positive(boreMm, 'boreMm') / 2;
  const outerMm = innerMm + zeroOrMore(wallMm, 'wallMm');
  if (flanged) return FLANGED_END_RADII * innerMm;
  const ratio = innerMm / outerMm;
  return innerMm * (0.821 - 0.135 * ratio - 0.073 * ratio ** 4);
}
