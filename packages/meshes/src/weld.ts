/** Corners that lie on exactly the same point, merged into one vertex. */
export interface WeldedMesh {
  readonly triangles: number;
  readonly vertices: number;
  /** Vertex of each corner: 3 for each triangle. */
  readonly vertexOfCorner: Uint32Array;
  /** A corner that lies on each vertex: the vertex has that corner's coordinates. */
  readonly cornerOfVertex: Uint32Array;
}

/**
 * Merges equal corners through an open-addressing hash table in one typed array: linear in time and memory.
 * Only exactly equal points merge (0 and −0 are equal), as slicers do it; near misses stay open edges and
 * are reported, never closed silently.
 */
export function weld(corners: Float32Array | Float64Array): WeldedMesh {
  const total = corners.length / 3;
  const vertexOfCorner = new Uint32Array(total);
  let cornerOfVertex = new Uint32Array(Math.max(16, total >>> 2));
  let vertices = 0;
  // A closed mesh has about half as many vertices as triangles: a sixth of its corners.
  let bits = Math.max(4, Math.ceil(Math.log2(Math.max(1, total / 6) * 2)));
  let table = new Int32Array(2 ** bits).fill(-1);
  const hash = hasherOf(corners);

  for (let corner = 0; corner < total; corner += 1) {
    const mask = table.length - 1;
    const o = 3 * corner;
    const x = corners[o],
      y = corners[o + 1],
      z = corners[o + 2];
    let slot = hash(corner) & mask;
    let vertex = table[slot]!;
    while (vertex >= 0) {
      const other = 3 * cornerOfVertex[vertex]!;
      if (corners[other] === x && corners[other + 1] === y && corners[other + 2] === z) break;
      slot = (slot + 1) & mask;
      vertex = table[slot]!;
    }
    if (vertex < 0) {
      vertex = vertices;
      vertices += 1;
      if (vertex === cornerOfVertex.length) {
        const larger = new Uint32Array(Math.min(total, 2 * cornerOfVertex.length));
        larger.set(cornerOfVertex);
        cornerOfVertex = larger;
      }
      cornerOfVertex[vertex] = corner;
      table[slot] = vertex;
      if (vertices * 2 > table.length) {
        bits += 1;
        table = rehash(cornerOfVertex, vertices, bits, hash);
      }
    }
    vertexOfCorner[corner] = vertex;
  }
  return {
    triangles: total / 3,
    vertices,
    vertexOfCorner,
    cornerOfVertex: cornerOfVertex.slice(0, vertices),
  };
}

type CornerHash = (corner: number) => number;

function rehash(
  cornerOfVertex: Uint32Array,
  vertices: number,
  bits: number,
  hash: CornerHash,
): Int32Array<ArrayBuffer> {
  const table = new Int32Array(2 ** bits).fill(-1);
  const mask = table.length - 1;
  for (let vertex = 0; vertex < vertices; vertex += 1) {
    let slot = hash(cornerOfVertex[vertex]!) & mask;
    while (table[slot]! >= 0) slot = (slot + 1) & mask;
    table[slot] = vertex;
  }
  return table;
}

/** Hashes the bit patterns: coordinates on a grid differ in few bits, so they are mixed thoroughly. */
function hasherOf(corners: Float32Array | Float64Array): CornerHash {
  const words = new Uint32Array(corners.buffer, corners.byteOffset, corners.byteLength / 4);
  if (corners instanceof Float32Array) {
    return (corner) => {
      const o = 3 * corner;
      return finish(
        step(step(step(0x9e3779b9, plain(words[o]!)), plain(words[o + 1]!)), plain(words[o + 2]!)),
      );
    };
  }
  return (corner) => {
    const o = 6 * corner;
    let value = 0x9e3779b9;
    for (let axis = 0; axis < 6; axis += 2) {
      value = step(step(value, words[o + axis]!), plain(words[o + axis + 1]!));
    }
    return finish(value);
  };
}

/** −0 has the sign bit alone and must hash as 0. */
function plain(word: number): number {
  return word === 0x80000000 ? 0 : word;
}

function step(value: number, word: number): number {
  let mixed = Math.imul(word, 0xcc9e2d51);
  mixed = (mixed << 15) | (mixed >>> 17);
  const next = value ^ Math.imul(mixed, 0x1b873593);
  return (Math.imul((next << 13) | (next >>> 19), 5) + 0xe6546b64) | 0;
}

function finish(value: number): number {
  let h = value ^ (value >>> 16);
  h = Math.imul(h, 0x85ebca6b);
  h ^= h >>> 13;
  h = Math.imul(h, 0xc2b2ae35);
  return (h ^ (h >>> 16)) >>> 0;
}
