import type { Bed, Placement, Point } from '@windchest/plates';

/** Beds are measured from their left front corner, drawings from the left top. */
const flipped = ([x, y]: Point, bed: Bed): Point => [x, bed.yMm - y];

/** A placed outline as an SVG path in mm. */
export const pathOf = ({ polygon }: Placement, bed: Bed): string =>
  `M${polygon
    .map((corner) =>
      flipped(corner, bed)
        .map((mm) => Number(mm.toFixed(2)))
        .join(' '),
    )
    .join('L')}Z`;

/** The middle of a convex outline's area, from the bed's left front corner. */
function middleOf(polygon: readonly Point[]): Point {
  let [twice, x, y] = [0, 0, 0];
  polygon.forEach((a, i) => {
    const b = polygon[(i + 1) % polygon.length]!;
    const cross = a[0] * b[1] - b[0] * a[1];
    twice += cross;
    x += (a[0] + b[0]) * cross;
    y += (a[1] + b[1]) * cross;
  });
  return [x / (3 * twice), y / (3 * twice)];
}

/** Outlines run counter-clockwise, so their inside lies to the left of every edge. */
const holds = (polygon: readonly Point[], [x, y]: Point, slackMm: number): boolean =>
  polygon.every((a, i) => {
    const b = polygon[(i + 1) % polygon.length]!;
    const cross = (b[0] - a[0]) * (y - a[1]) - (b[1] - a[1]) * (x - a[0]);
    return cross >= -slackMm * Math.hypot(b[0] - a[0], b[1] - a[1]);
  });

export interface LabelPlace {
  /** Its middle, from the left top corner of the bed. */
  xMm: number;
  yMm: number;
  isUpright: boolean;
}

/** `slackMm`: how far it may reach over the outline's edge. */
export interface LabelSize {
  widthMm: number;
  heightMm: number;
  slackMm: number;
}

/** Where a label stands on an outline, lying or upright; null where it would stick out. */
export function labelPlace({ polygon }: Placement, bed: Bed, size: LabelSize): LabelPlace | null {
  const middle = middleOf(polygon);
  const [xMm, yMm] = flipped(middle, bed);
  for (const isUpright of [false, true]) {
    const [width, height] = isUpright ? [size.heightMm, size.widthMm] : [size.widthMm, size.heightMm];
    const corners = [-1, 1].flatMap((right) =>
      [-1, 1].map((up): Point => [middle[0] + (right * width) / 2, middle[1] + (up * height) / 2]),
    );
    if (corners.every((corner) => holds(polygon, corner, size.slackMm))) return { xMm, yMm, isUpright };
  }
  return null;
}
