import { positive, within } from './number-checks.js';
import { PRINTED_MODULUS_SPREAD, isPrintedPlastic } from './materials.js';
import type { Sounding } from './sounding.js';
import { centsOf, PRINT_TOLERANCE_MM, type UncertaintyTerm } from './uncertainty.js';
import type { BarVoice } from './voice.js';
import { VoicingError } from './voicing-error.js';

/**
 * βL of a bar free at both ends: the roots of `cos x · cosh x = 1`.
 * Source: Rayleigh; Fletcher & Rossing, The Physics of Musical Instruments, 2.14.
 */
export const FREE_BAR_ROOTS = [
  4.730040744862704, 7.853204624095838, 10.995607838001671, 14.137165491257464,
] as const;

/** βL of a bar clamped at one end: the roots of `cos x · cosh x = −1`. Same source. */
export const TINE_ROOTS = [
  1.8751040687119611, 4.694091132974174, 7.854757438237612, 10.995540734875467,
] as const;

/** Where the first mode of a free bar stands still, as a part of its length from each end (22.4 %). */
export const FREE_BAR_NODE = 0.22415751;

/** A bar of one rectangular section, and which root of its ends it sounds by. */
export type Bar = {
  lengthMm: number;
  thicknessMm: number;
  youngsModulusGPa: number;
  densityKgM3: number;
  betaL: number;
};

/**
 * Bending frequency of a bar: `(βL)² / (2π √12) · (h / L²) · √(E / ρ)`.
 * Euler–Bernoulli: assumes one thickness, one material, thickness small against length (shear and rotary
 * inertia lower it by about 0.9 % at L/h = 20), free ends quite free, a clamp quite stiff. The width drops out.
 * Source: Fletcher & Rossing, The Physics of Musical Instruments, 2.14; coefficients 1.028 (free), 0.1615 (tine).
 * @returns Hz
 * @throws VoicingError `bad-number`
 */
export function barHz({ lengthMm, thicknessMm, youngsModulusGPa, densityKgM3, betaL }: Bar): number {
  const waveMS = Math.sqrt(
    (positive(youngsModulusGPa, 'youngsModulusGPa') * 1e9) / positive(densityKgM3, 'densityKgM3'),
  );
  const shapePerM = (positive(thicknessMm, 'thicknessMm') / positive(lengthMm, 'lengthMm') ** 2) * 1000;
  return (betaL ** 2 / (2 * Math.PI * Math.sqrt(12))) * shapePerM * waveMS;
}

/**
 * Young's modulus of a bar from the pitch it sounds: the inverse of `barHz`. The way to know a printed
 * material: print one bar, hear it, and use its figure for the rest.
 * @returns GPa
 * @throws VoicingError `bad-number`
 */
export function youngsModulusFromBarGPa(bar: Omit<Bar, 'youngsModulusGPa'> & { hz: number }): number {
  const atOneGPa = barHz({ ...bar, youngsModulusGPa: 1 });
  return (positive(bar.hz, 'hz') / atOneGPa) ** 2;
}

/** Where to hold or bore a free bar: the distance of its two still points from each end, in mm. */
export function barSupportMm(lengthMm: number): number {
  return FREE_BAR_NODE * positive(lengthMm, 'lengthMm');
}

/**
 * The fundamental of a free bar or a tine by `barHz`. It does not move with the room's temperature: the air
 * takes no part (that a warm plastic grows softer is left out).
 * @throws VoicingError `bad-number`; `out-of-range` for a bar too thick for its length or impossible material
 */
export function soundBar(voice: BarVoice): Sounding {
  checkMaterial(voice);
  const hz = barHz({ ...voice, betaL: firstRoot(voice.kind) });
  const slenderness = voice.lengthMm / voice.thicknessMm;
  refuseThickBar(voice.kind, slenderness);
  const warnings: string[] = [];
  if (slenderness < (voice.kind === 'free-bar' ? 20 : 10)) {
    warnings.push(
      `The bar is only ${slenderness.toFixed(1)} times as long as thick: it will sound about ` +
        `${centsOf(thicknessLowering(voice)).toFixed(0)} cents lower than computed.`,
    );
  }
  return { hz, terms: barTerms(voice), warnings };
}

