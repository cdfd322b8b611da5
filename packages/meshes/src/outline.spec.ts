import { readFileSync } from 'node:fs';
import { boxCorners, meshOf, tubeCorners } from '../fixtures/solids.js';
import { outline, outlines, readMesh, type Outline } from './index.js';

function read(file: string) {
  return readMesh(new Uint8Array(readFileSync(new URL(`../fixtures/reference/${file}`, import.meta.url))), {
    fileName: file,
  });
}

/** Reads back what the drawings write: M x y, relative l steps, z. */
function loopsOf(path: string): number[][] {
  return path
    .split('M')
    .filter(Boolean)
    .map((loop) => {
      const [start, steps] = loop.replace('z', '').split('l') as [string, string];
      const numbers = (text: string): number[] => (text.match(/-?\d*\.?\d+/g) ?? []).map(Number);
      const points = numbers(start);
      numbers(steps).forEach((step) => points.push(points[points.length - 2]! + step));
      return points;
    });
}

/** Area by the shoelace formula, in mm²; holes count negative. */
function areaOf(drawing: Outline): number {
  const sum = loopsOf(drawing.path).map((points) => {
    let twice = 0;
    for (let i = 0; i < points.length; i += 2) {
      const j = (i + 2) % points.length;
      twice += points[i]! * points[j + 1]! - points[j]! * points[i + 1]!;
    }
    return twice / 2;
  });
  return Math.abs(sum.reduce((a, b) => a + b, 0));
}

describe('drawing a part', () => {
  it('shows a box as an exact rectangle from each side', () => {
    const box = meshOf(boxCorners([40, 30, 10], [7, -3, 100]));
    const { front, side, top } = outlines(box);
    expect(front).toMatchObject({ viewBox: '0 0 40 10', path: 'M0 0l40 0 0 10-40 0z', edges: '' });
    expect(side.viewBox).toBe('0 0 30 10');
    expect(top.viewBox).toBe('0 0 40 30');
    expect(areaOf(side)).toBeCloseTo(300, 9);
    expect(areaOf(top)).toBeCloseTo(1200, 9);
  });

  it('cuts the bore out of a tube seen from the top, at its true size', () => {
    const top = outline(meshOf(tubeCorners(12, 10.5, 60, 64)), 'top');
    expect(loopsOf(top.path)).toHaveLength(2);
    // A(r) = n r² sin(2π/n) / 2 of a regular polygon.
    const expected = 32 * Math.sin((2 * Math.PI) / 64) * (12 ** 2 - 10.5 ** 2);
    expect(Math.abs(areaOf(top) - expected) / expected).toBeLessThan(0.01);
  });

  it('shows all 45 holes of a plate, and the edges of a step only from where they are seen', () => {
    expect(loopsOf(outline(read('plate_lattice_9x5.stl'), 'top').path)).toHaveLength(46);
    const step = meshOf([...boxCorners([40, 30, 10]), ...boxCorners([10, 30, 5], [30, 0, 10])]);
    // Seen from the top the step is one line across; from the right side it is flush.
    const { top } = outlines(step);
    expect(loopsOf(top.edges)).toHaveLength(1);
    loopsOf(top.edges)[0]!.forEach((value, i) => {
      if (i % 2 === 0) expect(value).toBeCloseTo(30, 2);
    });
  });

  it('draws a small round recess whole, once, though its facets are hardly a cell long', () => {
    const [radius, sides] = [1.3, 32];
    const at = (i: number, r: number, z: number): number[] => {
      const turn = (2 * Math.PI * i) / sides;
      return [r * Math.cos(turn), r * Math.sin(turn), z];
    };
    const band = (r0: number, z0: number, r1: number, z1: number): number[] =>
      Array.from({ length: sides }, (_, i) => [
        ...[at(i, r0, z0), at(i, r1, z1), at(i + 1, r1, z1)].flat(),
        ...(r0 > 0 ? [at(i, r0, z0), at(i + 1, r1, z1), at(i + 1, r0, z0)].flat() : []),
      ]).flat();
    // A disc with a well in its middle: floor, wall, top, rim, bottom.
    const disc = [
      ...band(0, 8, radius, 8),
      ...band(radius, 8, radius, 10),
      ...band(radius, 10, 100, 10),
      ...band(100, 10, 100, 0),
      ...band(0, 0, 100, 0),
    ];
    const loops = loopsOf(outline(meshOf(disc), 'top').edges);
    const round = loops.filter((loop) => loop.every((value) => Math.abs(value - 100) < 2));
    const lengths = round.map((loop) => {
      let length = 0;
      for (let i = 2; i < loop.length; i += 2)
        length += Math.hypot(loop[i]! - loop[i - 2]!, loop[i + 1]! - loop[i - 1]!);
      return length;
    });
    const drawnMm = lengths.reduce((sum, one) => sum + one, 0);
    expect(drawnMm).toBeGreaterThan(0.9 * 2 * Math.PI * radius);
    expect(drawnMm).toBeLessThan(1.3 * 2 * Math.PI * radius);
  });

  it('hides what lies behind', () => {
    const behind = meshOf([...boxCorners([40, 5, 20]), ...boxCorners([10, 5, 10], [15, 20, 5])]);
    expect(outline(behind, 'front').edges).toBe('');
  });

  it('looks from the front along +y and from the right along −x', () => {
    // A peg at the right end, near the front.
    const part = meshOf([...boxCorners([40, 30, 2]), ...boxCorners([4, 4, 20], [36, 0, 0])]);
    const right = (drawing: Outline): number[] =>
      loopsOf(drawing.path)[0]!.filter((_, i, all) => i % 2 === 0 && all[i + 1]! < 10);
    expect(Math.min(...right(outline(part, 'front')))).toBeCloseTo(36, 2);
    expect(Math.max(...right(outline(part, 'side')))).toBeCloseTo(4, 2);
  });

  it.each([
    'egg_vessel_25.stl',
    '3mfc_core_dodeca_chain_loop.3mf',
    'comb_rack_20.3mf',
    'sphere_r15_fn96.stl',
    'hole_five_triangles.stl',
  ])('keeps %s within its budget from every side, inside its box', (file) => {
    for (const drawing of Object.values(outlines(read(file)))) {
      expect(drawing.path.length + drawing.edges.length).toBeLessThanOrEqual(8000);
      const points = [...loopsOf(drawing.path), ...loopsOf(drawing.edges)].flat();
      const slackMm = 0.005 * Math.max(drawing.widthMm, drawing.heightMm);
      const across = points.filter((_, i) => i % 2 === 0);
      const down = points.filter((_, i) => i % 2 === 1);
      expect(Math.min(...points)).toBeGreaterThanOrEqual(-slackMm);
      expect(Math.max(...across)).toBeLessThanOrEqual(drawing.widthMm + slackMm);
      expect(Math.max(...down)).toBeLessThanOrEqual(drawing.heightMm + slackMm);
    }
  });

  it('takes a smaller budget as well', () => {
    const { path, edges } = outline(read('3mfc_core_dodeca_chain_loop.3mf'), 'side', { maxBytes: 1500 });
    expect(path.length + edges.length).toBeLessThanOrEqual(1500);
    expect(path).not.toBe('');
  });
});
