const BODY_OFFSET = 84;
const TRIANGLE_BYTES = 50;

/**
 * Writes triangles as binary STL. Normals follow from the winding (right-hand rule); the header is zero, so
 * that equal triangles give equal bytes.
 *
 * @param corners x, y, z of three corners for each triangle, in mm.
 * @throws RangeError when the numbers do not make up whole triangles.
 */
export function writeBinaryStl(corners: ArrayLike<number>): Uint8Array {
  if (corners.length % 9 !== 0) {
    throw new RangeError(`${corners.length} numbers do not make up whole triangles of 9 numbers each.`);
  }
  const triangles = corners.length / 9;
  const bytes = new Uint8Array(BODY_OFFSET + TRIANGLE_BYTES * triangles);
  const view = new DataView(bytes.buffer);
  view.setUint32(80, triangles, true);
  for (let triangle = 0; triangle < triangles; triangle += 1) {
    const offset = BODY_OFFSET + TRIANGLE_BYTES * triangle;
    const normal = unitNormal(corners, 9 * triangle);
    for (let axis = 0; axis < 3; axis += 1) view.setFloat32(offset + 4 * axis, normal[axis]!, true);
    for (let k = 0; k < 9; k += 1) view.setFloat32(offset + 12 + 4 * k, corners[9 * triangle + k]!, true);
  }
  return bytes;
}

function unitNormal(c: ArrayLike<number>, o: number): [number, number, number] {
  const ux = c[o + 3]! - c[o]!,
    uy = c[o + 4]! - c[o + 1]!,
    uz = c[o + 5]! - c[o + 2]!;
  const vx = c[o + 6]! - c[o]!,
    vy = c[o + 7]! - c[o + 1]!,
    vz = c[o + 8]! - c[o + 2]!;
  const nx = uy * vz - uz * vy,
    ny = uz * vx - ux * vz,
    nz = ux * vy - uy * vx;
  const length = Math.hypot(nx, ny, nz);
  return length > 0 ? [nx / length, ny / length, nz / length] : [0, 0, 0];
}
