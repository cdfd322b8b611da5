import { chamfered, loftedSolid, type Section } from '../geometry/lofted-solid.js';
import { inset, type PlanPoint, roundedRectangle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { dunlinSizes } from './dunlin-vessel.js';

const vessels = 3;
const rowMm = vessels * dunlinSizes.widthMm;
const gapMm = 0.3;

/**
 * The mouthpiece, lips down on the bed: one breath goes in and is led to the windways of three vessels,
 * whose beaks push into the socket on top.
 */
export function mouthpiece(): Solid {
  const socketFrom = 20;
  const top = socketFrom + 10;
  // The windways lie 1.4 mm in front of the middle of the beaks.
  const windways: PlanPoint = [0, -1.4];
  const at = (
    zMm: number,
    width: number,
    depth: number,
    radius: number,
    centre: PlanPoint = [0, 0],
  ): Section => ({
    zMm,
    plan: roundedRectangle(width, depth, radius, centre),
  });
  const wide = rowMm + 2 * gapMm;
  const deep = dunlinSizes.beakDepthMm + 2 * gapMm;
  const wall = 2.2;
  return loftedSolid(
    [
      at(0, 32, 8, 3.4, windways),
      at(0.8, 33.6, 9.6, 4.2, windways),
      at(17, wide + 2 * wall, deep + 2 * wall, 3),
      at(top, wide + 2 * wall, deep + 2 * wall, 3),
    ],
    [
      {
        sections: [
          at(0, 26, 3.6, 1.6, windways),
          at(socketFrom, 42, 4.2, 1.6, windways),
          at(socketFrom, wide, deep, 0.6),
          at(top - 0.6, wide, deep, 0.6),
          at(top, wide + 1.2, deep + 1.2, 1.2),
        ],
        opensBelow: true,
        opensAbove: true,
      },
    ],
  );
}

/** A band that holds the three vessels side by side. */
export function strap(): Solid {
  const wall = 2.4;
  const heightMm = 10;
  const inner = roundedRectangle(rowMm + 2 * gapMm, dunlinSizes.depthMm + 2 * gapMm, 0.8);
  const outer = roundedRectangle(rowMm + 2 * (gapMm + wall), dunlinSizes.depthMm + 2 * (gapMm + wall), 3.2);
  return loftedSolid(chamfered(outer, 0, heightMm, { belowMm: 0.5, aboveMm: 0.5 }, inset), [
    {
      sections: chamfered(inner, 0, heightMm, { belowMm: 0.5, aboveMm: 0.5 }, (plan, mm) => inset(plan, -mm)),
      opensBelow: true,
      opensAbove: true,
    },
  ]);
}
