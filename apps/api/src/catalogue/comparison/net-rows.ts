import type { Clearance } from '@windchest/contracts';
import { tellingDrawing, type Drawing } from '../files/measured-mesh.js';
import { fileAt, filesOfPart, hasVariants } from '../revisions/part-files.js';
import type { ReprintMark } from '../revisions/part.model.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import type { PartDifference } from './compare-parts.js';
import { asPrinted, compareVariants } from './compare-variants.js';
import type { Knowledge } from './mesh-comparisons.js';

/** What the maker said of a part when they changed it. */
export interface MarkedStep {
  readonly code: string;
  readonly revision: string;
  readonly mark: ReprintMark;
  readonly reason: string;
}

/** How a part stands between two revisions, whatever happened to it on the way. */
export interface NetRow {
  readonly code: string;
  readonly name: string;
  /** In the later revision; 0 where it is dropped. */
  readonly quantity: number;
  /** In the earlier one; 0 where it is new. */
  readonly quantityBefore: number;
  /** Which one is compared; null where the part comes in one, or in whichever the reader will choose. */
  readonly clearance: Clearance | null;
  readonly isGauge: boolean;
  readonly difference: PartDifference['difference'];
  /** Of the shape; quantities are told by those who know how many are printed. */
  readonly whatDiffers: string;
  /** Newest first; none where the part came out as it was. */
  readonly steps: readonly Omit<MarkedStep, 'code'>[];
  /** Of the later revision, by clearance; the zero for a part that comes in one. */
  readonly hashes: Readonly<Partial<Record<Clearance, string | null>>>;
  readonly drawing: Drawing | null;
}

export interface NetQuestion {
  /** Of the earlier revision; null where there is none. */
  readonly before: readonly PartOfRevision[] | null;
  readonly after: readonly PartOfRevision[];
  /** Of the revisions between, newest first. */
  readonly steps: readonly MarkedStep[];
  readonly clearance: Clearance | null;
  readonly known: Knowledge;
}

/** Parts of the later revision, then those it dropped. A part changed and changed back comes out as the same. */
export const netRows = ({ before, after, steps, clearance, known }: NetQuestion): NetRow[] => {
  const old = new Map((before ?? []).map((part) => [part.code, part]));
  const rowOf = (earlier: PartOfRevision | null, whole: PartOfRevision | null): NetRow => {
    const part = (whole ?? earlier)!;
    const now = asPrinted(whole, clearance);
    const then = earlier && whole ? { ...earlier, quantity: whole.quantity } : earlier;
    const { difference, whatDiffers } = compareVariants(asPrinted(then, clearance), now, known);
    return {
      code: part.code,
      name: part.name,
      quantity: whole?.quantity ?? 0,
      quantityBefore: earlier?.quantity ?? 0,
      clearance: whole && hasVariants(whole) ? clearance : null,
      isGauge: part.isGauge,
      difference,
      whatDiffers,
      steps:
        difference === 'changed'
          ? steps
              .filter(({ code }) => code === part.code)
              .map(({ revision, mark, reason }) => ({ revision, mark, reason }))
          : [],
      hashes: whole
        ? Object.fromEntries(filesOfPart(whole).map((one) => [one.clearance, one.file.geometryHash]))
        : {},
      drawing: tellingDrawing((whole && fileAt(whole, clearance ?? 'zero'))?.drawings ?? null),
    };
  };
  const codes = new Set(after.map(({ code }) => code));
  return [
    ...after.map((part) => rowOf(old.get(part.code) ?? null, part)),
    ...[...old.values()].filter(({ code }) => !codes.has(code)).map((part) => rowOf(part, null)),
  ];
};
