import { boxCorners, meshOf, tubeCorners } from '../fixtures/solids.js';
import { compare } from './index.js';
import { SurfaceIndex } from './surface-index.js';
import { squaredDistanceToTriangle } from './triangle-distance.js';

const block = meshOf(boxCorners([40, 30, 10]));

describe('comparing two revisions of a part', () => {
  it('finds nothing between equal meshes', () => {
    expect(compare(block, block)).toMatchObject({
      kind: 'same-geometry',
      largestDeviationMm: 0,
      placeMm: null,
      volumeChangeMm3: 0,
      areaChangeMm2: 0,
    });
  });

  it('takes another triangulation of the same faces for the same geometry', () => {
    // The top face in four triangles about its middle instead of two.
    const corners = boxCorners([40, 30, 10]);
    const top = [
      [0, 0],
      [40, 0],
      [40, 30],
      [0, 30],
    ] as const;
    const fan = top.flatMap(([x, y], i) => {
      const [u, v] = top[(i + 1) % 4]!;
      return [x, y, 10, u, v, 10, 20, 15, 10];
    });
    const result = compare(block, meshOf([...corners.slice(0, 18), ...corners.slice(36), ...fan]));
    expect(result.kind).toBe('same-geometry');
    expect(result.changedTriangles).toEqual({ before: 2, after: 4 });
  });

  it('says how a part moved that did not change', () => {
    const result = compare(block, meshOf(boxCorners([40, 30, 10], [5, -2, 0.5])));
    expect(result.kind).toBe('same-geometry');
    [5, -2, 0.5].forEach((step, axis) => expect(result.movedMm[axis]).toBeCloseTo(step, 9));
  });

  it('says how far and where a face moved', () => {
    const result = compare(block, meshOf(boxCorners([40, 30, 10.25])));
    expect(result.kind).toBe('changed');
    expect(result.largestDeviationMm).toBeCloseTo(0.25, 9);
    expect(result.placeMm![2]).toBeCloseTo(10.25, 9);
    expect(result.placeIsOn).toBe('after');
    expect(result.sizeChangeMm[2]).toBeCloseTo(0.25, 9);
    expect(result.volumeChangeMm3).toBeCloseTo(40 * 30 * 0.25, 6);
    expect(result.areaChangeMm2).toBeCloseTo(2 * (40 + 30) * 0.25, 6);
  });

  it('finds a bump in the middle of a face that was flat, and the same when it goes again', () => {
    const withBump = meshOf([...boxCorners([40, 30, 10]), ...boxCorners([2, 2, 1.5], [19, 14, 10])]);
    const added = compare(block, withBump);
    expect(added.largestDeviationMm).toBeCloseTo(1.5, 6);
    expect(added.placeIsOn).toBe('after');
    const gone = compare(withBump, block);
    expect(gone.largestDeviationMm).toBeCloseTo(1.5, 6);
    expect(gone.placeIsOn).toBe('before');
    expect(Math.abs(gone.placeMm![0] - 20)).toBeLessThanOrEqual(1);
    expect(gone.placeMm![2]).toBeCloseTo(11.5, 6);
  });

  it('finds the middle of a bore that was closed, though every corner lies on both surfaces', () => {
    // A tube of 2.5 bore radius against the full rod: the caps' middle is farthest from the tube, by the radius.
    const result = compare(meshOf(tubeCorners(6, 2.5, 20, 48)), meshOf(tubeCorners(6, 1e-6, 20, 48)));
    expect(result.kind).toBe('changed');
    expect(result.largestDeviationMm).toBeGreaterThan(2.4);
    expect(result.largestDeviationMm).toBeLessThanOrEqual(2.5);
  });

  it('calls a part changed whose triangles were turned round, though its surface stays', () => {
    const corners = boxCorners([40, 30, 10]);
    for (let o = 0; o < 9 * 4; o += 9) {
      for (let k = 0; k < 3; k += 1)
        [corners[o + 3 + k], corners[o + 6 + k]] = [corners[o + 6 + k]!, corners[o + 3 + k]!];
    }
    expect(compare(block, meshOf(corners))).toMatchObject({ kind: 'changed', placeMm: null });
  });
});

describe('the distance from a surface', () => {
  it('is the smallest over all triangles', () => {
    const corners = Float64Array.from(tubeCorners(12, 10.5, 60, 32));
    const surface = new SurfaceIndex(corners);
    for (let i = 0; i < 200; i += 1) {
      const [x, y, z] = [((i * 7.3) % 40) - 20, ((i * 3.7) % 30) - 15, ((i * 5.9) % 80) - 10] as const;
      let best = Infinity;
      for (let o = 0; o < corners.length; o += 9)
        best = Math.min(best, squaredDistanceToTriangle(corners, o, x, y, z));
      expect(surface.distanceMm(x, y, z)).toBeCloseTo(Math.sqrt(best), 12);
    }
  });

  it('to a triangle is right in front of its face, edges and corners', () => {
    const triangle = Float64Array.of(0, 0, 0, 4, 0, 0, 0, 3, 0);
    const distance = (x: number, y: number, z: number): number =>
      Math.sqrt(squaredDistanceToTriangle(triangle, 0, x, y, z));
    expect(distance(1, 1, 2)).toBeCloseTo(2, 12);
    expect(distance(2, -3, 4)).toBeCloseTo(5, 12);
    expect(distance(-3, -4, 0)).toBeCloseTo(5, 12);
    expect(distance(4, 3, 0)).toBeCloseTo(12 / 5, 12);
    expect(distance(8, -3, 0)).toBeCloseTo(5, 12);
  });
});
