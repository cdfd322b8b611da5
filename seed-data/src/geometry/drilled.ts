import type { Passage } from './lofted-solid.js';
import { circle, type PlanPoint } from './plan.js';

/** Radius of a hole that an M3 screw cuts its own thread into. */
export const screwPilotRadiusMm = 1.3;
/** Radius of a hole that an M3 screw passes through freely. */
export const screwFreeRadiusMm = 1.7;

const holeSegments = 32;

/** Round hole right through, its rims bevelled so that the first layer's squash does not narrow it. */
export function throughHole(
  centre: PlanPoint,
  radiusMm: number,
  fromZ: number,
  toZ: number,
  bevelMm = 0.3,
  segments = holeSegments,
): Passage {
  const at = (zMm: number, radius: number) => ({ zMm, plan: circle(radius, segments, centre) });
  return {
    sections: [
      at(fromZ, radiusMm + bevelMm),
      at(fromZ + bevelMm, radiusMm),
      at(toZ - bevelMm, radiusMm),
      at(toZ, radiusMm + bevelMm),
    ],
    opensBelow: true,
    opensAbove: true,
  };
}

/** Round blind hole from the top down. */
export function blindHoleFromTop(
  centre: PlanPoint,
  radiusMm: number,
  topZ: number,
  depthMm: number,
): Passage {
  const plan = circle(radiusMm, holeSegments, centre);
  return {
    sections: [
      { zMm: topZ - depthMm, plan },
      { zMm: topZ, plan },
    ],
    opensBelow: false,
    opensAbove: true,
  };
}

/** Round blind hole from the underside (z = 0) up. */
export function blindHoleFromBelow(centre: PlanPoint, radiusMm: number, depthMm: number): Passage {
  const plan = circle(radiusMm, holeSegments, centre);
  return {
    sections: [
      { zMm: 0, plan },
      { zMm: depthMm, plan },
    ],
    opensBelow: true,
    opensAbove: false,
  };
}

/** Hole for an M3 screw with a round room for its head, opening downwards so that the head stays hidden. */
export function counterboredHole(centre: PlanPoint, headDepthMm: number, topZ: number): Passage {
  const head = circle(3.2, holeSegments, centre);
  const shank = circle(screwFreeRadiusMm, holeSegments, centre);
  return {
    sections: [
      { zMm: 0, plan: head },
      { zMm: headDepthMm, plan: head },
      { zMm: headDepthMm, plan: shank },
      { zMm: topZ, plan: shank },
    ],
    opensBelow: true,
    opensAbove: true,
  };
}
