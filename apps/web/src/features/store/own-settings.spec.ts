import type { PrintSpecification } from '@windchest/contracts';
import { ownSettings } from './own-settings.js';

const kit: PrintSpecification = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 2,
  topLayers: 4,
  bottomLayers: 4,
  infill: 0.15,
  material: 'PETG',
  supports: 'none',
  remarks: '',
};

describe('a part’s own print settings', () => {
  it('are those that differ from the kit’s', () => {
    expect(ownSettings({ ...kit, perimeters: 3, infill: 1 }, kit)).toEqual(['3 perimeters', '100 % infill']);
    expect(ownSettings({ ...kit, material: 'TPU', layerMm: 0.12 }, kit)).toEqual(['TPU', '0.12 mm layers']);
  });

  it('are none where only the remarks differ', () => {
    expect(ownSettings({ ...kit, remarks: 'Slow.' }, kit)).toEqual([]);
  });
});
