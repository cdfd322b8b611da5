import { medianRanks, quantile, summarize, type FitWord } from './fit-statistics.js';

const measured = (...gaps: number[]): FitWord[] => gaps.map((gapMm) => ({ verdict: 'right', gapMm }));

describe('the statistics of fit reports', () => {
  it('takes quartiles as R does by default: quantile(c(1, 2, 4, 7, 11, 16), type = 7) gives 2.5, 5.5 and 10', () => {
    const values = [1, 2, 4, 7, 11, 16];
    expect([0.25, 0.5, 0.75].map((share) => quantile(values, share))).toEqual([2.5, 5.5, 10]);
  });

  it.each([
    [5, null],
    [6, [1, 6]],
    [8, [1, 8]],
    [9, [2, 8]],
    [10, [2, 9]],
    [15, [4, 12]],
    [20, [6, 15]],
    [25, [8, 18]],
  ])(
    'bounds the median of %i values at 95 %% by ranks %j, as tables of the sign test have it (from memory; binomial sums worked out by hand)',
    (count, ranks) => {
      expect(medianRanks(count, 0.95)).toEqual(ranks);
    },
  );

  it('keeps its promise: the ranks leave at most 5 % outside, one rank closer would leave more', () => {
    const outside = (count: number, rank: number): number => {
      let [sum, term] = [0, 0.5 ** count];
      for (let k = 0; k < rank; k++) {
        sum += term;
        term *= (count - k) / (k + 1);
      }
      return 2 * sum;
    };
    for (let count = 6; count <= 200; count++) {
      const [low] = medianRanks(count, 0.95)!;
      expect(outside(count, low)).toBeLessThanOrEqual(0.05);
      expect(outside(count, low + 1)).toBeGreaterThan(0.05);
    }
  });

  it('suggests half of the median for each side: too tight, take off; too loose, add', () => {
    expect(summarize(measured(-0.3, -0.2, -0.2, -0.1))).toMatchObject({
      medianMm: -0.2,
      changePerSideMm: -0.1,
    });
    expect(summarize(measured(0.1, 0.2, 0.4))).toMatchObject({ medianMm: 0.2, changePerSideMm: 0.1 });
  });

  it('is sure only when enough printers agree', () => {
    expect(summarize(measured(-0.2, -0.2, -0.2)).certainty).toBe('unsure');
    expect(summarize(measured(-0.2, -0.2, -0.2, -0.2)).certainty).toBe('likely');
    expect(summarize(measured(-0.3, -0.2, -0.2, -0.2, -0.1, -0.1)).certainty).toBe('sure');
    expect(summarize(measured(-0.3, -0.2, -0.2, 0.2, 0.1, 0.3)).certainty).toBe('unsure');
  });

  it('takes words for a distance where nobody measured, and says how many did', () => {
    const words: FitWord[] = [
      { verdict: 'tight', gapMm: null },
      { verdict: 'tight', gapMm: -0.16 },
      { verdict: 'far-too-tight', gapMm: null },
    ];
    expect(summarize(words)).toMatchObject({ count: 3, measured: 1, medianMm: -0.16 });
  });
});
