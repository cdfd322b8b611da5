import { chainSegments } from './chain-segments.js';
import { traceContours } from './contours.js';
import { drawDepths, type DepthBuffer } from './depth-buffer.js';
import { makeDrawable, type DrawableMesh } from './drawable-edges.js';
import type { Mesh } from './mesh.js';
import { pathData, type DrawnLine } from './path-data.js';
import { project, type Projection, type View } from './projection.js';
import { simplifyLine, simplifyLoop } from './simplify-line.js';
import { CornerSnapper, type SnappedLine } from './snap-to-corners.js';
import {
  PaintedCells,
  edgesToDraw,
  endOf,
  gridLineToMm,
  visiblePieces,
  type Segment,
} from './visible-edges.js';

/** A drawing of a part from one side, in mm; y runs down, as in SVG. */
export interface Outline {
  readonly view: View;
  readonly widthMm: number;
  readonly heightMm: number;
  /** For the `viewBox` attribute: the part's box, without margin. */
  readonly viewBox: string;
  /** Closed silhouette with through-holes: fill it with `fill-rule="evenodd"`, stroke it as the outline. */
  readonly path: string;
  /** Visible edges inside the silhouette: stroke only. May be empty. */
  readonly edges: string;
}

export interface OutlineOptions {
  /** Ceiling for both paths together. */
  readonly maxBytes?: number;
}

const DEFAULT_MAX_BYTES = 8000;
const RESOLUTION = 1000;
/** How far, in cells, simplified lines may stray: at true corners hardly, at traced grid points by a step. */
const TRUE_ALLOWANCE = 0.15;
const GRID_ALLOWANCE = 1.15;
const MIN_EDGE_CELLS = 4;
/** A line that lies on others by more than this share is not drawn again. */
const MOSTLY = 0.7;

/**
 * Draws a mesh from the front (−y side), the side (+x side) or the top: a silhouette with its holes, and the
 * edges and turns of the surface that can be seen from there.
 */
export function outline(mesh: Mesh, view: View, options: OutlineOptions = {}): Outline {
  return drawFrom(makeDrawable(mesh.corners), view, options);
}

/** The three views at once; the mesh is prepared only once. */
export function outlines(mesh: Mesh, options: OutlineOptions = {}): Record<View, Outline> {
  const drawable = makeDrawable(mesh.corners);
  return {
    front: drawFrom(drawable, 'front', options),
    side: drawFrom(drawable, 'side', options),
    top: drawFrom(drawable, 'top', options),
  };
}

function drawFrom(mesh: DrawableMesh, view: View, { maxBytes = DEFAULT_MAX_BYTES }: OutlineOptions): Outline {
  const projection = project(mesh.corners, view);
  const { widthMm, heightMm } = projection;
  const buffer = drawDepths(projection, RESOLUTION);
  const halfEdges = [...edgesToDraw(mesh, projection)];
  const silhouette = trueContours(buffer, projection, halfEdges);
  const inner = innerLines(buffer, projection, halfEdges, silhouette);
  const stepMm = 10 ** Math.floor(Math.log10(buffer.cellMm / 2));
  const paths = fit(silhouette, inner, buffer.cellMm, stepMm, maxBytes);
  const size = [widthMm, heightMm].map((lengthMm) => Number(lengthMm.toFixed(3)));
  return { view, widthMm, heightMm, viewBox: `0 0 ${size.join(' ')}`, ...paths };
}

function trueContours(
  buffer: DepthBuffer,
  projection: Projection,
  halfEdges: readonly number[],
): SnappedLine[] {
  const snapper = new CornerSnapper(buffer);
  for (const halfEdge of halfEdges) {
    for (const corner of [halfEdge, endOf(halfEdge)]) {
      snapper.add(projection.points[3 * corner]!, projection.points[3 * corner + 1]!);
    }
  }
  return traceContours(buffer).map((loop) => snapper.snap(gridLineToMm(buffer, loop)));
}

function innerLines(
  buffer: DepthBuffer,
  projection: Projection,
  halfEdges: readonly number[],
  silhouette: readonly SnappedLine[],
): Float64Array[] {
  const rim = new PaintedCells(buffer, 1);
  for (const { points, isTrue } of silhouette) {
    const kept = simplifyLoop(
      points,
      (i) => (isTrue[i] === 1 ? TRUE_ALLOWANCE : GRID_ALLOWANCE) * buffer.cellMm,
    );
    kept.forEach((from, i) => {
      const to = kept[(i + 1) % kept.length]!;
      rim.paint([points[2 * from]!, points[2 * from + 1]!, points[2 * to]!, points[2 * to + 1]!]);
    });
  }
  // Lines cover only the cells they cross: the next piece of a curve touches its neighbour at the end.
  const drawn = new PaintedCells(buffer, 0);
  const segments: Segment[] = [];
  for (const halfEdge of nearestFirst(projection, halfEdges)) {
    for (const piece of visiblePieces(buffer, projection, halfEdge)) {
      if (rim.coverOf(piece) > MOSTLY || drawn.coverOf(piece) > MOSTLY) continue;
      segments.push(piece);
      drawn.paint(piece);
    }
  }
  return chainSegments(segments, buffer.cellMm);
}

/** Of coinciding edges the nearest is drawn; it is the one that can be seen. */
function nearestFirst({ points }: Projection, halfEdges: readonly number[]): number[] {
  const depth = (halfEdge: number): number => points[3 * halfEdge + 2]! + points[3 * endOf(halfEdge) + 2]!;
  return [...halfEdges].sort((a, b) => depth(a) - depth(b));
}

/** Simplifies ever more, and leaves out the shortest edges, until the drawing is small enough. */
function fit(
  silhouette: readonly SnappedLine[],
  inner: readonly Float64Array[],
  cellMm: number,
  stepMm: number,
  maxBytes: number,
): Pick<Outline, 'path' | 'edges'> {
  for (let looseness = 1; ; looseness *= 1.5) {
    const outer = silhouette.map(({ points, isTrue }) => {
      const allowed = (i: number): number =>
        (isTrue[i] === 1 ? TRUE_ALLOWANCE : GRID_ALLOWANCE) * looseness * cellMm;
      return pick(points, simplifyLoop(points, allowed), true);
    });
    const lines = inner
      .filter((line) => lengthOf(line) >= MIN_EDGE_CELLS * looseness * cellMm)
      .map((line) =>
        pick(
          line,
          simplifyLine(line, () => 2 * TRUE_ALLOWANCE * looseness * cellMm),
          false,
        ),
      );
    const paths = { path: pathData(outer, stepMm), edges: pathData(lines, stepMm) };
    if (paths.path.length + paths.edges.length <= maxBytes || looseness > 500) return paths;
  }
}

function pick(line: Float64Array, kept: readonly number[], isClosed: boolean): DrawnLine {
  return { points: kept.flatMap((i) => [line[2 * i]!, line[2 * i + 1]!]), isClosed };
}

function lengthOf(line: Float64Array): number {
  let length = 0;
  for (let i = 2; i < line.length; i += 2)
    length += Math.hypot(line[i]! - line[i - 2]!, line[i + 1]! - line[i - 1]!);
  return length;
}
