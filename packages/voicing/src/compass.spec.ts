import { aBar, aStoppedPipe } from '../fixtures/voices.fixture.js';
import { compassOf } from './compass.js';

describe('the compass of a rank', () => {
  it('runs from its lowest note to its highest, in whatever order they stand', () => {
    expect(compassOf(['F6', 'C5', 'C#5'].map((note) => ({ ...aStoppedPipe, note })))).toBe('C5–F6');
    expect(compassOf(['Bb3', 'G#5'].map((note) => ({ ...aStoppedPipe, note })))).toBe('A♯3–G♯5');
  });

  it('counts a voice without a note by the note it sounds', () => {
    expect(compassOf([{ ...aStoppedPipe, note: 'C5' }, aBar])).toBe('C5–F6');
  });

  it('of one note is that note, of no voices is nothing', () => {
    expect(compassOf([{ ...aStoppedPipe, note: 'C5' }])).toBe('C5');
    expect(compassOf([])).toBe('');
  });
});
