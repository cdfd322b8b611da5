import type { Part } from '@windchest/contracts';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';
import { drawnVoices } from '../bench/drawn-voices.js';

/** The sounding parts of a revision as its rank is drawn. */
export const voicesOfParts = (parts: readonly Part[]): DrawnVoice[] =>
  drawnVoices(parts.flatMap(({ code, voice }) => (voice ? [{ code, voice }] : [])));

/** Stands for a kit that has no voices yet: eight stopped pipes of an octave, from 160 mm. */
export const sampleVoices: readonly DrawnVoice[] = [0, 2, 4, 5, 7, 9, 11, 12].map((semitone) => ({
  key: `sample-${semitone}`,
  label: '',
  kind: 'stopped-pipe',
  lengthMm: 160 / 2 ** (semitone / 12),
  widthMm: 14,
}));
