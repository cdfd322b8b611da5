import { boxOf, moved, turned } from './convex-hull.js';
import { aroundCircle, aroundPolygon, convexSum } from './convex-sum.js';
import { allowedTurn, restingsOf, type PartShape } from './fit-part.js';
import type { Pose } from './plate-filling.js';
import type { Bed, Point } from './types.js';

/** Corners kept of a round outline, and of the gap around it: more pack hardly closer and take longer. */
const HULL_SIDES = 24;
const GAP_SIDES = 8;
const TOUCHES_MM = 1e-6;

/**
 * Poses worth trying for a part that fits somehow, or none. Stood as exported where that fits, laid only where
 * it does not.
 */
export function posesOf(
  part: PartShape,
  bed: Bed,
  room: { readonly widthMm: number; readonly depthMm: number },
  gapMm: number,
): Pose[] {
  for (const { outline, heightMm, laidAxis } of restingsOf(part)) {
    if (heightMm > bed.zMm + TOUCHES_MM) continue;
    const fitting = allowedTurn(outline, part.orientation, room);
    if (fitting.slackMm < -TOUCHES_MM) continue;
    const degrees = part.orientation === 'as-exported' ? [0] : [...turnsOf(outline), fitting.degrees];
    const poses = degrees
      .map((turn) => poseAt(outline, turn, gapMm, laidAxis))
      .filter(
        (pose) => pose.widthMm <= room.widthMm + TOUCHES_MM && pose.depthMm <= room.depthMm + TOUCHES_MM,
      );
    return poses.filter(
      (pose, i) => !poses.slice(0, i).some((earlier) => isSame(earlier.outline, pose.outline)),
    );
  }
  return [];
}

/** Quarter turns, and those that bring the outline's tightest rectangle square to the bed. */
function turnsOf(outline: readonly Point[]): number[] {
  let tightest = 0;
  let leastArea = Infinity;
  outline.forEach(([x, y], i) => {
    const [nextX, nextY] = outline[(i + 1) % outline.length]!;
    const degrees = (-Math.atan2(nextY - y, nextX - x) * 180) / Math.PI;
    const box = boxOf(turned(outline, degrees));
    const area = (box.right - box.left) * (box.back - box.front);
    if (area >= leastArea * (1 - 1e-9)) return;
    leastArea = area;
    tightest = degrees;
  });
  const straight = boxOf(outline);
  const isStraightTightest =
    (straight.right - straight.left) * (straight.back - straight.front) <= leastArea * 1.001;
  const first = [0, 90, 180, 270];
  return isStraightTightest ? first : [...first, ...first.map((quarter) => tightest + quarter)];
}

function poseAt(outline: readonly Point[], degrees: number, gapMm: number, laidAxis?: 'x' | 'y'): Pose {
  const raw = turned(outline, degrees);
  const { left, front, right, back } = boxOf(raw);
  const settled = moved(raw, -left, -front);
  const hull = aroundPolygon(settled, HULL_SIDES);
  return {
    turnedDegrees: ((degrees % 360) + 360) % 360,
    ...(laidAxis !== undefined && { laidAxis }),
    outline: settled,
    hull,
    grownHull: gapMm > 0 ? convexSum(hull, aroundCircle(gapMm, GAP_SIDES)) : hull,
    widthMm: right - left,
    depthMm: back - front,
  };
}

/** The same outline, if perhaps begun at another corner. */
function isSame(a: readonly Point[], b: readonly Point[]): boolean {
  const isNear = (p: Point, q: Point): boolean =>
    Math.abs(p[0] - q[0]) < 1e-6 && Math.abs(p[1] - q[1]) < 1e-6;
  return a.length === b.length && a.every((corner) => b.some((other) => isNear(corner, other)));
}
