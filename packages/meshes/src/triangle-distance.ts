/**
 * Squared distance from a point to a triangle (nearest point by Voronoi regions: C. Ericson, "Real-Time
 * Collision Detection", 2005, 5.1.5), in mm².
 *
 * @param o where the nine coordinates of the triangle start.
 */
export function squaredDistanceToTriangle(
  c: Float32Array | Float64Array,
  o: number,
  x: number,
  y: number,
  z: number,
): number {
  const ax = c[o]!,
    ay = c[o + 1]!,
    az = c[o + 2]!;
  const ux = c[o + 3]! - ax,
    uy = c[o + 4]! - ay,
    uz = c[o + 5]! - az;
  const vx = c[o + 6]! - ax,
    vy = c[o + 7]! - ay,
    vz = c[o + 8]! - az;
  const px = x - ax,
    py = y - ay,
    pz = z - az;
  const uu = ux * ux + uy * uy + uz * uz;
  const uv = ux * vx + uy * vy + uz * vz;
  const vv = vx * vx + vy * vy + vz * vz;
  const pu = px * ux + py * uy + pz * uz;
  const pv = px * vx + py * vy + pz * vz;
  const atCorner = (s: number, t: number): number => {
    const dx = px - s * ux - t * vx,
      dy = py - s * uy - t * vy,
      dz = pz - s * uz - t * vz;
    return dx * dx + dy * dy + dz * dz;
  };
  if (pu <= 0 && pv <= 0) return atCorner(0, 0);
  const bu = pu - uu,
    bv = pv - uv;
  if (bu >= 0 && bv <= bu) return atCorner(1, 0);
  const cu = pu - uv,
    cv = pv - vv;
  if (cv >= 0 && cu <= cv) return atCorner(0, 1);
  const onU = pu * bv - bu * pv;
  if (onU <= 0 && pu >= 0 && bu <= 0) return atCorner(pu / uu, 0);
  const onV = cu * pv - pu * cv;
  if (onV <= 0 && pv >= 0 && cv <= 0) return atCorner(0, pv / vv);
  const onW = bu * cv - cu * bv;
  if (onW <= 0 && bv - bu >= 0 && cu - cv >= 0) {
    const t = (bv - bu) / (bv - bu + (cu - cv));
    return atCorner(1 - t, t);
  }
  const sum = onU + onV + onW;
  // A triangle without area has no inside; its edges have been looked at above, its corners remain.
  if (!(sum > 0)) return Math.min(atCorner(0, 0), atCorner(1, 0), atCorner(0, 1));
  return atCorner(onV / sum, onU / sum);
}