/**
 * The length of a bar for a frequency, in mm: `√(C h / f · √(E / ρ))`, the inverse of `soundBar`.
 * @throws VoicingError as `soundBar`
 */
export function barLengthMm(voice: Omit<BarVoice, 'lengthMm'>, hz: number): number {
  checkMaterial(voice);
  const atOneMm = barHz({ ...voice, lengthMm: 1, betaL: firstRoot(voice.kind) });
  const lengthMm = Math.sqrt(atOneMm / positive(hz, 'hz'));
  refuseThickBar(voice.kind, lengthMm / voice.thicknessMm);
  return lengthMm;
}

function firstRoot(kind: BarVoice['kind']): number {
  return kind === 'free-bar' ? FREE_BAR_ROOTS[0] : TINE_ROOTS[0];
}

function checkMaterial({ youngsModulusGPa, densityKgM3, thicknessMm }: Omit<BarVoice, 'lengthMm'>): void {
  positive(thicknessMm, 'thicknessMm');
  within(youngsModulusGPa, 0.01, 1200, 'youngsModulusGPa', 'give it in GPa (2300 MPa is 2.3).');
  within(densityKgM3, 50, 23_000, 'densityKgM3', 'give it in kg/m³ (1.24 g/cm³ is 1240).');
}

function refuseThickBar(kind: BarVoice['kind'], slenderness: number): void {
  const least = kind === 'free-bar' ? 8 : 4;
  if (slenderness >= least) return;
  throw new VoicingError(
    'out-of-range',
    `A ${kind === 'tine' ? 'tine' : 'bar'} ${slenderness.toFixed(1)} times as long as thick is no slender bar: ` +
      `the formula needs ${least} times at least. Make it thinner or longer.`,
    'thicknessMm',
  );
}

/**
 * Shear and rotary inertia lower the first mode by about `3.6 (h/L)²` for a free bar (0.9 % at L/h = 20) and
 * `0.8 (h/L)²` for a tine. Source: Timoshenko's beam (shear factor 5/6, Poisson's ratio 0.3), solved by finite
 * elements at L/h = 8, 10, 20, 40. Used for warnings and uncertainty alone.
 */
function thicknessLowering({ kind, lengthMm, thicknessMm }: BarVoice): number {
  const factor = kind === 'free-bar' ? 3.6 : 0.8;
  return factor * (thicknessMm / lengthMm) ** 2;
}

function barTerms(voice: BarVoice): UncertaintyTerm[] {
  const isPrinted = isPrintedPlastic(voice.youngsModulusGPa);
  // Drawn or planed stock keeps its thickness about four times as well as a print; common practice, no source.
  const sizeErrorMm = isPrinted ? PRINT_TOLERANCE_MM : 0.05;
  const terms = [
    { from: 'the stiffness of the material', cents: centsOf(modulusError(voice.youngsModulusGPa), 0.5) },
    { from: 'the density of the material, by 2 %', cents: centsOf(0.02, 0.5) },
    { from: `the thickness, by ${sizeErrorMm} mm`, cents: centsOf(sizeErrorMm / voice.thicknessMm) },
    { from: 'the length, by 0.2 mm', cents: centsOf(PRINT_TOLERANCE_MM / voice.lengthMm, 2) },
    { from: 'thickness against length', cents: centsOf(thicknessLowering(voice)) },
  ];
  if (voice.kind === 'tine') {
    // A clamp gives: the tine sounds up to half its thickness longer; common practice, no source.
    terms.push({ from: 'the clamp gives way', cents: centsOf(voice.thicknessMm / 2 / voice.lengthMm, 2) });
  }
  return terms;
}

/** How far a modulus taken from a table may be off: printed plastic by its range, wood 15 %, metal 3 %. */
function modulusError(youngsModulusGPa: number): number {
  if (isPrintedPlastic(youngsModulusGPa)) return PRINTED_MODULUS_SPREAD - 1;
  return youngsModulusGPa < 40 ? 0.15 : 0.03;
}
