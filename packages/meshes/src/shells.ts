import { gatherEdges, isCollapsed } from './edges.js';
import type { WeldedMesh } from './weld.js';

/** How the triangles of a mesh hang together. */
export interface Topology {
  readonly shells: number;
  /** Shell of each triangle; collapsed triangles have `NO_SHELL`. */
  readonly shellOfTriangle: Uint32Array;
  /** 1 where a triangle is wound against the first one of its shell. */
  readonly isTurned: Uint8Array;
  /** Edges that only one triangle has. */
  readonly openEdges: number;
  /** Edges that more than two triangles share. */
  readonly nonManifoldEdges: number;
  /** Edges whose two triangles run along them in the same direction. */
  readonly windingFaults: number;
}

export const NO_SHELL = 0xffffffff;

/**
 * Counts edges by how many triangles share them, and joins triangles across edges into shells, keeping for
 * each whether it is turned against its neighbours (union–find with parity). At an edge shared by an even
 * number of triangles in balanced directions solids only touch, so it does not join them.
 */
export function topologyOf(mesh: WeldedMesh): Topology {
  const { vertexOfCorner: v, triangles, vertices } = mesh;
  const { starts, halfEdges, higher } = gatherEdges(mesh);
  const sets = new ParitySets(triangles);
  let openEdges = 0;
  let nonManifoldEdges = 0;
  let windingFaults = 0;
  const runsUp = (halfEdge: number, low: number): boolean => v[halfEdge] === low;

  for (let low = 0; low < vertices; low += 1) {
    const end = starts[low + 1]!;
    for (let from = starts[low]!; from < end;) {
      let to = from + 1;
      while (to < end && higher[to] === higher[from]) to += 1;
      const first = halfEdges[from]!;
      const up = runsUp(first, low);
      if (to - from === 1) openEdges += 1;
      else if (to - from === 2) {
        const second = halfEdges[from + 1]!;
        const isFault = runsUp(second, low) === up;
        if (isFault) windingFaults += 1;
        sets.join((first / 3) | 0, (second / 3) | 0, isFault ? 1 : 0);
      } else {
        nonManifoldEdges += 1;
        let balance = 0;
        for (let i = from; i < to; i += 1) balance += runsUp(halfEdges[i]!, low) ? 1 : -1;
        for (let i = from + 1; i < to && balance !== 0; i += 1) {
          sets.join((first / 3) | 0, (halfEdges[i]! / 3) | 0, runsUp(halfEdges[i]!, low) === up ? 1 : 0);
        }
      }
      from = to;
    }
  }
  return { ...labelShells(mesh, sets), openEdges, nonManifoldEdges, windingFaults };
}

function labelShells(mesh: WeldedMesh, sets: ParitySets) {
  const shellOfTriangle = new Uint32Array(mesh.triangles).fill(NO_SHELL);
  const isTurned = new Uint8Array(mesh.triangles);
  const labelOfRoot = new Int32Array(mesh.triangles).fill(-1);
  let shells = 0;
  for (let t = 0; t < mesh.triangles; t += 1) {
    if (isCollapsed(mesh, t)) continue;
    const root = sets.find(t);
    if (labelOfRoot[root]! < 0) {
      labelOfRoot[root] = shells;
      shells += 1;
    }
    shellOfTriangle[t] = labelOfRoot[root]!;
    isTurned[t] = sets.parityOf(t);
  }
  return { shells, shellOfTriangle, isTurned };
}

/** Disjoint sets whose members know their parity against the root. */
class ParitySets {
  private readonly parent: Int32Array;
  private readonly parity: Uint8Array;
  private readonly rank: Uint8Array;

  constructor(size: number) {
    this.parent = new Int32Array(size);
    for (let i = 0; i < size; i += 1) this.parent[i] = i;
    this.parity = new Uint8Array(size);
    this.rank = new Uint8Array(size);
  }

  /** The root of a member; on the way each member is hung one step higher (path halving). */
  find(member: number): number {
    const { parent, parity } = this;
    let at = member;
    for (;;) {
      const up = parent[at]!;
      const above = parent[up]!;
      if (up === above) return up;
      parity[at]! ^= parity[up]!;
      parent[at] = above;
      at = above;
    }
  }

  /** Parity of a member against its root. */
  parityOf(member: number): number {
    let sum = 0;
    for (let at = member; this.parent[at] !== at; at = this.parent[at]!) sum ^= this.parity[at]!;
    return sum;
  }

  join(a: number, b: number, difference: number): void {
    const rootA = this.find(a);
    const rootB = this.find(b);
    if (rootA === rootB) return;
    const parity = this.parityOf(a) ^ this.parityOf(b) ^ difference;
    const isALower = this.rank[rootA]! < this.rank[rootB]!;
    const child = isALower ? rootA : rootB;
    const top = isALower ? rootB : rootA;
    this.parent[child] = top;
    this.parity[child] = parity;
    if (this.rank[child] === this.rank[top]) this.rank[top]! += 1;
  }
}
