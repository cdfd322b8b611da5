import type { FitCell, FitVerdict } from '@windchest/contracts';

/** How far off a part is taken to be, across, where nobody measured it (common practice, no source). */
const MM_OF_WORDS: Record<FitVerdict, number> = {
  'far-too-tight': -0.3,
  tight: -0.1,
  right: 0,
  loose: 0.1,
  'far-too-loose': 0.3,
};

export interface FitWord {
  readonly verdict: FitVerdict;
  readonly gapMm: number | null;
}

/** Deviation across the part in mm: too tight is minus, too loose plus. */
export const deviationOf = ({ verdict, gapMm }: FitWord): number => gapMm ?? MM_OF_WORDS[verdict];

/**
 * Sample quantile by linear interpolation between order statistics (definition 7 of R. J. Hyndman and Y. Fan,
 * "Sample quantiles in statistical packages", The American Statistician 50, 1996).
 * @param sorted rising, at least one
 */
export const quantile = (sorted: readonly number[], share: number): number => {
  const at = (sorted.length - 1) * share;
  const below = sorted[Math.floor(at)]!;
  const above = sorted[Math.ceil(at)]!;
  return below + (at - Math.floor(at)) * (above - below);
};

/**
 * Ranks, counted from 1, between which the median of the population lies with at least this confidence, whatever
 * its distribution: the interval of the sign test (W. J. Conover, Practical Nonparametric Statistics, ch. 3).
 * @returns null where so few values cannot give that confidence
 */
export const medianRanks = (count: number, confidence: number): [number, number] | null => {
  const tail = (1 - confidence) / 2;
  let probability = 0.5 ** count;
  let below = 0;
  let rank = 0;
  // Sum of the binomial distribution with p = 1/2, from its lower end.
  while (below + probability <= tail && rank < count) {
    below += probability;
    probability *= (count - rank) / (rank + 1);
    rank += 1;
  }
  return rank === 0 ? null : [rank, count + 1 - rank];
};

const SURE = 0.95;
const LIKELY = 0.8;

/**
 * What a group of reports says: the median deviation, its spread, and the change per side that would bring the
 * median to a good fit. `sure` when the 95 % interval of the median leaves out zero, `likely` when the 80 %
 * interval does; an interval that needs more reports than there are decides nothing.
 * @param words at least one
 */
export const summarize = (words: readonly FitWord[]): FitCell => {
  const sorted = words.map(deviationOf).toSorted((a, b) => a - b);
  const median = quantile(sorted, 0.5);
  const interval = intervalOf(sorted, SURE);
  const likely = intervalOf(sorted, LIKELY);
  return {
    count: words.length,
    measured: words.filter(({ gapMm }) => gapMm !== null).length,
    medianMm: hundredths(median),
    quartilesMm: [hundredths(quantile(sorted, 0.25)), hundredths(quantile(sorted, 0.75))],
    intervalMm: interval && [hundredths(interval[0]), hundredths(interval[1])],
    changePerSideMm: hundredths(median / 2),
    certainty: leavesOutZero(interval) ? 'sure' : leavesOutZero(likely) ? 'likely' : 'unsure',
  };
};

const intervalOf = (sorted: readonly number[], confidence: number): [number, number] | null => {
  const ranks = medianRanks(sorted.length, confidence);
  return ranks && [sorted[ranks[0] - 1]!, sorted[ranks[1] - 1]!];
};

const leavesOutZero = (interval: readonly [number, number] | null): boolean =>
  interval !== null && (interval[0] > 0 || interval[1] < 0);

/** Nobody prints or measures finer; adding 0 turns a negative zero into zero. */
const hundredths = (mm: number): number => Math.round(mm * 100) / 100 + 0;
