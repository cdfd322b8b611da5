import { boxOf, convexHull, rectangle } from './convex-hull.js';
import { PlatesError, requireNotNegative, requirePositive } from './plates-error.js';
import { bestTurn, slackAt, type BestTurn } from './turn-to-fit.js';
import type { Bed, OrientationRule, Point } from './types.js';

export interface PartShape {
  /** Width, depth and height as exported. */
  readonly sizeMm: readonly [number, number, number];
  /** Convex outline from above, if known: rounder parts then fit where their box would not. */
  readonly footprint?: readonly Point[];
  readonly orientation: OrientationRule;
}

export interface FitOptions {
  /** Kept free along all four edges of the bed; 0 if not given. */
  readonly marginMm?: number;
}

export interface Fit {
  readonly fit: 'fits' | 'fits-turned' | 'fits-laid' | 'too-big';
  /** Counter-clockwise about the vertical, above −90 and up to 90; absent where nothing is turned. */
  readonly turnedDegrees?: number;
  /** The axis of the part that stands upright when it is laid. */
  readonly laidAxis?: 'x' | 'y';
  /** For a part that is too big: the least excess that any allowed placing leaves, on its worst axis of the bed. */
  readonly overMm?: { readonly axis: 'x' | 'y' | 'z'; readonly mm: number };
}

/** One way a part may rest on the bed. */
export interface Resting {
  readonly outline: readonly Point[];
  readonly heightMm: number;
  readonly laidAxis?: 'x' | 'y';
}

const TOUCHES_MM = 1e-6;

/**
 * Whether a part fits a printer, as exported, turned by any angle about the vertical, or stood or laid on
 * another side, as far as its orientation rule allows. Turning is judged by the convex outline and is exact;
 * a laid part is judged by its box.
 *
 * @throws PlatesError when a size or the bed is no positive number, or the margin leaves no room.
 */
export function fitPart(part: PartShape, bed: Bed, { marginMm = 0 }: FitOptions = {}): Fit {
  const room = roomOn(bed, marginMm);
  let least: { axis: 'x' | 'y' | 'z'; mm: number } | undefined;
  for (const resting of restingsOf(part)) {
    const turn = allowedTurn(resting.outline, part.orientation, room);
    const overHeight = resting.heightMm - bed.zMm;
    const isHeightWorst = overHeight >= -turn.slackMm;
    const over = isHeightWorst ? overHeight : -turn.slackMm;
    if (over <= TOUCHES_MM) {
      const isTurned = turn.degrees !== 0;
      const isLaid = resting.laidAxis !== undefined;
      return {
        fit: isLaid ? 'fits-laid' : isTurned ? 'fits-turned' : 'fits',
        ...(isTurned && { turnedDegrees: turn.degrees }),
        ...(resting.laidAxis !== undefined && { laidAxis: resting.laidAxis }),
      };
    }
    if (least === undefined || over < least.mm) {
      least = { axis: isHeightWorst ? 'z' : turn.overAxis, mm: over };
    }
  }
  return { fit: 'too-big', overMm: least! };
}

/** Ways to rest on the bed, as exported first, then the lower of the laid ones. */
export function restingsOf({ sizeMm, footprint, orientation }: PartShape): Resting[] {
  const [width, depth, height] = sizeMm;
  requirePositive('The width of the part in mm', width);
  requirePositive('The depth of the part in mm', depth);
  requirePositive('The height of the part in mm', height);
  const hull = footprint === undefined ? rectangle(width, depth) : convexHull(footprint);
  if (hull.length < 3) {
    throw new PlatesError('The footprint has fewer than three corners; give the outline of the part.');
  }
  const asExported: Resting = { outline: hull, heightMm: height };
  if (orientation !== 'may-lie') return [asExported];
  const box = boxOf(hull);
  const hullWidth = box.right - box.left;
  const hullDepth = box.back - box.front;
  const laid: Resting[] = [
    { outline: rectangle(hullWidth, height), heightMm: hullDepth, laidAxis: 'y' },
    { outline: rectangle(height, hullDepth), heightMm: hullWidth, laidAxis: 'x' },
  ];
  return [asExported, ...laid.sort((a, b) => a.heightMm - b.heightMm)];
}

/** No turn if it fits so, else a quarter turn, else the turn with the most room. */
export function allowedTurn(
  outline: readonly Point[],
  rule: OrientationRule,
  room: { readonly widthMm: number; readonly depthMm: number },
): BestTurn {
  const straight = slackAt(outline, 0, room.widthMm, room.depthMm);
  if (rule === 'as-exported' || straight.slackMm >= -TOUCHES_MM) return straight;
  const quarter = slackAt(outline, 90, room.widthMm, room.depthMm);
  if (quarter.slackMm >= -TOUCHES_MM) return quarter;
  return bestTurn(outline, room.widthMm, room.depthMm);
}

/** What the margin leaves of the bed. */
export function roomOn(bed: Bed, marginMm: number): { widthMm: number; depthMm: number } {
  requirePositive('The width of the bed in mm', bed.xMm);
  requirePositive('The depth of the bed in mm', bed.yMm);
  requirePositive('The height of the printer in mm', bed.zMm);
  requireNotNegative('The margin in mm', marginMm);
  const widthMm = bed.xMm - 2 * marginMm;
  const depthMm = bed.yMm - 2 * marginMm;
  if (widthMm <= 0 || depthMm <= 0) {
    throw new PlatesError(`A margin of ${marginMm} mm leaves no room on the bed; choose a smaller margin.`);
  }
  return { widthMm, depthMm };
}
