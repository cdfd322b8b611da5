import { clearances, type Clearance, type Comparison } from '@windchest/contracts';
import { fileAt } from '../revisions/part-files.js';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';
import { deviationOf } from './deviation.js';
import type { KnownComparison, MeshPair } from './mesh-comparisons.js';

type Row = Comparison['rows'][number];
export type PartDifference = Pick<
  Row,
  'difference' | 'whatDiffers' | 'sizeChangeMm' | 'volumeChangePercent' | 'areaChangePercent' | 'deviation'
>;

/** Smaller changes than these are not told in numbers; the part still counts as changed. */
const TOLD_MM = 0.005;
const TOLD_PERCENT = 0.05;

/** As much of a part's files as tells whether their meshes are to be compared. */
type MeshOfPart = Pick<FileOfRevision, 'sha256' | 'geometryHash'> & { readonly measured: unknown };
export interface PartMeshes {
  readonly file: MeshOfPart | null;
  readonly variants: readonly { readonly clearance: Clearance; readonly file: MeshOfPart }[];
}

/** The meshes to be compared surface against surface: measured both, of unequal geometry hash. */
export const meshPairOf = (
  before: Pick<PartMeshes, 'file'> | null,
  after: Pick<PartMeshes, 'file'> | null,
): MeshPair | null => {
  const [old, now] = [before?.file, after?.file];
  if (!old?.measured || !now?.measured || old.sha256 === now.sha256 || isSameHash(old, now)) return null;
  return { beforeSha: old.sha256, afterSha: now.sha256 };
};

/** All pairs of a part, clearance by clearance. */
export const meshPairsOf = (before: PartMeshes | null, after: PartMeshes | null): MeshPair[] => {
  if (!before || !after) return [];
  const pairs = clearances.map((clearance) =>
    meshPairOf({ file: fileAt(before, clearance) }, { file: fileAt(after, clearance) }),
  );
  const byName = new Map(
    pairs.flatMap((pair) => (pair ? [[`${pair.beforeSha} ${pair.afterSha}`, pair]] : [])),
  );
  return [...byName.values()];
};

/**
 * How a part stands between two revisions: by the bytes, then the geometry hash, then by what is known of the
 * two meshes; box, volume and surface say how much. One of the two parts may be missing, not both.
 */
export const comparePart = (
  before: PartOfRevision | null,
  after: PartOfRevision | null,
  known: KnownComparison = { state: 'waiting' },
): PartDifference => {
  if (!before) return plain('new', 'a new part');
  if (!after) return plain('dropped', 'no longer in the kit');
  const quantity = before.quantity === after.quantity ? '' : `${before.quantity} → ${after.quantity} pieces`;
  if (!before.file || !after.file) {
    if (before.file === after.file) return plain('same', quantity);
    return plain('changed', joined(before.file ? 'its file was taken out' : 'it had no file', quantity));
  }
  if (before.file.sha256 === after.file.sha256) return plain('same', quantity);
  if (isSameHash(before.file, after.file))
    return plain('re-exported', joined('the same shape, exported again', quantity));
  return changed(before.file, after.file, quantity, known);
};

const isSameHash = (before: MeshOfPart, after: MeshOfPart): boolean =>
  before.geometryHash !== null && before.geometryHash === after.geometryHash;

const plain = (difference: Row['difference'], whatDiffers: string): PartDifference => ({
  difference,
  whatDiffers,
  sizeChangeMm: null,
  volumeChangePercent: null,
  areaChangePercent: null,
  deviation: null,
});

const changed = (
  before: FileOfRevision,
  after: FileOfRevision,
  quantity: string,
  known: KnownComparison,
): PartDifference => {
  const [old, now] = [before.measured, after.measured];
  if (!old || !now) {
    const why =
      after.measuring === 'refused' ? 'the new file cannot be measured' : 'another file, not measured yet';
    return plain('changed', joined(old ? why : 'another file; the old one was not measured', quantity));
  }
  const deviation = deviationOf(known, old, now);
  if (known.state === 'compared' && known.result.kind === 'same-geometry') {
    const moved = deviation.where.startsWith('moved') ? deviation.where : '';
    return {
      ...plain('re-exported', joined('the same shape, exported again', moved, quantity)),
      deviation,
    };
  }
  const [x, y, z] = [0, 1, 2].map((axis) => now.sizeMm[axis]! - old.sizeMm[axis]!) as [
    number,
    number,
    number,
  ];
  const volume = percentChange(old.volumeMm3, now.volumeMm3);
  const area = percentChange(old.areaMm2, now.areaMm2);
  const words = [
    inMm(x, 'width'),
    inMm(y, 'depth'),
    inMm(z, 'height'),
    inPercent(volume, 'volume'),
    inPercent(area, 'surface'),
  ].filter((word) => word !== '');
  return {
    difference: 'changed',
    whatDiffers: joined(
      words.length > 0 ? words.join(', ') : 'the shape differs, box, volume and surface stay as they were',
      quantity,
    ),
    sizeChangeMm: { x, y, z },
    volumeChangePercent: volume,
    areaChangePercent: area,
    deviation,
  };
};

/** Null where there was nothing to change from. */
const percentChange = (before: number, after: number): number | null =>
  before > 0 ? ((after - before) / before) * 100 : null;

const inMm = (change: number, what: string): string =>
  Math.abs(change) < TOLD_MM ? '' : `${signed(change, 2)} mm ${what}`;
const inPercent = (change: number | null, what: string): string =>
  change === null || Math.abs(change) < TOLD_PERCENT ? '' : `${signed(change, 1)} % ${what}`;
const signed = (value: number, digits: number): string =>
  `${value < 0 ? '−' : '+'}${Math.abs(value).toFixed(digits)}`;
const joined = (...words: string[]): string => words.filter((word) => word !== '').join(', ');
