import { interpolate } from './interpolate.js';
import type { PrintProfile, PrintSpec, ShellProfile, WallProfile } from './types.js';

/** Lines are printed a little wider than the nozzle (slicers' usual 0.45 mm for 0.4 mm). */
const LINE_WIDTH_PER_NOZZLE = 1.125;
const INFILL_OVERLAP = 0.25;
/** Bridges are round threads of the nozzle's width, laid this much apart from one another. */
const BRIDGE_GAP_MM = 0.05;
/**
 * Length of a gyroid's layers against straight lines of the nominal spacing: area of the surface in a cube of
 * side L, 3.0915 L² (Schoen, NASA TN D-5541), × π/4 for random cuts, at the period 2π/2.44 that slicers use.
 */
const GYROID_LENGTH = (3.0915 * (Math.PI / 4) * 2.44) / (2 * Math.PI);
/** Ends of infill lines are joined along the border: half of it at even spacing, a quarter at random. */
const JOINED_BORDER = 0.4;
/** From here up infill is printed as solid. */
const SOLID_INFILL = 0.99;

export interface FilamentVolumes {
  readonly wallsMm3: number;
  readonly solidMm3: number;
  readonly sparseMm3: number;
  readonly bridgesMm3: number;
  readonly totalMm3: number;
}

export interface LineSizes {
  readonly widthMm: number;
  /** Distance of neighbouring lines: a bead is a rectangle with round ends, so lines overlap a little. */
  readonly spacingMm: number;
  readonly areaMm2: number;
}

/** A printed line is a flat bead with half-round sides: area h·(w − h·(1 − π/4)). */
export function lineSizes({ nozzleMm, layerMm }: PrintSpec): LineSizes {
  const widthMm = LINE_WIDTH_PER_NOZZLE * nozzleMm;
  const spacingMm = widthMm - layerMm * (1 - Math.PI / 4);
  return { widthMm, spacingMm, areaMm2: spacingMm * layerMm };
}

/** Half the nozzle for the first layer, if the print settings do not say. */
export function firstLayerOf({ firstLayerMm, nozzleMm }: PrintSpec): number {
  return firstLayerMm ?? nozzleMm / 2;
}

/** A layer is printed when its middle still lies in the part. */
export function layerCount(heightMm: number, spec: PrintSpec): number {
  return 1 + Math.max(0, Math.floor((heightMm - firstLayerOf(spec)) / spec.layerMm + 0.5 - 1e-9));
}

/** Volume of filament in each kind of line, in mm³. */
export function filamentVolumes(profile: PrintProfile, spec: PrintSpec): FilamentVolumes {
  const { widthMm, spacingMm } = lineSizes(spec);
  const printedMm = firstLayerOf(spec) + (layerCount(profile.heightMm, spec) - 1) * spec.layerMm;
  const stretch = printedMm / profile.heightMm;
  const remaining = (insetMm: number): number =>
    interpolate(profile.insetMmSteps, profile.insetVolumeMm3, insetMm);

  // Outer lines run half a width inside the contour, so their round sides leave this much of it empty.
  const edgeMm = (widthMm - spacingMm) / 2;
  const wallMm = edgeMm + spec.perimeters * spacingMm;
  const inside = Math.min(remaining(wallMm), profile.volumeMm3);
  const printable = Math.max(inside, profile.volumeMm3 - edgeMm * profile.sideAreaMm2);
  const borderMm2 = (inside - remaining(wallMm + spacingMm / 2)) / (spacingMm / 2);
  const fill = inside + INFILL_OVERLAP * spacingMm * borderMm2;

  const { wall, shell } = lookUp(profile, spec, wallMm);
  const scale = wall.fillMm3 > 0 ? Math.min(1.5, fill / wall.fillMm3) : 0;
  const isSolid = spec.infill >= SOLID_INFILL;
  const isEmpty = spec.infill === 0;
  const sparseRoom = isSolid ? 0 : isEmpty ? shell.sparseMm3 : shell.sparseMm3 - shell.smallMm3;
  const bridged = isSolid ? 0 : isEmpty ? shell.bridgedMm2 + shell.bridgedSmallMm2 : shell.bridgedMm2;
  const bridgeMm = (Math.PI / 4) * (spec.nozzleMm ** 2 / (spec.nozzleMm + BRIDGE_GAP_MM));

  const wallsMm3 = (printable - inside) * stretch;
  const solidMm3 = Math.max(0, fill - sparseRoom * scale) * stretch;
  const sparseMm3 = sparseLines(sparseRoom, shell.sparseSideMm2, spec.infill, spacingMm) * scale * stretch;
  const bridgesMm3 = (bridged * scale + wall.ceilingMm2 * scale) * (bridgeMm - spec.layerMm);
  return {
    wallsMm3,
    solidMm3,
    sparseMm3,
    bridgesMm3,
    totalMm3: Math.max(0, wallsMm3 + solidMm3 + sparseMm3 + bridgesMm3),
  };
}

function sparseLines(roomMm3: number, sideMm2: number, infill: number, spacingMm: number): number {
  if (infill === 0 || roomMm3 <= 0) return 0;
  const reached = Math.max(0, roomMm3 - (spacingMm / 2) * sideMm2);
  const lines = GYROID_LENGTH * infill * reached + JOINED_BORDER * spacingMm * sideMm2;
  return Math.min(roomMm3, lines);
}

/** The profile's numbers at this wall and at the mean thickness of top and bottom. */
function lookUp(
  profile: PrintProfile,
  spec: PrintSpec,
  wallMm: number,
): { wall: WallProfile; shell: ShellProfile } {
  const topMm = spec.topLayers * spec.layerMm;
  const bottomMm = spec.bottomLayers === 0 ? 0 : firstLayerOf(spec) + (spec.bottomLayers - 1) * spec.layerMm;
  // Every column of the part ends as often at a top as at a bottom, so their mean serves for both.
  const shellMm = (topMm + bottomMm) / 2;
  const at = (of: (wall: WallProfile) => number): number =>
    interpolate(profile.wallMmSteps, profile.walls.map(of), wallMm);
  const atShell = (key: keyof ShellProfile, withoutShell: (wall: WallProfile) => number): number =>
    at((wall) =>
      interpolate(
        [0, ...profile.shellMmSteps],
        [withoutShell(wall), ...wall.shells.map((s) => s[key])],
        shellMm,
      ),
    );
  const thinnest = (key: keyof ShellProfile) => (wall: WallProfile) => wall.shells[0]?.[key] ?? 0;
  return {
    wall: { fillMm3: at((w) => w.fillMm3), ceilingMm2: at((w) => w.ceilingMm2), shells: [] },
    shell: {
      sparseMm3: atShell('sparseMm3', (wall) => wall.fillMm3),
      smallMm3: atShell('smallMm3', thinnest('smallMm3')),
      sparseSideMm2: atShell('sparseSideMm2', thinnest('sparseSideMm2')),
      bridgedMm2: shellMm === 0 ? 0 : atShell('bridgedMm2', thinnest('bridgedMm2')),
      bridgedSmallMm2: shellMm === 0 ? 0 : atShell('bridgedSmallMm2', thinnest('bridgedSmallMm2')),
    },
  };
}
