import { FREE_BAR_ROOTS, TINE_ROOTS } from './bars.js';
import type { VoiceKind } from './voice.js';

/** One partial of a sound: its frequency over the fundamental's, and its strength over the strongest's. */
export type VoicePartial = { ratio: number; amplitude: number };

const squaredOver = (roots: readonly [number, ...number[]]): number[] =>
  roots.map((root) => (root / roots[0]) ** 2);

const RATIOS: Readonly<Record<VoiceKind, readonly number[]>> = {
  'stopped-pipe': [1, 3, 5, 7],
  'open-pipe': [1, 2, 3, 4, 5, 6],
  'free-bar': squaredOver(FREE_BAR_ROOTS),
  tine: squaredOver(TINE_ROOTS),
  string: [1, 2, 3, 4, 5, 6, 7, 8],
  vessel: [1],
};

/** Strengths for sounding a voice; tuned by ear, no source: real ones follow the mouth, the mallet, the finger. */
const AMPLITUDES: Readonly<Record<VoiceKind, readonly number[]>> = {
  'stopped-pipe': [1, 0.22, 0.08, 0.03],
  'open-pipe': [1, 0.5, 0.26, 0.14, 0.08, 0.04],
  'free-bar': [1, 0.3, 0.12, 0.05],
  tine: [1, 0.16, 0.06, 0.02],
  string: [1, 0.5, 0.33, 0.25, 0.2, 0.16, 0.14, 0.12],
  vessel: [1],
};

/**
 * The partials of a kind of voice, lowest first, for sounding it.
 * Ratios: stopped pipe 1:3:5:7, open pipe and string 1:2:3…, by the modes of an ideal column and string (OpenStax,
 * University Physics vol. 1, 16.6, 17.4); bars by their squared roots (see `FREE_BAR_ROOTS`, 1:2.757:5.404:8.933;
 * tine 1:6.267:17.55:34.39); a vessel has one resonance. Strengths are by ear, no source.
 */
export function partialsOf(kind: VoiceKind): VoicePartial[] {
  const amplitudes = AMPLITUDES[kind];
  return RATIOS[kind].map((ratio, index) => ({ ratio, amplitude: amplitudes[index] ?? 0 }));
}

/** Whether a kind of voice sounds as long as it is blown; the others are struck or plucked and die away. */
export function isSustained(kind: VoiceKind): boolean {
  return kind === 'stopped-pipe' || kind === 'open-pipe' || kind === 'vessel';
}
