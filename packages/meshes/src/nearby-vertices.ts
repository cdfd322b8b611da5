import type { WeldedMesh } from './weld.js';

/** A mesh whose vertices can be asked for by place. */
export interface PlacedVertices {
  readonly corners: Float32Array | Float64Array;
  readonly welded: WeldedMesh;
}

/**
 * Finds the vertex nearest to a point within a small tolerance along each axis, through a hash table over
 * cells of four times the tolerance: constant time for each question.
 */
export class NearbyVertices {
  private readonly heads: Int32Array;
  private readonly next: Int32Array;
  private readonly cellMm: number;

  constructor(
    private readonly mesh: PlacedVertices,
    private readonly toleranceMm: number,
  ) {
    const { vertices } = mesh.welded;
    this.cellMm = 4 * toleranceMm;
    this.heads = new Int32Array(2 ** Math.ceil(Math.log2(Math.max(16, 2 * vertices)))).fill(-1);
    this.next = new Int32Array(vertices);
    for (let vertex = 0; vertex < vertices; vertex += 1) {
      const o = 3 * mesh.welded.cornerOfVertex[vertex]!;
      const slot = this.slot(
        this.cell(mesh.corners[o]!),
        this.cell(mesh.corners[o + 1]!),
        this.cell(mesh.corners[o + 2]!),
      );
      this.next[vertex] = this.heads[slot]!;
      this.heads[slot] = vertex;
    }
  }

  /** The nearest vertex, or −1. */
  find(x: number, y: number, z: number): number {
    const t = this.toleranceMm;
    let best = -1;
    let bestDistance = Infinity;
    for (let i = this.cell(x - t); i <= this.cell(x + t); i += 1) {
      for (let j = this.cell(y - t); j <= this.cell(y + t); j += 1) {
        for (let k = this.cell(z - t); k <= this.cell(z + t); k += 1) {
          for (let vertex = this.heads[this.slot(i, j, k)]!; vertex >= 0; vertex = this.next[vertex]!) {
            const distance = this.distance(vertex, x, y, z);
            if (distance <= t && distance < bestDistance) {
              best = vertex;
              bestDistance = distance;
            }
          }
        }
      }
    }
    return best;
  }

  /** Largest of the differences along the three axes. */
  private distance(vertex: number, x: number, y: number, z: number): number {
    const { corners, welded } = this.mesh;
    const o = 3 * welded.cornerOfVertex[vertex]!;
    return Math.max(Math.abs(corners[o]! - x), Math.abs(corners[o + 1]! - y), Math.abs(corners[o + 2]! - z));
  }

  private cell(coordinateMm: number): number {
    return Math.floor(coordinateMm / this.cellMm);
  }

  private slot(i: number, j: number, k: number): number {
    let h = Math.imul(i, 0x8da6b343) ^ Math.imul(j, 0xd8163841) ^ Math.imul(k, 0xcb1ab31f);
    h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
    return (h ^ (h >>> 13)) & (this.heads.length - 1);
  }
}
