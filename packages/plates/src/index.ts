export type {
  Bed,
  Material,
  OrientationRule,
  Point,
  PrintEstimate,
  PrintProfile,
  PrintSpec,
} from './types.js';
export { PlatesError } from './plates-error.js';
export { footprintOf } from './footprint.js';
export { fitPart, type Fit, type FitOptions, type PartShape } from './fit-part.js';
export {
  packPlates,
  type PackedPlates,
  type PackingOptions,
  type PartToPack,
  type Placement,
  type Plate,
} from './pack-plates.js';
export { profileOf } from './print-profile.js';
export { estimateFromProfile, estimatePrint } from './estimate-print.js';
export { filamentCost, filamentOf, gramsPerMetre, metresPerKilogram, spoolsFor } from './filament.js';
export { materialNamed, materials, type MaterialDensity, type MaterialName } from './materials.js';
export { usual } from './usual.js';
