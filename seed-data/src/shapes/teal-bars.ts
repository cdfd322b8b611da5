import { throughHole } from '../geometry/drilled.js';
import { chamfered, loftedSolid } from '../geometry/lofted-solid.js';
import { circle, inset, roundedRectangle } from '../geometry/plan.js';
import { laidAlongX, type Solid } from '../geometry/solid.js';

/** Sizes that bars and frame of Teal share, in mm. */
export const tealSizes = {
  barThicknessMm: 4,
  barWidthMm: 20,
  barHoleRadiusMm: 2.1,
  /** Where a free bar stands still, as a part of its length from either end. */
  nodeFraction: 0.22416,
  spacingMm: 23.5,
} as const;

/** A free bar lying flat, with a hole at either node, where a pin takes nothing from the tone. */
export function chimeBar(lengthMm: number): Solid {
  const { barThicknessMm, barWidthMm, barHoleRadiusMm, nodeFraction } = tealSizes;
  const plan = roundedRectangle(lengthMm, barWidthMm, 3);
  const nodeX = lengthMm * (0.5 - nodeFraction);
  return loftedSolid(chamfered(plan, 0, barThicknessMm, { belowMm: 0.4, aboveMm: 0.4 }, inset), [
    throughHole([-nodeX, 0], barHoleRadiusMm, 0, barThicknessMm),
    throughHole([nodeX, 0], barHoleRadiusMm, 0, barThicknessMm),
  ]);
}

export const beaterHandleLengthMm = 170;
const handleAcrossFlatsMm = 6;
const handleSocketDepthMm = 10;

/** A barrel: the middle zone of a ball, flat at both ends where it would overhang; the handle goes in from above. */
export function beaterHead(): Solid {
  const ballRadius = 10;
  const steps = 16;
  const half = ballRadius * Math.SQRT1_2;
  const shell = Array.from({ length: steps + 1 }, (_, index) => {
    const angle = (Math.PI / 2) * (index / steps) - Math.PI / 4;
    return { zMm: half + ballRadius * Math.sin(angle), plan: circle(ballRadius * Math.cos(angle), 64) };
  });
  const socket = circle(3.4, 32);
  return loftedSolid(shell, [
    {
      sections: [
        { zMm: 2 * half - handleSocketDepthMm, plan: socket },
        { zMm: 2 * half, plan: socket },
      ],
      opensBelow: false,
      opensAbove: true,
    },
  ]);
}

/** An eight-sided stick, lying on one of its flats. */
export function beaterHandle(): Solid {
  const radius = handleAcrossFlatsMm / 2 / Math.cos(Math.PI / 8);
  const plan = Array.from({ length: 8 }, (_, index) => {
    const angle = Math.PI / 8 + (index * Math.PI) / 4;
    return [radius * Math.cos(angle), radius * Math.sin(angle)] as const;
  });
  return laidAlongX(
    loftedSolid(chamfered(plan, 0, beaterHandleLengthMm, { belowMm: 0.6, aboveMm: 0.6 }, inset)),
  );
}
