/** What a person has printed of a kit, and what is to print again for another revision of it. */
import { z } from 'zod';
import { clearance } from './clearances.js';
import { endpoint } from './endpoint.js';
import { drawing } from './kits.js';
import { printSheet } from './printers.js';
import { id, sha256, slugParams } from './values.js';
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
  /** Pieces that are printed and stay as they are. */
  done: z.int(),
  /** Pieces that are printed as they should be, and more of them than are needed. */
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

/** The list of one kit on the shelf, with what plates and hours are worked out from. */
export const reprintPlan = z.object({
  list: reprintList,
  /** The parts that are on the list, in the clearance of their reader and in the pieces of the whole kit. */
  sheet: printSheet,
});
export type ReprintPlan = z.output<typeof reprintPlan>;

/** How far a build of one revision is. */
export const printRecord = z.object({
  revision: z.object({ id, label: z.string() }),
  /** Whether anything was said of this kit: until then the revision held counts as printed. */
  isKept: z.boolean(),
  parts: z.array(
    z.object({
      code: z.string(),
      name: z.string(),
      clearance: clearance.nullable(),
      quantity: z.int(),
      printed: z.int(),
      drawing: drawing.nullable(),
    }),
  ),
});
export type PrintRecordView = z.output<typeof printRecord>;

export const printedBody = z.object({
  revisionId: id,
  code: z.string().min(1).max(10),
  /** Pieces that are there now; none takes the word back. */
  quantity: z.int().min(0).max(999),
});

/** A bundle of what is to print alone: made when it is asked for. */
export const changedParts = z.object({
  revisionId: id,
  /** How many parts it holds; none where there is nothing to print. */
  parts: z.int(),
  state: z.enum(['not-asked', 'waiting', 'building', 'ready', 'failed']),
  percent: z.int(),
  fault: z.string().nullable(),
  /** To be fetched with a grant that names its hash. */
  file: z.object({ sha256, bytes: z.int() }).nullable(),
});
export type ChangedPartsView = z.output<typeof changedParts>;

const revisionQuery = z.object({ revision: id.optional() });

export const printRecordEndpoints = {
  'GET /shelf/:slug/reprint': endpoint({
    access: 'signed-in',
    summary:
      'What to print for another revision, the newest unless one is named; with what plates are laid out from',
    params: slugParams,
    query: revisionQuery,
    response: reprintPlan,
  }),
  'GET /shelf/:slug/printed': endpoint({
    access: 'signed-in',
    summary: 'What one has printed of a revision, part by part; of the one held unless one is named',
    params: slugParams,
    query: revisionQuery,
    response: printRecord,
  }),
  'PUT /shelf/:slug/printed': endpoint({
    access: 'signed-in',
    summary: 'Say how many pieces of a part one has printed, as a revision has it',
    params: slugParams,
    body: printedBody,
    response: printRecord,
  }),
  'GET /shelf/:slug/changed-parts': endpoint({
    access: 'signed-in',
    summary: 'How far the bundle of one’s changed parts for a revision is',
    params: slugParams,
    query: revisionQuery,
    response: changedParts,
  }),
  'POST /shelf/:slug/changed-parts': endpoint({
    access: 'signed-in',
    summary:
      'Have the bundle of one’s changed parts made; it is fetched by POST /shelf/grants, its hash as the file',
    params: slugParams,
    body: z.object({ revisionId: id.optional() }),
    response: changedParts,
    status: 202,
  }),
  'DELETE /shelf/:slug/printed': endpoint({
    access: 'signed-in',
    summary: 'Forget all that was said of a kit; the revision held then counts as printed',
    params: slugParams,
    response: null,
    status: 204,
  }),
};
