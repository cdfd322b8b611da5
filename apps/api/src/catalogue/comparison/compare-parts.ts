import type { Comparison } from '@windchest/contracts';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';

type Row = Comparison['rows'][number];
export type PartDifference = Pick<
  Row,
  'difference' | 'whatDiffers' | 'sizeChangeMm' | 'volumeChangePercent' | 'areaChangePercent'
>;

/** Smaller changes than these are not told in numbers; the part still counts as changed. */
const TOLD_MM = 0.005;
const TOLD_PERCENT = 0.05;

/**
 * How a part stands between two revisions, by what was measured: the bytes, then the geometry hash, then
 * box, volume and surface. One of the two may be missing, not both.
 */
export const comparePart = (before: PartOfRevision | null, after: PartOfRevision | null): PartDifference => {
  if (!before) return plain('new', 'a new part');
  if (!after) return plain('dropped', 'no longer in the kit');
  const quantity = before.quantity === after.quantity ? '' : `${before.quantity} → ${after.quantity} pieces`;
  if (!before.file || !after.file) {
    if (before.file === after.file) return plain('same', quantity);
    return plain('changed', joined(before.file ? 'its file was taken out' : 'it had no file', quantity));
  }
  if (before.file.sha256 === after.file.sha256) return plain('same', quantity);
  if (before.file.geometryHash !== null && before.file.geometryHash === after.file.geometryHash)
    return plain('re-exported', joined('the same shape, exported again', quantity));
  return changed(before.file, after.file, quantity);
};

const plain = (difference: Row['difference'], whatDiffers: string): PartDifference => ({
  difference,
  whatDiffers,
  sizeChangeMm: null,
  volumeChangePercent: null,
  areaChangePercent: null,
});

const changed = (before: FileOfRevision, after: FileOfRevision, quantity: string): PartDifference => {
  const [old, now] = [before.measured, after.measured];
  if (!old || !now) {
    const why =
      after.measuring === 'refused' ? 'the new file cannot be measured' : 'another file, not measured yet';
    return plain('changed', joined(old ? why : 'another file; the old one was not measured', quantity));
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
