import fc from 'fast-check';
import { centsBetween, hzToNote, midiToNote, noteLabel, noteToHz, noteToMidi } from './notes.js';
import { VoicingError } from './voicing-error.js';

const midis = fc.integer({ min: 0, max: 127 });
const a4s = fc.double({ min: 392, max: 466, noNaN: true });

describe('notes', () => {
  it('come back from their numbers', () => {
    fc.assert(fc.property(midis, (midi) => expect(noteToMidi(midiToNote(midi))).toBe(midi)));
  });

  it('come back from their frequencies at any reference pitch', () => {
    fc.assert(
      fc.property(midis, a4s, (midi, a4Hz) => {
        const found = hzToNote(noteToHz(midiToNote(midi), { a4Hz }), { a4Hz });
        expect(found.note).toBe(midiToNote(midi));
        expect(found.cents).toBeCloseTo(0, 6);
      }),
    );
  });

  it('are found within half a semitone, with the cents that lead back to the frequency', () => {
    fc.assert(
      fc.property(fc.double({ min: 20, max: 12_000, noNaN: true }), (hz) => {
        const { note, cents } = hzToNote(hz);
        expect(Math.abs(cents)).toBeLessThanOrEqual(50 + 1e-9);
        expect(noteToHz(note) * 2 ** (cents / 1200)).toBeCloseTo(hz, 6);
      }),
    );
  });

  it.each([
    ['Db5', 'C#5'],
    ['D♭5', 'C♯5'],
    ['B#3', 'C4'],
    ['Cb4', 'B3'],
    [' f#4 ', 'Gb4'],
    ['bb3', 'A#3'],
  ])('names %s and %s as one key', (one, other) => {
    expect(noteToMidi(one)).toBe(noteToMidi(other));
  });

  it.each(['', 'H4', 'C', 'C##4', 'C4.5', '4C', 'C 4'])(
    'refuses "%s" as a note and says how to write one',
    (note) => {
      expect(() => noteToMidi(note)).toThrow(VoicingError);
      expect(() => noteToMidi(note)).toThrow(/is no note: write a letter/);
    },
  );

  it('refuses notes beyond the numbered ones, and numbers that are none', () => {
    expect(() => noteToMidi('A9')).toThrow(/outside C-1 to G9/);
    expect(() => midiToNote(60.5)).toThrow(VoicingError);
    expect(() => midiToNote(128)).toThrow(VoicingError);
    expect(() => hzToNote(20_000)).toThrow(/outside the notes/);
  });

  it('refuses a reference pitch nobody tunes to', () => {
    expect(() => noteToHz('A4', { a4Hz: 44 })).toThrow(/a4Hz is 44/);
    expect(() => noteToHz('A4', { a4Hz: Number.NaN })).toThrow(/must be a number/);
  });

  it('are shown with the signs of music', () => {
    expect(noteLabel('c#5')).toBe('C♯5');
    expect(noteLabel('Bb4')).toBe('B♭4');
    expect(noteLabel('bb4')).toBe('B♭4');
    expect(() => noteLabel('x')).toThrow(VoicingError);
  });

  it('measures no interval from or to nothing', () => {
    expect(() => centsBetween(0, 440)).toThrow(/hz must be a number above zero/);
    expect(() => centsBetween(440, -1)).toThrow(/referenceHz/);
  });
});
