import { type Mesh } from '@windchest/meshes';

/** Contours of one cross-section as loose segments (x1, y1, x2, y2 in mm), the solid on their left. */
export type Segments = Float64Array;

export interface LayerPlan {
  readonly layers: number;
  readonly layerMm: number;
  readonly bottomMm: number;
}

/** Walls this upright (sine of the lean) have the same contour in the next layer. */
const UPRIGHT = 1e-3;

/** Taken out of the loops: some hosts look globals up slowly. */
const { abs, ceil, hypot, max, min } = Math;

/**
 * Cuts a mesh at the middle height of every layer, from the bed up. A layer whose contours are those of the
 * layer below (nothing begins or ends between, all walls upright) is given as `null`.
 */
export function sweepLayers(
  mesh: Mesh,
  plan: LayerPlan,
  visit: (layer: number, segments: Segments | null) => void,
): void {
  const { starts, order, last, isLeaning } = bucketTriangles(mesh, plan);
  let active: number[] = [];
  for (let layer = 0; layer < plan.layers; layer += 1) {
    const kept = active.filter((triangle) => last[triangle]! >= layer);
    let isSame = layer > 0 && kept.length === active.length;
    for (let i = starts[layer]!; i < starts[layer + 1]!; i += 1) {
      kept.push(order[i]!);
      isSame = false;
    }
    active = kept;
    if (isSame && active.every((triangle) => isLeaning[triangle] === 0)) visit(layer, null);
    else visit(layer, cut(mesh.corners, active, plan.bottomMm + (layer + 0.5) * plan.layerMm));
  }
}

/** How many layers of the plan have contours of their own: what a sweep costs. */
export function countDistinctLayers(mesh: Mesh, plan: LayerPlan): number {
  const { first, last, isLeaning } = bucketTriangles(mesh, plan);
  const changes = new Uint8Array(plan.layers + 1);
  const leaning = new Int32Array(plan.layers + 1);
  for (let triangle = 0; triangle < mesh.triangles; triangle += 1) {
    const from = first[triangle]!;
    const to = last[triangle]!;
    if (from > to) continue;
    changes[from] = 1;
    changes[to + 1] = 1;
    if (isLeaning[triangle] === 0) continue;
    leaning[from]! += 1;
    leaning[to + 1]! -= 1;
  }
  let distinct = 0;
  let depth = 0;
  for (let layer = 0; layer < plan.layers; layer += 1) {
    depth += leaning[layer]!;
    if (changes[layer] === 1 || depth > 0) distinct += 1;
  }
  return distinct;
}

function bucketTriangles({ corners, triangles }: Mesh, { layers, layerMm, bottomMm }: LayerPlan) {
  const first = new Int32Array(triangles);
  const last = new Int32Array(triangles);
  const isLeaning = new Uint8Array(triangles);
  const starts = new Int32Array(layers + 2);
  for (let triangle = 0; triangle < triangles; triangle += 1) {
    const o = 9 * triangle;
    const a = corners[o + 2]!;
    const b = corners[o + 5]!;
    const c = corners[o + 8]!;
    const from = max(0, ceil((min(a, b, c) - bottomMm) / layerMm - 0.5));
    const to = min(layers - 1, ceil((max(a, b, c) - bottomMm) / layerMm - 0.5) - 1);
    first[triangle] = from;
    last[triangle] = to;
    if (from <= to) starts[from + 1]! += 1;
    isLeaning[triangle] = leans(corners, o) ? 1 : 0;
  }
  for (let layer = 0; layer <= layers; layer += 1) starts[layer + 1]! += starts[layer]!;
  const order = new Int32Array(starts[layers]!);
  const next = starts.slice();
  for (let triangle = 0; triangle < triangles; triangle += 1) {
    const from = first[triangle]!;
    if (from <= last[triangle]!) order[next[from]!++] = triangle;
  }
  return { first, last, isLeaning, starts, order };
}

function leans(p: Float32Array | Float64Array, o: number): boolean {
  const ux = p[o + 3]! - p[o]!;
  const uy = p[o + 4]! - p[o + 1]!;
  const uz = p[o + 5]! - p[o + 2]!;
  const vx = p[o + 6]! - p[o]!;
  const vy = p[o + 7]! - p[o + 1]!;
  const vz = p[o + 8]! - p[o + 2]!;
  const nz = ux * vy - uy * vx;
  return abs(nz) > UPRIGHT * hypot(uy * vz - uz * vy, uz * vx - ux * vz, nz);
}

function cut(p: Float32Array | Float64Array, active: readonly number[], z: number): Segments {
  const segments = new Float64Array(4 * active.length);
  let count = 0;
  for (const triangle of active) {
    const o = 9 * triangle;
    const isAAbove = p[o + 2]! > z;
    const isBAbove = p[o + 5]! > z;
    const isCAbove = p[o + 8]! > z;
    if (isAAbove === isBAbove && isBAbove === isCAbove) continue;
    for (let corner = 0; corner < 3; corner += 1) {
      const from = o + 3 * corner;
      const to = o + 3 * ((corner + 1) % 3);
      const isFromAbove = p[from + 2]! > z;
      if (isFromAbove === p[to + 2]! > z) continue;
      // Both triangles of an edge must find the same point: always work from its lower end.
      const low = isFromAbove ? to : from;
      const high = isFromAbove ? from : to;
      const share = (z - p[low + 2]!) / (p[high + 2]! - p[low + 2]!);
      // The solid is on the left when one walks from the edge going down to the edge going up.
      const slot = 4 * count + (isFromAbove ? 0 : 2);
      segments[slot] = p[low]! + share * (p[high]! - p[low]!);
      segments[slot + 1] = p[low + 1]! + share * (p[high + 1]! - p[low + 1]!);
    }
    count += 1;
  }
  return segments.subarray(0, 4 * count);
}
