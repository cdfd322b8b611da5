import fc from 'fast-check';
import { box, joined, meshOf, torus } from '../fixtures/solids.js';
import { convexHull, polygonArea, turn } from './convex-hull.js';
import { aroundPolygon, convexSum, depthInside } from './convex-sum.js';
import { footprintOf, PlatesError, type Point } from './index.js';

const corner = fc.tuple(fc.integer({ min: -40, max: 40 }), fc.integer({ min: -40, max: 40 }));
const hull = fc
  .array(corner, { minLength: 3, maxLength: 40 })
  .map((points) => convexHull(points))
  .filter((points) => points.length >= 3);

describe('the footprint of a mesh', () => {
  it('is the rectangle of a box, counter-clockwise, without spare corners', () => {
    const outline = footprintOf(box([30, 20, 10], [5, 6, 7]));
    expect(outline).toEqual([
      [5, 6],
      [35, 6],
      [35, 26],
      [5, 26],
    ]);
    expect(polygonArea(outline)).toBe(600);
  });

  it('is the outer polygon of a torus', () => {
    const outline = footprintOf(torus(20, 6, 72, 36));
    // Area of a regular 72-gon: n/2·R²·sin(2π/n).
    expect(polygonArea(outline)).toBeCloseTo(36 * 26 ** 2 * Math.sin((2 * Math.PI) / 72), 6);
  });

  it('spans shells that stand apart', () => {
    expect(polygonArea(footprintOf(joined(box([10, 10, 5]), box([10, 10, 5], [30, 0, 0]))))).toBe(400);
  });

  it('equals the hull of all corners, however many there are', () => {
    fc.assert(
      fc.property(
        fc.array(corner, { minLength: 9, maxLength: 9 }),
        fc.integer({ min: 1, max: 1500 }),
        (seed, repeats) => {
          const points = Array.from({ length: 3 * repeats }, (_, i): Point => {
            const [a, b, c] = [seed[i % 9]!, seed[(i * 5 + 1) % 9]!, seed[(i * 7 + 2) % 9]!];
            const share = ((i * 37) % 101) / 101;
            return [a[0] + share * (b[0] - c[0]), a[1] + share * (c[1] - a[1])];
          });
          const expected = convexHull(points);
          fc.pre(expected.length >= 3);
          const mesh = meshOf(points.flatMap(([x, y]) => [x, y, 0]));
          // Corners that lie on an edge but for the last digit may come or go.
          const outline = footprintOf(mesh);
          for (const [x, y] of expected) expect(depthInside(outline, x, y)).toBeGreaterThan(-1e-9);
          for (const [x, y] of outline) expect(depthInside(expected, x, y)).toBeGreaterThan(-1e-9);
          expect(polygonArea(outline)).toBeCloseTo(polygonArea(expected), 6);
        },
      ),
      { numRuns: 40 },
    );
  });

  it('is refused for a mesh that covers no area', () => {
    expect(() => footprintOf(meshOf([0, 0, 0, 1, 1, 1, 2, 2, 5]))).toThrow(PlatesError);
  });
});

describe('convex outlines', () => {
  it('hold all their points and turn left at every corner', () => {
    fc.assert(
      fc.property(fc.array(corner, { minLength: 3, maxLength: 40 }), (points) => {
        const outline = convexHull(points);
        fc.pre(outline.length >= 3);
        for (const [x, y] of points) expect(depthInside(outline, x, y)).toBeGreaterThanOrEqual(-1e-9);
        outline.forEach((a, i) => {
          expect(
            turn(a, outline[(i + 1) % outline.length]!, outline[(i + 2) % outline.length]!),
          ).toBeGreaterThan(0);
        });
      }),
    );
  });

  it('add up to the hull of all sums of their corners', () => {
    fc.assert(
      fc.property(hull, hull, (a, b) => {
        const sums = a.flatMap(([x, y]) => b.map(([u, v]): Point => [x + u, y + v]));
        expect(convexHull(convexSum(a, b))).toEqual(convexHull(sums));
        expect(polygonArea(convexSum(a, b))).toBeCloseTo(polygonArea(convexHull(sums)), 6);
      }),
    );
  });

  it('are enclosed by their rounder stand-ins, within the same box', () => {
    fc.assert(
      fc.property(hull, (outline) => {
        const around = aroundPolygon(outline, 8);
        for (const [x, y] of outline)
          expect(depthInside(convexHull(around), x, y)).toBeGreaterThanOrEqual(-1e-9);
        expect(Math.max(...around.map(([x]) => x))).toBeCloseTo(Math.max(...outline.map(([x]) => x)), 9);
        expect(Math.min(...around.map(([, y]) => y))).toBeCloseTo(Math.min(...outline.map(([, y]) => y)), 9);
      }),
    );
  });
});
