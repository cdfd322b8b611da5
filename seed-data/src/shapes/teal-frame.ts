import {
  blindHoleFromBelow,
  blindHoleFromTop,
  counterboredHole,
  screwPilotRadiusMm,
} from '../geometry/drilled.js';
import { chamfered, loftedSolid } from '../geometry/lofted-solid.js';
import { inset, mirroredAcrossX, type Plan, type PlanPoint, roundedRectangle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { tealSizes } from './teal-bars.js';

const railHeightMm = 10;
const railHalfWidthMm = 6;
const endMm = 13;
const crossScrewMm = 5;
const bevel = { belowMm: 0.5, aboveMm: 0.5 } as const;

/** Nodes of the bars from the middle line of the frame, longest bar first. */
const nodeOffsetsMm = (barLengthsMm: readonly number[]) =>
  barLengthsMm.map((length) => length * (0.5 - tealSizes.nodeFraction));

export const barXMm = (index: number) => endMm + tealSizes.spacingMm * (index + 0.5);
export const frameLengthMm = (bars: number) => 2 * endMm + tealSizes.spacingMm * bars;

/**
 * One of two rails, lying as it is used: it follows the nodes of the bars, with a hole for each bar's
 * pin from above, and one at either end for the cross pieces from below. Front and back are mirror images.
 */
export function barRail(barLengthsMm: readonly number[], side: 'front' | 'back'): Solid {
  const nodes = nodeOffsetsMm(barLengthsMm).map((y, index): PlanPoint => [barXMm(index), y]);
  const firstY = nodes[0]?.[1] ?? 0;
  const lastY = nodes.at(-1)?.[1] ?? 0;
  const line: PlanPoint[] = [[0, firstY], ...nodes, [frameLengthMm(barLengthsMm.length), lastY]];
  const back: Plan = [
    ...line.map(([x, y]) => [x, y - railHalfWidthMm] as const),
    ...line.map(([x, y]) => [x, y + railHalfWidthMm] as const).toReversed(),
  ];
  const sign = side === 'back' ? 1 : -1;
  const crossX = [crossScrewMm, frameLengthMm(barLengthsMm.length) - crossScrewMm];
  return loftedSolid(
    chamfered(side === 'back' ? back : mirroredAcrossX(back), 0, railHeightMm, bevel, inset),
    [
      ...nodes.map(([x, y]) => blindHoleFromTop([x, sign * y], screwPilotRadiusMm, railHeightMm, 8)),
      ...crossX.map((x, index) =>
        blindHoleFromBelow([x, sign * (index === 0 ? firstY : lastY)], screwPilotRadiusMm, 7),
      ),
    ],
  );
}

/** A foot across the frame under the ends of both rails; screw heads sink into its underside. */
export function crossPiece(barLengthMm: number): Solid {
  const [nodeY = 0] = nodeOffsetsMm([barLengthMm]);
  const heightMm = 6;
  const plan = roundedRectangle(2 * crossScrewMm, 2 * (nodeY + railHalfWidthMm), 2);
  return loftedSolid(chamfered(plan, 0, heightMm, bevel, inset), [
    counterboredHole([0, -nodeY], 3, heightMm),
    counterboredHole([0, nodeY], 3, heightMm),
  ]);
}
