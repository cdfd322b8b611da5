import { boxOf, type Box } from './convex-hull.js';
import type { Point } from './types.js';

/** Taken out of the loops: some hosts look globals up slowly. */
const { abs, cos, hypot, max, min, sin, sqrt } = Math;

const COINCIDES_MM = 1e-9;

/**
 * Minkowski sum of two convex counter-clockwise polygons: their edges merged by direction (de Berg and others,
 * Computational Geometry, 13.3).
 */
export function convexSum(a: readonly Point[], b: readonly Point[]): Point[] {
  const first = fromLowest(a);
  const second = fromLowest(b);
  const sum: Point[] = [];
  let i = 0;
  let j = 0;
  while (i < first.length || j < second.length) {
    const p = first[i % first.length]!;
    const q = second[j % second.length]!;
    sum.push([p[0] + q[0], p[1] + q[1]]);
    const nextP = first[(i + 1) % first.length]!;
    const nextQ = second[(j + 1) % second.length]!;
    const cross = (nextP[0] - p[0]) * (nextQ[1] - q[1]) - (nextP[1] - p[1]) * (nextQ[0] - q[0]);
    const takesFirst = j >= second.length || (i < first.length && cross >= 0);
    const takesSecond = i >= first.length || (j < second.length && cross <= 0);
    if (takesFirst) i += 1;
    if (takesSecond) j += 1;
  }
  return sum;
}

export function negated(polygon: readonly Point[]): Point[] {
  return polygon.map(([x, y]) => [-x, -y]);
}

/** A polygon of equal angles around a circle about the origin. */
export function aroundCircle(radiusMm: number, sides: number): Point[] {
  const corner = radiusMm / cos(Math.PI / sides);
  return Array.from({ length: sides }, (_, i) => {
    const angle = (2 * Math.PI * (i + 0.5)) / sides;
    return [corner * cos(angle), corner * sin(angle)];
  });
}

/** A polygon of at most `sides` corners around a convex one, with the same box when `sides` is a multiple of 4. */
export function aroundPolygon(polygon: readonly Point[], sides: number): Point[] {
  if (polygon.length <= sides) return [...polygon];
  const reach = Array.from({ length: sides }, (_, i) => {
    const x = cos((2 * Math.PI * i) / sides);
    const y = sin((2 * Math.PI * i) / sides);
    return { x, y, distance: max(...polygon.map((corner) => corner[0] * x + corner[1] * y)) };
  });
  return reach.map((a, i) => {
    const b = reach[(i + 1) % sides]!;
    const cross = a.x * b.y - a.y * b.x;
    return [(a.distance * b.y - b.distance * a.y) / cross, (a.x * b.distance - b.x * a.distance) / cross];
  });
}

/** How deep a point lies inside a convex polygon: distance to its nearest edge line, below 0 outside. */
export function depthInside(polygon: readonly Point[], x: number, y: number): number {
  let least = Infinity;
  let a = polygon.at(-1)!;
  for (const b of polygon) {
    const dx = b[0] - a[0];
    const dy = b[1] - a[1];
    const length = sqrt(dx * dx + dy * dy);
    if (length > 0) least = min(least, (dx * (y - a[1]) - dy * (x - a[0])) / length);
    a = b;
  }
  return least;
}

export function boxesMeet(a: Box, b: Box): boolean {
  return a.left <= b.right && b.left <= a.right && a.front <= b.back && b.front <= a.back;
}

/** Where the borders of two convex polygons cross. */
export function borderCrossings(a: readonly Point[], b: readonly Point[]): Point[] {
  const boxA = boxOf(a);
  const boxB = boxOf(b);
  const common = {
    left: max(boxA.left, boxB.left),
    right: min(boxA.right, boxB.right),
    front: max(boxA.front, boxB.front),
    back: min(boxA.back, boxB.back),
  };
  const others = edgesWithin(b, common);
  const crossings: Point[] = [];
  for (const [p, q] of edgesWithin(a, common)) {
    const dx = q[0] - p[0];
    const dy = q[1] - p[1];
    for (const [r, s] of others) {
      const ex = s[0] - r[0];
      const ey = s[1] - r[1];
      const cross = dx * ey - dy * ex;
      if (abs(cross) <= 1e-12) continue;
      const along = ((r[0] - p[0]) * ey - (r[1] - p[1]) * ex) / cross;
      const across = ((r[0] - p[0]) * dy - (r[1] - p[1]) * dx) / cross;
      if (along < 0 || along > 1 || across < 0 || across > 1) continue;
      crossings.push([p[0] + along * dx, p[1] + along * dy]);
    }
  }
  return crossings;
}

/** The edges of a polygon whose own box meets another box. */
function edgesWithin(polygon: readonly Point[], box: Box): [Point, Point][] {
  const edges: [Point, Point][] = [];
  let p = polygon.at(-1)!;
  for (const q of polygon) {
    const isBeside = max(p[0], q[0]) < box.left || min(p[0], q[0]) > box.right;
    if (!isBeside && max(p[1], q[1]) >= box.front && min(p[1], q[1]) <= box.back) edges.push([p, q]);
    p = q;
  }
  return edges;
}

/** From the lowest corner on; corners that coincide are left out, for an edge of no length has no direction. */
function fromLowest(corners: readonly Point[]): Point[] {
  const polygon = corners.filter(([x, y], i) => {
    const [beforeX, beforeY] = corners.at(i - 1)!;
    return hypot(x - beforeX, y - beforeY) > COINCIDES_MM;
  });
  let lowest = 0;
  polygon.forEach(([x, y], i) => {
    const [lowX, lowY] = polygon[lowest]!;
    if (y < lowY || (y === lowY && x < lowX)) lowest = i;
  });
  return [...polygon.slice(lowest), ...polygon.slice(0, lowest)];
}
