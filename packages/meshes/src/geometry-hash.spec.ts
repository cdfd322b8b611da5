import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { boxCorners, meshOf, shuffled, tubeCorners, withNoise, withPointMoved } from '../fixtures/solids.js';
import { geometryHash, isSameGeometry, readMesh, writeBinaryStl } from './index.js';

const tube = tubeCorners(12, 10.5, 60, 64);
/** A stepped block with dimensions in steps of 0.05 mm, as parts are dimensioned. */
const block = [...boxCorners([44, 16, 1.6]), ...boxCorners([8.35, 12.05, 20.15], [4.2, 2.15, 1.6])];
const order = Array.from({ length: 512 }, (_, i) => i);
const share = fc.double({ min: -1, max: 1, noNaN: true });

function hash(corners: ArrayLike<number>): string {
  return geometryHash(meshOf(corners));
}

/** Deterministic noise between −1 and 1 from a seed (Park & Miller's generator). */
function noiseFrom(seed: number): () => number {
  let state = (seed % 2147483646) + 1;
  return () => {
    state = (state * 48271) % 2147483647;
    return (2 * state) / 2147483647 - 1;
  };
}

describe('the geometry hash', () => {
  it('is 32 hex digits', () => {
    expect(hash(tube)).toMatch(/^[0-9a-f]{32}$/);
  });

  it('does not depend on the order of triangles or on the corner each starts with', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(order, { minLength: 512 }), (shuffle) => {
        expect(hash(shuffled(tube, shuffle))).toBe(hash(tube));
      }),
      { numRuns: 30 },
    );
  });

  it('stands noise of ±0.9 µm on a dimensioned part, wherever the part lies', () => {
    const seed = fc.integer({ min: 0, max: 2 ** 30 });
    const offset = fc.tuple(...[0, 1, 2].map(() => fc.double({ min: -200, max: 200, noNaN: true })));
    fc.assert(
      fc.property(seed, offset, (start, shift) => {
        const placed = block.map((value, i) => value + shift[i % 3]!);
        expect(hash(withNoise(placed, 0.0009, noiseFrom(start)))).toBe(hash(block));
      }),
      { numRuns: 300 },
    );
  });

  it('stands noise at offsets that put every coordinate on a cell border', () => {
    for (const offset of [0.0025, 0.00125, -0.0025, 0.0049999, 1e-9]) {
      const placed = block.map((value) => value + offset);
      for (let seed = 0; seed < 20; seed += 1)
        expect(hash(withNoise(placed, 0.0009, noiseFrom(seed)))).toBe(hash(block));
    }
  });

  it('changes whenever any point of a dimensioned or a curved part moves by 10 µm', () => {
    for (const corners of [block, tube]) {
      const points = corners.length / 3;
      const before = hash(corners);
      fc.assert(
        fc.property(
          fc.integer({ min: 0, max: points - 1 }),
          fc.constantFrom(0, 1, 2),
          fc.constantFrom(-1, 1),
          (at, axis, sign) => {
            const step = [0, 0, 0];
            step[axis] = sign * 0.010001;
            const moved = withPointMoved(corners, at, step as unknown as [number, number, number]);
            expect(hash(moved)).not.toBe(before);
          },
        ),
        { numRuns: 100 },
      );
    }
  });

  it('changes when a bore grows by 20 µm, and when a part is scaled by a thousandth', () => {
    expect(hash(tubeCorners(12, 10.51, 60, 64))).not.toBe(hash(tube));
    expect(hash(tube.map((value) => value * 1.001))).not.toBe(hash(tube));
  });

  it('changes when a triangle is turned round, left out or doubled', () => {
    expect(hash(tube.slice(9))).not.toBe(hash(tube));
    expect(hash([...tube, ...tube.slice(0, 9)])).not.toBe(hash(tube));
    expect(hash([...tube.slice(0, 3), ...tube.slice(6, 9), ...tube.slice(3, 6), ...tube.slice(9)])).not.toBe(
      hash(tube),
    );
  });

  it('is the same after a part went through single precision and text', () => {
    const mesh = readMesh(writeBinaryStl(tube), { fileName: 'tube.stl' });
    const text = Array.from(mesh.corners, (value) => Number(value.toPrecision(9)));
    expect(hash(text)).toBe(geometryHash(mesh));
    expect(hash(Float32Array.from(block))).toBe(hash(block));
  });

  it('leaves degenerate triangles out of account', () => {
    const read = (file: string) =>
      readMesh(new Uint8Array(readFileSync(new URL(`../fixtures/reference/${file}`, import.meta.url))), {
        fileName: file,
      });
    expect(geometryHash(read('degenerate_triangles.stl'))).toBe(geometryHash(read('tube_od24_id21_h60.stl')));
  });
});

describe('comparing a pair for sameness', () => {
  it('stands noise of ±0.9 µm on a curved part, shuffled and wherever it lies', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 2 ** 30 }),
        fc.shuffledSubarray(order, { minLength: 512 }),
        fc.tuple(share, share, share),
        (seed, shuffle, shift) => {
          const placed = tube.map((value, i) => value + 100 * shift[i % 3]!);
          const again = shuffled(withNoise(placed, 0.0009, noiseFrom(seed)), shuffle);
          expect(isSameGeometry(meshOf(placed), meshOf(again))).toBe(true);
        },
      ),
      { numRuns: 25 },
    );
  });

  it('sees any point of a curved part that moved by 10 µm, under noise', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1535 }), fc.integer({ min: 0, max: 2 ** 30 }), (at, seed) => {
        const moved = withPointMoved(tube, at, [0, 0, at % 2 === 0 ? 0.01 : -0.01]);
        expect(isSameGeometry(meshOf(tube), meshOf(withNoise(moved, 0.0009, noiseFrom(seed))))).toBe(false);
      }),
      { numRuns: 8 },
    );
  });
});
