import { areaMm2, arc, circle, inset, type Plan, rectangle, roundedRectangle } from './plan.js';
import { triangulate } from './triangulate.js';

function sumOfTriangles(outline: Plan, holes: readonly Plan[] = []): number {
  const points = [...outline, ...holes.flat()];
  return triangulate(outline, holes).reduce((sum, corners) => {
    const triangle = corners.map((index) => points[index] ?? ([NaN, NaN] as const));
    const area = areaMm2(triangle);
    expect(area).toBeGreaterThan(0);
    return sum + area;
  }, 0);
}

describe('triangulate', () => {
  it('covers an outline with holes exactly', () => {
    const outline = roundedRectangle(105.6, 39, 3);
    const holes = [-40, -20, 0, 20, 40].flatMap((x) => [circle(8, 72, [x, -2]), circle(1.3, 32, [x, -14])]);
    const expected = areaMm2(outline) - holes.reduce((sum, hole) => sum + areaMm2(hole), 0);
    expect(sumOfTriangles(outline, holes)).toBeCloseTo(expected, 8);
  });

  it('uses every corner of a straight side, so that neighbours meet edge to edge', () => {
    const outline: Plan = [
      [0, 0],
      [3, 0],
      [3, 1],
      [2.5, 1],
      [2, 1],
      [1, 1],
      [0, 1],
      [0, 0.5],
    ];
    expect(sumOfTriangles(outline)).toBeCloseTo(3, 12);
    expect(triangulate(outline)).toHaveLength(outline.length - 2);
    expect(new Set(triangulate(outline).flat()).size).toBe(outline.length);
  });

  it('cuts an outline that turns inwards', () => {
    const ring: Plan = [...arc([0, 0], 10, 10, 350, 60), ...arc([0, 0], 8, 10, 350, 60).toReversed()];
    expect(sumOfTriangles(ring)).toBeCloseTo(areaMm2(ring), 8);
  });

  it('refuses a hole outside its outline', () => {
    expect(() => triangulate(rectangle(0, 0, 1, 1), [rectangle(2, 2, 1, 1).toReversed()])).toThrow('hole');
  });
});

describe('inset', () => {
  it('moves every side by the same amount', () => {
    expect(areaMm2(inset(rectangle(0, 0, 10, 6), 0.5))).toBeCloseTo(9 * 5, 12);
    expect(areaMm2(inset(rectangle(0, 0, 10, 6), -0.5))).toBeCloseTo(11 * 7, 12);
  });
});
