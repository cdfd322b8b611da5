import { boxOf, moved, polygonArea, rectangle } from './convex-hull.js';
import { roomOn, type PartShape } from './fit-part.js';
import { PlatesError, requireNotNegative, requireWhole } from './plates-error.js';
import { PlateFilling, type FillOrder, type Pose } from './plate-filling.js';
import { posesOf } from './poses.js';
import type { Bed, OrientationRule, Point } from './types.js';

export interface PartToPack {
  readonly code: string;
  readonly quantity: number;
  /** Convex outline from above; where it is missing, `sizeMm` stands in as a box. */
  readonly footprint?: readonly Point[];
  readonly sizeMm?: readonly [number, number, number];
  readonly heightMm: number;
  readonly orientation: OrientationRule;
}

export interface PackingOptions {
  /** Between parts. */
  readonly gapMm: number;
  /** Along the edges of the bed. */
  readonly marginMm: number;
  /** Told how much of the work is done, as a share from 0 to 1, while it goes on. */
  readonly onProgress?: (done: number) => void;
}

export interface Placement {
  readonly code: string;
  /** Left front corner of the piece's box, from the left front corner of the bed. */
  readonly xMm: number;
  readonly yMm: number;
  /** Counter-clockwise, from 0 to below 360. */
  readonly turnedDegrees: number;
  /** The axis of the part that stands upright, where it is laid. */
  readonly laidAxis?: 'x' | 'y';
  /** Outline on the bed, in mm. */
  readonly polygon: readonly Point[];
}

export interface Plate {
  readonly placements: readonly Placement[];
}

export interface PackedPlates {
  readonly plates: readonly Plate[];
  /** Codes of parts that fit in no allowed way; they are on no plate. */
  readonly tooBig: readonly string[];
}

interface Piece {
  readonly code: string;
  readonly poses: readonly Pose[];
  readonly areaMm2: number;
  readonly longestMm: number;
}

/** Up to so many pieces every order of packing is tried, beyond only the best one on average. */
const PATIENT_PIECES = 80;

/**
 * Lays all pieces out on as few plates as a few fixed rules find: larger pieces first, each as near to an edge
 * as it will go, turned where its rule allows. The same input gives the same plates.
 *
 * Finding the fewest plates for certain is out of reach (two-dimensional bin packing is NP-hard); the count is
 * what this layout needs, and a cleverer one may save a plate.
 *
 * @throws PlatesError for sizes, quantities, gap or margin that make no sense, or two parts with one code.
 */
export function packPlates(
  parts: readonly PartToPack[],
  bed: Bed,
  { gapMm, marginMm, onProgress }: PackingOptions,
): PackedPlates {
  requireNotNegative('The gap in mm', gapMm);
  const room = roomOn(bed, marginMm);
  const codes = new Set<string>();
  const tooBig: string[] = [];
  const pieces: Piece[] = [];
  for (const part of parts) {
    if (codes.has(part.code))
      throw new PlatesError(`Part ${part.code} is listed twice; add up its quantity.`);
    codes.add(part.code);
    requireWhole(`The quantity of ${part.code}`, part.quantity, 0);
    if (part.quantity === 0) continue;
    const poses = posesOf(shapeOf(part), bed, room, gapMm);
    const [first] = poses;
    if (first === undefined) {
      tooBig.push(part.code);
      continue;
    }
    const piece: Piece = {
      code: part.code,
      poses,
      areaMm2: polygonArea(first.outline),
      longestMm: Math.max(first.widthMm, first.depthMm),
    };
    pieces.push(...Array.from({ length: part.quantity }, () => piece));
  }
  const fillings = bestFillings(pieces, room, onProgress);
  return { plates: fillings.map((filling) => plateOf(filling, marginMm)), tooBig };
}

interface Filling {
  readonly plate: PlateFilling;
  readonly codes: string[];
  /** Codes that found no room: neither will the next piece of the same kind. */
  readonly full: Set<string>;
}

function bestFillings(
  pieces: readonly Piece[],
  room: { widthMm: number; depthMm: number },
  onProgress?: (done: number) => void,
): Filling[] {
  const byArea = pieces.toSorted((a, b) => b.areaMm2 - a.areaMm2 || compareCodes(a, b));
  const byLength = pieces.toSorted((a, b) => b.longestMm - a.longestMm || compareCodes(a, b));
  const attempts: [readonly Piece[], FillOrder][] = [
    [byArea, 'front-first'],
    [byArea, 'left-first'],
    [byLength, 'front-first'],
    [byLength, 'left-first'],
  ];
  let best: Filling[] | undefined;
  const isOneOrder = byArea.every((piece, i) => piece === byLength[i]);
  const most = pieces.length > PATIENT_PIECES ? 1 : isOneOrder ? 2 : attempts.length;
  const total = most * pieces.length;
  let laid = 0;
  const onPiece = (): void => onProgress?.((laid += 1) / total);
  for (const [order, fillOrder] of attempts.slice(0, most)) {
    const fillings = fill(order, room, fillOrder, onPiece);
    if (best === undefined || isBetter(fillings, best)) best = fillings;
  }
  return best ?? [];
}

function fill(
  pieces: readonly Piece[],
  { widthMm, depthMm }: { widthMm: number; depthMm: number },
  order: FillOrder,
  onPiece: () => void,
): Filling[] {
  const fillings: Filling[] = [];
  for (const { code, poses } of pieces) {
    const placedOn = fillings.find(({ plate, full }) => {
      if (full.has(code)) return false;
      if (plate.place(poses)) return true;
      full.add(code);
      return false;
    });
    if (placedOn !== undefined) placedOn.codes.push(code);
    else {
      const plate = new PlateFilling(widthMm, depthMm, order);
      plate.place(poses);
      fillings.push({ plate, codes: [code], full: new Set() });
    }
    onPiece();
  }
  return fillings;
}

/** Fewer plates; with as many, a last plate that is filled less far. */
function isBetter(a: readonly Filling[], b: readonly Filling[]): boolean {
  if (a.length !== b.length) return a.length < b.length;
  return (a.at(-1)?.plate.filledMm ?? 0) < (b.at(-1)?.plate.filledMm ?? 0) - 1e-6;
}

function plateOf({ plate, codes }: Filling, marginMm: number): Plate {
  return {
    placements: plate.spots.map(({ pose, xMm, yMm }, i) => ({
      code: codes[i]!,
      xMm: xMm + marginMm,
      yMm: yMm + marginMm,
      turnedDegrees: pose.turnedDegrees,
      ...(pose.laidAxis !== undefined && { laidAxis: pose.laidAxis }),
      polygon: moved(pose.outline, xMm + marginMm, yMm + marginMm),
    })),
  };
}

function shapeOf({ code, footprint, sizeMm, heightMm, orientation }: PartToPack): PartShape {
  if (footprint !== undefined) {
    const { left, right, front, back } = boxOf(footprint);
    return { sizeMm: [right - left, back - front, heightMm], footprint, orientation };
  }
  if (sizeMm === undefined)
    throw new PlatesError(`Part ${code} has neither a footprint nor a size; give one.`);
  const [width, depth] = sizeMm;
  return { sizeMm: [width, depth, heightMm], footprint: rectangle(width, depth), orientation };
}

function compareCodes(a: Piece, b: Piece): number {
  return a.code < b.code ? -1 : a.code > b.code ? 1 : 0;
}
