import { boundsOf, type Vector3 } from './bounds.js';
import type { Mesh } from './mesh.js';
import { NO_SHELL, topologyOf, type Topology } from './shells.js';
import { guessUnit, type UnitGuess } from './unit-guess.js';
import { weld, type WeldedMesh } from './weld.js';

/** What a mesh measures. Lengths in mm, areas in mm², volumes in mm³. */
export interface Measurement {
  readonly format: Mesh['format'];
  readonly triangles: number;
  /** Groups of triangles joined by edges; a hollow part has an inner and an outer shell. */
  readonly shells: number;
  readonly sizeMm: Vector3;
  readonly minMm: Vector3;
  readonly maxMm: Vector3;
  /** Never negative. Trustworthy only when `watertight`: an open mesh has no volume. */
  readonly volumeMm3: number;
  readonly areaMm2: number;
  /** Edges that only one triangle has: holes. */
  readonly openEdges: number;
  /** Edges shared by more than two triangles. */
  readonly nonManifoldEdges: number;
  /** Triangles without area. */
  readonly degenerateTriangles: number;
  /** Edges whose two triangles disagree about which side is outside. */
  readonly windingFaults: number;
  /** Triangles to turn round so that all agree and the outside is outside. */
  readonly flippedTriangles: number;
  /** Every edge is shared by exactly two triangles that agree about the outside. */
  readonly watertight: boolean;
  readonly unitGuess: UnitGuess;
}

/** A triangle counts as degenerate when its height is under this share of its longest side. */
const FLATNESS = 1e-9;

/**
 * Measures a mesh as it is; nothing is repaired.
 *
 * Volume is the sum of signed tetrahedra against the centre of the box (divergence theorem; Zhang & Chen,
 * "Efficient feature extraction for 2D/3D objects in mesh representation", ICIP 2001), in doubles. Triangles
 * wound against their shell are counted the right way round, and reported as `windingFaults` and
 * `flippedTriangles`. Shells that overlap are counted once each.
 */
export function measure(mesh: Mesh): Measurement {
  const { minMm, maxMm } = boundsOf(mesh.corners);
  const sizeMm: Vector3 = [maxMm[0] - minMm[0], maxMm[1] - minMm[1], maxMm[2] - minMm[2]];
  const welded = weld(mesh.corners);
  const topology = topologyOf(welded);
  const sums = sumTriangles(mesh.corners, welded, topology, minMm, maxMm);
  return {
    format: mesh.format,
    triangles: mesh.triangles,
    shells: topology.shells,
    sizeMm,
    minMm,
    maxMm,
    volumeMm3: sums.volumeMm3,
    areaMm2: sums.areaMm2,
    openEdges: topology.openEdges,
    nonManifoldEdges: topology.nonManifoldEdges,
    degenerateTriangles: sums.degenerateTriangles,
    windingFaults: topology.windingFaults,
    flippedTriangles: sums.flippedTriangles,
    watertight:
      topology.shells > 0 &&
      topology.openEdges === 0 &&
      topology.nonManifoldEdges === 0 &&
      topology.windingFaults === 0,
    unitGuess: guessUnit(mesh, sizeMm),
  };
}

function sumTriangles(
  corners: Float32Array | Float64Array,
  welded: WeldedMesh,
  topology: Topology,
  minMm: Vector3,
  maxMm: Vector3,
) {
  const { shells, shellOfTriangle, isTurned } = topology;
  const cx = (minMm[0] + maxMm[0]) / 2,
    cy = (minMm[1] + maxMm[1]) / 2,
    cz = (minMm[2] + maxMm[2]) / 2;
  const straight = new Float64Array(shells);
  const turned = new Float64Array(shells);
  const turnedCount = new Uint32Array(shells);
  const shellCount = new Uint32Array(shells);
  let doubleArea = 0;
  let degenerateTriangles = 0;
  for (let t = 0; t < welded.triangles; t += 1) {
    const o = 9 * t;
    const ax = corners[o]! - cx,
      ay = corners[o + 1]! - cy,
      az = corners[o + 2]! - cz;
    const bx = corners[o + 3]! - cx,
      by = corners[o + 4]! - cy,
      bz = corners[o + 5]! - cz;
    const dx = corners[o + 6]! - cx,
      dy = corners[o + 7]! - cy,
      dz = corners[o + 8]! - cz;
    const ux = bx - ax,
      uy = by - ay,
      uz = bz - az;
    const vx = dx - ax,
      vy = dy - ay,
      vz = dz - az;
    const nx = uy * vz - uz * vy,
      ny = uz * vx - ux * vz,
      nz = ux * vy - uy * vx;
    const squared = nx * nx + ny * ny + nz * nz;
    doubleArea += Math.sqrt(squared);
    const longest = Math.max(ux * ux + uy * uy + uz * uz, vx * vx + vy * vy + vz * vz);
    if (squared <= FLATNESS * FLATNESS * longest * longest) degenerateTriangles += 1;
    const shell = shellOfTriangle[t]!;
    if (shell === NO_SHELL) continue;
    const six = ax * nx + ay * ny + az * nz;
    shellCount[shell]! += 1;
    if (isTurned[t] === 1) {
      turned[shell]! += six;
      turnedCount[shell]! += 1;
    } else straight[shell]! += six;
  }
  let sum = 0;
  let flippedTriangles = 0;
  for (let shell = 0; shell < shells; shell += 1) {
    const count = shellCount[shell]!;
    const reversed = turnedCount[shell]!;
    const asWound = straight[shell]! - turned[shell]!;
    // The larger group is taken to be right; with equal groups the one that encloses a positive volume.
    const keepsStraight = 2 * reversed < count || (2 * reversed === count && asWound >= 0);
    sum += keepsStraight ? asWound : -asWound;
    flippedTriangles += keepsStraight ? reversed : count - reversed;
  }
  if (sum < 0) flippedTriangles = welded.triangles - flippedTriangles;
  return {
    volumeMm3: Math.abs(sum) / 6,
    areaMm2: doubleArea / 2,
    degenerateTriangles,
    flippedTriangles,
  };
}
