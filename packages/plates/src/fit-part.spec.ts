import fc from 'fast-check';
import { fitPart, PlatesError, type Bed, type PartShape, type Point } from './index.js';

const bed: Bed = { xMm: 200, yMm: 200, zMm: 250 };
const part = (x: number, y: number, z: number, orientation: PartShape['orientation']): PartShape => ({
  sizeMm: [x, y, z],
  orientation,
});

/**
 * Least depth of a rectangle of width a in which a p × q rectangle fits, for p > a ≥ q (Carver 1957, as given
 * by Wetzel, Rectangles in Rectangles, Mathematics Magazine 73, 2000; from memory).
 */
function carverDepth(p: number, q: number, a: number): number {
  return (2 * p * q * a + (p ** 2 - q ** 2) * Math.sqrt(p ** 2 + q ** 2 - a ** 2)) / (p ** 2 + q ** 2);
}

describe('fitting a part', () => {
  it('fits as exported where it can', () => {
    expect(fitPart(part(200, 200, 250, 'may-lie'), bed)).toEqual({ fit: 'fits' });
  });

  it('turns a quarter where that is enough', () => {
    expect(fitPart(part(100, 250, 10, 'may-turn'), { xMm: 250, yMm: 100, zMm: 50 })).toEqual({
      fit: 'fits-turned',
      turnedDegrees: 90,
    });
  });

  it('lays a long thin bar on the diagonal, up to side·√2 − width on a square bed', () => {
    const longest = 200 * Math.SQRT2 - 10;
    const fits = fitPart(part(longest - 0.001, 10, 10, 'may-turn'), bed);
    expect(fits.fit).toBe('fits-turned');
    expect(Math.abs(fits.turnedDegrees!)).toBeCloseTo(45, 2);
    const over = fitPart(part(longest + 0.1, 10, 10, 'may-turn'), bed);
    expect(over.fit).toBe('too-big');
    // Each mm of length takes 1/√2 mm on either axis at 45°.
    expect(over.overMm!.mm).toBeCloseTo(0.1 / Math.SQRT2, 6);
  });

  it('agrees with the closed form for a rectangle in a rectangle', () => {
    const mm = fc.double({ min: 5, max: 400, noNaN: true });
    fc.assert(
      fc.property(mm, mm, mm, mm, (p, q, a, b) => {
        const [long, short] = p > q ? [p, q] : [q, p];
        const [wide, deep] = a > b ? [a, b] : [b, a];
        const isSquareOn = long <= wide && short <= deep;
        const needed = long > wide && short <= deep ? carverDepth(long, short, wide) : Infinity;
        fc.pre(
          Math.abs(deep - needed) > 1e-3 && Math.abs(long - wide) > 1e-3 && Math.abs(short - deep) > 1e-3,
        );
        const { fit } = fitPart(part(p, q, 1, 'may-turn'), { xMm: a, yMm: b, zMm: 10 });
        expect(fit !== 'too-big').toBe(isSquareOn || deep > needed);
      }),
      { numRuns: 500 },
    );
  });

  it('finds a turn that truly fits, whatever the outline', () => {
    const corner = fc.tuple(fc.integer({ min: -60, max: 60 }), fc.integer({ min: -60, max: 60 }));
    fc.assert(
      fc.property(
        fc.array(corner, { minLength: 3, maxLength: 14 }),
        fc.integer({ min: 40, max: 150 }),
        (points, x) => {
          const footprint = points as Point[];
          const small = { xMm: x, yMm: 90, zMm: 10 };
          const xs = footprint.map((p) => p[0]);
          const ys = footprint.map((p) => p[1]);
          const [dx, dy] = [Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys)];
          const [p0] = footprint;
          const isFlat = footprint.every((p) =>
            footprint.every((q) => (p[0] - p0![0]) * (q[1] - p0![1]) === (p[1] - p0![1]) * (q[0] - p0![0])),
          );
          fc.pre(!isFlat);
          const fit = fitPart({ sizeMm: [dx, dy, 1], footprint, orientation: 'may-turn' }, small);
          const roomAt = (degrees: number): number => {
            const [c, s] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
            const across = footprint.map(([px, py]) => px * c - py * s);
            const along = footprint.map(([px, py]) => px * s + py * c);
            return Math.min(
              x - Math.max(...across) + Math.min(...across),
              90 - Math.max(...along) + Math.min(...along),
            );
          };
          if (fit.fit === 'too-big') {
            // No turn in steps of half a degree does better than the excess that is reported.
            for (let degrees = 0; degrees < 180; degrees += 0.5)
              expect(roomAt(degrees)).toBeLessThanOrEqual(1e-6 - fit.overMm!.mm);
          } else {
            expect(roomAt(fit.turnedDegrees ?? 0)).toBeGreaterThanOrEqual(-1e-5);
          }
        },
      ),
      { numRuns: 200 },
    );
  });

  it('uses the outline where the box would not fit', () => {
    const disc: Point[] = Array.from({ length: 90 }, (_, i) => [
      95 * Math.cos(i * 0.0698131701),
      95 * Math.sin(i * 0.0698131701),
    ]);
    const diamond: Point[] = [
      [0, -130],
      [130, 0],
      [0, 130],
      [-130, 0],
    ];
    expect(fitPart({ sizeMm: [190, 190, 5], footprint: disc, orientation: 'may-turn' }, bed).fit).toBe(
      'fits',
    );
    const turned = fitPart({ sizeMm: [260, 260, 5], footprint: diamond, orientation: 'may-turn' }, bed);
    expect(turned.fit).toBe('fits-turned');
    expect(Math.abs(turned.turnedDegrees!)).toBeCloseTo(45, 6);
  });

  it('keeps the orientation rule', () => {
    expect(fitPart(part(250, 10, 10, 'as-exported'), bed)).toEqual({
      fit: 'too-big',
      overMm: { axis: 'x', mm: 50 },
    });
    expect(fitPart(part(250, 10, 10, 'may-turn'), bed).fit).toBe('fits-turned');
    expect(fitPart(part(20, 20, 260, 'may-turn'), bed)).toEqual({
      fit: 'too-big',
      overMm: { axis: 'z', mm: 10 },
    });
    expect(fitPart(part(5, 10, 260, 'may-lie'), bed)).toMatchObject({ fit: 'fits-laid', laidAxis: 'x' });
  });

  it('stands a part up where only that fits', () => {
    expect(fitPart(part(240, 190, 190, 'may-lie'), bed)).toEqual({ fit: 'fits-laid', laidAxis: 'x' });
  });

  it('keeps the margin free along all edges', () => {
    expect(fitPart(part(190, 190, 5, 'as-exported'), bed, { marginMm: 5 }).fit).toBe('fits');
    expect(fitPart(part(190.2, 190, 5, 'as-exported'), bed, { marginMm: 5 })).toMatchObject({
      fit: 'too-big',
      overMm: { axis: 'x' },
    });
    expect(() => fitPart(part(1, 1, 1, 'may-turn'), bed, { marginMm: 100 })).toThrow(
      'choose a smaller margin',
    );
  });

  it('refuses sizes that are none', () => {
    expect(() => fitPart(part(0, 1, 1, 'may-turn'), bed)).toThrow(PlatesError);
    expect(() => fitPart(part(1, 1, 1, 'may-turn'), { ...bed, yMm: -1 })).toThrow(/depth of the bed/);
    expect(() =>
      fitPart(
        {
          ...part(1, 1, 1, 'may-turn'),
          footprint: [
            [0, 0],
            [1, 1],
            [2, 2],
          ],
        },
        bed,
      ),
    ).toThrow(/footprint/);
  });
});
