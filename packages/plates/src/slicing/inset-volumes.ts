import type { SlicedMesh } from './layers.js';

/** Insets at which the remaining volume is kept, in mm: fine where walls end, coarse beyond. */
export const INSET_MM_STEPS: readonly number[] = [
  0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.1, 1.2, 1.3, 1.4, 1.5, 1.6, 1.8, 2, 2.25, 2.5, 3, 3.5,
  4, 5, 6,
];
const BIN_MM = 0.02;

/** Taken out of the loops: some hosts look globals up slowly. */
const { ceil, floor, max, min } = Math;

/**
 * Volume that remains when every contour moves inwards by each of the steps. A cell counts in part while the
 * contour moves across it (a ramp one cell wide), which is exact for straight contours.
 */
export function insetVolumes({ grid, plan, layers }: SlicedMesh): number[] {
  const volumes = INSET_MM_STEPS.map(() => 0);
  for (let layer = 0; layer < layers.length;) {
    let repeats = 1;
    while (layers[layer + repeats] === layers[layer]) repeats += 1;
    const { depths, areaMm2 } = layers[layer]!;
    const areas = insetAreas(depths, grid.cellMm);
    // The ramp thickens walls thinner than a cell; the exact area sets that right.
    const scale = areas[0]! > 0 ? areaMm2 / areas[0]! : 0;
    areas.forEach((area, step) => {
      volumes[step]! += area * scale * repeats * plan.layerMm;
    });
    layer += repeats;
  }
  return volumes;
}

function insetAreas(depths: Float32Array, cellMm: number): number[] {
  const half = cellMm / 2;
  const offset = cellMm;
  const bins = ceil((INSET_MM_STEPS.at(-1)! + 2 * offset) / BIN_MM) + 2;
  // Slope of the remaining area over the inset: each cell falls from 1 to 0 between depth ∓ half a cell.
  const slope = new Float64Array(bins + 1);
  let whole = 0;
  const last = bins - 1;
  const addTo = (at: number, value: number): void => {
    const bin = min(last, max(0, (at + offset) / BIN_MM));
    const low = floor(bin);
    slope[low]! += value * (1 - (bin - low));
    slope[low + 1]! += value * (bin - low);
  };
  for (const depth of depths) {
    if (depth <= -half) continue;
    whole += 1;
    addTo(depth - half, -1 / cellMm);
    addTo(depth + half, 1 / cellMm);
  }
  const remaining = new Float64Array(bins + 1);
  let rate = 0;
  let value = whole;
  for (let bin = 0; bin <= bins; bin += 1) {
    remaining[bin] = value;
    rate += slope[bin]!;
    value += rate * BIN_MM;
  }
  return INSET_MM_STEPS.map((inset) => {
    const bin = (inset + offset) / BIN_MM;
    const low = floor(bin);
    const share = bin - low;
    const cells = remaining[low]! * (1 - share) + remaining[min(bins, low + 1)]! * share;
    return max(0, cells) * cellMm ** 2;
  });
}
