import { boxOf, turned } from './convex-hull.js';
import type { Point } from './types.js';

export interface BestTurn {
  /** Counter-clockwise, above −90 and up to 90. */
  readonly degrees: number;
  /** Room left on the tighter axis; below 0 where the outline does not fit at any turn. */
  readonly slackMm: number;
  readonly overAxis: 'x' | 'y';
}

/** Room left at one turn: the lesser of what remains in width and in depth. */
export function slackAt(
  outline: readonly Point[],
  degrees: number,
  widthMm: number,
  depthMm: number,
): BestTurn {
  const box = boxOf(turned(outline, degrees));
  const x = widthMm - (box.right - box.left);
  const y = depthMm - (box.back - box.front);
  return { degrees, slackMm: Math.min(x, y), overAxis: x <= y ? 'x' : 'y' };
}

/**
 * The turn about the vertical that leaves a convex outline the most room in a rectangle, over all angles.
 *
 * Between two angles at which an edge stands square to the bed, width and depth are each the shadow of one
 * fixed pair of corners, a·cos(θ − φ). Such a shadow has no minimum inside the stretch, so the best turn is
 * at an end of a stretch or where width and depth have equal room; both are found in closed form (rotating
 * calipers: Toussaint 1983).
 */
export function bestTurn(outline: readonly Point[], widthMm: number, depthMm: number): BestTurn {
  let best = slackAt(outline, 0, widthMm, depthMm);
  const squares = squareAngles(outline);
  const consider = (degrees: number): void => {
    const turn = slackAt(outline, normalised(degrees), widthMm, depthMm);
    const isSame = Math.abs(turn.slackMm - best.slackMm) < 1e-9;
    if (isSame ? Math.abs(turn.degrees) < Math.abs(best.degrees) - 1e-9 : turn.slackMm > best.slackMm) {
      best = turn;
    }
  };
  squares.forEach((from, i) => {
    consider(from);
    const to = i + 1 < squares.length ? squares[i + 1]! : squares[0]! + 180;
    for (const degrees of equalRoomAngles(outline, from, to, widthMm - depthMm)) consider(degrees);
  });
  return best;
}

/** Turns from 0 to below 180 at which an edge is parallel to an edge of the bed. */
function squareAngles(outline: readonly Point[]): number[] {
  const angles = new Set<number>();
  outline.forEach(([x, y], i) => {
    const [nextX, nextY] = outline[(i + 1) % outline.length]!;
    const edge = (-Math.atan2(nextY - y, nextX - x) * 180) / Math.PI;
    for (const quarter of [0, 90]) angles.add((((edge + quarter) % 180) + 180) % 180);
  });
  return [...angles].sort((a, b) => a - b);
}

/** Turns inside a stretch at which width − depth is `difference`: C·cos(θ − ψ) = difference. */
function equalRoomAngles(outline: readonly Point[], from: number, to: number, difference: number): number[] {
  const middle = turned(outline, (from + to) / 2);
  const [dx, dy] = extremePair(outline, middle, 0);
  const [ex, ey] = extremePair(outline, middle, 1);
  // Width is dx·cos θ − dy·sin θ, depth is ex·sin θ + ey·cos θ.
  const cosPart = dx - ey;
  const sinPart = -dy - ex;
  const size = Math.hypot(cosPart, sinPart);
  if (size === 0 || Math.abs(difference) > size) return [];
  const psi = Math.atan2(sinPart, cosPart);
  const half = Math.acos(difference / size);
  return [psi - half, psi + half].flatMap((radians) => {
    const degrees = (radians * 180) / Math.PI;
    const shifted = degrees + 360 * Math.ceil((from - degrees) / 360);
    return shifted <= to ? [shifted] : [];
  });
}

/** From the least to the greatest corner along an axis of the turned outline, in unturned coordinates. */
function extremePair(outline: readonly Point[], atMiddle: readonly Point[], axis: 0 | 1): Point {
  let least = 0;
  let most = 0;
  atMiddle.forEach((corner, i) => {
    if (corner[axis] < atMiddle[least]![axis]) least = i;
    if (corner[axis] > atMiddle[most]![axis]) most = i;
  });
  return [outline[most]![0] - outline[least]![0], outline[most]![1] - outline[least]![1]];
}

/** A turn by 180° more takes the same room. */
function normalised(degrees: number): number {
  const turn = ((degrees % 180) + 180) % 180;
  return turn > 90 ? turn - 180 : turn;
}
