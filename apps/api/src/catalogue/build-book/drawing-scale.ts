/**
 * Scales of a technical drawing: those of ISO 5455 (5 : 1, 2 : 1, 1 : 1, 1 : 2, 1 : 5, 1 : 10, 1 : 20, 1 : 50),
 * and between them, so that a sheet is filled, 1 : 1.5, 1 : 2.5, 1 : 3 and 1 : 4.
 */
const ratios = [5, 2, 1, 1 / 1.5, 1 / 2, 1 / 2.5, 1 / 3, 1 / 4, 1 / 5, 1 / 10, 1 / 20, 1 / 50] as const;

export const smallestRatio = 1 / 50;

/** The largest scale at which something fits, or the smallest there is. */
export const largestScale = (fits: (ratio: number) => boolean, atMost = 5): number =>
  ratios.find((ratio) => ratio <= atMost && fits(ratio)) ?? smallestRatio;

/** `1 : 2.5` */
export const scaleText = (ratio: number): string => {
  const text = (value: number): string => String(Number(value.toFixed(1)));
  return ratio >= 1 ? `${text(ratio)} : 1` : `1 : ${text(1 / ratio)}`;
};
