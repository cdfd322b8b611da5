import { type Mesh } from '@windchest/meshes';
import { requirePositive, PlatesError } from './plates-error.js';
import { INSET_MM_STEPS, insetVolumes } from './slicing/inset-volumes.js';
import { sliceMesh, type Layer, type SlicedMesh } from './slicing/layers.js';
import { wallProfiles } from './slicing/shell-volumes.js';
import type { PrintProfile, ProfileBand } from './types.js';

/** Walls of one to four lines of a 0.4 mm nozzle, or one to three of wider ones. */
const WALL_MM_STEPS: readonly number[] = [0.42, 0.83, 1.24, 1.9];
const SHELL_MM: readonly number[] = [0.4, 0.8, 1.2, 2];
const MOST_BANDS = 24;
const DEFAULT_LAYER_MM = 0.2;

/**
 * Slices a mesh once and keeps what `estimateFromProfile` needs for any print settings: a few kB of plain JSON.
 *
 * @param layerMm thickness of the layers to cut, 0.2 mm if not given; tall curved parts are cut thicker.
 * @throws PlatesError for a mesh without triangles or height, or a layer thickness that is none.
 */
export function profileOf(mesh: Mesh, layerMm = DEFAULT_LAYER_MM): PrintProfile {
  requirePositive('The layer thickness in mm', layerMm);
  if (mesh.triangles === 0) throw new PlatesError('The mesh has no triangles; export the part again.');
  const sliced = sliceMesh(mesh, layerMm);
  const { plan, layers } = sliced;
  if (!(plan.layerMm > 0)) throw new PlatesError('The mesh has no height; export the part as a solid.');
  const shellLayers = [...new Set(SHELL_MM.map((mm) => Math.max(1, Math.round(mm / plan.layerMm))))];
  const volumeMm3 = sum(layers, ({ areaMm2 }) => areaMm2) * plan.layerMm;
  return {
    version: 1,
    heightMm: round(plan.layers * plan.layerMm),
    volumeMm3: round(volumeMm3),
    sideAreaMm2: round(sum(layers, ({ contourMm }) => contourMm) * plan.layerMm),
    insetMmSteps: INSET_MM_STEPS,
    insetVolumeMm3: insetVolumes(sliced).map(round),
    bands: bandsOf(sliced),
    wallMmSteps: WALL_MM_STEPS,
    shellMmSteps: shellLayers.map((count) => round(count * plan.layerMm)),
    walls: wallProfiles(sliced, WALL_MM_STEPS, shellLayers).map(({ fillMm3, ceilingMm2, shells }) => ({
      fillMm3: round(fillMm3),
      ceilingMm2: round(ceilingMm2),
      shells: shells.map((shell) => ({
        sparseMm3: round(shell.sparseMm3),
        smallMm3: round(shell.smallMm3),
        sparseSideMm2: round(shell.sparseSideMm2),
        bridgedMm2: round(shell.bridgedMm2),
        bridgedSmallMm2: round(shell.bridgedSmallMm2),
      })),
    })),
    isClosed: sliced.isClosed,
  };
}

function bandsOf({ plan, layers }: SlicedMesh): ProfileBand[] {
  const bands: ProfileBand[] = [];
  const each = Math.ceil(layers.length / MOST_BANDS);
  for (let from = 0; from < layers.length; from += each) {
    const band = layers.slice(from, from + each);
    bands.push({
      heightMm: round(band.length * plan.layerMm),
      areaMm2: round(sum(band, ({ areaMm2 }) => areaMm2) / band.length),
      contourMm: round(sum(band, ({ contourMm }) => contourMm) / band.length),
    });
  }
  return bands;
}

function sum(layers: readonly Layer[], of: (layer: Layer) => number): number {
  return layers.reduce((total, layer) => total + of(layer), 0);
}

/** Four digits after the point: far finer than the estimate, and short in JSON. */
function round(value: number): number {
  return Math.round(value * 1e4) / 1e4;
}
