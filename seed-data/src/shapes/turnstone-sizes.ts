import type { PlanPoint } from '../geometry/plan.js';

/** Sizes that the parts of Turnstone share, in mm. */
export const turnstoneSizes = {
  strings: 10,
  pitchMm: 14,
  firstStringXMm: 12,
  longestMm: 168,
  stepMm: 8.5,
  widthMm: 150,
  heightMm: 22,
  floorMm: 2.4,
  sideWallMm: 10,
  /** From the slanted edge to the line where a string leaves its saddle, along the string. */
  crownMm: 18,
  /** From the slanted edge to the cavity, along the strings: room for the saddles. */
  hitchMm: 34,
  /** From the nut to the cavity, and from the nut to the upper edge. */
  belowNutMm: 16,
  aboveNutMm: 24,
  pinMm: 12,
  boardMm: 2,
  boardLapMm: 7,
} as const;

const { pitchMm, firstStringXMm, longestMm, stepMm, crownMm } = turnstoneSizes;

/** The sounding length of a string, the lowest first. */
export const stringMm = (index: number): number => longestMm - stepMm * index;
export const stringXMm = (index: number): number => firstStringXMm + pitchMm * index;

/** How far the slanted edge lies up at a place across the body: it follows the ends of the strings. */
export const edgeYMm = (xMm: number): number => (xMm * stepMm) / pitchMm;
export const crownYMm = (index: number): number => edgeYMm(stringXMm(index)) + crownMm;
export const nutYMm = crownYMm(0) + longestMm;

const { sideWallMm, widthMm } = turnstoneSizes;
/** Where the board is screwed to the walls beside the cavity. */
export const boardScrews: readonly PlanPoint[] = [sideWallMm - 3.5, widthMm - sideWallMm + 3.5].flatMap(
  (x) => {
    const [low, high] = [edgeYMm(x) + turnstoneSizes.hitchMm + 2, nutYMm - turnstoneSizes.belowNutMm - 3];
    return [low, (low + high) / 2, high].map((y): PlanPoint => [x, y]);
  },
);

/** The screw of a saddle, and that of the nut, measured from where the string crosses them. */
export const saddleScrewMm = -7;
export const nutScrewMm = 6;
export const nutScrewsXMm = [0, 4, 8].map((index) => stringXMm(index) + pitchMm / 2);
