import { NOTHING, columnAt, toMm, type DepthBuffer } from './depth-buffer.js';
import { isCrease, type DrawableMesh } from './drawable-edges.js';
import type { Projection } from './projection.js';

/** A straight piece of a visible edge, in mm of the drawing. */
export type Segment = readonly [x0: number, y0: number, x1: number, y1: number];

/** Edges seen this obliquely, as a share of the triangle's size, count as seen from the edge. */
const EDGE_ON = 1e-7;
const DIRECTIONS = 4;
const SHORTEST_CELLS = 0.01;

/** End points of edges that may lie on the outline from this side: creases, borders, turns of the surface. */
export function* edgesToDraw(mesh: DrawableMesh, projection: Projection): Generator<number> {
  for (let i = 0; i < mesh.edges.length; i += 2) {
    const halfEdge = mesh.edges[i]!,
      other = mesh.edges[i + 1]!;
    const isTurn = other >= 0 && facing(projection, halfEdge) * facing(projection, other) <= 0;
    if (isTurn || isCrease(mesh, halfEdge, other)) yield halfEdge;
  }
}

/** 1 towards the eye, −1 away, 0 edge-on. */
function facing({ points }: Projection, halfEdge: number): number {
  const o = 9 * Math.floor(halfEdge / 3);
  const ux = points[o + 3]! - points[o]!,
    uy = points[o + 4]! - points[o + 1]!;
  const vx = points[o + 6]! - points[o]!,
    vy = points[o + 7]! - points[o + 1]!;
  const area = ux * vy - uy * vx;
  return Math.abs(area) <= EDGE_ON * (ux * ux + uy * uy + vx * vx + vy * vy) ? 0 : Math.sign(area);
}

export function endOf(halfEdge: number): number {
  return halfEdge % 3 === 2 ? halfEdge - 2 : halfEdge + 1;
}

/** Remembers which cells carry a line in about which direction, so that coinciding edges are drawn once. */
export class PaintedCells {
  private readonly marks: Uint8Array;

  /** @param reachCells how many cells beside a line count as covered by it. */
  constructor(
    private readonly buffer: DepthBuffer,
    private readonly reachCells: number,
  ) {
    this.marks = new Uint8Array(buffer.columns * buffer.rows);
  }

  paint([x0, y0, x1, y1]: Segment): void {
    const { buffer, reachCells, marks } = this;
    const mask = directionMask(x1 - x0, y1 - y0);
    const samples = sampleCount(buffer, x1 - x0, y1 - y0);
    for (let i = 0; i < samples; i += 1) {
      const column = columnOf(buffer, x0 + ((x1 - x0) * (i + 0.5)) / samples);
      const row = columnOf(buffer, y0 + ((y1 - y0) * (i + 0.5)) / samples);
      for (let r = row - reachCells; r <= row + reachCells; r += 1) {
        for (let c = column - reachCells; c <= column + reachCells; c += 1)
          marks[r * buffer.columns + c]! |= mask;
      }
    }
  }

  /** Share of the segment, 0 to 1, that lies on lines painted before. */
  coverOf([x0, y0, x1, y1]: Segment): number {
    const { buffer } = this;
    const bit = 1 << sector(x1 - x0, y1 - y0);
    const samples = sampleCount(buffer, x1 - x0, y1 - y0);
    let covered = 0;
    for (let i = 0; i < samples; i += 1) {
      const column = columnOf(buffer, x0 + ((x1 - x0) * (i + 0.5)) / samples);
      const row = columnOf(buffer, y0 + ((y1 - y0) * (i + 0.5)) / samples);
      if ((this.marks[row * buffer.columns + column]! & bit) !== 0) covered += 1;
    }
    return covered / samples;
  }
}

/**
 * The pieces of an edge that nothing hides. A point is visible when, at it or beside
 * it, nothing lies nearer to the eye: an edge bounds its own faces, so one side of it is always free.
 */
export function visiblePieces(buffer: DepthBuffer, projection: Projection, halfEdge: number): Segment[] {
  const { points } = projection;
  const a = 3 * halfEdge,
    b = 3 * endOf(halfEdge);
  const [x0, y0, z0] = [points[a]!, points[a + 1]!, points[a + 2]!];
  const dx = points[b]! - x0,
    dy = points[b + 1]! - y0,
    dz = points[b + 2]! - z0;
  // An edge along the line of sight is a point, and would only break the lines that pass it.
  if (Math.hypot(dx, dy) < SHORTEST_CELLS * buffer.cellMm) return [];
  const samples = sampleCount(buffer, dx, dy);
  const pieces: Segment[] = [];
  let open = -1;
  const close = (at: number): void => {
    if (open >= 0) pieces.push([x0 + dx * open, y0 + dy * open, x0 + dx * at, y0 + dy * at]);
    open = -1;
  };
  for (let i = 0; i < samples; i += 1) {
    const t = (i + 0.5) / samples;
    const isShown = isFree(buffer, columnOf(buffer, x0 + dx * t), columnOf(buffer, y0 + dy * t), z0 + dz * t);
    if (isShown && open < 0) open = i / samples;
    if (!isShown) close(i / samples);
  }
  close(1);
  return pieces;
}

function isFree(
  { columns, depths, cellMm }: DepthBuffer,
  column: number,
  row: number,
  depth: number,
): boolean {
  const reach = depth - 0.75 * cellMm;
  for (let r = row - 1; r <= row + 1; r += 1) {
    for (let c = column - 1; c <= column + 1; c += 1) {
      const there = depths[r * columns + c]!;
      if (there >= reach && there < NOTHING) return true;
    }
  }
  return false;
}

function sampleCount(buffer: DepthBuffer, dx: number, dy: number): number {
  return Math.max(1, Math.ceil(Math.hypot(dx, dy) / buffer.cellMm));
}

function columnOf(buffer: DepthBuffer, positionMm: number): number {
  return Math.floor(columnAt(buffer, positionMm));
}

function sector(dx: number, dy: number): number {
  const half = (Math.atan2(dy, dx) / Math.PI + 1) % 1;
  return Math.min(2 * DIRECTIONS - 1, Math.floor(half * 2 * DIRECTIONS));
}

/** Eight sectors of 22.5°; a line covers its own and the two beside it. */
function directionMask(dx: number, dy: number): number {
  const own = sector(dx, dy);
  const count = 2 * DIRECTIONS;
  return (1 << own) | (1 << ((own + 1) % count)) | (1 << ((own + count - 1) % count));
}

/** Grid points as lines in mm. */
export function gridLineToMm(buffer: DepthBuffer, line: Float64Array): Float64Array {
  return line.map((position) => toMm(buffer, position));
}
