import type { Deviation } from '@windchest/contracts';
import type { MeasuredMesh } from '../files/measured-mesh.js';
import type { KnownComparison } from './mesh-comparisons.js';
import { whereItDiffers } from './where-it-differs.js';

type Point = readonly [number, number, number];

/** What is told of two measured meshes of a part that were compared, or wait for it. */
export const deviationOf = (known: KnownComparison, before: MeasuredMesh, after: MeasuredMesh): Deviation => {
  const unknown = {
    state: known.state,
    largestMm: null,
    placeMm: null,
    placeIsOn: null,
    movedMm: null,
    clearance: null,
    boxMm: boxOf(after),
    earlierBoxMm: boxOf(before),
  };
  if (known.state === 'waiting') return { ...unknown, where: 'the two shapes are being compared' };
  if (known.state === 'failed') return { ...unknown, where: `where it differs is not known: ${known.fault}` };
  const { kind, largestDeviationMm, placeMm, placeIsOn, movedMm } = known.result;
  return {
    ...unknown,
    largestMm: largestDeviationMm,
    placeMm: placeMm && toPoint(placeMm),
    placeIsOn,
    movedMm: kind === 'same-geometry' ? toPoint(movedMm) : null,
    where: whereItDiffers(known.result, { before, after }),
  };
};

const boxOf = ({ minMm, maxMm }: MeasuredMesh): Deviation['boxMm'] => ({
  min: toPoint(minMm),
  max: toPoint(maxMm),
});

const toPoint = ([x, y, z]: Point): Deviation['boxMm']['min'] => ({ x, y, z });
