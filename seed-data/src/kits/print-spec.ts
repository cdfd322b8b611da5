import type { DemoPrintSpec } from '../demo-types.js';

/** What the workshop prints with unless a kit says otherwise. */
export function printSpec(
  material: string,
  remarks: string,
  other: Partial<DemoPrintSpec> = {},
): DemoPrintSpec {
  return {
    nozzleMm: 0.4,
    layerMm: 0.2,
    perimeters: 2,
    topLayers: 4,
    bottomLayers: 4,
    infill: 0.15,
    material,
    supports: 'none',
    remarks,
    ...other,
  };
}
