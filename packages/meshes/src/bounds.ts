/** A point or a size in mm: x, y, z. */
export type Vector3 = readonly [number, number, number];

export interface Bounds {
  readonly minMm: Vector3;
  readonly maxMm: Vector3;
}

/** Axis-aligned box of all corners, in mm. Corners must be finite and at least one. */
export function boundsOf(corners: Float32Array | Float64Array): Bounds {
  let minX = Infinity,
    minY = Infinity,
    minZ = Infinity;
  let maxX = -Infinity,
    maxY = -Infinity,
    maxZ = -Infinity;
  for (let i = 0; i < corners.length; i += 3) {
    const x = corners[i]!,
      y = corners[i + 1]!,
      z = corners[i + 2]!;
    if (x < minX) minX = x;
    if (x > maxX) maxX = x;
    if (y < minY) minY = y;
    if (y > maxY) maxY = y;
    if (z < minZ) minZ = z;
    if (z > maxZ) maxZ = z;
  }
  return { minMm: [minX, minY, minZ], maxMm: [maxX, maxY, maxZ] };
}
