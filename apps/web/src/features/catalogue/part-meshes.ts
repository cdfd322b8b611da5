import type { Clearance, Part, RevisionFile, VariantClearance } from '@windchest/contracts';

export interface PartMesh {
  clearance: Clearance;
  file: RevisionFile;
}

/** All files of a part, tightest first; its own file is the zero. */
export const meshesOf = ({ file, variants }: Part): PartMesh[] => [
  ...variants.filter((one) => one.clearance === 'minus'),
  ...(file ? [{ clearance: 'zero' as const, file }] : []),
  ...variants.filter((one) => one.clearance === 'plus'),
];

/** File and drawings of a part in one clearance; its own where it has no such, or none is told. */
export const partIn = (
  part: Part | null | undefined,
  clearance: Clearance | null | undefined,
): Pick<Part, 'file' | 'drawings'> | undefined =>
  part?.variants.find((one) => one.clearance === clearance) ?? part ?? undefined;

export const filesOfParts = (parts: readonly Part[]): RevisionFile[] =>
  parts.flatMap((part) => meshesOf(part).map((mesh) => mesh.file));

/** Under this name the workshop takes a mesh for that clearance of the part: `J-01 Locking tongue (plus).stl`. */
export const variantFileName = (
  { code, name }: Pick<Part, 'code' | 'name'>,
  clearance: VariantClearance,
  chosen: string,
): string => {
  const ending = /\.[A-Za-z0-9]{1,8}$/.exec(chosen)?.[0] ?? '';
  // A part may be called what a file may not be.
  const words = name
    .replace(/[<>:"|?*\\/()]/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();
  return [code, ...(words === code ? [] : [words]), `(${clearance})`].join(' ') + ending;
};

/** Meshes that may become a variant of a part: those that are other parts, and have no clearances of their own. */
export const meshesToTake = (part: Part, parts: readonly Part[]): { file: RevisionFile; code: string }[] =>
  parts.flatMap(({ id, code, file, variants }) =>
    id !== part.id && file && variants.length === 0 ? [{ file, code }] : [],
  );
