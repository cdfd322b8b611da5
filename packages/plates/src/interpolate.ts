/**
 * Straight line between the two steps around `at`. Before the first step and past the last one the nearest
 * pair is drawn on, never below 0: the quantities kept by step are all sizes.
 *
 * @param steps rising, at least one; `values` holds one number for each.
 */
export function interpolate(steps: readonly number[], values: readonly number[], at: number): number {
  if (steps.length === 1) return values[0]!;
  let high = 1;
  while (high < steps.length - 1 && steps[high]! < at) high += 1;
  const low = high - 1;
  const share = (at - steps[low]!) / (steps[high]! - steps[low]!);
  return Math.max(0, values[low]! + share * (values[high]! - values[low]!));
}
