import type { RankVoice } from '@windchest/contracts';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';

/** Walls and widths are not always written down; these are what printed ones usually have. */
const usualWallMm = 1.2;
const usualWidthOfThickness = 4;
/** A string is drawn as a line. */
const stringWidthMm = 1;

/** `C♯` of `C#5`: the letter under a drawn voice. */
export const noteLetter = (note: string): string =>
  note
    .replace(/-?\d+$/, '')
    .replace('#', '♯')
    .replace('b', '♭');

/** `C♯5` of `C#5`. */
export const noteName = (note: string): string => note.replace('#', '♯').replace('b', '♭');

/** The diameter of the ball that holds so much air: a vessel’s note hangs on its volume, not on its shape. */
export const ballDiameterMm = (volumeCm3: number): number => Math.cbrt((6 * volumeCm3 * 1000) / Math.PI);

function sizeOf({ voice }: RankVoice): { lengthMm: number; widthMm: number } {
  switch (voice.kind) {
    case 'stopped-pipe':
    case 'open-pipe':
      return { lengthMm: voice.lengthMm, widthMm: voice.boreMm + 2 * (voice.wallMm ?? usualWallMm) };
    case 'free-bar':
    case 'tine':
      return {
        lengthMm: voice.lengthMm,
        widthMm: voice.widthMm ?? voice.thicknessMm * usualWidthOfThickness,
      };
    case 'string':
      return { lengthMm: voice.lengthMm, widthMm: stringWidthMm };
    case 'vessel': {
      const outerMm = ballDiameterMm(voice.volumeCm3) + 2 * voice.wallMm;
      return { lengthMm: outerMm, widthMm: outerMm };
    }
  }
}

/** Whether a rank is drawn in its parts’ own sizes; a vessel is drawn as the ball of its air. */
export const hasTrueSizes = (rank: readonly RankVoice[]): boolean =>
  rank.every(({ voice }) => voice.kind !== 'vessel');

/** The voices of a kit as its rank is drawn, to scale. */
export const drawnVoices = (rank: readonly RankVoice[]): DrawnVoice[] =>
  rank.map((one) => ({
    key: one.code,
    label: noteLetter(one.voice.note),
    kind: one.voice.kind,
    ...sizeOf(one),
  }));
