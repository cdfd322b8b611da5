import { positive, within } from './number-checks.js';
import { VoicingError } from './voicing-error.js';

/** A4 of ISO 16:1975, in Hz. */
export const STANDARD_A4_HZ = 440;

/** The reference pitch; 440 Hz where not given. */
export type Tuning = { a4Hz?: number };

/** The nearest note to a frequency, and how far above it (+) or below it (−) the frequency is. */
export type NearestNote = { note: string; midi: number; cents: number };

const MIDI_A4 = 69;
const LOWEST_MIDI = 0;
const HIGHEST_MIDI = 127;
const NAMES = ['C', 'C#', 'D', 'D#', 'E', 'F', 'F#', 'G', 'G#', 'A', 'A#', 'B'] as const;
const LETTER_STEPS: Readonly<Record<string, number>> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const ACCIDENTAL_STEPS: Readonly<Record<string, number>> = { '': 0, '#': 1, '♯': 1, b: -1, '♭': -1 };
const NOTE_PATTERN = /^([A-Ga-g])([#♯b♭]?)(-?\d{1,2})$/u;

/**
 * The note number of a note name: C4 (the middle C) is 60, A4 is 69, as in the MIDI specification's table.
 * Sharps as `#` or `♯`, flats as `b` or `♭`; octaves in scientific pitch notation.
 * @throws VoicingError `bad-note` for what is no note name, `out-of-range` beyond C-1..G9.
 */
export function noteToMidi(note: string): number {
  const match = NOTE_PATTERN.exec(note.trim());
  const step = match === null ? undefined : LETTER_STEPS[(match[1] ?? '').toUpperCase()];
  const shift = match === null ? undefined : ACCIDENTAL_STEPS[match[2] ?? ''];
  if (match === null || step === undefined || shift === undefined) {
    throw new VoicingError(
      'bad-note',
      `"${note}" is no note: write a letter, a sharp or flat, an octave (F#5, B♭4).`,
      'note',
    );
  }
  const midi = (Number(match[3]) + 1) * 12 + step + shift;
  if (midi < LOWEST_MIDI || midi > HIGHEST_MIDI) {
    throw new VoicingError('out-of-range', `The note "${note}" is outside C-1 to G9.`, 'note');
  }
  return midi;
}

/**
 * The note name of a note number, with `#` for black keys (61 → `C#4`).
 * @throws VoicingError `out-of-range` where it is not a whole number of 0..127.
 */
export function midiToNote(midi: number): string {
  const name = Number.isInteger(midi) ? NAMES[((midi % 12) + 12) % 12] : undefined;
  if (name === undefined || midi < LOWEST_MIDI || midi > HIGHEST_MIDI) {
    throw new VoicingError(
      'out-of-range',
      `The note number ${midi} is no whole number from 0 to 127.`,
      'midi',
    );
  }
  return `${name}${Math.floor(midi / 12) - 1}`;
}

/** A note as it is shown to people, with the sharp and flat signs: `C#5` → `C♯5`. Checks the note. */
export function noteLabel(note: string): string {
  noteToMidi(note);
  const trimmed = note.trim();
  return trimmed.charAt(0).toUpperCase() + trimmed.slice(1).replace('#', '♯').replace('b', '♭');
}

/**
 * The frequency of a note in twelve-tone equal temperament: `a4 × 2^((midi − 69) / 12)`.
 * Source: common practice (textbook formula); A4 = 440 Hz is ISO 16:1975.
 * @returns Hz
 * @throws VoicingError `bad-note`, or `out-of-range` for an A4 outside 350..550 Hz.
 */
export function noteToHz(note: string, tuning: Tuning = {}): number {
  return midiToHz(noteToMidi(note), tuning);
}

/**
 * The nearest note to a frequency, and the cents from it (−50..50).
 * @throws VoicingError `bad-number`, or `out-of-range` where no named note is near.
 */
export function hzToNote(hz: number, tuning: Tuning = {}): NearestNote {
  positive(hz, 'hz');
  const midi = Math.round(MIDI_A4 + 12 * Math.log2(hz / a4Of(tuning)));
  if (midi < LOWEST_MIDI || midi > HIGHEST_MIDI) {
    throw new VoicingError('out-of-range', `${hz.toPrecision(4)} Hz is outside the notes C-1 to G9.`, 'hz');
  }
  return { note: midiToNote(midi), midi, cents: centsBetween(hz, midiToHz(midi, tuning)) };
}

/**
 * The interval from a reference to a frequency: `1200 × log2(hz / reference)`; positive when sharp.
 * Source: Ellis's definition of the cent (common practice).
 * @throws VoicingError `bad-number` where one is not above zero.
 */
export function centsBetween(hz: number, referenceHz: number): number {
  return 1200 * Math.log2(positive(hz, 'hz') / positive(referenceHz, 'referenceHz'));
}

function midiToHz(midi: number, tuning: Tuning): number {
  return a4Of(tuning) * 2 ** ((midi - MIDI_A4) / 12);
}

function a4Of({ a4Hz = STANDARD_A4_HZ }: Tuning): number {
  return within(a4Hz, 350, 550, 'a4Hz', 'give the frequency of A4 in Hz, 440 as a rule.');
}
