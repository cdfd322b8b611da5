import { modeNumber, positive } from './number-checks.js';

/** An ideal column of air (or a rod sounding along its length): its sounding length and wave speed. */
export type Column = { lengthMm: number; speedMS: number; mode?: number };

/** The wave speed, the frequency to reach, and by which of its resonances. */
export type ColumnTarget = { hz: number; speedMS: number; mode?: number };

/**
 * Resonance of a column closed at one end: `(2n − 1) c / 4L`, the odd harmonics only.
 * `lengthMm` is the sounding length, end correction included. Assumes plane waves without losses.
 * Source: OpenStax, University Physics vol. 1, 17.4 (f = n v / 4L, n odd).
 * @returns Hz of the n-th resonance (`mode`, 1 where not given)
 * @throws VoicingError `bad-number`
 */
export function stoppedColumnHz({ lengthMm, speedMS, mode = 1 }: Column): number {
  const quarterWaves = 2 * modeNumber(mode) - 1;
  return (quarterWaves * positive(speedMS, 'speedMS') * 1000) / (4 * positive(lengthMm, 'lengthMm'));
}

/**
 * Resonance of a column open at both ends, or of a free rod sounding along its length: `n c / 2L`.
 * Same assumptions and source as `stoppedColumnHz` (f = n v / 2L).
 * @returns Hz
 * @throws VoicingError `bad-number`
 */
export function openColumnHz({ lengthMm, speedMS, mode = 1 }: Column): number {
  return (modeNumber(mode) * positive(speedMS, 'speedMS') * 1000) / (2 * positive(lengthMm, 'lengthMm'));
}

/** The inverse of `stoppedColumnHz`: the sounding length in mm, end correction included. */
export function stoppedColumnMm({ hz, speedMS, mode = 1 }: ColumnTarget): number {
  return ((2 * modeNumber(mode) - 1) * positive(speedMS, 'speedMS') * 1000) / (4 * positive(hz, 'hz'));
}

/** The inverse of `openColumnHz`: the sounding length in mm, both end corrections included. */
export function openColumnMm({ hz, speedMS, mode = 1 }: ColumnTarget): number {
  return (modeNumber(mode) * positive(speedMS, 'speedMS') * 1000) / (2 * positive(hz, 'hz'));
}

/**
 * How much the walls of a narrow bore slow the wave, as a part of the speed of sound: the boundary layer's
 * `(1/a) √(ν / 2ω) (1 + (γ − 1) / √Pr)`, with ν = 15.1 mm²/s, γ = 1.4, Pr = 0.71 of air at 20 °C.
 * Source: G. Kirchhoff 1868, the wide-tube limit (from memory; A. H. Benade 1968 and textbooks round it to
 * 1.65e-3 / (a √f) in SI units). Holds while it is small (under 0.1).
 */
export function wallSlowing(boreMm: number, hz: number): number {
  const radiusM = positive(boreMm, 'boreMm') / 2000;
  const layerM = Math.sqrt(15.1e-6 / (4 * Math.PI * positive(hz, 'hz')));
  return (layerM / radiusM) * (1 + 0.4 / Math.sqrt(0.71));
}
