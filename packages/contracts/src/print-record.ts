/** What a person has printed of a kit, and what is to print again for another revision of it. */
import { z } from 'zod';
import { clearance } from './clearances.js';
import { drawing } from './kits.js';
import { id } from './values.js';
import { differenceKind, reprintMark } from './workshop-revisions.js';

/**
 * `print`: pieces are missing or no longer do. `if-it-troubles`: better pieces are there for whom the old ones
 * trouble. `not-asked`: another shape, but the workshop asks for nothing. `fewer`: pieces are left over.
 */
export const reprintAdvice = z.enum(['print', 'if-it-troubles', 'not-asked', 'fewer', 'dropped']);
export type ReprintAdvice = z.output<typeof reprintAdvice>;

export const reprintPart = z.object({
  code: z.string(),
  name: z.string(),
  /** What the wanted revision needs of it. */
  quantity: z.int(),
  /** Which one to print; null where the part comes in one, or nothing is known of the reader's choice. */
  clearance: clearance.nullable(),
  /** Null for a part that stays as it is. */
  advice: reprintAdvice.nullable(),
  /** Pieces to print in any case. */
  print: z.int(),
  /** Pieces to print besides, if the old ones trouble. */
  optional: z.int(),
  /** Pieces that are printed and not needed any more. */
  spare: z.int(),
  /** Net, between what is printed and the wanted revision. */
  difference: differenceKind,
  whatDiffers: z.string(),
  /** The strongest of the maker's marks since what is printed. */
  mark: reprintMark.nullable(),
  /** Each step's mark and reason, newest first. */
  steps: z.array(z.object({ revision: z.string(), mark: reprintMark, reason: z.string() })),
  drawing: drawing.nullable(),
});
export type ReprintPart = z.output<typeof reprintPart>;

export const reprintList = z.object({
  from: z.object({
    /** What is known of a reader's prints: what they said part by part, the revision last fetched, or nothing. */
    basis: z.enum(['print-record', 'held', 'nothing']),
    /** Of the revisions that prints are from, newest first. */
    labels: z.array(z.string()),
  }),
  to: z.object({ id, label: z.string() }),
  /** Printed parts of one mark do not go with those of another: then all of it counts as to print. */
  breaks: z.object({ from: z.array(z.string()), to: z.string() }).nullable(),
  /** All parts of the wanted revision, then those dropped since. */
  parts: z.array(reprintPart),
});
export type ReprintList = z.output<typeof reprintList>;
