/** Sparse regions up to this size are printed solid (a slicer's usual default, 70 mm²). */
export const SMALL_REGION_MM2 = 70;

/**
 * Marks the cells of connected regions (side by side, not corner to corner) whose area stays below
 * `SMALL_REGION_MM2`.
 *
 * @param cover how much of each cell belongs to the region, 0 to 1; cells from one half up connect.
 * @returns 1 for cells of small regions.
 */
export function markSmallRegions(cover: Float32Array, columns: number, cellMm: number): Uint8Array {
  const isSmall = new Uint8Array(cover.length);
  const isSeen = new Uint8Array(cover.length);
  const region = new Int32Array(cover.length);
  const sides = [-1, 1, -columns, columns, -columns - 1, -columns + 1, columns - 1, columns + 1];
  for (let start = 0; start < cover.length; start += 1) {
    if (cover[start]! < 0.5 || isSeen[start] === 1) continue;
    let count = 1;
    let area = 0;
    region[0] = start;
    isSeen[start] = 1;
    for (let at = 0; at < count; at += 1) {
      const cell = region[at]!;
      area += cover[cell]!;
      for (let side = 0; side < 4; side += 1) {
        const neighbour = cell + sides[side]!;
        if (isSeen[neighbour] === 1 || !(cover[neighbour]! >= 0.5)) continue;
        isSeen[neighbour] = 1;
        region[count] = neighbour;
        count += 1;
      }
    }
    if (area * cellMm ** 2 >= SMALL_REGION_MM2) continue;
    for (let at = 0; at < count; at += 1) {
      const cell = region[at]!;
      isSmall[cell] = 1;
      // The fringe of partly covered cells goes with its region.
      for (let side = 0; side < 8; side += 1) {
        const neighbour = cell + sides[side]!;
        if (cover[neighbour]! > 0 && cover[neighbour]! < 0.5) isSmall[neighbour] = 1;
      }
    }
  }
  return isSmall;
}
