import type { RankVoice } from '@windchest/contracts';
import { noteLabel, predict, VoicingError, type TargetedVoice } from '@windchest/voicing';
import type { BookVoice, BuildBook } from './build-book.js';

/** Walls and widths are not always written down; these are what printed ones usually have. */
const usualWallMm = 1.2;
const usualWidthOfThickness = 4;
const stringWidthMm = 1;

/** The rank as a build book lists and draws it, with what each voice should sound like in the room. */
export const bookVoices = (rank: readonly RankVoice[], room: BuildBook['room']): BookVoice[] =>
  rank.map(({ code, voice }) => ({
    code,
    note: noteLabel(voice.note),
    kind: voice.kind,
    ...shapeOf(voice),
    predicted: predictedOf(voice, room),
  }));

const mm = (value: number): string => `${Number(value.toFixed(2))} mm`;

const shapeOf = (voice: RankVoice['voice']): Pick<BookVoice, 'dimensions' | 'lengthMm' | 'widthMm'> => {
  switch (voice.kind) {
    case 'stopped-pipe':
    case 'open-pipe':
      return {
        lengthMm: voice.lengthMm,
        widthMm: voice.boreMm + 2 * (voice.wallMm ?? usualWallMm),
        dimensions: `bore ${mm(voice.boreMm)}${voice.wallMm === undefined ? '' : `, wall ${mm(voice.wallMm)}`}`,
      };
    case 'free-bar':
    case 'tine':
      return {
        lengthMm: voice.lengthMm,
        widthMm: voice.widthMm ?? voice.thicknessMm * usualWidthOfThickness,
        dimensions: `thickness ${mm(voice.thicknessMm)}`,
      };
    case 'string':
      return {
        lengthMm: voice.lengthMm,
        widthMm: stringWidthMm,
        dimensions: `tension ${Number(voice.tensionN.toFixed(2))} N, ${Number(voice.linearDensityGPerM.toFixed(3))} g/m`,
      };
    case 'vessel': {
      // A vessel's note hangs on its volume, not its shape: it is drawn as the ball that holds as much air.
      const ballMm = Math.cbrt((6 * voice.volumeCm3 * 1000) / Math.PI);
      const holes = voice.holes.map(({ diameterMm }) => Number(diameterMm.toFixed(2))).join(', ');
      return {
        lengthMm: null,
        widthMm: ballMm + 2 * voice.wallMm,
        dimensions: `volume ${Number(voice.volumeCm3.toFixed(2))} cm³, open ${holes} mm`,
      };
    }
  }
};

const predictedOf = (voice: RankVoice['voice'], room: BuildBook['room']): BookVoice['predicted'] => {
  try {
    const { hz, cents, uncertaintyCents } = predict(voice as TargetedVoice, room);
    return { hz, cents, uncertaintyCents };
  } catch (fault) {
    if (fault instanceof VoicingError) return null;
    throw fault;
  }
};
