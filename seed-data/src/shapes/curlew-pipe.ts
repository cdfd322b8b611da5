import { loftedSolid, type Section } from '../geometry/lofted-solid.js';
import { circle } from '../geometry/plan.js';
import type { Solid } from '../geometry/solid.js';

/** Sizes that pipe, block and rail of Curlew share, in mm. */
export const curlewSizes = {
  boreMm: 11,
  wallMm: 1.6,
  floorMm: 2,
  /** Corners of a pipe's circles. */
  segments: 72,
  collarOutMm: 0.7,
  collarHeightMm: 2,
  /** From the underside of the seat's rim to the mouth: how far a pipe stands above its block. */
  standMm: 10.2,
  rimBevelMm: 0.4,
  /** Gap on each side between a pipe and its socket: a sliding fit. */
  socketGapMm: 0.2,
  pitchMm: 17.6,
} as const;

export const pipeRadiusMm = curlewSizes.boreMm / 2 + curlewSizes.wallMm;
export const collarRadiusMm = pipeRadiusMm + curlewSizes.collarOutMm;

/** Outside of a pipe as radius and height, from its foot up. */
export function pipeProfile(lengthMm: number): { zMm: number; radiusMm: number }[] {
  const { floorMm, standMm, collarOutMm, collarHeightMm, rimBevelMm } = curlewSizes;
  const top = floorMm + lengthMm;
  const seat = top - standMm;
  return [
    { zMm: 0, radiusMm: pipeRadiusMm - rimBevelMm },
    { zMm: rimBevelMm, radiusMm: pipeRadiusMm },
    { zMm: seat - collarOutMm, radiusMm: pipeRadiusMm },
    { zMm: seat, radiusMm: collarRadiusMm },
    { zMm: seat + collarHeightMm, radiusMm: collarRadiusMm },
    { zMm: seat + collarHeightMm, radiusMm: pipeRadiusMm },
    { zMm: top - rimBevelMm, radiusMm: pipeRadiusMm },
    { zMm: top, radiusMm: pipeRadiusMm - rimBevelMm },
  ];
}

/**
 * A stopped pipe, foot down: the bore is as long as the voice asks for, on a closed floor. A conical
 * collar hangs it in its block, so that all mouths end level.
 */
export function curlewPipe(lengthMm: number): Solid {
  const { boreMm, floorMm, segments } = curlewSizes;
  const shell: Section[] = pipeProfile(lengthMm).map(({ zMm, radiusMm }) => ({
    zMm,
    plan: circle(radiusMm, segments),
  }));
  const bore = circle(boreMm / 2, segments);
  return loftedSolid(shell, [
    {
      sections: [
        { zMm: floorMm, plan: bore },
        { zMm: floorMm + lengthMm, plan: bore },
      ],
      opensBelow: false,
      opensAbove: true,
    },
  ]);
}

/** A disc that lies on the floor of a pipe and raises its pitch; an M3 screw in its hole fishes it out. */
export function tuningPlug(thicknessMm: number): Solid {
  const { boreMm, segments, socketGapMm } = curlewSizes;
  const radius = boreMm / 2 - socketGapMm;
  const bevel = 0.2;
  const at = (zMm: number, radiusMm: number) => ({ zMm, plan: circle(radiusMm, segments) });
  const hole = circle(1.3, 32);
  return loftedSolid(
    [
      at(0, radius - bevel),
      at(bevel, radius),
      at(thicknessMm - bevel, radius),
      at(thicknessMm, radius - bevel),
    ],
    [
      {
        sections: [
          { zMm: 0, plan: hole },
          { zMm: thicknessMm, plan: hole },
        ],
        opensBelow: true,
        opensAbove: true,
      },
    ],
  );
}
