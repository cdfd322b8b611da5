import type { MeasuredMesh } from '../files/measured-mesh.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import { comparePart } from './compare-parts.js';

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
    measured: { sizeMm: [10, 20, 30], volumeMm3: 6000, areaMm2: 2200, ...mesh } as MeasuredMesh,
    geometryHash,
    drawings: null,
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
});
