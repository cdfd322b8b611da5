/** Several pitches heard after each other, as one. */
export interface Reading {
  /** The median. */
  hz: number;
  /** Half the range that holds the middle four fifths, in cents. */
  spreadCents: number;
  isSteady: boolean;
}

/** Pitches farther from the newest belong to another sound. */
const sameSoundCents = 100;
/** A reading that wanders more is no ground to trim on. */
const steadyCents = 6;

const cents = (hz: number, from: number) => 1200 * Math.log2(hz / from);
const at = (sorted: readonly number[], share: number): number => {
  const place = share * (sorted.length - 1);
  const below = sorted[Math.floor(place)]!;
  return below + (place % 1) * (sorted[Math.ceil(place)]! - below);
};

/**
 * What several frames say together; undefined while there are too few.
 * @param pitches newest last, Hz
 */
export function readingOf(pitches: readonly number[], leastFrames: number): Reading | undefined {
  const newest = pitches.at(-1);
  if (newest === undefined) return undefined;
  const off = pitches
    .map((hz) => cents(hz, newest))
    .filter((one) => Math.abs(one) < sameSoundCents)
    .sort((a, b) => a - b);
  if (off.length < leastFrames) return undefined;
  const spreadCents = (at(off, 0.9) - at(off, 0.1)) / 2;
  return { hz: newest * 2 ** (at(off, 0.5) / 1200), spreadCents, isSteady: spreadCents <= steadyCents };
}
