import { type Cell, cellSolid } from '../geometry/cell-solid.js';
import { screwFreeRadiusMm } from '../geometry/drilled.js';
import { circle, rectangle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { nutScrewMm, nutScrewsXMm, saddleScrewMm } from './turnstone-sizes.js';

const footHeightMm = 3;
/** A brass rod of 2 mm lies in it: a wire would cut into plastic. */
const groove = { halfMm: 1.05, deepMm: 1 } as const;
const ridgeHalfMm = 3;

/** Each string's saddle is one layer lower than that of the string below it, which swings wider. */
const tallestSaddleMm = 8;
const layerMm = 0.2;
export const saddleHeightMm = (index: number): number => tallestSaddleMm - layerMm * index;
export const nutHeightMm = 9;

/**
 * A foot with screw holes and before it a ridge with the rod's groove. The side where the string comes up
 * from its screw or pin stands lower, so that it touches nothing but the rod.
 * @param side where the foot lies, as seen from the rod: −1 below, 1 above
 */
function bridge(
  fromX: number,
  toX: number,
  heightMm: number,
  foot: { side: -1 | 1; reachMm: number; screws: readonly (readonly [number, number])[] },
): Solid {
  const strip = (near: number, far: number, toZ: number, holes: Cell['holes'] = []): Cell => ({
    plan: foot.side < 0 ? rectangle(fromX, -far, toX, -near) : rectangle(fromX, near, toX, far),
    holes,
    filledMm: [[0, toZ]],
  });
  return cellSolid([
    strip(-ridgeHalfMm, -groove.halfMm, heightMm),
    strip(-groove.halfMm, groove.halfMm, heightMm - groove.deepMm),
    strip(groove.halfMm, 2, heightMm - 0.8),
    strip(2, ridgeHalfMm, heightMm - 1.8),
    strip(
      ridgeHalfMm,
      foot.reachMm,
      footHeightMm,
      foot.screws.map((centre) => circle(screwFreeRadiusMm, 32, centre)),
    ),
  ]);
}

/** Where one string ends: its screw holds the saddle and, under its head, the string's loop. */
export const saddle = (index: number): Solid =>
  bridge(-5, 5, saddleHeightMm(index), { side: -1, reachMm: 12, screws: [[0, saddleScrewMm]] });

/** Where all strings begin, before the pins. */
export function nut(): Solid {
  const [fromX, toX] = [5, 145];
  return bridge(fromX, toX, nutHeightMm, {
    side: 1,
    reachMm: 9,
    screws: nutScrewsXMm.map((x) => [x, nutScrewMm] as const),
  });
}
