import type { Comparison as MeshComparison } from '@windchest/meshes';
import { whereItDiffers } from './where-it-differs.js';

const box = { minMm: [0, 0, 0], maxMm: [20, 10, 41] } as const;
const found = (over: Partial<MeshComparison>): MeshComparison => ({
  kind: 'changed',
  movedMm: [0, 0, 0],
  largestDeviationMm: 0.42,
  placeMm: [12.5, 5, 41],
  placeIsOn: 'after',
  sizeChangeMm: [0, 0, 0],
  volumeChangeMm3: 0,
  areaChangeMm2: 0,
  changedTriangles: { before: 2, after: 2 },
  ...over,
});
const words = (over: Partial<MeshComparison>, boxes = { before: box, after: box }): string =>
  whereItDiffers(found(over), boxes as Parameters<typeof whereItDiffers>[1]);

describe('the sentence of where a part differs', () => {
  it('says how far, in which place as the part stands on the bed, and at which coordinates', () => {
    expect(words({})).toBe('up to 0.42 mm, at the top, right of the middle (12.5, 5.0, 41.0 mm)');
  });

  it.each([
    [[10, 5, 20.5], 'in the middle'],
    [[0, 0, 0], 'at the bottom, at the left, at the front'],
    [[20, 10, 41], 'at the top, at the right, at the back'],
    [[5, 3, 12], 'below the middle, left of the middle, in front of the middle'],
    [[15, 7, 30], 'above the middle, right of the middle, behind the middle'],
    // The middle fifth of a side is its middle, the outer tenth its end.
    [[11.9, 4.1, 24.5], 'in the middle'],
    [[18.1, 5, 20.5], 'at the right'],
    [[17.9, 5, 20.5], 'right of the middle'],
  ] as const)('finds %j %s', (placeMm, place) => {
    expect(words({ placeMm: [...placeMm] as [number, number, number] })).toContain(`mm, ${place} (`);
  });

  it('tells a place of the earlier shape within that one', () => {
    const taller = { minMm: [0, 0, 0], maxMm: [20, 10, 60] } as const;
    const boxes = { before: taller, after: box };
    expect(words({ placeMm: [10, 5, 60], placeIsOn: 'before' }, boxes as never)).toBe(
      'up to 0.42 mm, at the top (10.0, 5.0, 60.0 mm on the earlier shape)',
    );
    expect(words({ placeMm: [10, 5, 41] }, boxes as never)).toContain('at the top');
  });

  it('reckons in the coordinates of the file, wherever the part lies in it', () => {
    const centred = { minMm: [-10, -5, -2], maxMm: [10, 5, 2] } as const;
    const boxes = { before: centred, after: centred };
    expect(words({ placeMm: [-9.96, -0.04, 0] }, boxes as never)).toBe(
      'up to 0.42 mm, at the left (−10.0, 0.0, 0.0 mm)',
    );
  });

  it('rounds what is too small to be told', () => {
    expect(words({ largestDeviationMm: 0.0031 })).toMatch(/^by less than 0.01 mm, at the top/);
    expect(words({ largestDeviationMm: 12.345 })).toContain('up to 12.35 mm');
  });

  it('has words for surfaces that coincide, and for parts that stayed as they were', () => {
    expect(words({ placeMm: null, placeIsOn: null, largestDeviationMm: 0 })).toMatch(/no place was found/);
    expect(words({ kind: 'same-geometry', placeMm: null })).toBe('nowhere by more than 1 µm');
    expect(words({ kind: 'same-geometry', placeMm: null, movedMm: [5, -2, 0.5] })).toBe(
      'moved in its file by 5.00, −2.00, 0.50 mm',
    );
  });
});
