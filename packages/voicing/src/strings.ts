import { modeNumber, positive, within } from './number-checks.js';
import type { Sounding } from './sounding.js';
import { centsOf } from './uncertainty.js';
import type { StringVoice } from './voice.js';

/** An ideal string and which of its modes. */
export type IdealString = { lengthMm: number; tensionN: number; linearDensityGPerM: number; mode?: number };

/** Above this wave speed (√(tension / mass per metre)) steel, gut and nylon break; from memory of their strengths. */
const FASTEST_STRING_MS = 600;
/** Density of a light string (nylon, rubber), kg/m³, for a guess at its diameter; from memory. */
const LIGHT_STRING_KG_M3 = 1100;

/**
 * Frequency of an ideal string: `n / 2L · √(T / μ)` (Mersenne's law).
 * Assumes an even, flexible string between two fixed ends and small swings: stiffness (short, thick strings)
 * and hard plucking raise it. Source: OpenStax, University Physics vol. 1, 16.6.
 * @returns Hz
 * @throws VoicingError `bad-number`
 */
export function stringHz({ lengthMm, tensionN, linearDensityGPerM, mode = 1 }: IdealString): number {
  const waveMS = waveSpeedMS(tensionN, linearDensityGPerM);
  return (modeNumber(mode) * waveMS * 1000) / (2 * positive(lengthMm, 'lengthMm'));
}

/** The tension a string needs to sound a frequency, in N: `μ (2 L f / n)²`, from `stringHz`. */
export function stringTensionN({
  lengthMm,
  linearDensityGPerM,
  hz,
  mode = 1,
}: Omit<IdealString, 'tensionN'> & { hz: number }): number {
  const waveMS = (2 * positive(lengthMm, 'lengthMm') * positive(hz, 'hz')) / 1000 / modeNumber(mode);
  return (positive(linearDensityGPerM, 'linearDensityGPerM') / 1000) * waveMS ** 2;
}

/**
 * The fundamental of a string by `stringHz`. It does not move with the room's temperature: the air takes no
 * part (that a warm string or frame slackens is left out: strings are tuned by hand).
 * @throws VoicingError `bad-number`, `out-of-range` for a mass per metre no string has
 */
export function soundString(voice: StringVoice): Sounding {
  checkMass(voice.linearDensityGPerM);
  const hz = stringHz(voice);
  const warnings: string[] = [];
  const speedMS = waveSpeedMS(voice.tensionN, voice.linearDensityGPerM);
  if (speedMS > FASTEST_STRING_MS) {
    warnings.push(
      `${voice.tensionN} N is more than steel, gut or nylon of ${voice.linearDensityGPerM} g/m can bear: ` +
        'the string would break. Wear eye protection and take a lower tension.',
    );
  }
  const thickestMm = 2000 * Math.sqrt(voice.linearDensityGPerM / 1000 / (Math.PI * LIGHT_STRING_KG_M3));
  if (voice.lengthMm / thickestMm < 100) {
    warnings.push(
      'The string is short for its mass: its stiffness may raise it above the figure, and its partials most.',
    );
  }
  return {
    hz,
    warnings,
    // What a spring balance, a kitchen scale and a rule allow; common practice, no source.
    terms: [
      { from: 'the tension, by 5 %', cents: centsOf(0.05, 0.5) },
      { from: 'the mass per metre, by 2 %', cents: centsOf(0.02, 0.5) },
      { from: 'the length, by 0.5 mm', cents: centsOf(0.5 / voice.lengthMm) },
    ],
  };
}

/** The sounding length of a string for a frequency, in mm, the inverse of `soundString`. */
export function stringLengthMm(voice: Omit<StringVoice, 'lengthMm'>, hz: number): number {
  checkMass(voice.linearDensityGPerM);
  return (waveSpeedMS(voice.tensionN, voice.linearDensityGPerM) * 1000) / (2 * positive(hz, 'hz'));
}

function waveSpeedMS(tensionN: number, linearDensityGPerM: number): number {
  return Math.sqrt(
    positive(tensionN, 'tensionN') / (positive(linearDensityGPerM, 'linearDensityGPerM') / 1000),
  );
}

function checkMass(linearDensityGPerM: number): void {
  positive(linearDensityGPerM, 'linearDensityGPerM');
  within(
    linearDensityGPerM,
    0.005,
    1000,
    'linearDensityGPerM',
    'give the mass of one metre in grams (0.006 kg/m is 6).',
  );
}
