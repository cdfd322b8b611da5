import { type Solid, type Vertex, vertexOf } from '../geometry/solid.js';

const headerBytes = 80;
const triangleBytes = 50;

/**
 * Binary STL: 80 bytes of free text, the number of triangles, then 50 bytes a triangle (normal, three
 * corners, an unused word), little-endian.
 */
export function binaryStl(solid: Solid, title: string): Uint8Array {
  const bytes = new Uint8Array(headerBytes + 4 + triangleBytes * solid.triangles.length);
  // Some programs take a file that begins with the word "solid" for the text form.
  const header = new TextEncoder().encode(title.replace(/^solid/i, 'part'));
  bytes.set(header.subarray(0, headerBytes));
  const view = new DataView(bytes.buffer);
  view.setUint32(headerBytes, solid.triangles.length, true);
  solid.triangles.forEach(([a, b, c], index) => {
    const corners: [Vertex, Vertex, Vertex] = [vertexOf(solid, a), vertexOf(solid, b), vertexOf(solid, c)];
    let offset = headerBytes + 4 + index * triangleBytes;
    for (const number of [normalOf(corners), ...corners].flat()) {
      view.setFloat32(offset, number, true);
      offset += 4;
    }
  });
  return bytes;
}

function normalOf([a, b, c]: [Vertex, Vertex, Vertex]): Vertex {
  const [ux, uy, uz] = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
  const [vx, vy, vz] = [c[0] - a[0], c[1] - a[1], c[2] - a[2]];
  const [x, y, z] = [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx];
  const length = Math.hypot(x, y, z);
  return length === 0 ? [0, 0, 0] : [x / length, y / length, z / length];
}
