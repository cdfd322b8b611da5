import type { Vector3 } from './bounds.js';
import type { SurfaceIndex } from './surface-index.js';

export interface Deviation {
  readonly distanceMm: number;
  readonly placeMm: Vector3;
}

/** Triangles looked at first; of more, an even selection is taken. */
export const MAX_SEEDS = 200_000;
/** Distances computed while closing in on the place. */
const MAX_REFINEMENTS = 20_000;
/** The search ends when nothing can be farther than the best by more than this share, or 1 µm. */
const CLOSE_ENOUGH = 0.01;
const CLOSE_ENOUGH_MM = 0.001;

/** A piece of a triangle: nine coordinates, and the distance its farthest point can have at most. */
interface Piece {
  readonly corners: Float64Array;
  readonly boundMm: number;
}

/**
 * Finds the point of some triangles that lies farthest from a surface (the directed Hausdorff distance).
 * Two bounds tell how far any point of a piece can be: distance changes by at most the way walked from its
 * centre, and no point is farther from the triangle nearest to the centre than the farthest corner. Pieces
 * that cannot win are dropped, the others quartered, most promising first (branch and bound).
 *
 * @returns null when there are no triangles.
 */
export function largestDeviation(
  corners: Float32Array | Float64Array,
  triangles: Uint32Array,
  surface: SurfaceIndex,
): Deviation | null {
  if (triangles.length === 0) return null;
  const search = new Search(surface);
  const step = Math.max(1, triangles.length / MAX_SEEDS);
  for (let i = 0; i < triangles.length; i += step) {
    const o = 9 * triangles[Math.floor(i)]!;
    for (let k = 0; k < 9; k += 3) search.visit(corners[o + k]!, corners[o + k + 1]!, corners[o + k + 2]!);
    search.add(Float64Array.from(corners.subarray(o, o + 9)));
  }
  search.refine();
  return { distanceMm: search.bestMm, placeMm: search.place };
}

class Search {
  bestMm = -1;
  place: Vector3 = [0, 0, 0];
  private readonly heap: Piece[] = [];

  constructor(private readonly surface: SurfaceIndex) {}

  /** @param enoughMm below which the exact distance no longer matters. */
  visit(x: number, y: number, z: number, enoughMm = this.bestMm): number {
    const distance = this.surface.distanceMm(x, y, z, enoughMm);
    if (distance > this.bestMm) {
      this.bestMm = distance;
      this.place = [x, y, z];
    }
    return distance;
  }

  add(corners: Float64Array): void {
    const x = (corners[0]! + corners[3]! + corners[6]!) / 3;
    const y = (corners[1]! + corners[4]! + corners[7]!) / 3;
    const z = (corners[2]! + corners[5]! + corners[8]!) / 3;
    let radius = 0;
    for (let k = 0; k < 9; k += 3) {
      radius = Math.max(radius, Math.hypot(corners[k]! - x, corners[k + 1]! - y, corners[k + 2]! - z));
    }
    const fromCentreMm = this.visit(x, y, z, Math.min(this.bestMm, this.goodEnough() - radius)) + radius;
    const boundMm = Math.min(fromCentreMm, this.surface.boundMm(corners));
    if (boundMm > this.goodEnough()) this.push({ corners, boundMm });
  }

  refine(): void {
    for (let i = 0; i < MAX_REFINEMENTS; i += 4) {
      const piece = this.pop();
      if (piece === undefined || piece.boundMm <= this.goodEnough()) return;
      for (const quarter of quarters(piece.corners)) this.add(quarter);
    }
  }

  private goodEnough(): number {
    return this.bestMm + Math.max(CLOSE_ENOUGH_MM, CLOSE_ENOUGH * this.bestMm);
  }

  private push(piece: Piece): void {
    const { heap } = this;
    let at = heap.length;
    heap.push(piece);
    while (at > 0) {
      const up = (at - 1) >> 1;
      if (heap[up]!.boundMm >= piece.boundMm) break;
      heap[at] = heap[up]!;
      at = up;
    }
    heap[at] = piece;
  }

  private pop(): Piece | undefined {
    const { heap } = this;
    const top = heap[0];
    const last = heap.pop();
    if (last === undefined || heap.length === 0) return top;
    let at = 0;
    for (;;) {
      let child = 2 * at + 1;
      if (child >= heap.length) break;
      if (child + 1 < heap.length && heap[child + 1]!.boundMm > heap[child]!.boundMm) child += 1;
      if (heap[child]!.boundMm <= last.boundMm) break;
      heap[at] = heap[child]!;
      at = child;
    }
    heap[at] = last;
    return top;
  }
}

function quarters(c: Float64Array): Float64Array[] {
  const middle = (a: number, b: number): number[] =>
    [0, 1, 2].map((axis) => (c[a + axis]! + c[b + axis]!) / 2);
  const ab = middle(0, 3),
    bc = middle(3, 6),
    ca = middle(6, 0);
  const [a, b, d] = [c.subarray(0, 3), c.subarray(3, 6), c.subarray(6, 9)];
  return [
    Float64Array.of(...a, ...ab, ...ca),
    Float64Array.of(...ab, ...b, ...bc),
    Float64Array.of(...ca, ...bc, ...d),
    Float64Array.of(...ab, ...bc, ...ca),
  ];
}
