import { blindHoleFromTop, screwFreeRadiusMm, screwPilotRadiusMm, throughHole } from '../geometry/drilled.js';
import { chamfered, loftedSolid } from '../geometry/lofted-solid.js';
import { circle, inset, type Plan } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';
import {
  boardScrews,
  crownYMm,
  edgeYMm,
  nutScrewMm,
  nutScrewsXMm,
  nutYMm,
  saddleScrewMm,
  stringXMm,
  turnstoneSizes,
} from './turnstone-sizes.js';

const { strings, widthMm, heightMm, floorMm, sideWallMm, hitchMm, belowNutMm, aboveNutMm, pinMm } =
  turnstoneSizes;
const each = <T>(make: (index: number) => T): T[] =>
  Array.from({ length: strings }, (_, index) => make(index));

/** Under 5 mm, for the pin to grip: printed holes come out 0.1 to 0.3 mm narrow. */
const pinHoleRadiusMm = 2.4;

/** What lies between the slanted edge and the nut, so far within them and the sides. */
const between = (fromX: number, aboveEdge: number, belowNut: number): Plan => {
  const toX = widthMm - fromX;
  return [
    [fromX, edgeYMm(fromX) + aboveEdge],
    [toX, edgeYMm(toX) + aboveEdge],
    [toX, nutYMm - belowNut],
    [fromX, nutYMm - belowNut],
  ];
};

/** The body, floor down: a box with a solid block at either end, for the pins and for the saddles. */
export function psalteryBody(): Solid {
  const outer = between(0, 0, -aboveNutMm);
  const cavity = between(sideWallMm, hitchMm, belowNutMm);
  const pilot = (x: number, y: number) => blindHoleFromTop([x, y], screwPilotRadiusMm, heightMm, 12);
  return loftedSolid(chamfered(outer, 0, heightMm, { belowMm: 0.6, aboveMm: 0.6 }, inset), [
    {
      sections: [
        { zMm: floorMm, plan: cavity },
        { zMm: heightMm, plan: cavity },
      ],
      opensBelow: false,
      opensAbove: true,
    },
    ...each((index) => pilot(stringXMm(index), crownYMm(index) + saddleScrewMm)),
    ...nutScrewsXMm.map((x) => pilot(x, nutYMm + nutScrewMm)),
    ...boardScrews.map(([x, y]) => pilot(x, y)),
    ...each((index) =>
      blindHoleFromTop([stringXMm(index), nutYMm + pinMm], pinHoleRadiusMm, heightMm, heightMm - 4),
    ),
  ]);
}

/** The board over the cavity, with a round hole. It carries no string. */
export function psalteryBoard(): Solid {
  const { boardMm, boardLapMm } = turnstoneSizes;
  const lapUp = boardLapMm * Math.hypot(1, edgeYMm(1));
  const plan = between(sideWallMm - boardLapMm, hitchMm - lapUp, belowNutMm - boardLapMm);
  return loftedSolid(chamfered(plan, 0, boardMm, { belowMm: 0.4, aboveMm: 0.4 }, inset), [
    ...boardScrews.map((centre) => throughHole(centre, screwFreeRadiusMm, 0, boardMm)),
    {
      sections: [
        { zMm: 0, plan: circle(15, 72, [62, 128]) },
        { zMm: boardMm, plan: circle(15, 72, [62, 128]) },
      ],
      opensBelow: true,
      opensAbove: true,
    },
  ]);
}

/**
 * The greatest stress in the body from strings of so much tension together: they press it and, lying above
 * its middle, bend it. Two side walls on a floor, the board left out (beam theory: σ = F/A + M·z/I).
 * @param stringsAboveMm how far the strings lie above the body
 * @returns N/mm²
 */
export function bodyStressMPa(totalTensionN: number, stringsAboveMm: number): number {
  const walls = {
    areaMm2: 2 * sideWallMm * heightMm,
    middleMm: heightMm / 2,
    ownMm4: (2 * sideWallMm * heightMm ** 3) / 12,
  };
  const floorWidthMm = widthMm - 2 * sideWallMm;
  const floor = {
    areaMm2: floorWidthMm * floorMm,
    middleMm: floorMm / 2,
    ownMm4: (floorWidthMm * floorMm ** 3) / 12,
  };
  const areaMm2 = walls.areaMm2 + floor.areaMm2;
  const middleMm = (walls.areaMm2 * walls.middleMm + floor.areaMm2 * floor.middleMm) / areaMm2;
  const inertiaMm4 = [walls, floor].reduce(
    (sum, one) => sum + one.ownMm4 + one.areaMm2 * (one.middleMm - middleMm) ** 2,
    0,
  );
  const bendingNmm = totalTensionN * (heightMm + stringsAboveMm - middleMm);
  return totalTensionN / areaMm2 + (bendingNmm * (heightMm - middleMm)) / inertiaMm4;
}
