import type { PartFit } from '../bench/fit-report.js';
import { fitWords } from './fit-words.js';

const fit = (code: string, fit: PartFit['fit']): PartFit => ({ code, name: 'Lid', fit });
const fits = fit('A-01', { fit: 'fits' });

describe('a kit against a printer, in words', () => {
  it('says once that all fits', () => {
    expect(fitWords({ fits: [fits, fits], unmeasured: [] }, '220 × 220 × 250')).toEqual([
      { state: 'ok', words: 'All 2 parts fit 220 × 220 × 250 mm.' },
    ]);
  });

  it('names each part that does not fit, by how much, and in which direction', () => {
    const lines = fitWords(
      {
        fits: [
          fits,
          fit('G-02', { fit: 'too-big', overMm: { axis: 'x', mm: 12.46 } }),
          fit('G-03', { fit: 'too-big', overMm: { axis: 'z', mm: 0.01 } }),
        ],
        unmeasured: [],
      },
      '100 × 100 × 100',
    );
    expect(lines.map((line) => line.words)).toEqual([
      '1 of 3 parts fit 100 × 100 × 100 mm.',
      'G-02 (Lid) is 12.5 mm too wide.',
      'G-03 (Lid) is 0.1 mm too tall.',
    ]);
    expect(lines.every((line) => line.state === 'stop')).toBe(true);
  });

  it('says what has to be turned or laid, and what nobody measured', () => {
    const lines = fitWords(
      {
        fits: [
          fit('J-01', { fit: 'fits-turned', turnedDegrees: -37.6 }),
          fit('J-02', { fit: 'fits-laid', laidAxis: 'x' }),
        ],
        unmeasured: ['K-01'],
      },
      '220 × 220 × 250',
    );
    expect(lines.slice(1).map((line) => line.words)).toEqual([
      'Turned on the bed: J-01 by 38°.',
      'Laid on another side: J-02.',
      'Without a size yet: K-01.',
    ]);
  });
});
