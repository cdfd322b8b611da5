import type { MeasuredMesh } from '../files/measured-mesh.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import { comparePart, meshPairOf } from './compare-parts.js';

const part = (
  sha256: string,
  geometryHash: string | null,
  mesh: Partial<MeasuredMesh> = {},
): PartOfRevision => ({
  id: 'p',
  revisionId: 'r',
  code: 'J-01',
  name: 'Tongue',
  quantity: 1,
  orientation: 'may-turn',
  printSpec: null,
  voice: null,
  mark: null,
  reason: '',
  isGauge: false,
  variants: [],
  file: {
    id: 'f',
    sha256,
    fileName: 'x.stl',
    bytes: 1,
    kind: 'stl',
    addedAt: new Date(0),
    measuring: 'measured',
    measured: {
      sizeMm: [10, 20, 30],
      minMm: [0, 0, 0],
      maxMm: [10, 20, 30],
      volumeMm3: 6000,
      areaMm2: 2200,
      ...mesh,
    } as MeasuredMesh,
    geometryHash,
    drawings: null,
    previewSha256: null,
    fault: null,
  },
});

describe('a part between two revisions', () => {
  const before = part('a', 'g1');

  it('is the same with the same bytes, re-exported with the same geometry', () => {
    expect(comparePart(before, part('a', 'g1'))).toMatchObject({ difference: 'same', whatDiffers: '' });
    expect(comparePart(before, part('b', 'g1'))).toMatchObject({ difference: 're-exported' });
  });

  it('is new or dropped where one side has none', () => {
    expect(comparePart(null, before).difference).toBe('new');
    expect(comparePart(before, null).difference).toBe('dropped');
  });

  it('tells a change of size, volume and surface in words', () => {
    const after = part('b', 'g2', { sizeMm: [10, 19.5, 31.5], volumeMm3: 6186, areaMm2: 2200 });
    expect(comparePart(before, after)).toEqual({
      difference: 'changed',
      whatDiffers: '−0.50 mm depth, +1.50 mm height, +3.1 % volume',
      sizeChangeMm: { x: 0, y: -0.5, z: 1.5 },
      volumeChangePercent: expect.closeTo(3.1, 10),
      areaChangePercent: 0,
      deviation: expect.objectContaining({ state: 'waiting' }),
    });
  });

  it('says so where shape alone differs, or nothing is measured yet', () => {
    expect(comparePart(before, part('b', 'g2')).whatDiffers).toContain('the shape differs');
    const waiting = part('b', null);
    const unmeasured = {
      ...waiting,
      file: { ...waiting.file!, measuring: 'waiting' as const, measured: null },
    };
    expect(comparePart(before, unmeasured)).toMatchObject({
      difference: 'changed',
      whatDiffers: 'another file, not measured yet',
      volumeChangePercent: null,
    });
    expect(comparePart(before, { ...before, file: null }).whatDiffers).toBe('its file was taken out');
  });

  it('tells another quantity of the same part', () => {
    expect(comparePart(before, { ...before, quantity: 3 })).toMatchObject({
      difference: 'same',
      whatDiffers: '1 → 3 pieces',
    });
  });

  it('asks for a comparison of two measured meshes of unequal geometry, and of nothing else', () => {
    expect(meshPairOf(before, part('b', 'g2'))).toEqual({ beforeSha: 'a', afterSha: 'b' });
    expect(meshPairOf(before, part('b', 'g1'))).toBeNull();
    expect(meshPairOf(before, part('a', 'g2'))).toBeNull();
    expect(meshPairOf(null, before)).toBeNull();
    const waiting = part('b', null);
    expect(meshPairOf(before, { ...waiting, file: { ...waiting.file!, measured: null } })).toBeNull();
  });

  const compared = {
    kind: 'changed' as const,
    movedMm: [0, 0, 0] as const,
    largestDeviationMm: 1.5,
    placeMm: [5, 10, 30] as const,
    placeIsOn: 'after' as const,
    sizeChangeMm: [0, 0, 0] as const,
    volumeChangeMm3: 0,
    areaChangeMm2: 0,
    changedTriangles: { before: 1, after: 1 },
  };

  it('is re-exported where the meshes turn out to be one shape, also where it moved in its file', () => {
    const same = { ...compared, kind: 'same-geometry' as const, largestDeviationMm: 0, placeMm: null };
    const result = { ...same, placeIsOn: null };
    expect(comparePart(before, part('b', 'g2'), { state: 'compared', result })).toMatchObject({
      difference: 're-exported',
      whatDiffers: 'the same shape, exported again',
      sizeChangeMm: null,
      deviation: { state: 'compared', placeMm: null, movedMm: { x: 0, y: 0, z: 0 } },
    });
    const moved = { ...result, movedMm: [5, -2, 0.5] as const };
    expect(comparePart(before, part('b', 'g2'), { state: 'compared', result: moved }).whatDiffers).toBe(
      'the same shape, exported again, moved in its file by 5.00, −2.00, 0.50 mm',
    );
  });

  it('carries the place where it differs most, or why that is not known', () => {
    const known = { state: 'compared' as const, result: compared };
    expect(comparePart(before, part('b', 'g2'), known)).toMatchObject({
      difference: 'changed',
      deviation: {
        state: 'compared',
        largestMm: 1.5,
        placeMm: { x: 5, y: 10, z: 30 },
        placeIsOn: 'after',
        movedMm: null,
        boxMm: { min: { x: 0, y: 0, z: 0 }, max: { x: 10, y: 20, z: 30 } },
        where: 'up to 1.50 mm, at the top (5.0, 10.0, 30.0 mm)',
      },
    });
    const failed = { state: 'failed' as const, fault: 'comparing the two files takes longer than 600 s.' };
    expect(comparePart(before, part('b', 'g2'), failed)).toMatchObject({
      difference: 'changed',
      deviation: {
        state: 'failed',
        where: 'where it differs is not known: comparing the two files takes longer than 600 s.',
      },
    });
  });
});
