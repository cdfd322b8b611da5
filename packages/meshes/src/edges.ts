import type { WeldedMesh } from './weld.js';

/**
 * All directed edges of a mesh, gathered by their lower vertex and, within it, sorted by the higher one.
 * Half-edge `3·t + k` runs from corner k of triangle t to the next corner.
 */
export interface EdgeBuckets {
  /** Start of each vertex's bucket in `halfEdges`; one more entry than vertices. */
  readonly starts: Uint32Array;
  readonly halfEdges: Uint32Array;
  /** The higher vertex of each entry, with the same order as `halfEdges`. */
  readonly higher: Uint32Array;
}

/** Buckets up to this size are sorted in place by insertion; fans of thousands go through a real sort. */
const INSERTION_LIMIT = 48;

/** Whether two corners of the triangle coincide: such a triangle has no edges worth counting. */
export function isCollapsed({ vertexOfCorner: v }: WeldedMesh, triangle: number): boolean {
  const o = 3 * triangle;
  return v[o] === v[o + 1] || v[o + 1] === v[o + 2] || v[o + 2] === v[o];
}

/** Counting sort of half-edges by lower vertex, then a small sort in each bucket: linear for real meshes. */
export function gatherEdges(mesh: WeldedMesh): EdgeBuckets {
  const { vertexOfCorner: v, triangles, vertices } = mesh;
  const starts = new Uint32Array(vertices + 1);
  for (let t = 0; t < triangles; t += 1) {
    const o = 3 * t;
    const a = v[o]!,
      b = v[o + 1]!,
      c = v[o + 2]!;
    if (a === b || b === c || c === a) continue;
    starts[(a < b ? a : b) + 1]! += 1;
    starts[(b < c ? b : c) + 1]! += 1;
    starts[(c < a ? c : a) + 1]! += 1;
  }
  for (let i = 0; i < vertices; i += 1) starts[i + 1]! += starts[i]!;
  const total = starts[vertices]!;
  const halfEdges = new Uint32Array(total);
  const higher = new Uint32Array(total);
  const cursor = starts.slice(0, vertices);
  const put = (from: number, to: number, halfEdge: number): void => {
    const low = from < to ? from : to;
    const at = cursor[low]!;
    cursor[low] = at + 1;
    halfEdges[at] = halfEdge;
    higher[at] = from < to ? to : from;
  };
  for (let t = 0; t < triangles; t += 1) {
    const o = 3 * t;
    const a = v[o]!,
      b = v[o + 1]!,
      c = v[o + 2]!;
    if (a === b || b === c || c === a) continue;
    put(a, b, o);
    put(b, c, o + 1);
    put(c, a, o + 2);
  }
  for (let vertex = 0; vertex < vertices; vertex += 1) {
    sortBucket(higher, halfEdges, starts[vertex]!, starts[vertex + 1]!);
  }
  return { starts, halfEdges, higher };
}

function sortBucket(keys: Uint32Array, values: Uint32Array, from: number, to: number): void {
  if (to - from > INSERTION_LIMIT) return sortLargeBucket(keys, values, from, to);
  for (let i = from + 1; i < to; i += 1) {
    const key = keys[i]!,
      value = values[i]!;
    let j = i - 1;
    while (j >= from && keys[j]! > key) {
      keys[j + 1] = keys[j]!;
      values[j + 1] = values[j]!;
      j -= 1;
    }
    keys[j + 1] = key;
    values[j + 1] = value;
  }
}

function sortLargeBucket(keys: Uint32Array, values: Uint32Array, from: number, to: number): void {
  // Key and place in the bucket packed in one double (32 + 21 bits at most); native sorting needs no callback.
  const length = to - from;
  const packed = new Float64Array(length);
  for (let i = 0; i < length; i += 1) packed[i] = keys[from + i]! * length + i;
  packed.sort();
  const old = values.slice(from, to);
  for (let i = 0; i < length; i += 1) {
    const key = Math.floor(packed[i]! / length);
    keys[from + i] = key;
    values[from + i] = old[packed[i]! - key * length]!;
  }
}
