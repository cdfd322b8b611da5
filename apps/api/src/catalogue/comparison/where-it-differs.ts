import type { Comparison as MeshComparison } from '@windchest/meshes';

type Point = readonly [number, number, number];
/** The box of a part, in the coordinates of its file. */
export interface PartBox {
  readonly minMm: Point;
  readonly maxMm: Point;
}

/** Words for each axis as the drawings look at a part: x to the right, y to the back, z up. */
const AXES = [
  { low: 'at the left', below: 'left of the middle', above: 'right of the middle', high: 'at the right' },
  { low: 'at the front', below: 'in front of the middle', above: 'behind the middle', high: 'at the back' },
  { low: 'at the bottom', below: 'below the middle', above: 'above the middle', high: 'at the top' },
] as const;
/** How high comes first: a print is seen standing on its bed. */
const TOLD_ORDER = [2, 0, 1] as const;
/** Common practice, no source: the outer tenth of a side is an end of it, the middle fifth its middle. */
const END = 0.1;
const MIDDLE = 0.1;

/**
 * Where two shapes of a part lie farthest apart, as a maker would say it: "up to 0.42 mm, at the top, right
 * of the middle (12.0, 3.5, 41.0 mm)".
 * @param boxes of both; a place is told within the one it lies on
 */
export const whereItDiffers = (
  { kind, movedMm, largestDeviationMm, placeMm, placeIsOn }: MeshComparison,
  boxes: { readonly before: PartBox; readonly after: PartBox },
): string => {
  if (kind === 'same-geometry')
    return movedMm.some((mm) => Math.abs(mm) >= 0.005)
      ? `moved in its file by ${coordinates(movedMm, 2)}`
      : 'nowhere by more than 1 µm';
  // Triangles turned round, shells put together differently, or more triangles than can all be looked at.
  if (!placeMm) return 'no place was found that lies more than 1 µm off; triangles or shells differ';
  const place = `${placeWords(placeMm, boxes[placeIsOn ?? 'after'])} (${coordinates(placeMm, 1)}`;
  return `${farWords(largestDeviationMm)}, ${place}${placeIsOn === 'before' ? ' on the earlier shape' : ''})`;
};

const farWords = (mm: number): string => (mm < 0.005 ? 'by less than 0.01 mm' : `up to ${mm.toFixed(2)} mm`);

const placeWords = (place: Point, { minMm, maxMm }: PartBox): string => {
  const words = TOLD_ORDER.flatMap((axis) => {
    const size = maxMm[axis] - minMm[axis];
    const share = size > 0 ? (place[axis] - minMm[axis]) / size : 0.5;
    const { low, below, above, high } = AXES[axis];
    if (Math.abs(share - 0.5) <= MIDDLE) return [];
    if (share < 0.5) return [share <= END ? low : below];
    return [share >= 1 - END ? high : above];
  });
  return words.length > 0 ? words.join(', ') : 'in the middle';
};

const coordinates = (place: Point, digits: number): string =>
  `${place.map((mm) => withSign(mm, digits)).join(', ')} mm`;

/** With a true minus sign, and none before a nought. */
const withSign = (mm: number, digits: number): string => {
  const text = Math.abs(mm).toFixed(digits);
  return mm < 0 && Number(text) !== 0 ? `−${text}` : text;
};
