/**
 * numerator / denominator to the nearest whole number, halves away from zero, exactly. Away from zero and
 * not upward, so that taking an amount back rounds to the same units as giving it did. The denominator is
 * above zero. Rule: ROUND_HALF_UP of the General Decimal Arithmetic specification.
 */
export function roundHalfUp(numerator: bigint, denominator: bigint): bigint {
  const magnitude = numerator < 0n ? -numerator : numerator;
  const rounded = (2n * magnitude + denominator) / (2n * denominator);
  return numerator < 0n ? -rounded : rounded;
}
