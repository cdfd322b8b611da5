import type { Bounds, Vector3 } from './bounds.js';
import { MAX_SEEDS, largestDeviation, type Deviation } from './largest-deviation.js';
import { matchTriangles, type TriangleMatch } from './match-triangles.js';
import { measure, type Measurement } from './measure.js';
import type { Mesh } from './mesh.js';
import type { PlacedVertices } from './nearby-vertices.js';
import { SurfaceIndex } from './surface-index.js';
import { weld } from './weld.js';

/** What became of a part. Differences are after minus before. */
export interface Comparison {
  readonly kind: 'same-geometry' | 'changed';
  /** How the part as a whole moved in its file, in mm; [0, 0, 0] unless only its place differs. */
  readonly movedMm: Vector3;
  /** Farthest that one surface lies from the other, in mm (symmetric Hausdorff distance, within 1 %). */
  readonly largestDeviationMm: number;
  /** Where that is, in the coordinates of the file; null where the surfaces coincide (a triangle turned round). */
  readonly placeMm: Vector3 | null;
  /** `after`: something was added or moved out there; `before`: something that was there is gone. */
  readonly placeIsOn: 'before' | 'after' | null;
  readonly sizeChangeMm: Vector3;
  readonly volumeChangeMm3: number;
  readonly areaChangeMm2: number;
  /** Triangles without an equal one on the other side. */
  readonly changedTriangles: { readonly before: number; readonly after: number };
}

/** Noise that export and import add to a coordinate; a change begins above it. */
const NOISE_MM = 0.001;
/** Room for the rounding of the coordinates themselves to single precision. */
const SINGLE_PRECISION = 2 ** -23;

/** Whether two meshes are the same geometry but for noise under 1 µm and their place in the file. */
export function isSameGeometry(before: Mesh, after: Mesh): boolean {
  return compare(before, after).kind === 'same-geometry';
}

/**
 * Compares two meshes of a part: first triangle by triangle within 1 µm, then, for those left over, surface
 * against surface, so that another triangulation of the same shape counts as the same.
 */
export function compare(before: Mesh, after: Mesh): Comparison {
  const old = placed(before);
  const now = placed(after);
  const measured = { before: measure(before), after: measure(after) };
  const toleranceMm = toleranceOf(measured);
  const changes = changesOf(measured);

  const unmoved = matchTriangles(old, now, toleranceMm);
  if (isComplete(unmoved)) return { ...changes, ...SAME, movedMm: [0, 0, 0] };
  const movedMm = difference(middle(measured.after), middle(measured.before));
  if (changes.sizeChangeMm.every((change) => Math.abs(change) <= 2 * toleranceMm)) {
    const backMm: Vector3 = [-movedMm[0], -movedMm[1], -movedMm[2]];
    // The middle of the box carries noise of its own, which adds to that of each corner.
    if (isComplete(matchTriangles(old, now, 2 * toleranceMm, backMm)))
      return { ...changes, ...SAME, movedMm };
  }
  const farthest = farthestOf(before, after, unmoved);
  const changedTriangles = { before: unmoved.onlyBefore.length, after: unmoved.onlyAfter.length };
  // Where only a selection was looked at, nothing proves that the rest is the same.
  const isAllSeen = Math.max(changedTriangles.before, changedTriangles.after) <= MAX_SEEDS;
  if (isAllSeen && farthest.distanceMm <= toleranceMm && isWithinNoise(measured, changes, toleranceMm)) {
    return {
      ...changes,
      ...SAME,
      movedMm: [0, 0, 0],
      largestDeviationMm: farthest.distanceMm,
      changedTriangles,
    };
  }
  const isElsewhere = farthest.distanceMm > toleranceMm;
  return {
    ...changes,
    kind: 'changed',
    movedMm: [0, 0, 0],
    largestDeviationMm: farthest.distanceMm,
    placeMm: isElsewhere ? farthest.placeMm : null,
    placeIsOn: isElsewhere ? farthest.isOn : null,
    changedTriangles,
  };
}

const SAME = {
  kind: 'same-geometry',
  largestDeviationMm: 0,
  placeMm: null,
  placeIsOn: null,
  changedTriangles: { before: 0, after: 0 },
} as const;

interface MeasuredPair {
  readonly before: Measurement;
  readonly after: Measurement;
}

function changesOf({ before, after }: MeasuredPair) {
  return {
    sizeChangeMm: difference(after.sizeMm, before.sizeMm),
    volumeChangeMm3: after.volumeMm3 - before.volumeMm3,
    areaChangeMm2: after.areaMm2 - before.areaMm2,
  };
}

function farthestOf(
  before: Mesh,
  after: Mesh,
  match: TriangleMatch,
): Deviation & { isOn: 'before' | 'after' } {
  const added = largestDeviation(after.corners, match.onlyAfter, new SurfaceIndex(before.corners));
  const gone = largestDeviation(before.corners, match.onlyBefore, new SurfaceIndex(after.corners));
  if (added !== null && (gone === null || added.distanceMm >= gone.distanceMm))
    return { ...added, isOn: 'after' };
  if (gone !== null) return { ...gone, isOn: 'before' };
  return { distanceMm: 0, placeMm: [0, 0, 0], isOn: 'after' };
}

/** Moving a surface by the noise changes the volume by at most its area times the noise. */
function isWithinNoise(
  { before, after }: MeasuredPair,
  changes: ReturnType<typeof changesOf>,
  noiseMm: number,
): boolean {
  const reachMm3 = Math.max(before.areaMm2, after.areaMm2) * noiseMm;
  return (
    Math.abs(changes.volumeChangeMm3) <= reachMm3 &&
    before.shells === after.shells &&
    before.flippedTriangles === after.flippedTriangles
  );
}

function isComplete(match: TriangleMatch): boolean {
  return match.onlyBefore.length === 0 && match.onlyAfter.length === 0;
}

function toleranceOf({ before, after }: MeasuredPair): number {
  const farthest = Math.max(...[before, after].flatMap((m) => [...m.minMm, ...m.maxMm].map(Math.abs)));
  return NOISE_MM + farthest * SINGLE_PRECISION;
}

function placed(mesh: Mesh): PlacedVertices {
  return { corners: mesh.corners, welded: weld(mesh.corners) };
}

function middle({ minMm, maxMm }: Bounds): Vector3 {
  return [(minMm[0] + maxMm[0]) / 2, (minMm[1] + maxMm[1]) / 2, (minMm[2] + maxMm[2]) / 2];
}

function difference(a: Vector3, b: Vector3): Vector3 {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
}
