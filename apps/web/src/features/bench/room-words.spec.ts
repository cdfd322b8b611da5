import type { RankVoice } from '@windchest/contracts';
import { predictedRank } from './predicted-rank.js';
import { roomWords } from './room-words.js';

const pipes: RankVoice[] = [
  { code: 'P-72', voice: { kind: 'stopped-pipe', note: 'C5', lengthMm: 160.19, boreMm: 11, wallMm: 1.6 } },
  { code: 'P-73', voice: { kind: 'stopped-pipe', note: 'C#5', lengthMm: 150.98, boreMm: 11, wallMm: 1.6 } },
];
const bar: RankVoice = {
  code: 'B-72',
  voice: {
    kind: 'free-bar',
    note: 'C5',
    lengthMm: 98.04,
    thicknessMm: 4,
    youngsModulusGPa: 1.9,
    densityKgM3: 1270,
  },
};
const at = (cents: number, code = 'P-72') => ({ code, cents, uncertaintyCents: 6 });

describe('a room’s effect on a rank, in words', () => {
  it('says how near to their notes voices are that lie on both sides of them', () => {
    expect(roomWords(pipes, [at(-0.4), at(3.2)])?.spread).toBe('all pipes within 4 cents of their notes');
    expect(roomWords(pipes, [at(0), at(0)])?.spread).toBe('all pipes within 1 cent of their notes');
  });

  it('says by how much all are sharp or flat', () => {
    expect(roomWords(pipes, [at(15.2), at(18)])?.spread).toBe('all pipes 15–18 cents sharp');
    expect(roomWords(pipes, [at(-18), at(-15.2)])?.spread).toBe('all pipes 15–18 cents flat');
    expect(roomWords(pipes, [at(-1), at(-1.2)])?.spread).toBe('all pipes 1 cent flat');
  });

  it('names what may be off as printed', () => {
    expect(roomWords(pipes, [at(0), { ...at(0), uncertaintyCents: 9 }])?.unsure).toBe(
      'Before tuning, a print may be off by ± 6–9 cents.',
    );
  });

  it('says of solid voices alone that the air does not move them', () => {
    expect(roomWords([bar], [at(2, 'B-72')])?.stays).toBe('The air’s warmth does not move bars.');
    expect(roomWords([bar, ...pipes], [at(2, 'B-72'), at(1)])?.stays).toBeUndefined();
    expect(roomWords([bar], [at(0.3, 'B-72')])?.spread).toBe('the bar within 1 cent of its note');
  });

  it('is silent where nothing can be predicted', () => {
    expect(roomWords(pipes, [])).toBeUndefined();
  });
});

describe('a predicted rank', () => {
  // The speed of sound grows with the root of the absolute temperature, so a pipe rises by 600·log2(T2/T1)
  // cents; from 20 to 30 °C that is 29.0 (ideal gas, textbook formula; the end correction takes part too).
  it('moves together with the warmth of the air', () => {
    const cool = predictedRank(pipes, { temperatureC: 20 });
    const warm = predictedRank(pipes, { temperatureC: 30 });
    const rise = warm.map((one, index) => one.cents - (cool[index]?.cents ?? 0));
    for (const cents of rise) expect(Math.abs(cents - 600 * Math.log2(303.15 / 293.15))).toBeLessThan(0.6);
  });

  it('leaves bars where they are', () => {
    expect(predictedRank([bar], { temperatureC: 5 })).toEqual(predictedRank([bar], { temperatureC: 35 }));
  });

  it('leaves out a voice whose sizes are beyond the formulas', () => {
    const absurd: RankVoice = {
      code: 'P-01',
      voice: { kind: 'stopped-pipe', note: 'C5', lengthMm: 0.0001, boreMm: 4000 },
    };
    expect(predictedRank([...pipes, absurd], { temperatureC: 20 }).map((one) => one.code)).toEqual([
      'P-72',
      'P-73',
    ]);
  });
});
