import type { Clearance } from '@windchest/contracts';
import { fileAt, filesOfPart, hasVariants } from '../revisions/part-files.js';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';

export interface BundledFile {
  /** Null where the part comes in one file only. */
  readonly clearance: Clearance | null;
  readonly file: FileOfRevision;
}

/**
 * What a bundle holds of a part: all its clearances, the part's own file first, or the one that is asked
 * for, else its own.
 */
export const bundledFiles = (part: PartOfRevision, wanted?: Clearance): BundledFile[] => {
  const files = filesOfPart(part);
  const known = (one: (typeof files)[number]): BundledFile => ({
    clearance: hasVariants(part) ? one.clearance : null,
    file: one.file,
  });
  if (!wanted) return files.toSorted((a, b) => order[a.clearance] - order[b.clearance]).map(known);
  const file = fileAt(part, wanted);
  return files.filter((one) => one.file === file).map(known);
};

const order: Record<Clearance, number> = { zero: 0, minus: 1, plus: 2 };
