import { type Cell, cellSolid } from '../geometry/cell-solid.js';
import { type Plan, type PlanPoint, rectangle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';

/** Sizes of a Dunlin vessel, in mm. It prints roof down, mouth up: nothing overhangs. */
export const dunlinSizes = {
  widthMm: 16,
  depthMm: 45,
  sideWallMm: 2,
  /** Front wall, in which the window is cut. */
  frontWallMm: 3,
  backWallMm: 2,
  roofMm: 2,
  windowWidthMm: 8,
  windowHeightMm: 4,
  blockMm: 8,
  beakMm: 12,
  beakDepthMm: 8,
} as const;

const { widthMm, depthMm, sideWallMm, frontWallMm, backWallMm, windowWidthMm } = dunlinSizes;
const rear = depthMm - backWallMm;
export const chamberAreaMm2 = (widthMm - 2 * sideWallMm) * (rear - frontWallMm);
/** Diameter of the round hole with the window's area: the voicing formula knows round holes. */
export const windowDiameterMm = Math.sqrt((4 * windowWidthMm * dunlinSizes.windowHeightMm) / Math.PI);

const windowFrom = (widthMm - windowWidthMm) / 2;
const windowTo = windowFrom + windowWidthMm;
/** The front wall across the window, in strips: the lip's ramp takes them away one by one. */
const rampStepYMm = 0.2;
const rampStepZMm = 0.4;
const rampSteps = 12;
const stripEdges = [...Array.from({ length: rampSteps + 1 }, (_, index) => (index * 2) / 10), frontWallMm];
/** The windway lies at the height of the lip's edge: from 2.0 to 3.2 mm behind the front. */
const windwayFromY = 2;
const windwayToY = 3.2;

/** Height of the chamber that holds a volume, in mm. */
export const chamberHeightMm = (volumeCm3: number) => (volumeCm3 * 1000) / chamberAreaMm2;

/**
 * A vessel whistle: a narrow chamber, a window with a sharp lip in its front, a block with a windway,
 * and a beak that goes into the mouthpiece.
 */
export function dunlinVessel(volumeCm3: number): Solid {
  const { roofMm, windowHeightMm, blockMm, beakMm } = dunlinSizes;
  const blockFrom = roofMm + chamberHeightMm(volumeCm3);
  const edge = blockFrom - windowHeightMm;
  const blockTo = blockFrom + blockMm;
  const beakTo = blockTo + beakMm;
  const rampFrom = edge - rampSteps * rampStepZMm;
  if (rampFrom <= roofMm) throw new RangeError(`A chamber of ${volumeCm3} cm³ leaves no room for the lip.`);

  const strips = stripEdges.slice(0, -1).map((fromY, index): Cell => {
    const toY = stripEdges[index + 1] ?? frontWallMm;
    const isLip = index >= rampSteps;
    const lipTo = isLip ? edge : rampFrom + index * rampStepZMm;
    const isWindway = fromY >= windwayFromY - rampStepYMm / 2;
    return {
      plan: rectangle(windowFrom, fromY, windowTo, toY),
      filledMm: isWindway
        ? [[0, lipTo]]
        : [
            [0, lipTo],
            [blockFrom, beakTo],
          ],
    };
  });
  return cellSolid([
    ...strips,
    { plan: leftFront, filledMm: [[0, beakTo]] },
    { plan: mirrored(leftFront), filledMm: [[0, beakTo]] },
    { plan: rectangle(windowFrom, frontWallMm, windowTo, windwayToY), filledMm: [[0, roofMm]] },
    {
      plan: behindWindway,
      filledMm: [
        [0, roofMm],
        [blockFrom, beakTo],
      ],
    },
    {
      plan: rectangle(sideWallMm, dunlinSizes.beakDepthMm, widthMm - sideWallMm, rear),
      filledMm: [
        [0, roofMm],
        [blockFrom, blockTo],
      ],
    },
    { plan: backShell, filledMm: [[0, blockTo]] },
  ]);
}

const cornerMm = 1;
const { beakDepthMm } = dunlinSizes;

const leftFront: Plan = [
  [cornerMm, 0],
  [windowFrom, 0],
  ...stripEdges.slice(1).map((y): PlanPoint => [windowFrom, y]),
  [sideWallMm, frontWallMm],
  [sideWallMm, beakDepthMm],
  [0, beakDepthMm],
  [0, cornerMm],
];

const behindWindway: Plan = [
  [sideWallMm, frontWallMm],
  [windowFrom, frontWallMm],
  [windowFrom, windwayToY],
  [windowTo, windwayToY],
  [windowTo, frontWallMm],
  [widthMm - sideWallMm, frontWallMm],
  [widthMm - sideWallMm, beakDepthMm],
  [sideWallMm, beakDepthMm],
];

const backShell: Plan = [
  [0, beakDepthMm],
  [sideWallMm, beakDepthMm],
  [sideWallMm, rear],
  [widthMm - sideWallMm, rear],
  [widthMm - sideWallMm, beakDepthMm],
  [widthMm, beakDepthMm],
  [widthMm, depthMm - cornerMm],
  [widthMm - cornerMm, depthMm],
  [cornerMm, depthMm],
  [0, depthMm - cornerMm],
];

function mirrored(plan: Plan): Plan {
  return plan.map(([x, y]): PlanPoint => [widthMm - x, y]).toReversed();
}
