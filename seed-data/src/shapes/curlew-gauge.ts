import { blindHoleFromTop } from '../geometry/drilled.js';
import { chamfered, loftedSolid } from '../geometry/lofted-solid.js';
import { inset, type Plan, type PlanPoint } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { dovetail, tongueEndGapMm } from './curlew-block.js';

const halfPlateMm = 12;
const heightMm = 8;
const dimpleRadiusMm = 1.2;

/**
 * A square handle with a lug on three of its sides, each the half of a locking tongue that goes into a
 * block, and as many dimples beside it as its place in the row: one for the tightest.
 * @param cheekGapsMm of the three lugs, tightest first
 */
export function tongueGauge(cheekGapsMm: readonly [number, number, number]): Solid {
  const sides = [0, 1, 2].map((side) => lug(cheekGapsMm[side] ?? 0).map((point) => turned(point, side)));
  const plan: Plan = [[-halfPlateMm, -halfPlateMm], ...sides.flat()];
  const dimples = [0, 1, 2].flatMap((side) =>
    Array.from({ length: side + 1 }, (_, index) =>
      blindHoleFromTop(turned([8, 4 * (index - side / 2)], side), dimpleRadiusMm, heightMm, 0.8),
    ),
  );
  return loftedSolid(chamfered(plan, 0, heightMm, { belowMm: 0.4, aboveMm: 0.4 }, inset), dimples);
}

/** The right side of the handle from its lower corner up, with the lug in its middle. */
function lug(cheekGapMm: number): PlanPoint[] {
  const neck = dovetail.neckHalfMm - cheekGapMm;
  const wide = dovetail.wideHalfMm - cheekGapMm;
  const end = halfPlateMm + dovetail.reachMm - tongueEndGapMm;
  return [
    [halfPlateMm, -halfPlateMm],
    [halfPlateMm, -neck],
    [end, -wide],
    [end, wide],
    [halfPlateMm, neck],
  ];
}

/** Turned about the middle by so many right angles, counter-clockwise. */
function turned([x, y]: PlanPoint, quarters: number): PlanPoint {
  if (quarters === 1) return [-y, x];
  return quarters === 2 ? [-x, -y] : [x, y];
}
