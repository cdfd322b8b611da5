import { type Mesh } from '@windchest/meshes';
import { convexHull } from './convex-hull.js';
import { PlatesError } from './plates-error.js';
import type { Point } from './types.js';

/** Corners waiting until the hull is drawn anew: few enough to sort at once, many enough to do so seldom. */
const WAITING = 2048;

/**
 * Convex outline of a mesh seen from above, in mm, counter-clockwise. One pass: corners inside the outline
 * found so far are dropped as they come.
 *
 * @throws PlatesError for a mesh that covers no area.
 */
export function footprintOf({ corners, triangles }: Mesh): Point[] {
  let outline = new Outline([]);
  let waiting: Point[] = [];
  for (let i = 0; i < 9 * triangles; i += 3) {
    const x = corners[i]!;
    const y = corners[i + 1]!;
    if (outline.covers(x, y)) continue;
    waiting.push([x, y]);
    if (waiting.length < WAITING) continue;
    outline = new Outline(convexHull([...outline.hull, ...waiting]));
    waiting = [];
  }
  const hull = convexHull([...outline.hull, ...waiting]);
  if (hull.length < 3) {
    throw new PlatesError('The mesh covers no area when seen from above; export the part as a solid.');
  }
  return hull;
}

/** A hull split into its lower and upper chain, so that a point is tested by two binary searches. */
class Outline {
  private readonly lower: readonly Point[];
  private readonly upper: readonly Point[];

  constructor(readonly hull: readonly Point[]) {
    // The hull starts at its leftmost corner and runs along the lower side first.
    let rightmost = 0;
    hull.forEach(([x, y], i) => {
      const [mostX, mostY] = hull[rightmost]!;
      if (x > mostX || (x === mostX && y < mostY)) rightmost = i;
    });
    this.lower = hull.slice(0, rightmost + 1);
    const back = hull.slice(rightmost);
    const [start] = hull;
    this.upper = start === undefined ? [] : [start, ...back.toReversed()];
  }

  covers(x: number, y: number): boolean {
    if (this.hull.length < 3) return false;
    const low = heightAt(this.lower, x);
    const high = heightAt(this.upper, x);
    return low !== null && high !== null && y >= low && y <= high;
  }
}

/** Height of a chain that runs from left to right; null beside it and at upright ends. */
function heightAt(chain: readonly Point[], x: number): number | null {
  if (x <= chain[0]![0] || x >= chain.at(-1)![0]) return null;
  let low = 0;
  let high = chain.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (chain[middle]![0] <= x) low = middle;
    else high = middle;
  }
  const [x1, y1] = chain[low]!;
  const [x2, y2] = chain[high]!;
  return x2 > x1 ? y1 + ((x - x1) / (x2 - x1)) * (y2 - y1) : null;
}
