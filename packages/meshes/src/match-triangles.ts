import type { Vector3 } from './bounds.js';
import { isCollapsed } from './edges.js';
import { NearbyVertices, type PlacedVertices } from './nearby-vertices.js';

/** Which triangles of two meshes have no counterpart in the other. */
export interface TriangleMatch {
  readonly onlyBefore: Uint32Array;
  readonly onlyAfter: Uint32Array;
}

/**
 * Pairs the triangles of two meshes whose corners agree within a tolerance along each axis, wherever they
 * stand in their files and whichever corner they start with. Winding must agree. Collapsed triangles are
 * left out.
 *
 * @param shiftMm added to `after` before comparing.
 */
export function matchTriangles(
  before: PlacedVertices,
  after: PlacedVertices,
  toleranceMm: number,
  shiftMm: Vector3 = [0, 0, 0],
): TriangleMatch {
  const nearby = new NearbyVertices(before, toleranceMm);
  // Vertices of `before` closer together than the tolerance count as one, or the pairing would be a lottery.
  const nameBefore = nameVertices(before, nearby, [0, 0, 0]);
  const nameAfter = nameVertices(after, nearby, shiftMm);
  const table = new TriangleTable(before.welded.triangles);
  for (let t = 0; t < before.welded.triangles; t += 1) {
    if (!isCollapsed(before.welded, t)) table.add(t, before.welded.vertexOfCorner, nameBefore);
  }
  const onlyAfter: number[] = [];
  for (let t = 0; t < after.welded.triangles; t += 1) {
    if (!isCollapsed(after.welded, t) && !table.take(t, after.welded.vertexOfCorner, nameAfter))
      onlyAfter.push(t);
  }
  return { onlyBefore: table.left(), onlyAfter: Uint32Array.from(onlyAfter) };
}

function nameVertices(mesh: PlacedVertices, nearby: NearbyVertices, shiftMm: Vector3): Int32Array {
  const { corners, welded } = mesh;
  const names = new Int32Array(welded.vertices);
  for (let vertex = 0; vertex < welded.vertices; vertex += 1) {
    const o = 3 * welded.cornerOfVertex[vertex]!;
    names[vertex] = nearby.find(
      corners[o]! + shiftMm[0],
      corners[o + 1]! + shiftMm[1],
      corners[o + 2]! + shiftMm[2],
    );
  }
  return names;
}

/** A multiset of triangles by the names of their corners, first the lowest name. */
class TriangleTable {
  private readonly heads: Int32Array;
  private readonly next: Int32Array;
  private readonly keys: Int32Array;
  private readonly isHeld: Uint8Array;
  private readonly key = new Int32Array(3);

  constructor(size: number) {
    this.heads = new Int32Array(2 ** Math.ceil(Math.log2(Math.max(16, 2 * size)))).fill(-1);
    this.next = new Int32Array(size);
    this.keys = new Int32Array(3 * size);
    this.isHeld = new Uint8Array(size);
  }

  add(triangle: number, vertexOfCorner: Uint32Array, names: Int32Array): void {
    const slot = this.load(triangle, vertexOfCorner, names);
    this.keys.set(this.key, 3 * triangle);
    this.next[triangle] = this.heads[slot]!;
    this.heads[slot] = triangle;
    this.isHeld[triangle] = 1;
  }

  /** Takes one equal triangle out, if there is one. */
  take(triangle: number, vertexOfCorner: Uint32Array, names: Int32Array): boolean {
    const slot = this.load(triangle, vertexOfCorner, names);
    const { key, keys } = this;
    if (key[0]! < 0) return false;
    for (let at = this.heads[slot]!; at >= 0; at = this.next[at]!) {
      const o = 3 * at;
      if (this.isHeld[at] === 1 && keys[o] === key[0] && keys[o + 1] === key[1] && keys[o + 2] === key[2]) {
        this.isHeld[at] = 0;
        return true;
      }
    }
    return false;
  }

  left(): Uint32Array {
    const triangles: number[] = [];
    this.isHeld.forEach((held, triangle) => {
      if (held === 1) triangles.push(triangle);
    });
    return Uint32Array.from(triangles);
  }

  private load(triangle: number, vertexOfCorner: Uint32Array, names: Int32Array): number {
    const o = 3 * triangle;
    const a = names[vertexOfCorner[o]!]!,
      b = names[vertexOfCorner[o + 1]!]!,
      c = names[vertexOfCorner[o + 2]!]!;
    const { key } = this;
    if (a <= b && a <= c) key.set([a, b, c]);
    else if (b <= c) key.set([b, c, a]);
    else key.set([c, a, b]);
    let h = Math.imul(key[0]!, 0x8da6b343) ^ Math.imul(key[1]!, 0xd8163841) ^ Math.imul(key[2]!, 0xcb1ab31f);
    h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
    return (h ^ (h >>> 13)) & (this.heads.length - 1);
  }
}
