import { type Mesh } from '@windchest/meshes';
import { filamentVolumes } from './estimate-volume.js';
import { filamentOf } from './filament.js';
import { PlatesError, requirePositive, requireWhole } from './plates-error.js';
import { profileOf } from './print-profile.js';
import { printMinutes } from './print-time.js';
import type { Material, PrintEstimate, PrintProfile, PrintSpec } from './types.js';

/** Two slicers differ by this much at worst on the same parts: no estimate can promise better. */
const SLICERS_DIFFER_PERCENT = 8;
/** Checked with 0.4 mm nozzles; other nozzles have other habits of line width. */
const CHECKED_NOZZLE_MM = 0.4;
const OTHER_NOZZLE_PERCENT = 4;
const OPEN_MESH_PERCENT = 12;

/**
 * Filament and time for one print of one part. Supports, brims, purging and failed prints are not in it.
 *
 * @throws PlatesError when a value of the settings or of the material makes no sense.
 */
export function estimateFromProfile(
  profile: PrintProfile,
  spec: PrintSpec,
  material: Material,
): PrintEstimate {
  requireSpec(spec);
  const volumes = filamentVolumes(profile, spec);
  const isCheckedNozzle = Math.abs(spec.nozzleMm - CHECKED_NOZZLE_MM) < 1e-9;
  return {
    ...filamentOf(volumes.totalMm3, material),
    volumeMm3: volumes.totalMm3,
    minutes: printMinutes(profile, spec, volumes),
    mayBeOffPercent:
      SLICERS_DIFFER_PERCENT +
      (isCheckedNozzle ? 0 : OTHER_NOZZLE_PERCENT) +
      (profile.isClosed ? 0 : OPEN_MESH_PERCENT),
  };
}

/** `profileOf` and `estimateFromProfile` in one. Takes up to seconds for large curved meshes. */
export function estimatePrint(mesh: Mesh, spec: PrintSpec, material: Material): PrintEstimate {
  requireSpec(spec);
  return estimateFromProfile(profileOf(mesh), spec, material);
}

function requireSpec(spec: PrintSpec): void {
  requirePositive('The nozzle in mm', spec.nozzleMm);
  requirePositive('The layer height in mm', spec.layerMm);
  requireWhole('The number of perimeters', spec.perimeters, 0);
  requireWhole('The number of top layers', spec.topLayers, 0);
  requireWhole('The number of bottom layers', spec.bottomLayers, 0);
  if (spec.firstLayerMm !== undefined) requirePositive('The first layer in mm', spec.firstLayerMm);
  if (!(spec.infill >= 0 && spec.infill <= 1)) {
    throw new PlatesError(`The infill is ${spec.infill}; give a share from 0 to 1 (15 % is 0.15).`);
  }
  if (spec.layerMm > spec.nozzleMm) {
    throw new PlatesError(
      `Layers of ${spec.layerMm} mm are higher than the nozzle of ${spec.nozzleMm} mm is wide; choose lower layers.`,
    );
  }
}
