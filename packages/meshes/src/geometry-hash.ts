import { boundsOf } from './bounds.js';
import type { Mesh } from './mesh.js';

/** Half of the change that must always show (10 µm), so that two roundings cannot hide it. */
const CELL_MM = 0.005;
/** How strongly coordinates must agree on a place within the cells for the cells to be laid around it. */
const CLEAR_AGREEMENT = 0.35;
const BINS = 512;

/**
 * A fingerprint of the shape, as 32 hex digits: independent of the order of triangles, of which corner a
 * triangle starts with, of degenerate triangles and of where the part lies as a whole.
 *
 * Every coordinate is rounded to cells of 5 µm, counted from the lowest cell; triangles are hashed one by
 * one and summed, so order does not matter. Cells are not laid from zero but around the place where the
 * coordinates of the part gather (circular mean of their remainders: Mardia & Jupp, "Directional
 * Statistics", 2000, 2.2), so that a dimensioned part keeps clear of cell borders wherever it lies.
 *
 * What it promises:
 * - different whenever any corner has moved by 10 µm or more, along an axis, against any other;
 * - equal under noise up to 0.9 µm a coordinate where dimensions are multiples of 5 µm apart.
 *
 * What no such fingerprint can promise: to be equal under *any* noise under 1 µm. Ten steps of 1 µm make a
 * change of 10 µm, and if no step changed the fingerprint, the change would not either. Corners of curved
 * faces lie anywhere, and noise carries some over a border. So an equal hash settles that two files hold
 * the same geometry, and an unequal one asks for `isSameGeometry` or `compare`, which look at both meshes.
 * Not meant against forgery: that is what SHA-256 of the bytes is for.
 */
export function geometryHash(mesh: Mesh): string {
  const { corners } = mesh;
  const { minMm } = boundsOf(corners);
  const phases = [0, 1, 2].map((axis) => gatheringPlace(corners, axis, minMm[axis]!));
  const lowest = [0, 1, 2].map((axis) => lowestCell(corners, axis, phases[axis]!));
  const cells = new Int32Array(9);
  const sums = new Uint32Array(4);
  let counted = 0;
  for (let o = 0; o < corners.length; o += 9) {
    for (let k = 0; k < 9; k += 1) {
      const axis = k % 3;
      cells[k] = Math.round((corners[o + k]! - phases[axis]!) / CELL_MM) - lowest[axis]!;
    }
    if (sameCell(cells, 0, 3) || sameCell(cells, 3, 6) || sameCell(cells, 6, 0)) continue;
    const first = firstCorner(cells);
    for (let lane = 0; lane < 4; lane += 1) sums[lane]! += hashTriangle(cells, first, LANE_SEEDS[lane]!);
    counted += 1;
  }
  const lanes = [...sums].map((sum, lane) => finish(sum ^ Math.imul(counted + lane, 0x9e3779b1)));
  return lanes.map((lane) => lane.toString(16).padStart(8, '0')).join('');
}

const LANE_SEEDS = [0x243f6a88, 0x85a308d3, 0x13198a2e, 0x03707344];

/** The place within a cell, in mm, around which the coordinates of an axis gather; `from` if nowhere. */
function gatheringPlace(corners: Float32Array | Float64Array, axis: number, from: number): number {
  // Counted in bins of a small fraction of the noise first: sines of millions of numbers are slow.
  const counts = new Float64Array(BINS);
  for (let i = axis; i < corners.length; i += 3) {
    const cells = (corners[i]! - from) / CELL_MM;
    counts[Math.floor((cells - Math.floor(cells)) * BINS)]! += 1;
  }
  let cosines = 0;
  let sines = 0;
  counts.forEach((count, bin) => {
    const angle = (2 * Math.PI * (bin + 0.5)) / BINS;
    cosines += count * Math.cos(angle);
    sines += count * Math.sin(angle);
  });
  const agreement = (3 * Math.hypot(cosines, sines)) / corners.length;
  return agreement < CLEAR_AGREEMENT ? from : from + (Math.atan2(sines, cosines) / (2 * Math.PI)) * CELL_MM;
}

function lowestCell(corners: Float32Array | Float64Array, axis: number, phase: number): number {
  let lowest = Infinity;
  for (let i = axis; i < corners.length; i += 3) {
    const cell = Math.round((corners[i]! - phase) / CELL_MM);
    if (cell < lowest) lowest = cell;
  }
  return lowest;
}

function sameCell(cells: Int32Array, a: number, b: number): boolean {
  return cells[a] === cells[b] && cells[a + 1] === cells[b + 1] && cells[a + 2] === cells[b + 2];
}

/** Start of the corner that comes first by x, then y, then z; the winding is kept. */
function firstCorner(cells: Int32Array): number {
  let first = 0;
  for (let corner = 3; corner < 9; corner += 3) {
    for (let axis = 0; axis < 3; axis += 1) {
      const difference = cells[corner + axis]! - cells[first + axis]!;
      if (difference < 0) first = corner;
      if (difference !== 0) break;
    }
  }
  return first;
}

function hashTriangle(cells: Int32Array, first: number, seed: number): number {
  let value = seed;
  for (let k = 0; k < 9; k += 1) {
    let at = first + k;
    if (at >= 9) at -= 9;
    let word = Math.imul(cells[at]!, 0xcc9e2d51);
    word = (word << 15) | (word >>> 17);
    value ^= Math.imul(word, 0x1b873593);
    value = (Math.imul((value << 13) | (value >>> 19), 5) + 0xe6546b64) | 0;
  }
  return finish(value);
}

/** Last mixing of MurmurHash3 (A. Appleby, public domain). */
function finish(value: number): number {
  let h = value ^ (value >>> 16);
  h = Math.imul(h, 0x85ebca6b);
  h ^= h >>> 13;
  h = Math.imul(h, 0xc2b2ae35);
  return (h ^ (h >>> 16)) >>> 0;
}
