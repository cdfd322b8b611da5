import { type Cell, cellSolid } from '../geometry/cell-solid.js';
import { screwFreeRadiusMm } from '../geometry/drilled.js';
import { circle, rectangle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { blockWidthMm, railScrewsXMm, railScrewsYMm } from './curlew-block.js';

const endGapMm = 0.5;
const footHeightMm = 3;
const ridge = { frontYMm: 5.6, backYMm: 9 } as const;
/**
 * The ridge's top is rounded in steps of one layer, as the printer lays it: how far the edge stands back, from the top layer down
 * (a radius of 1 mm taken at the middle of each layer of 0.2 mm).
 */
const layerMm = 0.2;
const standBackMm = [0.56, 0.29, 0.13] as const;

/** What the lower lip rests on: a foot that is screwed to the block, and a ridge along the pipes. */
export function lipRail(heightMm: number): Solid {
  const fromX = endGapMm;
  const toX = blockWidthMm - endGapMm;
  const strip = (fromY: number, toY: number, toZ: number): Cell => ({
    plan: rectangle(fromX, fromY, toX, toY),
    filledMm: [[0, toZ]],
  });
  const foot: Cell = {
    plan: rectangle(fromX, 0, toX, ridge.frontYMm),
    holes: railScrewsXMm.map((x) => circle(screwFreeRadiusMm, 32, [x, railScrewsYMm])),
    filledMm: [[0, footHeightMm]],
  };
  const edges = standBackMm.toReversed();
  const front: Cell[] = [];
  const back: Cell[] = [];
  let reached = 0;
  edges.forEach((edge, index) => {
    const toZ = heightMm - layerMm * (edges.length - index);
    front.push(strip(ridge.frontYMm + reached, ridge.frontYMm + edge, toZ));
    back.push(strip(ridge.backYMm - edge, ridge.backYMm - reached, toZ));
    reached = edge;
  });
  const middle = strip(ridge.frontYMm + reached, ridge.backYMm - reached, heightMm);
  return cellSolid([foot, ...front, middle, ...back]);
}
