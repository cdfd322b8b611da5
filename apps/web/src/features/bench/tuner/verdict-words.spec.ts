import type { RankVoice } from '@windchest/contracts';
import { type Judging, judge, targetOf } from './judge.js';
import { offWords, verdictWords } from './verdict-words.js';

const judgingOf = (voice: RankVoice['voice']): Judging => {
  const one = { code: 'V-01', voice };
  return { rank: [one], voice: one, room: { temperatureC: 20 }, tunedAtC: undefined };
};
const pipe = judgingOf({ kind: 'stopped-pipe', note: 'C5', lengthMm: 160.19, boreMm: 11, wallMm: 1.6 });
const string = judgingOf({ kind: 'string', note: 'E4', lengthMm: 300, tensionN: 60, linearDensityGPerM: 1 });
const vessel = judgingOf({
  kind: 'vessel',
  note: 'F5',
  volumeCm3: 40,
  holes: [{ diameterMm: 10 }],
  wallMm: 2,
});

const wordsFor = (judging: Judging, cents: number, { spreadCents = 0.4, isSteady = true } = {}) => {
  const reading = { hz: targetOf(judging) * 2 ** (cents / 1200), spreadCents, isSteady };
  return verdictWords(judge(reading, judging), reading, judging, 8);
};

describe('a verdict in words', () => {
  // 20 cents of a stopped C5 column: c/4 · (1/f heard − 1/f wanted) = 164.1 mm · (2^(20/1200) − 1) = 1.9 mm.
  it('tells how far off a pipe is and what to trim', () => {
    const words = wordsFor(pipe, -20);
    expect(words).toMatchObject({ headline: '20 cents flat', todo: 'Trim 1.9 mm off the open end.' });
    expect(words.notes[0]).toMatch(/Cut less than told/);
    expect(wordsFor(pipe, 12).todo).toBe('Reprint it 1.1 mm longer.');
  });

  it('speaks of tension for a string and of holes for a vessel', () => {
    // (2^(20/1200))² − 1 = 2.3 %.
    expect(wordsFor(string, -20).todo).toBe(
      'Tighten it by 2.3 % of its tension, or shorten what sounds by 3.4 mm.',
    );
    expect(wordsFor(string, 20).todo).toMatch(/^Slacken it by 2\.3 %/);
    expect(wordsFor(string, -20).notes).toEqual([]);
    expect(wordsFor(vessel, -20).todo).toMatch(/^File its widest hole 0\.\d mm wider\.$/);
    expect(wordsFor(vessel, 20).todo).toMatch(/^Reprint it with its widest hole 0\.\d mm narrower\.$/);
  });

  it('lets be what is in tune, and says so', () => {
    expect(wordsFor(pipe, 0.2)).toEqual({
      headline: 'In tune',
      todo: 'Leave it as it is.',
      notes: [],
      other: undefined,
    });
    expect(wordsFor(pipe, -4)).toMatchObject({
      headline: '4 cents flat',
      todo: 'Leave it as it is.',
      notes: ['Within the ±8 cents the kit is declared for.'],
    });
    expect(offWords(1)).toBe('1 cent sharp');
  });

  it('cuts nothing on a tone that wanders', () => {
    expect(wordsFor(pipe, -40, { spreadCents: 9, isSteady: false }).todo).toMatch(/Hold it steadier/);
    expect(wordsFor(pipe, -8, { spreadCents: 9, isSteady: false }).todo).toMatch(/^Too near to cut/);
  });

  it('names overtones, and what helps', () => {
    expect(wordsFor(pipe, 1200 * Math.log2(3))).toMatchObject({
      headline: 'That is the twelfth of C5, not its own tone.',
      todo: 'Blow softer.',
    });
    const bar = judgingOf({
      kind: 'free-bar',
      note: 'C5',
      lengthMm: 98,
      thicknessMm: 4,
      youngsModulusGPa: 2,
      densityKgM3: 1270,
    });
    expect(wordsFor(bar, 1200 * Math.log2(2.757)).headline).toBe(
      'That is the first overtone of C5, not its own tone.',
    );
    expect(wordsFor(string, 1200).headline).toBe('That is the octave of E4, not its own tone.');
    expect(wordsFor(pipe, -1200).headline).toBe('That is an octave below C5.');
    expect(wordsFor(pipe, 900).headline).toBe('That is A5, not C5.');
  });
});
