import { type Mesh } from '@windchest/meshes';
import { withoutBuried } from './buried-contours.js';
import { depthField } from './depth-field.js';
import { markInside, type Grid } from './inside-rows.js';
import { countDistinctLayers, sweepLayers, type LayerPlan, type Segments } from './sweep.js';

export interface Layer {
  /** Depth below the contour for each cell of the grid, in mm; layers of one shape share one field. */
  readonly depths: Float32Array;
  readonly areaMm2: number;
  readonly contourMm: number;
}

export interface SlicedMesh {
  readonly grid: Grid;
  readonly plan: LayerPlan;
  readonly layers: readonly Layer[];
  readonly isClosed: boolean;
}

const MIN_CELL_MM = 0.2;
const USUAL_CELL_MM = 0.5;
/** Cells aimed at for a layer, and the most for a large one. */
const USUAL_CELLS = 10_000;
const MOST_CELLS = 120_000;
/** Bounds memory (4 bytes each) and time: cells of all layers that differ. */
const MOST_CELLS_IN_ALL = 2_500_000;
const MOST_LAYERS = 4_000;
/** Exact and counted area may differ by this much before the count is believed. */
const AREA_DOUBT = 0.15;

/** Cuts a mesh into layers and finds how deep below the contour each place of each layer lies. */
export function sliceMesh(mesh: Mesh, layerMm: number): SlicedMesh {
  const { min, max } = boxOf(mesh);
  const grid = gridOver(min, max);
  const plan = planLayers(mesh, layerMm, min[2], max[2] - min[2], grid);
  const layers: Layer[] = [];
  let isClosed = true;
  sweepLayers(mesh, plan, (_, segments) => {
    const below = layers.at(-1);
    if (segments === null && below !== undefined) {
      layers.push(below);
      return;
    }
    const { layer, hasGaps } = readLayer(segments ?? new Float64Array(), grid);
    if (hasGaps) isClosed = false;
    layers.push(layer);
  });
  return { grid, plan, layers, isClosed };
}

function readLayer(cut: Segments, grid: Grid): { layer: Layer; hasGaps: boolean } {
  const { cells, hasGaps, hasOverlap } = markInside(cut, grid);
  const union = hasOverlap && !hasGaps ? withoutBuried(cut) : undefined;
  const segments = union?.segments ?? cut;
  let twiceArea = 0;
  let lengthMm = 0;
  for (let s = 0; s < segments.length; s += 4) {
    // Measured from the grid's corner, so that parts far from the origin lose no digits.
    const x1 = segments[s]! - grid.leftMm;
    const y1 = segments[s + 1]! - grid.frontMm;
    const x2 = segments[s + 2]! - grid.leftMm;
    const y2 = segments[s + 3]! - grid.frontMm;
    twiceArea += x1 * y2 - x2 * y1;
    lengthMm += Math.hypot(x2 - x1, y2 - y1);
  }
  const contourMm = union?.contourMm ?? lengthMm;
  let counted = 0;
  for (const cell of cells) counted += cell;
  const countedMm2 = counted * grid.cellMm ** 2;
  const exactMm2 = Math.abs(twiceArea) / 2;
  const doubtMm2 = AREA_DOUBT * exactMm2 + grid.cellMm * contourMm;
  const isExact = Math.abs(exactMm2 - countedMm2) <= doubtMm2 && !hasOverlap;
  const depths = depthField(segments, cells, grid);
  return { layer: { depths, areaMm2: isExact ? exactMm2 : countedMm2, contourMm }, hasGaps };
}

function gridOver(min: readonly number[], max: readonly number[]): Grid {
  const width = max[0]! - min[0]!;
  const depth = max[1]! - min[1]!;
  const usual = Math.min(USUAL_CELL_MM, Math.sqrt((width * depth) / USUAL_CELLS));
  const cellMm = Math.max(MIN_CELL_MM, usual, Math.sqrt((width * depth) / MOST_CELLS));
  return {
    cellMm,
    columns: Math.ceil(width / cellMm) + 3,
    rows: Math.ceil(depth / cellMm) + 3,
    // An odd share of a cell: contours on round numbers should not run through cell centres.
    leftMm: min[0]! - 1.37 * cellMm,
    frontMm: min[1]! - 1.41 * cellMm,
  };
}

/** Layers of the wished thickness, thicker where a tall and curved part would have too many shapes. */
function planLayers(mesh: Mesh, layerMm: number, bottomMm: number, heightMm: number, grid: Grid): LayerPlan {
  const most = Math.max(40, MOST_CELLS_IN_ALL / (grid.columns * grid.rows));
  const planOf = (layers: number): LayerPlan => ({ layers, layerMm: heightMm / layers, bottomMm });
  let plan = planOf(Math.min(MOST_LAYERS, Math.max(1, Math.round(heightMm / layerMm))));
  while (plan.layers > 1) {
    const distinct = countDistinctLayers(mesh, plan);
    if (distinct <= most) break;
    plan = planOf(Math.max(1, Math.min(plan.layers - 1, Math.round((plan.layers * most) / distinct))));
  }
  return plan;
}

function boxOf({ corners, triangles }: Mesh): {
  min: [number, number, number];
  max: [number, number, number];
} {
  const min: [number, number, number] = [Infinity, Infinity, Infinity];
  const max: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (let i = 0; i < 9 * triangles; i += 3) {
    for (let axis = 0; axis < 3; axis += 1) {
      const value = corners[i + axis]!;
      if (value < min[axis]!) min[axis] = value;
      if (value > max[axis]!) max[axis] = value;
    }
  }
  return { min, max };
}
