export interface Location {
  readonly country: string;
  /** Two pieces of evidence agree. */
  readonly isClear: boolean;
}

/**
 * Where a buyer is, from what they declared, the billing address and the country of the card's bank.
 * Rule: two items of non-contradictory evidence (Implementing Regulation (EU) 282/2011, art. 24b and 24f).
 * Where no two agree the declared country stands, and somebody should look.
 */
export const locate = (declared: string, ...others: readonly (string | null | undefined)[]): Location => {
  const pieces = [declared, ...others]
    .filter((one): one is string => Boolean(one))
    .map((one) => one.toUpperCase());
  const agreed = pieces.find((country, index) => pieces.indexOf(country) < index);
  return agreed ? { country: agreed, isClear: true } : { country: declared, isClear: false };
};
