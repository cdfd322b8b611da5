import { blindHoleFromTop, screwFreeRadiusMm, screwPilotRadiusMm, throughHole } from '../geometry/drilled.js';
import { chamfered, loftedSolid } from '../geometry/lofted-solid.js';
import { arc, inset, type Plan, type PlanPoint, roundedRectangle, stadium } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';

/** Sizes that the parts of Godwit share, in mm. */
export const godwitSizes = {
  tineThicknessMm: 2.4,
  tineWidthMm: 9,
  /** Clamped end of a tine, up to the edge of the bridge. */
  tailMm: 18,
  pitchMm: 11.5,
  tines: 8,
  boxWidthMm: 116,
  boxLengthMm: 120,
  boxHeightMm: 26,
  boxFloorMm: 2.4,
  boardMm: 3,
  bridgeMm: 8,
  clampMm: 5,
  barDepthMm: 16,
} as const;

const { pitchMm, tines, boxWidthMm, boxLengthMm, boxHeightMm, tailMm, tineWidthMm } = godwitSizes;
const screwRow = Array.from({ length: tines }, (_, index) => pitchMm * (index - (tines - 1) / 2));
const bridgeYMm = 30;
const cornerInsetMm = 6;
const lidScrews: PlanPoint[] = [-1, 1].flatMap((x) =>
  [-1, 1].map((y): PlanPoint => [
    x * (boxWidthMm / 2 - cornerInsetMm),
    y * (boxLengthMm / 2 - cornerInsetMm),
  ]),
);
const fineBevel = { belowMm: 0.4, aboveMm: 0.4 } as const;

/** A tine lying flat, tip along x: the slot in its tail lets it slide under the clamp while it is tuned. */
export function tine(lengthMm: number): Solid {
  const radius = tineWidthMm / 2;
  const total = tailMm + lengthMm;
  const plan: Plan = [[0, -radius], ...arc([total - radius, 0], radius, -90, 90, 20), [0, radius]];
  const slot = stadium(7, 13, 0, screwFreeRadiusMm);
  const { tineThicknessMm } = godwitSizes;
  return loftedSolid(chamfered(plan, 0, tineThicknessMm, { belowMm: 0.3, aboveMm: 0.3 }, inset), [
    {
      sections: [
        { zMm: 0, plan: slot },
        { zMm: tineThicknessMm, plan: slot },
      ],
      opensBelow: true,
      opensAbove: true,
    },
  ]);
}

/** The open box, floor down, with a post in each corner for the lid's screws. */
export function soundBox(): Solid {
  const wall = 2.4;
  const post = 9;
  const outer = roundedRectangle(boxWidthMm, boxLengthMm, 6);
  const x = boxWidthMm / 2 - wall;
  const y = boxLengthMm / 2 - wall;
  const cavity: Plan = [
    [-x + post, -y],
    [x - post, -y],
    [x - post, -y + post],
    [x, -y + post],
    [x, y - post],
    [x - post, y - post],
    [x - post, y],
    [-x + post, y],
    [-x + post, y - post],
    [-x, y - post],
    [-x, -y + post],
    [-x + post, -y + post],
  ];
  return loftedSolid(chamfered(outer, 0, boxHeightMm, { belowMm: 0.6, aboveMm: 0 }, inset), [
    {
      sections: [
        { zMm: godwitSizes.boxFloorMm, plan: cavity },
        { zMm: boxHeightMm, plan: cavity },
      ],
      opensBelow: false,
      opensAbove: true,
    },
    ...lidScrews.map((centre) => blindHoleFromTop(centre, screwPilotRadiusMm, boxHeightMm, 12)),
  ]);
}

/** The lid that carries the tines, outer side up. */
export function soundBoard(): Solid {
  const { boardMm } = godwitSizes;
  const plan = roundedRectangle(boxWidthMm, boxLengthMm, 6);
  return loftedSolid(chamfered(plan, 0, boardMm, fineBevel, inset), [
    ...lidScrews.map((centre) => throughHole(centre, screwFreeRadiusMm, 0, boardMm)),
    ...screwRow.map((x) => throughHole([x, bridgeYMm], screwFreeRadiusMm, 0, boardMm)),
    throughHole([0, -32], 11, 0, boardMm, 0.4, 64),
  ]);
}

/** Bridge or clamp bar: eight holes in a row; tines bend over the edge of both. */
export function tineBar(heightMm: number): Solid {
  const plan = roundedRectangle(pitchMm * tines + 6, godwitSizes.barDepthMm, 1.5);
  // The edge over which the tines bend stays sharp: a bevel there would lengthen them.
  return loftedSolid(
    [
      { zMm: 0, plan },
      { zMm: heightMm, plan },
    ],
    screwRow.map((x) => throughHole([x, 0], screwFreeRadiusMm, 0, heightMm)),
  );
}
