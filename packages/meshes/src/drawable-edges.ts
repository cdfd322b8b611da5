import { gatherEdges } from './edges.js';
import { weld, type WeldedMesh } from './weld.js';

/** A mesh made ready for drawings from several sides. */
export interface DrawableMesh {
  readonly corners: Float32Array | Float64Array;
  readonly welded: WeldedMesh;
  /**
   * Edges that a drawing may show: half-edge and, for an edge of two triangles, the half-edge on its other
   * side, else −1. Edges within flat faces are left out.
   */
  readonly edges: Int32Array;
}

/** Faces that meet at less than this are one curved surface (common practice, no source). */
const CREASE_COSINE = Math.cos((32 * Math.PI) / 180);
const FLAT_COSINE = Math.cos((0.5 * Math.PI) / 180);

export function makeDrawable(corners: Float32Array | Float64Array): DrawableMesh {
  const welded = weld(corners);
  const { starts, halfEdges, higher } = gatherEdges(welded);
  const edges: number[] = [];
  for (let low = 0; low < welded.vertices; low += 1) {
    const end = starts[low + 1]!;
    for (let from = starts[low]!; from < end;) {
      let to = from + 1;
      while (to < end && higher[to] === higher[from]) to += 1;
      if (to - from !== 2) edges.push(halfEdges[from]!, -1);
      else if (cosineBetween(corners, halfEdges[from]!, halfEdges[from + 1]!) < FLAT_COSINE) {
        edges.push(halfEdges[from]!, halfEdges[from + 1]!);
      }
      from = to;
    }
  }
  return { corners, welded, edges: Int32Array.from(edges) };
}

/** Whether the faces on both sides of an edge meet at an angle worth a line from any side. */
export function isCrease(mesh: DrawableMesh, halfEdge: number, other: number): boolean {
  return other < 0 || cosineBetween(mesh.corners, halfEdge, other) < CREASE_COSINE;
}

function cosineBetween(corners: Float32Array | Float64Array, halfEdgeA: number, halfEdgeB: number): number {
  const a = normalOf(corners, Math.floor(halfEdgeA / 3));
  const b = normalOf(corners, Math.floor(halfEdgeB / 3));
  const lengths = Math.hypot(...a) * Math.hypot(...b);
  // A needle has no direction of its own, so it makes no crease.
  return lengths === 0 ? 1 : (a[0] * b[0] + a[1] * b[1] + a[2] * b[2]) / lengths;
}

function normalOf(c: Float32Array | Float64Array, triangle: number): [number, number, number] {
  const o = 9 * triangle;
  const ux = c[o + 3]! - c[o]!,
    uy = c[o + 4]! - c[o + 1]!,
    uz = c[o + 5]! - c[o + 2]!;
  const vx = c[o + 6]! - c[o]!,
    vy = c[o + 7]! - c[o + 1]!,
    vz = c[o + 8]! - c[o + 2]!;
  return [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx];
}
