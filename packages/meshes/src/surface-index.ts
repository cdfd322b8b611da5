import { boundsOf } from './bounds.js';
import { squaredDistanceToTriangle } from './triangle-distance.js';

const LEAF_TRIANGLES = 4;
const MORTON_BITS = 9;
const STACK_DEPTH = 64;

/**
 * Answers how far a point is from a triangle surface. Triangles are put in Morton order of their centres and
 * boxed in a complete binary tree (Lauterbach et al., "Fast BVH construction on GPUs", 2009): the build is
 * one sort and one pass.
 */
export class SurfaceIndex {
  private readonly order: Uint32Array;
  private readonly boxes: Float64Array;
  private readonly firstLeaf: number;
  private lastNearest = 0;
  private readonly stack = new Int32Array(STACK_DEPTH);

  constructor(private readonly corners: Float32Array | Float64Array) {
    this.order = mortonOrder(corners);
    const leaves = Math.ceil(this.order.length / LEAF_TRIANGLES);
    this.firstLeaf = 2 ** Math.ceil(Math.log2(Math.max(1, leaves)));
    this.boxes = new Float64Array(6 * 2 * this.firstLeaf);
    this.fillBoxes();
  }

  /**
   * Distance from a point to the surface, in mm.
   *
   * @param enoughMm the search stops at the first triangle this near: the answer is then only known to be no
   * more than what is returned.
   */
  distanceMm(x: number, y: number, z: number, enoughMm = 0): number {
    const { stack, boxes, firstLeaf } = this;
    const enough = enoughMm > 0 ? enoughMm * enoughMm : -1;
    // Points are asked for in runs of neighbours, so the last answer is a good first guess.
    let best = squaredDistanceToTriangle(this.corners, 9 * this.lastNearest, x, y, z);
    let depth = 1;
    stack[0] = 1;
    while (depth > 0 && best > enough) {
      depth -= 1;
      const node = stack[depth]!;
      if (squaredDistanceToBox(boxes, 6 * node, x, y, z) >= best) continue;
      if (node >= firstLeaf) {
        best = this.nearestInLeaf(node - firstLeaf, x, y, z, best);
        continue;
      }
      const left = squaredDistanceToBox(boxes, 12 * node, x, y, z);
      const right = squaredDistanceToBox(boxes, 12 * node + 6, x, y, z);
      const isLeftNearer = left <= right;
      stack[depth] = isLeftNearer ? 2 * node + 1 : 2 * node;
      stack[depth + 1] = isLeftNearer ? 2 * node : 2 * node + 1;
      depth += 2;
    }
    return Math.sqrt(best);
  }

  /**
   * The most that any point of a triangle can be away, in mm, judged by the triangle found last: the distance
   * from a convex set is a convex function, so it is greatest at a corner.
   */
  boundMm(c: Float64Array): number {
    const o = 9 * this.lastNearest;
    return Math.sqrt(
      Math.max(
        squaredDistanceToTriangle(this.corners, o, c[0]!, c[1]!, c[2]!),
        squaredDistanceToTriangle(this.corners, o, c[3]!, c[4]!, c[5]!),
        squaredDistanceToTriangle(this.corners, o, c[6]!, c[7]!, c[8]!),
      ),
    );
  }

  private nearestInLeaf(leaf: number, x: number, y: number, z: number, before: number): number {
    let best = before;
    const end = Math.min(this.order.length, (leaf + 1) * LEAF_TRIANGLES);
    for (let i = leaf * LEAF_TRIANGLES; i < end; i += 1) {
      const triangle = this.order[i]!;
      const squared = squaredDistanceToTriangle(this.corners, 9 * triangle, x, y, z);
      if (squared < best) {
        best = squared;
        this.lastNearest = triangle;
      }
    }
    return best;
  }

  private fillBoxes(): void {
    const { boxes, corners, order, firstLeaf } = this;
    for (let node = 1; node < 2 * firstLeaf; node += 1) {
      boxes.fill(Infinity, 6 * node, 6 * node + 3);
      boxes.fill(-Infinity, 6 * node + 3, 6 * node + 6);
    }
    for (let i = 0; i < order.length; i += 1) {
      const box = 6 * (firstLeaf + Math.floor(i / LEAF_TRIANGLES));
      for (let k = 0; k < 9; k += 1) {
        const value = corners[9 * order[i]! + k]!;
        const axis = k % 3;
        if (value < boxes[box + axis]!) boxes[box + axis] = value;
        if (value > boxes[box + 3 + axis]!) boxes[box + 3 + axis] = value;
      }
    }
    for (let node = firstLeaf - 1; node >= 1; node -= 1) {
      for (let axis = 0; axis < 3; axis += 1) {
        boxes[6 * node + axis] = Math.min(boxes[12 * node + axis]!, boxes[12 * node + 6 + axis]!);
        boxes[6 * node + 3 + axis] = Math.max(boxes[12 * node + 3 + axis]!, boxes[12 * node + 9 + axis]!);
      }
    }
  }
}

function squaredDistanceToBox(boxes: Float64Array, o: number, x: number, y: number, z: number): number {
  const dx = Math.max(boxes[o]! - x, 0, x - boxes[o + 3]!);
  const dy = Math.max(boxes[o + 1]! - y, 0, y - boxes[o + 4]!);
  const dz = Math.max(boxes[o + 2]! - z, 0, z - boxes[o + 5]!);
  return dx * dx + dy * dy + dz * dz;
}

function mortonOrder(corners: Float32Array | Float64Array): Uint32Array {
  const triangles = corners.length / 9;
  const { minMm, maxMm } = boundsOf(corners);
  const top = 2 ** MORTON_BITS - 1;
  const scale = [0, 1, 2].map((axis) => top / Math.max(1e-12, maxMm[axis]! - minMm[axis]!) / 3);
  const keys = new Float64Array(triangles);
  for (let t = 0; t < triangles; t += 1) {
    let code = 0;
    for (let axis = 0; axis < 3; axis += 1) {
      const o = 9 * t + axis;
      const sum = corners[o]! + corners[o + 3]! + corners[o + 6]! - 3 * minMm[axis]!;
      code |= spread(Math.min(top, Math.max(0, Math.floor(sum * scale[axis]!)))) << axis;
    }
    // 27 bits of Morton code over up to 26 bits of index: exact in a double, so one native sort does it.
    keys[t] = code * 2 ** 26 + t;
  }
  keys.sort();
  const order = new Uint32Array(triangles);
  for (let i = 0; i < triangles; i += 1) order[i] = keys[i]! % 2 ** 26;
  return order;
}

/** Puts two zero bits between the bits of a number. */
function spread(value: number): number {
  let v = value & 0x3ff;
  v = (v | (v << 16)) & 0x30000ff;
  v = (v | (v << 8)) & 0x300f00f;
  v = (v | (v << 4)) & 0x30c30c3;
  return (v | (v << 2)) & 0x9249249;
}
