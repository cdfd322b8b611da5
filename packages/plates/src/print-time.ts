import { layerCount, lineSizes, type FilamentVolumes } from './estimate-volume.js';
import type { PrintProfile, PrintSpec } from './types.js';

/** Speeds in mm/s and acceleration in mm/s² of a common printer's middling profile (PrusaSlicer 2.5 defaults). */
const SPEED = { outerWall: 25, innerWall: 45, solid: 80, sparse: 80, bridge: 30 };
const ACCELERATION = 1000;
/** Slicers slow down so that a layer can cool. */
const LEAST_LAYER_S = 10;
/** Moves without printing, retractions, the step up to the next layer. */
const LAYER_OVERHEAD_S = 2;
/** The first layer is printed this much slower. */
const FIRST_LAYER_TIMES = 3;
/** Printers differ by more than any estimate: the range spans a quick one and a careful one. */
const LOW_SHARE = 0.65;
const HIGH_SHARE = 1.5;
/** Wave length of gyroid infill in line spacings: its path turns back and forth once in each. */
const WAVE_PER_SPACING = (2 * Math.PI) / 2.44;

/** Print time as a range for one part, without heating up, in minutes. */
export function printMinutes(
  profile: PrintProfile,
  spec: PrintSpec,
  volumes: FilamentVolumes,
): { low: number; high: number } {
  const seconds = printSeconds(profile, spec, volumes);
  return { low: (LOW_SHARE * seconds) / 60, high: (HIGH_SHARE * seconds) / 60 };
}

/**
 * Time at middling speeds, in s. Lines run at their speed, less what starting and stopping costs (v/a for each
 * stretch); every layer takes at least its cooling time.
 */
export function printSeconds(profile: PrintProfile, spec: PrintSpec, volumes: FilamentVolumes): number {
  const { areaMm2, spacingMm } = lineSizes(spec);
  const layers = layerCount(profile.heightMm, spec);
  const wallLength = volumes.wallsMm3 / areaMm2;
  const outerLength = Math.min(wallLength, (profile.sideAreaMm2 / profile.heightMm) * layers);
  const wallSeconds = outerLength / SPEED.outerWall + (wallLength - outerLength) / SPEED.innerWall;

  // Mean length of straight lines across a region: π·area/border (Cauchy–Crofton).
  const chordMm = (Math.PI * profile.volumeMm3) / Math.max(profile.sideAreaMm2, 1e-9);
  const waveMm = spec.infill > 0 ? (WAVE_PER_SPACING * spacingMm) / spec.infill : chordMm;
  const fillSeconds =
    stretchSeconds(volumes.solidMm3 / areaMm2, chordMm, SPEED.solid) +
    stretchSeconds(volumes.sparseMm3 / areaMm2, Math.min(chordMm, waveMm), SPEED.sparse) +
    Math.max(0, volumes.bridgesMm3) / areaMm2 / SPEED.bridge;

  let seconds = 0;
  const contourSum = profile.bands.reduce((sum, band) => sum + band.contourMm * band.heightMm, 0);
  const areaSum = profile.bands.reduce((sum, band) => sum + band.areaMm2 * band.heightMm, 0);
  for (const band of profile.bands) {
    const bandLayers = (layers * band.heightMm) / profile.heightMm;
    const walls = contourSum > 0 ? (wallSeconds * band.contourMm * band.heightMm) / contourSum : 0;
    const fill = areaSum > 0 ? (fillSeconds * band.areaMm2 * band.heightMm) / areaSum : 0;
    seconds += Math.max(walls + fill + LAYER_OVERHEAD_S * bandLayers, LEAST_LAYER_S * bandLayers);
  }
  return (seconds * (layers - 1 + FIRST_LAYER_TIMES)) / layers;
}

/** Time for lines broken into stretches: each speeds up and slows down, or never reaches full speed. */
function stretchSeconds(lengthMm: number, stretchMm: number, speed: number): number {
  if (lengthMm <= 0) return 0;
  const stretch = Math.max(stretchMm, 0.5);
  const each =
    stretch >= speed ** 2 / ACCELERATION
      ? stretch / speed + speed / ACCELERATION
      : 2 * Math.sqrt(stretch / ACCELERATION);
  return (lengthMm / stretch) * each;
}
