import type { Clearance, PrintSheetPart } from '@windchest/contracts';

/**
 * The parts as somebody prints them whose printer wants this clearance: each in the shape of that clearance
 * where it comes in it, and no gauge, which has told what it is there to tell. Where the clearance is not known,
 * everything as drawn.
 */
export const partsInClearance = (
  parts: readonly PrintSheetPart[],
  clearance: Clearance | null,
): readonly PrintSheetPart[] =>
  clearance === null
    ? parts
    : parts
        .filter(({ isGauge }) => !isGauge)
        .map((part) => {
          const own = part.variants.find((one) => one.clearance === clearance);
          if (!own) return part;
          const { sizeMm, heightMm, footprint, profile } = own;
          return { ...part, sizeMm, heightMm, footprint, profile };
        });

/** What the clearance of a card does to a plan, for a sentence; null where it does nothing. */
export const clearanceEffect = (
  parts: readonly PrintSheetPart[],
  clearance: Clearance | null,
): { clearance: Clearance; gauges: string[] } | null => {
  const gauges = parts.filter(({ isGauge }) => isGauge).map(({ code }) => code);
  const hasVariants = parts.some(({ variants }) => variants.length > 0);
  return clearance !== null && (hasVariants || gauges.length > 0) ? { clearance, gauges } : null;
};
