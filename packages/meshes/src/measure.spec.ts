import fc from 'fast-check';
import { boxCorners, meshOf, shuffled, tubeCorners, tubeVolumeMm3 } from '../fixtures/solids.js';
import { measure } from './index.js';

const tube = tubeCorners(12, 10.5, 60, 64);

/** Turns by three angles and moves; a rigid motion. */
function moved(corners: readonly number[], [a, b, c]: readonly number[], shift: readonly number[]): number[] {
  const result: number[] = [];
  for (let i = 0; i < corners.length; i += 3) {
    let [x, y, z] = [corners[i]!, corners[i + 1]!, corners[i + 2]!];
    [x, y] = [x * Math.cos(a!) - y * Math.sin(a!), x * Math.sin(a!) + y * Math.cos(a!)];
    [y, z] = [y * Math.cos(b!) - z * Math.sin(b!), y * Math.sin(b!) + z * Math.cos(b!)];
    [x, z] = [x * Math.cos(c!) - z * Math.sin(c!), x * Math.sin(c!) + z * Math.cos(c!)];
    result.push(x + shift[0]!, y + shift[1]!, z + shift[2]!);
  }
  return result;
}

function flipped(corners: readonly number[], which: (triangle: number) => boolean): number[] {
  const result = [...corners];
  for (let o = 0; o < corners.length; o += 9) {
    if (which(o / 9))
      for (let k = 0; k < 3; k += 1)
        [result[o + 3 + k], result[o + 6 + k]] = [corners[o + 6 + k]!, corners[o + 3 + k]!];
  }
  return result;
}

describe('measuring', () => {
  it('gives the closed form of a tube', () => {
    const measured = measure(meshOf(tube));
    expect(measured.volumeMm3 / tubeVolumeMm3(12, 10.5, 60, 64)).toBeCloseTo(1, 12);
    expect(measured).toMatchObject({ shells: 1, triangles: 512, watertight: true, flippedTriangles: 0 });
  });

  it('does not depend on where the part lies or how it is turned', () => {
    const angle = fc.double({ min: -Math.PI, max: Math.PI, noNaN: true });
    const shift = fc.double({ min: -500, max: 500, noNaN: true });
    const before = measure(meshOf(tube));
    fc.assert(
      fc.property(fc.tuple(angle, angle, angle), fc.tuple(shift, shift, shift), (angles, shifts) => {
        const after = measure(meshOf(moved(tube, angles, shifts)));
        expect(after.volumeMm3 / before.volumeMm3).toBeCloseTo(1, 9);
        expect(after.areaMm2 / before.areaMm2).toBeCloseTo(1, 9);
        expect(after.watertight).toBe(true);
      }),
      { numRuns: 40 },
    );
  });

  it('does not depend on the order of triangles and corners', () => {
    const order = Array.from({ length: 512 }, (_, i) => i);
    fc.assert(
      fc.property(fc.shuffledSubarray(order, { minLength: 512 }), (shuffle) => {
        const { volumeMm3, shells, watertight } = measure(meshOf(shuffled(tube, shuffle)));
        expect(volumeMm3 / tubeVolumeMm3(12, 10.5, 60, 64)).toBeCloseTo(1, 12);
        expect([shells, watertight]).toEqual([1, true]);
      }),
      { numRuns: 20 },
    );
  });

  it('finds any flipped triangles, counts them, and still gives the volume', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 0, max: 511 }), { minLength: 1, maxLength: 200 }),
        (which) => {
          const set = new Set(which);
          const measured = measure(meshOf(flipped(tube, (triangle) => set.has(triangle))));
          expect(measured.flippedTriangles).toBe(set.size);
          expect(measured.windingFaults).toBeGreaterThan(0);
          expect(measured.watertight).toBe(false);
          expect(measured.volumeMm3 / tubeVolumeMm3(12, 10.5, 60, 64)).toBeCloseTo(1, 9);
        },
      ),
      { numRuns: 30 },
    );
  });

  it('takes a hollow off, and counts its shell', () => {
    const hollow = flipped(boxCorners([10, 10, 10], [5, 5, 5]), () => true);
    const measured = measure(meshOf([...boxCorners([20, 20, 20]), ...hollow]));
    expect(measured.volumeMm3).toBeCloseTo(7000, 9);
    expect(measured).toMatchObject({ shells: 2, flippedTriangles: 0, watertight: true });
  });

  it('takes 0 and −0 for the same place', () => {
    const corners = boxCorners([5, 6, 7]).map((value, i) => (value === 0 && i % 2 === 0 ? -0 : value));
    expect(measure(meshOf(corners)).watertight).toBe(true);
    expect(measure({ ...meshOf(corners), corners: Float32Array.from(corners) }).watertight).toBe(true);
  });

  it('counts the border of a missing triangle', () => {
    expect(measure(meshOf(tube.slice(9)))).toMatchObject({ openEdges: 3, watertight: false, shells: 1 });
  });

  it('stays quick and right on a fan of many thousand triangles about one point', () => {
    const sides = 40_000;
    const cone: number[] = [];
    for (let i = 0; i < sides; i += 1) {
      const [a, b] = [i, (i + 1) % sides].map((k) => (2 * Math.PI * k) / sides) as [number, number];
      const p = [Math.cos(a), Math.sin(a), 0],
        q = [Math.cos(b), Math.sin(b), 0];
      cone.push(...p, ...q, 0, 0, 3, ...q, ...p, 0, 0, 0);
    }
    const measured = measure(meshOf(cone.map((value) => 10 * value)));
    // V = π r² h / 3 of a round cone.
    expect(measured.volumeMm3 / (Math.PI * 1000)).toBeCloseTo(1, 6);
    expect(measured).toMatchObject({ shells: 1, watertight: true });
  });
});
