import type { Point } from './types.js';

/** Taken out of the loops: some hosts look globals up slowly. */
const { max, min } = Math;

/**
 * Convex hull, counter-clockwise from the leftmost lowest corner, without corners on straight edges (Andrew's
 * monotone chain, 1979). Fewer than three corners come back as they are.
 */
export function convexHull(points: readonly Point[]): Point[] {
  const sorted = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const unique = sorted.filter((p, i) => i === 0 || p[0] !== sorted[i - 1]![0] || p[1] !== sorted[i - 1]![1]);
  if (unique.length < 3) return unique;
  return [...halfHull(unique).slice(0, -1), ...halfHull(unique.toReversed()).slice(0, -1)];
}

function halfHull(points: readonly Point[]): Point[] {
  const hull: Point[] = [];
  for (const point of points) {
    while (hull.length >= 2 && turn(hull.at(-2)!, hull.at(-1)!, point) <= 0) hull.pop();
    hull.push(point);
  }
  return hull;
}

/** Twice the area of the triangle a b c: above 0 where c lies left of the way from a to b. */
export function turn(a: Point, b: Point, c: Point): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

/** Area of a counter-clockwise polygon, in mm². */
export function polygonArea(polygon: readonly Point[]): number {
  let twice = 0;
  polygon.forEach((a, i) => {
    const b = polygon[(i + 1) % polygon.length]!;
    twice += a[0] * b[1] - b[0] * a[1];
  });
  return twice / 2;
}

export interface Box {
  readonly left: number;
  readonly right: number;
  readonly front: number;
  readonly back: number;
}

export function boxOf(polygon: readonly Point[]): Box {
  let left = Infinity;
  let right = -Infinity;
  let front = Infinity;
  let back = -Infinity;
  for (const [x, y] of polygon) {
    left = min(left, x);
    right = max(right, x);
    front = min(front, y);
    back = max(back, y);
  }
  return { left, right, front, back };
}

/** Turned counter-clockwise about the origin; quarter turns are exact. */
export function turned(polygon: readonly Point[], degrees: number): Point[] {
  const quarters = degrees / 90;
  const isQuarter = Number.isInteger(quarters);
  const cos = isQuarter ? [1, 0, -1, 0][((quarters % 4) + 4) % 4]! : Math.cos((degrees * Math.PI) / 180);
  const sin = isQuarter ? [0, 1, 0, -1][((quarters % 4) + 4) % 4]! : Math.sin((degrees * Math.PI) / 180);
  return polygon.map(([x, y]) => [x * cos - y * sin, x * sin + y * cos]);
}

export function moved(polygon: readonly Point[], dx: number, dy: number): Point[] {
  return polygon.map(([x, y]) => [x + dx, y + dy]);
}

/** A rectangle with one corner at the origin. */
export function rectangle(widthMm: number, depthMm: number): Point[] {
  return [
    [0, 0],
    [widthMm, 0],
    [widthMm, depthMm],
    [0, depthMm],
  ];
}
