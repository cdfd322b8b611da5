import type { Part, VoiceWithNote } from '@windchest/contracts';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';

/** Where a voice does not say how thick its wall is, a pipe is drawn with one of this, mm. */
const usualWallMm = 1.6;

/** The diameter of a ball that holds so much air. */
const ballDiameterMm = (volumeCm3: number): number => Math.cbrt((6 * volumeCm3 * 1000) / Math.PI);

const drawnSize = (voice: VoiceWithNote): { lengthMm: number; widthMm: number } => {
  switch (voice.kind) {
    case 'stopped-pipe':
    case 'open-pipe':
      return { lengthMm: voice.lengthMm, widthMm: voice.boreMm + 2 * (voice.wallMm ?? usualWallMm) };
    case 'free-bar':
    case 'tine':
      return { lengthMm: voice.lengthMm, widthMm: voice.widthMm ?? voice.lengthMm / 6 };
    case 'string':
      return { lengthMm: voice.lengthMm, widthMm: 1 };
    case 'vessel': {
      const outerMm = ballDiameterMm(voice.volumeCm3) + 2 * voice.wallMm;
      return { lengthMm: outerMm, widthMm: outerMm };
    }
  }
};

/** The sounding parts of a kit as they are drawn, in the order of their codes. */
export const drawnVoices = (parts: readonly Part[]): DrawnVoice[] =>
  parts.flatMap(({ code, voice }) =>
    voice ? [{ key: code, label: voice.note, kind: voice.kind, ...drawnSize(voice) }] : [],
  );

/** Stands for a kit that has no voices yet: eight stopped pipes of an octave, from 160 mm. */
export const sampleVoices: readonly DrawnVoice[] = [0, 2, 4, 5, 7, 9, 11, 12].map((semitone) => ({
  key: `sample-${semitone}`,
  label: '',
  kind: 'stopped-pipe',
  lengthMm: 160 / 2 ** (semitone / 12),
  widthMm: 14,
}));
