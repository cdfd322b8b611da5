import { boundsOf, type Bounds } from './bounds.js';
import { GrowingDoubles } from './growing-array.js';
import { KeyTable } from './key-table.js';
import { weld, type WeldedMesh } from './weld.js';

/** A coarse likeness of a mesh: points on a lattice, at most 256 steps a side. */
export interface CoarseMesh {
  /** Lattice steps from the low corner of the box: x, y, z for each point, 0 to 255. */
  readonly points: Uint8Array;
  readonly indices: Uint16Array;
  readonly minMm: Bounds['minMm'];
  /** Length of one lattice step along each axis. */
  readonly stepMm: readonly [number, number, number];
}

/** No lattice step is finer: fits need 0.1 to 0.2 mm, so a print of the likeness would not go together. */
const MIN_STEP_MM = 0.6;
const STEPS_ALONG_LONGEST = 160;
const COARSER = 0.9;
const POINT_SPAN = 2 ** 17;

/**
 * Coarsens a mesh by vertex clustering (Rossignac & Borrel, "Multi-resolution 3D approximations for
 * rendering complex scenes", 1993): the vertices of a cell become their mean, rounded to a lattice; collapsed
 * and doubled triangles go. Cells grow until few enough triangles are left.
 */
export function coarsen(corners: Float32Array | Float64Array, maxTriangles: number): CoarseMesh {
  const welded = weld(corners);
  const bounds = boundsOf(corners);
  const sizeMm = [0, 1, 2].map((axis) => bounds.maxMm[axis]! - bounds.minMm[axis]!);
  const finestMm = Math.max(Math.max(...sizeMm) / STEPS_ALONG_LONGEST, MIN_STEP_MM);
  const steps = sizeMm.map((length) => Math.min(255, Math.max(1, Math.round(length / finestMm))));
  const stepMm = [0, 1, 2].map((axis) => Math.max(sizeMm[axis]!, 1e-9) / steps[axis]!) as [
    number,
    number,
    number,
  ];
  let cellsPerStep = 1;
  for (;;) {
    const points = clusterPoints(corners, welded, bounds, stepMm, cellsPerStep);
    const triangles = remainingTriangles(welded, points.pointOfVertex);
    if (triangles.length <= 3 * maxTriangles) {
      return { ...compact(points.lattice, triangles), minMm: bounds.minMm, stepMm };
    }
    // Triangles go with the square of the cells along a side; the last factor makes sure of an end.
    cellsPerStep *= Math.min(COARSER, Math.sqrt((3 * maxTriangles) / triangles.length));
  }
}

/** Means of the vertices of each cell, rounded to the lattice; equal places become one point. */
function clusterPoints(
  corners: Float32Array | Float64Array,
  welded: WeldedMesh,
  { minMm }: Bounds,
  stepMm: readonly number[],
  cellsPerStep: number,
) {
  const [minX, minY, minZ] = minMm;
  const [stepX, stepY, stepZ] = stepMm as [number, number, number];
  const cells = new KeyTable(1024);
  const cellOfVertex = new Uint32Array(welded.vertices);
  const sums = new GrowingDoubles();
  for (let vertex = 0; vertex < welded.vertices; vertex += 1) {
    const o = 3 * welded.cornerOfVertex[vertex]!;
    const x = (corners[o]! - minX) / stepX,
      y = (corners[o + 1]! - minY) / stepY,
      z = (corners[o + 2]! - minZ) / stepZ;
    const cellX = Math.floor(x * cellsPerStep + 0.5),
      cellY = Math.floor(y * cellsPerStep + 0.5);
    const cell = cells.nameOf((cellX * 512 + cellY) * 512 + Math.floor(z * cellsPerStep + 0.5));
    cellOfVertex[vertex] = cell;
    while (sums.length < 4 * cells.size) sums.push(0);
    const sum = sums.values;
    sum[4 * cell]! += x;
    sum[4 * cell + 1]! += y;
    sum[4 * cell + 2]! += z;
    sum[4 * cell + 3]! += 1;
  }
  const lattice: number[] = [];
  const places = new KeyTable(cells.size);
  const pointOfCell = new Uint32Array(cells.size);
  for (let cell = 0; cell < cells.size; cell += 1) {
    const [x, y, z, count] = sums.values.subarray(4 * cell, 4 * cell + 4) as unknown as [
      number,
      number,
      number,
      number,
    ];
    const rounded = [Math.round(x / count), Math.round(y / count), Math.round(z / count)] as const;
    const point = places.nameOf((rounded[0] * 256 + rounded[1]) * 256 + rounded[2]);
    if (3 * point === lattice.length) lattice.push(...rounded);
    pointOfCell[cell] = point;
  }
  return { lattice, pointOfVertex: cellOfVertex.map((cell) => pointOfCell[cell]!) };
}

/** Triangles that keep an extent, each once: three points in turn, the lowest first. */
function remainingTriangles(welded: WeldedMesh, pointOfVertex: Uint32Array): number[] {
  const seen = new KeyTable(4096);
  const indices: number[] = [];
  for (let o = 0; o < 3 * welded.triangles; o += 3) {
    const a = pointOfVertex[welded.vertexOfCorner[o]!]!;
    const b = pointOfVertex[welded.vertexOfCorner[o + 1]!]!;
    const c = pointOfVertex[welded.vertexOfCorner[o + 2]!]!;
    if (a === b || b === c || c === a) continue;
    let p = a,
      q = b,
      r = c;
    if (b < a && b < c) [p, q, r] = [b, c, a];
    else if (c < a && c < b) [p, q, r] = [c, a, b];
    const before = seen.size;
    // 17 bits for each point fit the 53 of a double; beyond 131,072 points a false match only makes the count
    // a little low, and with so many points the cells grow anyway.
    seen.nameOf(((p % POINT_SPAN) * POINT_SPAN + (q % POINT_SPAN)) * POINT_SPAN + (r % POINT_SPAN));
    if (seen.size > before) indices.push(p, q, r);
  }
  return indices;
}

/** Drops points that no triangle uses. */
function compact(lattice: readonly number[], triangles: readonly number[]) {
  const renamed = new Map<number, number>();
  const points: number[] = [];
  const indices = triangles.map((point) => {
    let name = renamed.get(point);
    if (name === undefined) {
      name = renamed.size;
      renamed.set(point, name);
      points.push(lattice[3 * point]!, lattice[3 * point + 1]!, lattice[3 * point + 2]!);
    }
    return name;
  });
  return { points: Uint8Array.from(points), indices: Uint16Array.from(indices) };
}
