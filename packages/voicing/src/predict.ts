import { soundBar } from './bars.js';
import { centsBetween, hzToNote, noteLabel, noteToHz } from './notes.js';
import { partialsOf } from './partials.js';
import { soundPipe } from './pipes.js';
import type { Sounding } from './sounding.js';
import { airIn } from './speed-of-sound.js';
import { soundString } from './strings.js';
import { combinedCents, type UncertaintyTerm } from './uncertainty.js';
import { soundVessel } from './vessel.js';
import { unknownKind, type Room, type TargetedVoice, type Voice } from './voice.js';

export type Prediction = {
  /** The fundamental. */
  hz: number;
  /** From `note`; positive is sharp. */
  cents: number;
  /** The voice's own note as it is written there, else the nearest (`C#5`); `noteLabel` is for showing it. */
  note: string;
  /** The fundamental and what sounds above it, lowest first. */
  partialsHz: number[];
  /** ± cents; a half-width that the truth seldom leaves, no promise. */
  uncertaintyCents: number;
  /** Sentences for the maker: where a formula is stretched, what it leaves out. */
  warnings: string[];
};

/**
 * What a voice will sound like in a room. Pipes and vessels move with the speed of sound; bars, tines and strings
 * do not. The formulas, their assumptions and sources stand at `soundPipe`, `soundBar`, `soundString`, `soundVessel`.
 * @throws VoicingError where an input is no fair number or lies outside the formula's range, or the pitch is
 * beyond all named notes; a mild overstep is computed and named in `warnings`
 */
export function predict(voice: TargetedVoice, room: Room): Prediction {
  const { hz, terms, warnings } = soundVoice(voice, room);
  const nearest = hzToNote(hz, room);
  const note = voice.note ?? nearest.note;
  const inaudible = hz < 20 ? [`${hz.toFixed(1)} Hz is too low to be heard.`] : [];
  return {
    hz,
    note,
    cents: voice.note === undefined ? nearest.cents : centsBetween(hz, noteToHz(voice.note, room)),
    partialsHz: partialsOf(voice.kind).map(({ ratio }) => ratio * hz),
    uncertaintyCents: combinedCents(terms),
    warnings: [...warnings, ...farFromNote(voice, hz, room), ...inaudible],
  };
}

/**
 * What the uncertainty of a prediction is made of, largest first, each in ± cents.
 * @throws VoicingError as `predict`
 */
export function uncertaintyOf(voice: Voice, room: Room): UncertaintyTerm[] {
  return [...soundVoice(voice, room).terms].sort((a, b) => b.cents - a.cents);
}

function soundVoice(voice: Voice, room: Room): Sounding {
  const air = airIn(room);
  switch (voice.kind) {
    case 'stopped-pipe':
    case 'open-pipe':
      return soundPipe(voice, air);
    case 'free-bar':
    case 'tine':
      return soundBar(voice);
    case 'string':
      return soundString(voice);
    case 'vessel':
      return soundVessel(voice, air);
    default:
      throw unknownKind(voice);
  }
}

function farFromNote({ note }: TargetedVoice, hz: number, room: Room): string[] {
  if (note === undefined) return [];
  const cents = centsBetween(hz, noteToHz(note, room));
  if (Math.abs(cents) <= 100) return [];
  return [
    `It sounds ${Math.abs(cents).toFixed(0)} cents ${cents > 0 ? 'above' : 'below'} ${noteLabel(note)}: ` +
      'check its sizes and its note.',
  ];
}
