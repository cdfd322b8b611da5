import { clearances, clearanceSigns, type Clearance } from '@windchest/contracts';
import type { FileOfRevision, PartOfRevision } from './revision-contents.js';

export interface PartFile {
  readonly clearance: Clearance;
  readonly file: FileOfRevision;
}

/** All files of a part, tightest first. */
export const filesOfPart = ({ file, variants }: Pick<PartOfRevision, 'file' | 'variants'>): PartFile[] => [
  ...variants.filter((one) => one.clearance === 'minus'),
  ...(file ? [{ clearance: 'zero' as const, file }] : []),
  ...variants.filter((one) => one.clearance === 'plus'),
];

/** The file somebody prints who prints in a clearance; a part that does not come in it has its own file only. */
export const fileAt = <File>(
  part: { readonly file: File | null; readonly variants: readonly { clearance: Clearance; file: File }[] },
  clearance: Clearance,
): File | null => part.variants.find((one) => one.clearance === clearance)?.file ?? part.file;

export const hasVariants = ({ variants }: Pick<PartOfRevision, 'variants'>): boolean => variants.length > 0;

/** The clearances a revision comes in, tightest first; none where each part has one file. */
export const clearancesOf = (parts: readonly PartOfRevision[]): Clearance[] => {
  const found = new Set(
    parts
      .filter(hasVariants)
      .flatMap(filesOfPart)
      .map((one) => one.clearance),
  );
  return clearances.filter((one) => found.has(one));
};

/** Every mesh of a revision as a part of its own, called `J-01`, or `J-01 +` where it is one of several. */
export const eachMesh = (parts: readonly PartOfRevision[]): PartOfRevision[] =>
  parts.flatMap((part) => [
    ...(part.file ? [] : [part]),
    ...filesOfPart(part).map(({ clearance, file }) => ({
      ...part,
      code: clearance === 'zero' ? part.code : `${part.code} ${clearanceSigns[clearance]}`,
      file,
    })),
  ]);
