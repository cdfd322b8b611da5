import fc from 'fast-check';
import {
  packPlates,
  PlatesError,
  type Bed,
  type PackedPlates,
  type PartToPack,
  type Point,
} from './index.js';

const bed: Bed = { xMm: 180, yMm: 150, zMm: 120 };

function segmentDistance(a: Point, b: Point, p: Point): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
  const share = Math.min(1, Math.max(0, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / (dx * dx + dy * dy)));
  return Math.hypot(p[0] - a[0] - share * dx, p[1] - a[1] - share * dy);
}

/** Separating axis test: least overlap of the shadows on all edge normals; above 0 where the polygons meet. */
function overlap(a: readonly Point[], b: readonly Point[]): number {
  let least = Infinity;
  for (const polygon of [a, b]) {
    polygon.forEach((p, i) => {
      const q = polygon[(i + 1) % polygon.length]!;
      const length = Math.hypot(q[0] - p[0], q[1] - p[1]);
      const [nx, ny] = [(q[1] - p[1]) / length, (p[0] - q[0]) / length];
      const shadow = (points: readonly Point[]) => points.map(([x, y]) => x * nx + y * ny);
      const [s, t] = [shadow(a), shadow(b)];
      least = Math.min(least, Math.max(...s) - Math.min(...t), Math.max(...t) - Math.min(...s));
    });
  }
  return least;
}

function gapBetween(a: readonly Point[], b: readonly Point[]): number {
  if (overlap(a, b) > 1e-6) return -1;
  let least = Infinity;
  for (const [from, to] of [
    [a, b],
    [b, a],
  ] as const) {
    from.forEach((p, i) => {
      for (const corner of to)
        least = Math.min(least, segmentDistance(p, from[(i + 1) % from.length]!, corner));
    });
  }
  return least;
}

function expectSound(
  packed: PackedPlates,
  parts: readonly PartToPack[],
  on: Bed,
  gapMm: number,
  marginMm: number,
): void {
  const counts = new Map<string, number>();
  for (const { placements } of packed.plates) {
    expect(placements.length).toBeGreaterThan(0);
    placements.forEach(({ code, polygon, xMm, yMm }, i) => {
      counts.set(code, (counts.get(code) ?? 0) + 1);
      const xs = polygon.map(([x]) => x);
      const ys = polygon.map(([, y]) => y);
      expect(Math.min(...xs)).toBeCloseTo(xMm, 6);
      expect(Math.min(...ys)).toBeCloseTo(yMm, 6);
      expect(Math.min(...xs, ...ys)).toBeGreaterThanOrEqual(marginMm - 1e-5);
      expect(Math.max(...xs)).toBeLessThanOrEqual(on.xMm - marginMm + 1e-5);
      expect(Math.max(...ys)).toBeLessThanOrEqual(on.yMm - marginMm + 1e-5);
      for (const other of placements.slice(0, i)) {
        expect(gapBetween(polygon, other.polygon)).toBeGreaterThanOrEqual(gapMm - 1e-5);
      }
    });
  }
  for (const { code, quantity } of parts) {
    expect(counts.get(code) ?? 0).toBe(packed.tooBig.includes(code) ? 0 : quantity);
  }
}

const outline = fc
  .array(fc.tuple(fc.integer({ min: 0, max: 90 }), fc.integer({ min: 0, max: 90 })), {
    minLength: 3,
    maxLength: 9,
  })
  .filter((points) => {
    const [a] = points as [[number, number], ...[number, number][]];
    return points.some((b) =>
      points.some((c) => Math.abs((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0])) > 50),
    );
  });
const orientation = fc.constantFrom('as-exported', 'may-turn', 'may-lie');
const shape = fc.oneof(
  fc.record({
    footprint: outline,
    heightMm: fc.integer({ min: 1, max: 140 }),
    orientation,
    quantity: fc.integer({ min: 0, max: 4 }),
  }),
  fc.record({
    sizeMm: fc.tuple(fc.integer({ min: 2, max: 200 }), fc.integer({ min: 2, max: 90 }), fc.constant(1)),
    heightMm: fc.integer({ min: 1, max: 140 }),
    orientation,
    quantity: fc.integer({ min: 0, max: 4 }),
  }),
);
const kit = fc
  .array(shape, { minLength: 1, maxLength: 7 })
  .map((shapes): PartToPack[] => shapes.map((each, i) => ({ code: `A-${i}`, ...each })));

