import type { RankVoice } from '@windchest/contracts';
import {
  centsBetween,
  hzToNote,
  partialsOf,
  predict,
  type Room,
  targetInRoomHz,
  type TrimAdvice,
  trimAdvice,
  uncertaintyOf,
  type UncertaintyTerm,
  VoicingError,
} from '@windchest/voicing';
import type { Reading } from './steady-pitch.js';

/** Against what a voice is judged: the room it sounds in now, and the one it is tuned for. */
export interface Judging {
  rank: readonly RankVoice[];
  voice: RankVoice;
  room: Room;
  /** Undefined where it is tuned for the room as it is. */
  tunedAtC: number | undefined;
}

export interface NearVoice {
  code: string;
  note: string;
  cents: number;
}

/** What to make of a pitch. */
export type Verdict =
  | { says: 'advice'; cents: number; advice: TrimAdvice; nearer: NearVoice | undefined }
  /** Heard well, and no cut or print mends it. */
  | { says: 'beyond'; cents: number; sentence: string }
  /** One of its overtones sounded: `partial` counts from 2. */
  | { says: 'partial'; partial: number; ratio: number; nearer: NearVoice | undefined }
  | { says: 'below' }
  | { says: 'another'; note: string; nearer: NearVoice | undefined };

/** About what an ear can tell; an unsteady reading tells less. */
const leaveWithinCents = 5;
const partialWithinCents = 120;
/** Nearer than this to its own note, nobody asks whether it is another voice. */
const ownCents = 60;
const nearCents = 50;

export const targetOf = ({ voice: { voice }, room, tunedAtC }: Judging): number =>
  targetInRoomHz(voice, voice.note, room, tunedAtC);

/** The voice of the rank whose note lies nearest to a pitch, if one lies near. */
function nearestVoice(hz: number, judging: Judging): NearVoice | undefined {
  const others = judging.rank
    .filter(({ code }) => code !== judging.voice.code)
    .map((voice) => ({
      code: voice.code,
      note: voice.voice.note,
      cents: centsBetween(hz, targetOf({ ...judging, voice })),
    }))
    .sort((a, b) => Math.abs(a.cents) - Math.abs(b.cents));
  const nearest = others[0];
  return nearest && Math.abs(nearest.cents) < nearCents ? nearest : undefined;
}

function nameOf(hz: number, room: Room): string {
  try {
    return hzToNote(hz, room).note;
  } catch (thrown) {
    if (!(thrown instanceof VoicingError)) throw thrown;
    return '';
  }
}

/** What a reading means for the voice it is judged by, and what to do. */
export function judge({ hz, spreadCents }: Reading, judging: Judging): Verdict {
  const { voice, room, tunedAtC } = judging;
  const cents = centsBetween(hz, targetOf(judging));
  const nearer = nearestVoice(hz, judging);
  try {
    const advice = trimAdvice(voice.voice, hz, voice.voice.note, room, {
      leaveWithinCents: Math.min(50, Math.max(leaveWithinCents, spreadCents)),
      ...(tunedAtC !== undefined && { tunedAtC }),
    });
    const isDoubtful = Math.abs(cents) > ownCents && nearer && Math.abs(nearer.cents) < Math.abs(cents);
    return { says: 'advice', cents, advice, nearer: isDoubtful ? nearer : undefined };
  } catch (thrown) {
    if (!(thrown instanceof VoicingError)) throw thrown;
    if (thrown.code !== 'not-this-voice') return { says: 'beyond', cents, sentence: thrown.message };
  }
  const overtones = partialsOf(voice.voice.kind);
  const at = overtones.findIndex(
    ({ ratio }, index) => index > 0 && Math.abs(cents - 1200 * Math.log2(ratio)) < partialWithinCents,
  );
  // A soft blow or a light touch may bring the octave of any voice, not only of those it belongs to.
  const isOctave = Math.abs(cents - 1200) < partialWithinCents;
  if (at > 0) return { says: 'partial', partial: at + 1, ratio: overtones[at]!.ratio, nearer };
  if (isOctave) return { says: 'partial', partial: 2, ratio: 2, nearer };
  if (Math.abs(cents + 1200) < partialWithinCents) return { says: 'below' };
  return { says: 'another', note: nameOf(hz, room), nearer };
}

export interface Foreseen {
  /** From the pitch it should have in this room. */
  cents: number;
  uncertaintyCents: number;
  terms: UncertaintyTerm[];
}

/** What calculation says of a print before anybody heard it; undefined beyond the formulas. */
export function foresee(judging: Judging): Foreseen | undefined {
  const { voice, room } = judging;
  try {
    const { hz, uncertaintyCents } = predict(voice.voice, room);
    const terms = uncertaintyOf(voice.voice, room);
    return { cents: centsBetween(hz, targetOf(judging)), uncertaintyCents, terms };
  } catch (thrown) {
    if (!(thrown instanceof VoicingError)) throw thrown;
    return undefined;
  }
}
