import { endCorrectionMm, FLANGED_END_RADII } from './end-correction.js';
import { positive, zeroOrMore } from './number-checks.js';
import type { Sounding } from './sounding.js';
import type { Air } from './speed-of-sound.js';
import { centsOf, PRINT_TOLERANCE_MM, type UncertaintyTerm } from './uncertainty.js';
import type { VesselVoice } from './voice.js';
import { VoicingError } from './voicing-error.js';

/**
 * What a bare hole adds to the thickness of its wall, both faces together, in radii.
 * Source: L. E. Kinsler & A. R. Frey et al., Fundamentals of Acoustics, 4th ed., 10.5 (2 × 0.85).
 */
export const BARE_HOLE_RADII = 1.7;

/** How far Helmholtz's formula was off on a measured bottle: 63 Hz heard, 56.4 Hz computed (J. D. Cook, 2021). */
const FORMULA_ERROR = 63 / 56.4 - 1;
const VOLUME_ERROR = 0.02;

/** A volume with one opening, all in sounding sizes (end corrections included in `neckMm`). */
export type HelmholtzResonator = { volumeCm3: number; openingMm2: number; neckMm: number; speedMS: number };

/**
 * Helmholtz's resonance: `c / 2π · √(S / (V L))`.
 * Assumes a vessel small against the wave (an eighth at most), stiff walls, a small opening.
 * Source: H. Helmholtz; L. E. Kinsler & A. R. Frey et al., Fundamentals of Acoustics, 4th ed., 10.5.
 * @returns Hz
 * @throws VoicingError `bad-number`
 */
export function helmholtzHz({ volumeCm3, openingMm2, neckMm, speedMS }: HelmholtzResonator): number {
  return conductedHz(positive(openingMm2, 'openingMm2') / positive(neckMm, 'neckMm'), volumeCm3, speedMS);
}

/**
 * Sounding length of a neck that stands out of a vessel, in mm: a plain open end outside, a flanged one inside.
 * Source: see `endCorrectionMm`.
 * @throws VoicingError `bad-number`
 */
export function neckSoundingMm({ lengthMm, diameterMm }: { lengthMm: number; diameterMm: number }): number {
  const outsideMm = endCorrectionMm({ boreMm: diameterMm, wallMm: 0 });
  return zeroOrMore(lengthMm, 'lengthMm') + outsideMm + (FLANGED_END_RADII * diameterMm) / 2;
}

/**
 * How well a bare hole lets air through, as a length in mm: its area over wall + 1.7 radii. Holes side by side add
 * up (Rayleigh's conductivity, The Theory of Sound II, 16; holes far apart against their size).
 */
export function holeConductanceMm(diameterMm: number, wallMm: number): number {
  const radiusMm = positive(diameterMm, 'diameterMm') / 2;
  return (Math.PI * radiusMm ** 2) / (zeroOrMore(wallMm, 'wallMm') + BARE_HOLE_RADII * radiusMm);
}

/** The diameter of the bare hole with a conductance, in mm: the inverse of `holeConductanceMm`. */
export function holeDiameterMm(conductanceMm: number, wallMm: number): number {
  const reach = BARE_HOLE_RADII * positive(conductanceMm, 'conductanceMm');
  const root = Math.sqrt(reach ** 2 + 4 * Math.PI * conductanceMm * zeroOrMore(wallMm, 'wallMm'));
  return (reach + root) / Math.PI;
}

/** The conductance of all the holes of a vessel together, in mm. */
export function vesselConductanceMm({ holes, wallMm }: Pick<VesselVoice, 'holes' | 'wallMm'>): number {
  if (holes.length === 0) {
    throw new VoicingError(
      'bad-number',
      'A vessel needs a hole to sound: give its mouth as the first of holes.',
      'holes',
    );
  }
  return holes.reduce((sum, { diameterMm }) => sum + holeConductanceMm(diameterMm, wallMm), 0);
}

/**
 * The pitch of a vessel by Helmholtz's formula, its open holes together. It moves with the speed of sound, so with
 * the temperature. The weakest of the predictions: the breath covers a part of the mouth, and no formula knows it.
 * @throws VoicingError `bad-number`; `out-of-range` where a hole is as wide as the vessel, or the vessel is as
 * large as the wave
 */
export function soundVessel(voice: VesselVoice, air: Air): Sounding {
  const hz = conductedHz(vesselConductanceMm(voice), voice.volumeCm3, air.speedMS);
  const sideMm = 10 * Math.cbrt(voice.volumeCm3);
  const widestMm = Math.max(...voice.holes.map(({ diameterMm }) => diameterMm));
  const waves = (sideMm * hz) / 1000 / air.speedMS;
  if (widestMm >= sideMm || waves > 0.5) {
    throw new VoicingError(
      'out-of-range',
      widestMm >= sideMm
        ? `A hole of ${widestMm} mm is as wide as a vessel of ${voice.volumeCm3} cm³: make it smaller.`
        : `A vessel of ${voice.volumeCm3} cm³ is as large as its wave: the formula does not hold.`,
      widestMm >= sideMm ? 'holes' : 'volumeCm3',
    );
  }
  return {
    hz,
    terms: [...air.terms, ...vesselTerms(widestMm)],
    warnings: [...air.warnings, ...vesselWarnings(voice, { widestMm, sideMm, waves })],
  };
}

function conductedHz(conductanceMm: number, volumeCm3: number, speedMS: number): number {
  const volumeMm3 = positive(volumeCm3, 'volumeCm3') * 1000;
  return ((positive(speedMS, 'speedMS') * 1000) / (2 * Math.PI)) * Math.sqrt(conductanceMm / volumeMm3);
}

function vesselTerms(widestMm: number): UncertaintyTerm[] {
  return [
    { from: "Helmholtz's formula against a measured bottle", cents: centsOf(FORMULA_ERROR) },
    { from: 'the volume, by 2 %', cents: centsOf(VOLUME_ERROR, 0.5) },
    { from: 'the holes, by 0.2 mm', cents: centsOf(PRINT_TOLERANCE_MM / widestMm) },
  ];
}

type VesselShape = { widestMm: number; sideMm: number; waves: number };

function vesselWarnings(voice: VesselVoice, { widestMm, sideMm, waves }: VesselShape): string[] {
  const warnings: string[] = [];
  if (waves > 1 / 8) {
    warnings.push('The vessel is large against its wave: the figure is less sure than stated.');
  }
  if (widestMm > 0.6 * sideMm) {
    warnings.push(
      `A hole of ${widestMm} mm is wide for ${voice.volumeCm3} cm³: the figure is less sure than stated.`,
    );
  }
  if (voice.wallMm > 2 * widestMm) {
    const neckMm = neckSoundingMm({ lengthMm: voice.wallMm, diameterMm: widestMm });
    const asHoleMm = voice.wallMm + (BARE_HOLE_RADII * widestMm) / 2;
    warnings.push(
      'The wall is more than twice as thick as the holes are wide: if it is a neck that stands out, it sounds ' +
        `${centsOf(asHoleMm / neckMm - 1, 0.5).toFixed(0)} cents higher.`,
    );
  }
  return warnings;
}