describe('packing plates', () => {
  it('places every piece once, inside the margin, with the gap kept and nothing overlapping', () => {
    fc.assert(
      fc.property(kit, fc.constantFrom(0, 1, 3.5, 8), fc.constantFrom(0, 4, 10), (parts, gapMm, marginMm) => {
        expectSound(packPlates(parts, bed, { gapMm, marginMm }), parts, bed, gapMm, marginMm);
      }),
      { numRuns: 150 },
    );
  });

  it('gives the same plates for the same kit, whatever the order of the list', () => {
    fc.assert(
      fc.property(kit, (parts) => {
        const options = { gapMm: 2, marginMm: 5 };
        const packed = packPlates(parts, bed, options);
        expect(packPlates(parts, bed, options)).toEqual(packed);
        expect(packPlates(parts.toReversed(), bed, options).plates).toEqual(packed.plates);
      }),
      { numRuns: 30 },
    );
  });

  it('fills a plate of squares to the last place', () => {
    const tile: PartToPack = {
      code: 'T-1',
      quantity: 12,
      sizeMm: [40, 40, 5],
      heightMm: 5,
      orientation: 'as-exported',
    };
    const on = { xMm: 4 * 40 + 3 * 2 + 10, yMm: 3 * 40 + 2 * 2 + 10, zMm: 10 };
    const packed = packPlates([tile], on, { gapMm: 2, marginMm: 5 });
    expect(packed.plates).toHaveLength(1);
    expectSound(packed, [tile], on, 2, 5);
    expect(packPlates([{ ...tile, quantity: 13 }], on, { gapMm: 2, marginMm: 5 }).plates).toHaveLength(2);
  });

  it('packs by the outline, not by the box', () => {
    // Two right triangles make one rectangle when one is turned by half a turn; their boxes would not both fit.
    const bracket: PartToPack = {
      code: 'C-1',
      quantity: 2,
      footprint: [
        [0, 0],
        [100, 0],
        [0, 80],
      ],
      heightMm: 10,
      orientation: 'may-turn',
    };
    const on = { xMm: 101, yMm: 81, zMm: 20 };
    expect(packPlates([bracket], on, { gapMm: 0, marginMm: 0 }).plates).toHaveLength(1);
    expect(
      packPlates([{ ...bracket, orientation: 'as-exported' }], on, { gapMm: 0, marginMm: 0 }).plates,
    ).toHaveLength(2);
  });

  it('names what is too big and packs the rest', () => {
    const parts: PartToPack[] = [
      { code: 'L-1', quantity: 1, sizeMm: [300, 20, 10], heightMm: 10, orientation: 'may-turn' },
      { code: 'H-1', quantity: 2, sizeMm: [20, 20, 130], heightMm: 130, orientation: 'may-turn' },
      { code: 'H-2', quantity: 2, sizeMm: [20, 20, 130], heightMm: 130, orientation: 'may-lie' },
    ];
    const packed = packPlates(parts, bed, { gapMm: 2, marginMm: 5 });
    expect(packed.tooBig).toEqual(['L-1', 'H-1']);
    expectSound(packed, parts, bed, 2, 5);
    expect(packed.plates[0]!.placements.every(({ laidAxis }) => laidAxis !== undefined)).toBe(true);
  });

  it('turns a bar onto the diagonal where it fits no other way', () => {
    const bar: PartToPack = {
      code: 'B-1',
      quantity: 2,
      sizeMm: [200, 8, 5],
      heightMm: 5,
      orientation: 'may-turn',
    };
    const packed = packPlates([bar], bed, { gapMm: 3, marginMm: 2 });
    expect(packed.tooBig).toEqual([]);
    expectSound(packed, [bar], bed, 3, 2);
  });

  it('tells how far it is, piece by piece, and ends at the whole', () => {
    const told: number[] = [];
    const parts: PartToPack[] = [
      { code: 'A-1', quantity: 3, sizeMm: [60, 50, 5], heightMm: 5, orientation: 'may-turn' },
      { code: 'B-1', quantity: 2, sizeMm: [120, 10, 5], heightMm: 5, orientation: 'may-turn' },
    ];
    packPlates(parts, bed, { gapMm: 2, marginMm: 5, onProgress: (done) => told.push(done) });
    expect(told.length % 5).toBe(0);
    expect(told).toEqual(told.toSorted((a, b) => a - b));
    expect(told.at(0)).toBeGreaterThan(0);
    expect(told.at(-1)).toBe(1);
  });

  it('packs nothing into no plates', () => {
    expect(packPlates([], bed, { gapMm: 2, marginMm: 5 })).toEqual({ plates: [], tooBig: [] });
  });

  it('refuses what makes no sense, and names the part', () => {
    const part: PartToPack = {
      code: 'A-1',
      quantity: 1,
      sizeMm: [1, 1, 1],
      heightMm: 1,
      orientation: 'may-turn',
    };
    const options = { gapMm: 2, marginMm: 5 };
    expect(() => packPlates([part, part], bed, options)).toThrow('Part A-1 is listed twice');
    expect(() => packPlates([{ ...part, quantity: 1.5 }], bed, options)).toThrow(/quantity of A-1 is 1.5/);
    expect(() =>
      packPlates([{ code: 'A-1', quantity: 1, heightMm: 1, orientation: 'may-turn' }], bed, options),
    ).toThrow(/A-1 has neither/);
    expect(() => packPlates([part], bed, { gapMm: -1, marginMm: 5 })).toThrow(PlatesError);
  });
});
