import { blindHoleFromTop, screwPilotRadiusMm } from '../geometry/drilled.js';
import { loftedSolid, type Passage } from '../geometry/lofted-solid.js';
import { circle, inset, type Plan, shifted } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import { collarRadiusMm, curlewSizes, pipeRadiusMm } from './curlew-pipe.js';

export const pipesPerBlock = 6;
export const blockWidthMm = pipesPerBlock * curlewSizes.pitchMm;
const blockDepthMm = 39;
const socketRowYMm = 17.5;
const slotYMm = 32;
const slotDepthMm = 19;
/** Where the screws of the lip rail go, along the block: between the pipes. */
export const railScrewsXMm = [1, 3, 5].map((pipes) => pipes * curlewSizes.pitchMm);
export const railScrewsYMm = 2.8;

/** Half a bow tie: narrow at the joint, wide inside the block, so that what slides in cannot be pulled out sideways. */
export const dovetail = { reachMm: 7, neckHalfMm: 3, wideHalfMm: 4.5 } as const;

/**
 * A rack of six pipes, underside down. All three blocks are level on top; the one for the longest
 * pipes is the tallest and grips them deepest. `marks` counts the dimples that tell the blocks apart.
 */
export function curlewBlock(heightMm: number, marks: number): Solid {
  const footBevel = 0.6;
  // The sockets come close to the ends of the block: a wider bevel would cut into them.
  const topBevel = 0.3;
  const slotFloor = heightMm - slotDepthMm;
  const shell = [
    { zMm: 0, plan: inset(blockPlan(false), footBevel) },
    { zMm: footBevel, plan: blockPlan(false) },
    { zMm: slotFloor, plan: blockPlan(false) },
    { zMm: slotFloor, plan: blockPlan(true) },
    { zMm: heightMm - topBevel, plan: blockPlan(true) },
    { zMm: heightMm, plan: inset(blockPlan(true), topBevel) },
  ];
  const sockets = Array.from({ length: pipesPerBlock }, (_, index) =>
    socket(curlewSizes.pitchMm * (index + 0.5), heightMm),
  );
  const pilots = railScrewsXMm.map((x) =>
    blindHoleFromTop([x, railScrewsYMm], screwPilotRadiusMm, heightMm, 10),
  );
  const dimples = Array.from({ length: marks }, (_, index) =>
    blindHoleFromTop([blockWidthMm / 2 + 6 * (index - (marks - 1) / 2), slotYMm], 1.2, heightMm, 0.8),
  );
  return loftedSolid(shell, [...sockets, ...pilots, ...dimples]);
}

/** The same number of corners with and without the slots, so that one can step to the other. */
function blockPlan(hasSlots: boolean): Plan {
  const reach = hasSlots ? dovetail.reachMm : 0;
  const half = hasSlots ? dovetail.wideHalfMm : dovetail.neckHalfMm - 1;
  const neck = dovetail.neckHalfMm;
  return [
    [0, 0],
    [blockWidthMm, 0],
    [blockWidthMm, slotYMm - neck],
    [blockWidthMm - reach, slotYMm - half],
    [blockWidthMm - reach, slotYMm + half],
    [blockWidthMm, slotYMm + neck],
    [blockWidthMm, blockDepthMm],
    [0, blockDepthMm],
    [0, slotYMm + neck],
    [reach, slotYMm + half],
    [reach, slotYMm - half],
    [0, slotYMm - neck],
  ];
}

function socket(x: number, heightMm: number): Passage {
  const { socketGapMm, collarOutMm, rimBevelMm, segments } = curlewSizes;
  const at = (zMm: number, radiusMm: number) => ({
    zMm,
    plan: circle(radiusMm, segments, [x, socketRowYMm]),
  });
  const radius = pipeRadiusMm + socketGapMm;
  return {
    sections: [
      at(0, radius + rimBevelMm),
      at(rimBevelMm, radius),
      at(heightMm - collarOutMm, radius),
      at(heightMm, collarRadiusMm + socketGapMm),
    ],
    opensBelow: true,
    opensAbove: true,
  };
}

const tongueHeightMm = 18.6;
export const tongueEndGapMm = 0.2;

/**
 * The bow tie that draws two blocks together, pushed down into the slots of both.
 * @param cheekGapMm gap between a cheek of the tongue and the slot, on each side
 */
export function lockingTongue(cheekGapMm: number): Solid {
  const reach = dovetail.reachMm - tongueEndGapMm;
  const wide = dovetail.wideHalfMm - cheekGapMm;
  const neck = dovetail.neckHalfMm - cheekGapMm;
  const plan: Plan = [
    [-reach, -wide],
    [0, -neck],
    [reach, -wide],
    [reach, wide],
    [0, neck],
    [-reach, wide],
  ];
  return loftedSolid(tongueSections(plan), [
    blindHoleFromTop([0, 0], screwPilotRadiusMm, tongueHeightMm, 10),
  ]);
}

/** Closes the free slot at either end of the row, and carries the neck cord. */
export function endTongue(): Solid {
  const gap = 0.15;
  const neck = dovetail.neckHalfMm - gap;
  const wide = dovetail.wideHalfMm - gap;
  const reach = dovetail.reachMm - tongueEndGapMm;
  const lugRadius = 7;
  const lugX = 9;
  const away = Math.asin(neck / lugRadius);
  const segments = 40;
  const lug: Plan = Array.from({ length: segments + 1 }, (_, index) => {
    const angle = Math.PI + away + ((2 * Math.PI - 2 * away) * index) / segments;
    return [lugX + lugRadius * Math.cos(angle), lugRadius * Math.sin(angle)] as const;
  });
  const plan: Plan = [[-reach, wide], [-reach, -wide], [0, -neck], ...lug, [0, neck]];
  const eye = (zMm: number, radiusMm: number) => ({ zMm, plan: shifted(circle(radiusMm, 32), lugX, 0) });
  return loftedSolid(tongueSections(plan), [
    {
      sections: [eye(0, 2.7), eye(0.6, 2.1), eye(tongueHeightMm - 0.6, 2.1), eye(tongueHeightMm, 2.7)],
      opensBelow: true,
      opensAbove: true,
    },
  ]);
}

const tongueSections = (plan: Plan) => [
  { zMm: 0, plan: inset(plan, 0.8) },
  { zMm: 0.8, plan },
  { zMm: tongueHeightMm - 0.4, plan },
  { zMm: tongueHeightMm, plan: inset(plan, 0.4) },
];
