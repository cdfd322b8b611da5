/** One cause of uncertainty, as a half-width in cents. */
export type UncertaintyTerm = { from: string; cents: number };

/**
 * Independent causes together: the root of the sum of squares (Guide to the Expression of Uncertainty in
 * Measurement, JCGM 100:2008, 5.1). Each term is a half-width that the truth seldom leaves, so the sum is
 * one too; it is no promise.
 * @returns ± cents
 */
export function combinedCents(terms: readonly UncertaintyTerm[]): number {
  return Math.sqrt(terms.reduce((sum, { cents }) => sum + cents ** 2, 0));
}

/** How many cents a pitch moves when a quantity it follows with a power moves by a relative change. */
export function centsOf(relativeChange: number, power = 1): number {
  return Math.abs(1200 * power * Math.log2(1 + Math.abs(relativeChange)));
}

/**
 * Print tolerance of a length, ± mm. Source: published guidance for consumer FDM machines, ±0.2 mm
 * (x3dstudios.com "3D Printing Tolerances"; novalab3d.com 2026 guide). Others say up to ±0.5 mm.
 */
export const PRINT_TOLERANCE_MM = 0.2;
