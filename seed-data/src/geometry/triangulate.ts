import { areaMm2, type Plan, type PlanPoint } from './plan.js';

export type Corners = readonly [number, number, number];

/** Below this, three corners count as lying on one line (mm²; coordinates are good to 0.0001 mm). */
const onLineMm2 = 1e-9;

interface Corner {
  /** Index into the outline followed by its holes. */
  readonly index: number;
  readonly point: PlanPoint;
}

/**
 * Cuts an outline with holes into triangles by clipping ears, holes joined to the outline by bridges
 * first (D. Eberly, "Triangulation by Ear Clipping"; from memory). No corner is added, and no triangle has another corner on
 * its rim, so that neighbouring faces meet edge to edge.
 *
 * @param outline counter-clockwise
 * @param holes counter-clockwise, inside the outline, apart from each other
 * @returns counter-clockwise triangles as indices into `[...outline, ...holes.flat()]`
 */
export function triangulate(outline: Plan, holes: readonly Plan[] = []): Corners[] {
  const ring = bridgeHoles(outline, holes);
  const triangles: Corners[] = [];
  let start = 0;
  while (ring.length > 3) {
    const ear = findEar(ring, start);
    if (ear < 0) throw new Error(`A plan of ${outline.length} corners cannot be cut into triangles.`);
    const [before, corner, after] = threeAt(ring, ear);
    triangles.push([before.index, corner.index, after.index]);
    ring.splice(ear, 1);
    // Going on two corners further spreads the cuts instead of making a fan of needles.
    start = ear + 1;
  }
  const [a, b, c] = threeAt(ring, 1);
  triangles.push([a.index, b.index, c.index]);
  return triangles;
}

function bridgeHoles(outline: Plan, holes: readonly Plan[]): Corner[] {
  let ring: Corner[] = outline.map((point, index) => ({ index, point }));
  let offset = outline.length;
  const waiting = holes.map((hole) => {
    // Holes run the other way round, so that the ring stays a single walk with its inside on the left.
    const corners = hole.map((point, index) => ({ index: offset + index, point })).toReversed();
    offset += hole.length;
    if (areaMm2(hole) <= 0) throw new Error('A hole must run counter-clockwise.');
    return corners;
  });
  const rightmost = (corners: Corner[]) => Math.max(...corners.map((corner) => corner.point[0]));
  waiting.sort((a, b) => rightmost(b) - rightmost(a));
  for (const [position, hole] of waiting.entries()) {
    ring = joinHole(ring, hole, waiting.slice(position + 1));
  }
  return ring;
}

function joinHole(ring: Corner[], hole: Corner[], others: Corner[][]): Corner[] {
  const from = hole.reduce(
    (best, corner, index) => (corner.point[0] > pointOf(hole, best)[0] ? index : best),
    0,
  );
  const start = pointOf(hole, from);
  const byDistance = ring
    .map((corner, index) => ({
      index,
      distance: Math.hypot(corner.point[0] - start[0], corner.point[1] - start[1]),
    }))
    .sort((a, b) => a.distance - b.distance);
  const seen = byDistance.find(({ index }) => {
    const end = pointOf(ring, index);
    const isClear = [ring, hole, ...others].every((loop) => !crossesLoop(start, end, loop));
    return isClear && opensTowards(ring, index, start);
  });
  if (!seen) throw new Error('A hole does not lie inside its outline.');
  const walk = [...hole.slice(from), ...hole.slice(0, from)];
  const landing = ring[seen.index];
  const first = walk[0];
  if (!landing || !first) throw new Error('A hole needs corners.');
  return [...ring.slice(0, seen.index + 1), ...walk, first, landing, ...ring.slice(seen.index + 1)];
}

/** Whether `target` lies within the inner angle at a ring's corner: a corner may occur twice after a bridge. */
function opensTowards(ring: Corner[], index: number, target: PlanPoint): boolean {
  const [before, corner, after] = threeAt(ring, index);
  const isLeftOfBefore = cross(before.point, corner.point, target) > onLineMm2;
  const isLeftOfAfter = cross(corner.point, after.point, target) > onLineMm2;
  const isConvex = cross(before.point, corner.point, after.point) > 0;
  return isConvex ? isLeftOfBefore && isLeftOfAfter : isLeftOfBefore || isLeftOfAfter;
}

function crossesLoop(start: PlanPoint, end: PlanPoint, loop: Corner[]): boolean {
  return loop.some((corner, index) => {
    const a = corner.point;
    const b = pointOf(loop, index + 1);
    if (same(a, start) || same(b, start) || same(a, end) || same(b, end)) {
      return [a, b].some(
        (point) => !same(point, start) && !same(point, end) && isOnSegment(point, start, end),
      );
    }
    const sideA = cross(start, end, a);
    const sideB = cross(start, end, b);
    const sideStart = cross(a, b, start);
    const sideEnd = cross(a, b, end);
    return sideA * sideB <= 0 && sideStart * sideEnd <= 0;
  });
}

function isOnSegment(point: PlanPoint, start: PlanPoint, end: PlanPoint): boolean {
  if (Math.abs(cross(start, end, point)) > onLineMm2) return false;
  const along = (point[0] - start[0]) * (end[0] - start[0]) + (point[1] - start[1]) * (end[1] - start[1]);
  return along >= 0 && along <= (end[0] - start[0]) ** 2 + (end[1] - start[1]) ** 2;
}

function findEar(ring: Corner[], start: number): number {
  for (let step = 0; step < ring.length; step++) {
    const index = (start + step) % ring.length;
    if (isEar(ring, index)) return index;
  }
  return -1;
}

function isEar(ring: Corner[], index: number): boolean {
  const [before, corner, after] = threeAt(ring, index);
  const [a, b, c] = [before.point, corner.point, after.point];
  if (cross(a, b, c) <= onLineMm2) return false;
  return ring.every(({ point }) => {
    if (same(point, a) || same(point, b) || same(point, c)) return true;
    const isOutside =
      cross(a, b, point) < -onLineMm2 || cross(b, c, point) < -onLineMm2 || cross(c, a, point) < -onLineMm2;
    return isOutside;
  });
}

function threeAt(ring: Corner[], index: number): [Corner, Corner, Corner] {
  const [before, corner, after] = [-1, 0, 1].map((step) => ring[(index + step + ring.length) % ring.length]);
  if (!before || !corner || !after) throw new Error('A ring needs three corners.');
  return [before, corner, after];
}

function pointOf(ring: Corner[], index: number): PlanPoint {
  const corner = ring[index % ring.length];
  if (!corner) throw new RangeError('No such corner.');
  return corner.point;
}

const same = (a: PlanPoint, b: PlanPoint) => a[0] === b[0] && a[1] === b[1];

/** Twice the signed area of a triangle. */
const cross = (a: PlanPoint, b: PlanPoint, c: PlanPoint) =>
  (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
