/** A corner of an outline seen from above: x, y in mm. */
export type Point = readonly [number, number];

/** What a printer can reach, in mm. */
export interface Bed {
  readonly xMm: number;
  readonly yMm: number;
  readonly zMm: number;
}

/** How a part may lie on the bed: as exported, turned about the vertical, or also stood and laid. */
export type OrientationRule = 'as-exported' | 'may-turn' | 'may-lie';

/** A filament, as bought. */
export interface Material {
  readonly densityGPerCm3: number;
  readonly diameterMm: number;
  readonly pricePerKg?: number;
}

/** How a part is printed. `infill` is a share from 0 to 1. */
export interface PrintSpec {
  readonly nozzleMm: number;
  readonly layerMm: number;
  readonly perimeters: number;
  readonly topLayers: number;
  readonly bottomLayers: number;
  readonly infill: number;
  /** Half the nozzle where nothing is said (common practice). */
  readonly firstLayerMm?: number;
}

/** Filament and time for one print of one part. */
export interface PrintEstimate {
  readonly massG: number;
  readonly lengthM: number;
  /** Volume of the filament used up, not of the part. */
  readonly volumeMm3: number;
  readonly minutes: { readonly low: number; readonly high: number };
  /** How far mass and length may be from a slicer's figure, in percent either way. */
  readonly mayBeOffPercent: number;
}

/**
 * What the estimate needs to know of a mesh: plain JSON of a few kB, so that a browser can estimate for any
 * print settings without the mesh. Every list of `…MmSteps` says at which lengths the numbers beside it hold.
 */
export interface PrintProfile {
  readonly version: 1;
  readonly heightMm: number;
  /** Enclosed volume, and the area of all upright surfaces (contour length summed over the height). */
  readonly volumeMm3: number;
  readonly sideAreaMm2: number;
  /** Volume that remains more than so far inside every contour. */
  readonly insetMmSteps: readonly number[];
  readonly insetVolumeMm3: readonly number[];
  /** From the bed up: mean cross-section and contour length of the layers in each band. */
  readonly bands: readonly ProfileBand[];
  readonly wallMmSteps: readonly number[];
  readonly shellMmSteps: readonly number[];
  /** One entry for each wall of `wallMmSteps`. */
  readonly walls: readonly WallProfile[];
  /** Doubt about the numbers: an open mesh has no sure inside. */
  readonly isClosed: boolean;
}

export interface ProfileBand {
  readonly heightMm: number;
  readonly areaMm2: number;
  readonly contourMm: number;
}

export interface WallProfile {
  /** Volume inside the walls. */
  readonly fillMm3: number;
  /** Ceilings over air inside the walls. */
  readonly ceilingMm2: number;
  /** One entry for each shell of `shellMmSteps`. */
  readonly shells: readonly ShellProfile[];
}

/** What lies inside the walls and away from top and bottom: room for infill. */
export interface ShellProfile {
  readonly sparseMm3: number;
  /** The part of it in regions so small that they are printed solid when there is infill at all. */
  readonly smallMm3: number;
  /** Border of the room for infill, summed over the height; small regions left out. */
  readonly sparseSideMm2: number;
  /** Solid layers that begin over infill. */
  readonly bridgedMm2: number;
  readonly bridgedSmallMm2: number;
}
