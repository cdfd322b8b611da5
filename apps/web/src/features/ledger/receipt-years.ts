/** A trader keeps its books for ten years in most countries; common practice, no source. */
const KEPT_YEARS = 10;

/** This year and those before it, newest first, by UTC as receipts are numbered. */
export const yearsUntil = (now: Date): { value: string; label: string }[] =>
  Array.from({ length: KEPT_YEARS }, (_, back) => String(now.getUTCFullYear() - back)).map((year) => ({
    value: year,
    label: year,
  }));
