import type { VariantClearance } from '@windchest/contracts';
import type { MeasuredMesh } from '../files/measured-mesh.js';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';
import { comparePart } from './compare-parts.js';
import { asPrinted, compareVariants } from './compare-variants.js';

/** A tongue so many mm wide; the width stands for its bytes and its shape. */
const file = (widthMm: number): FileOfRevision => ({
  id: `f${widthMm}`,
  sha256: String(widthMm),
  fileName: 'x.stl',
  bytes: 1,
  kind: 'stl',
  addedAt: new Date(0),
  measuring: 'measured',
  measured: {
    sizeMm: [widthMm, 20, 30],
    minMm: [0, 0, 0],
    maxMm: [widthMm, 20, 30],
    volumeMm3: 6000,
    areaMm2: 2200,
  } as unknown as MeasuredMesh,
  geometryHash: String(widthMm),
  drawings: null,
  previewSha256: null,
  fault: null,
});
const part = (
  zeroMm: number,
  variantsMm: Partial<Record<VariantClearance, number>> = {},
  quantity = 1,
): PartOfRevision => ({
  id: 'p',
  revisionId: 'r',
  code: 'J-01',
  name: 'Tongue',
  quantity,
  orientation: 'may-turn',
  printSpec: null,
  voice: null,
  mark: null,
  reason: '',
  isGauge: false,
  file: file(zeroMm),
  variants: (['minus', 'plus'] as const).flatMap((clearance) => {
    const widthMm = variantsMm[clearance];
    return widthMm === undefined ? [] : [{ clearance, file: file(widthMm) }];
  }),
});

describe('a part that comes in several clearances, between two revisions', () => {
  const before = part(10, { minus: 10.2, plus: 9.8 });

  it('is compared as any other part where neither revision has variants', () => {
    expect(compareVariants(part(10), part(9))).toEqual({ ...comparePart(part(10), part(9)), variants: [] });
  });

  it('is compared clearance by clearance, the zero too, and is as different as the strongest of them', () => {
    expect(compareVariants(before, part(10, { minus: 10.2, plus: 9.6 }))).toEqual({
      difference: 'changed',
      whatDiffers: 'in +: −0.20 mm width',
      sizeChangeMm: { x: expect.closeTo(-0.2, 10), y: 0, z: 0 },
      volumeChangePercent: 0,
      areaChangePercent: 0,
      deviation: expect.objectContaining({ state: 'waiting', clearance: 'plus' }),
      variants: [
        { clearance: 'minus', difference: 'same', whatDiffers: '' },
        { clearance: 'zero', difference: 'same', whatDiffers: '' },
        { clearance: 'plus', difference: 'changed', whatDiffers: '−0.20 mm width' },
      ],
    });
  });

  it('tells clearances that differ alike together, and another quantity once', () => {
    const wider = part(10.1, { minus: 10.3, plus: 9.9 }, 2);
    expect(compareVariants(before, wider)).toMatchObject({
      difference: 'changed',
      whatDiffers: '+0.10 mm width, 1 → 2 pieces',
    });
    expect(compareVariants(before, part(10.1, { minus: 10.3, plus: 9.8 })).whatDiffers).toBe(
      'in − and 0: +0.10 mm width',
    );
    expect(compareVariants(before, part(10, { minus: 10.2, plus: 9.8 }, 2))).toMatchObject({
      difference: 'same',
      whatDiffers: '1 → 2 pieces',
    });
  });

  it('stays the same where clearances only come or go, for nothing that was printed is wrong', () => {
    expect(compareVariants(part(10), before)).toMatchObject({
      difference: 'same',
      whatDiffers: 'in − and +: a new clearance',
      variants: [{ difference: 'new' }, { difference: 'same' }, { difference: 'new' }],
    });
    expect(compareVariants(part(9.9), before).whatDiffers).toBe(
      'in 0: +0.10 mm width; in − and +: a new clearance',
    );
    expect(compareVariants(before, part(10, { minus: 10.2 }))).toMatchObject({
      difference: 'same',
      whatDiffers: 'in +: no longer in this clearance',
      variants: [{ difference: 'same' }, { difference: 'same' }, { difference: 'dropped' }],
    });
  });

  it('is new or dropped as a whole', () => {
    expect(compareVariants(null, before)).toMatchObject({ difference: 'new', whatDiffers: 'a new part' });
    expect(compareVariants(before, null)).toMatchObject({ difference: 'dropped', variants: { length: 3 } });
  });

  it('is, for somebody who prints one clearance, what that one is', () => {
    const after = part(10.1, { minus: 10.2, plus: 9.8 });
    const as = (clearance: 'minus' | 'zero', old = before) =>
      compareVariants(asPrinted(old, clearance), asPrinted(after, clearance));
    expect(as('minus')).toMatchObject({ difference: 'same', whatDiffers: '', variants: [] });
    expect(as('zero')).toMatchObject({ difference: 'changed', whatDiffers: '+0.10 mm width' });
    // Of a revision without clearances they hold what there was.
    expect(as('minus', part(10))).toMatchObject({ difference: 'changed', whatDiffers: '+0.20 mm width' });
    expect(asPrinted(before, null)).toBe(before);
  });

  it('tells where it differs in the clearance that its figures are of, once none is waiting', () => {
    const after = part(10.1, { minus: 10.2, plus: 9.9 });
    const result = {
      kind: 'changed' as const,
      movedMm: [0, 0, 0] as const,
      largestDeviationMm: 0.1,
      placeMm: [10.1, 10, 15] as const,
      placeIsOn: 'after' as const,
      sizeChangeMm: [0, 0, 0] as const,
      volumeChangeMm3: 0,
      areaChangeMm2: 0,
      changedTriangles: { before: 1, after: 1 },
    };
    const compared = { state: 'compared' as const, result };
    expect(compareVariants(before, after, () => compared).deviation).toMatchObject({
      clearance: 'zero',
      where: 'in 0: up to 0.10 mm, at the right (10.1, 10.0, 15.0 mm)',
    });
    const half = compareVariants(before, after, ({ afterSha }) =>
      afterSha === '9.9' ? { state: 'waiting' } : compared,
    );
    expect(half.deviation).toMatchObject({ state: 'waiting', clearance: 'plus' });
    const same = compareVariants(before, part(10.1, { minus: 10.2, plus: 9.8 }), () => ({
      state: 'compared',
      result: { ...result, kind: 'same-geometry', placeMm: null },
    }));
    expect(same).toMatchObject({ difference: 're-exported', deviation: { clearance: 'zero' } });
    expect(compareVariants(before, before).deviation).toBeNull();
  });
});
