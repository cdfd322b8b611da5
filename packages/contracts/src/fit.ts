/** What buyers say about how a part fits, and what the workshop makes of it. */
import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { filamentColour, id, idParams, moment, pageOf, pageQuery, slug, slugParams } from './values.js';

/** From tight to loose, in five steps. */
export const fitVerdicts = ['far-too-tight', 'tight', 'right', 'loose', 'far-too-loose'] as const;
export const fitVerdict = z.enum(fitVerdicts);
export type FitVerdict = z.output<typeof fitVerdict>;

export const fitStates = ['new', 'answered', 'planned', 'fixed', 'closed'] as const;
export const fitState = z.enum(fitStates);
export type FitState = z.output<typeof fitState>;

export const fitReportBody = z.object({
  revisionId: id,
  partCode: z.string().min(1).max(10),
  /** Of a part that comes in several: the one that was printed. */
  clearance: z.enum(['minus', 'zero', 'plus']).nullable(),
  printerName: z.string().trim().max(80),
  material: z.string().trim().min(1, 'Say what it is printed in.').max(40),
  nozzleMm: z.number().min(0.1).max(2),
  layerMm: z.number().min(0.04).max(1.2),
  verdict: fitVerdict,
  /** Measured across the part: how much too tight (minus) or too loose (plus) it is. */
  gapMm: z.number().min(-5).max(5).nullable(),
  words: z.string().trim().max(2000),
});

export const fitAnswer = z.object({ at: moment, by: z.string(), text: z.string() });
export const fitReport = z.object({
  id,
  kit: z.object({ id, slug, name: z.string(), colour: filamentColour }),
  revision: z.string(),
  partCode: z.string(),
  partName: z.string(),
  clearance: z.enum(['minus', 'zero', 'plus']).nullable(),
  printerName: z.string(),
  material: z.string(),
  nozzleMm: z.number(),
  layerMm: z.number(),
  verdict: fitVerdict,
  gapMm: z.number().nullable(),
  words: z.string(),
  hasPicture: z.boolean(),
  state: fitState,
  /** The revision that mends it, also one that is not out yet. */
  fixedIn: z.object({ label: z.string(), isReleased: z.boolean() }).nullable(),
  createdAt: moment,
  answers: z.array(fitAnswer),
});
export type FitReport = z.output<typeof fitReport>;

/** Whose word it is, for the workshop. */
export const workshopFitReport = fitReport.extend({
  reporter: z.object({ name: z.string(), email: z.string() }),
  revisionId: id,
  fixedInId: id.nullable(),
  /** Revisions of the kit that may mend it: newer ones, drafts too. */
  mayFixIn: z.array(z.object({ id, label: z.string(), isReleased: z.boolean() })),
});
export type WorkshopFitReport = z.output<typeof workshopFitReport>;

export const fitCell = z.object({
  count: z.int(),
  /** How many of them were measured; the others were taken from words. */
  measured: z.int(),
  /** Too tight is minus, too loose plus, across the part. */
  medianMm: z.number(),
  /** First and third quartile. */
  quartilesMm: z.tuple([z.number(), z.number()]),
  /** Where the median of all printers lies, as far as these reports can tell; null for too few of them. */
  intervalMm: z.tuple([z.number(), z.number()]).nullable(),
  /** What to add to each side (plus) or take off it (minus). */
  changePerSideMm: z.number(),
  certainty: z.enum(['sure', 'likely', 'unsure']),
});
export type FitCell = z.output<typeof fitCell>;

export const fitMatrix = z.object({
  materials: z.array(z.string()),
  rows: z.array(
    z.object({
      partCode: z.string(),
      partName: z.string(),
      all: fitCell,
      cells: z.record(z.string(), fitCell),
    }),
  ),
});
export type FitMatrix = z.output<typeof fitMatrix>;

const inReport = idParams('reportId');
const fitQuery = pageQuery.extend({
  kitId: id.optional(),
  state: fitState.optional(),
  part: z.string().max(10).optional(),
  material: z.string().max(40).optional(),
});

export const fitEndpoints = {
  'GET /shelf/:slug/fit-reports': endpoint({
    access: 'signed-in',
    summary: 'One’s own reports about a kit, newest first',
    params: slugParams,
    query: pageQuery,
    response: pageOf(fitReport),
  }),
  'POST /shelf/:slug/fit-reports': endpoint({
    access: 'signed-in',
    summary: 'Say how a part of one’s kit fits',
    params: slugParams,
    body: fitReportBody,
    response: fitReport,
    status: 201,
  }),
  'POST /fit-reports/:reportId/picture': endpoint({
    access: 'signed-in',
    summary: 'Add a picture to one’s own report (multipart field `picture`)',
    params: inReport,
    response: fitReport,
    status: 201,
  }),
  'GET /fit-reports/:reportId/picture': endpoint({
    access: 'signed-in',
    summary: 'The picture of a report, for its reporter and the workshop',
    params: inReport,
    response: 'stream',
  }),
  'GET /workshop/fit-reports': endpoint({
    access: 'fit:read',
    summary: 'Reports, filtered and paged, newest first',
    query: fitQuery,
    response: pageOf(workshopFitReport.omit({ mayFixIn: true })),
  }),
  'GET /workshop/fit-reports.csv': endpoint({
    access: 'fit:read',
    summary: 'The same reports as CSV',
    query: fitQuery,
    response: 'stream',
  }),
  'GET /workshop/fit-reports/:reportId': endpoint({
    access: 'fit:read',
    summary: 'One report',
    params: inReport,
    response: workshopFitReport,
  }),
  'POST /workshop/fit-reports/:reportId/answers': endpoint({
    access: 'fit:answer',
    summary: 'Answer a report; the reporter gets it by e-mail',
    params: inReport,
    body: z.object({ text: z.string().trim().min(1, 'Write an answer.').max(4000) }),
    response: workshopFitReport,
    status: 201,
  }),
  'POST /workshop/fit-fixes': endpoint({
    access: 'fit:answer',
    summary: 'Name the revision that mends reports; their reporters hear of it when it is out',
    body: z.object({ reportIds: z.array(id).min(1).max(200), revisionId: id }),
    response: z.object({ count: z.int() }),
  }),
  'POST /workshop/fit-reports/:reportId/closing': endpoint({
    access: 'fit:answer',
    summary: 'Close a report that needs no change',
    params: inReport,
    response: workshopFitReport,
  }),
  'GET /workshop/kits/:kitId/fit-matrix': endpoint({
    access: 'fit:read',
    summary: 'Part by material: count, median, spread, and the change they suggest',
    params: idParams('kitId'),
    query: z.object({ revisionId: id.optional() }),
    response: fitMatrix,
  }),
};
