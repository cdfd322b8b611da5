import { z } from 'zod';
import { variantClearance } from './clearances.js';
import { endpoint } from './endpoint.js';
import { licence, licenceKinds, previewQuery, revisionState } from './kits.js';
import {
  filamentColour,
  id,
  idParams,
  line,
  minor,
  moment,
  money,
  pageOf,
  pageQuery,
  prose,
  slug,
} from './values.js';
import {
  revisionFile,
  part,
  partBody,
  comparison,
  markBody,
  revisionDetail,
  revisionBody,
  fileOffer,
  offerAnswer,
  gateNames,
  waiverBody,
  withdrawalBody,
  withdrawalFacts,
  variantBody,
} from './workshop-revisions.js';

export const revisionSummary = z.object({
  id,
  label: z.string(),
  state: revisionState,
  createdAt: moment,
  releasedAt: moment.nullable(),
  partCount: z.int(),
  bundleBytes: z.int().nullable(),
});

export const workshopKitRow = z.object({
  id,
  slug,
  name: z.string(),
  colour: filamentColour,
  isListed: z.boolean(),
  newest: z.string().nullable(),
  draft: z.string().nullable(),
  price: money.nullable(),
  updatedAt: moment,
});

export const workshopLicence = licence.extend({ isOffered: z.boolean() });

export const workshopKit = z.object({
  id,
  slug,
  name: z.string(),
  tagline: z.string(),
  description: z.string(),
  colour: filamentColour,
  isListed: z.boolean(),
  licences: z.array(workshopLicence),
  revisions: z.array(revisionSummary),
});
export type WorkshopKit = z.output<typeof workshopKit>;

export const kitBody = z.object({
  name: line.max(60),
  slug,
  tagline: z.string().trim().max(200),
  description: prose,
  colour: filamentColour,
});
export const licenceBody = z.object({
  kind: z.enum(licenceKinds),
  name: line.max(120),
  terms: prose.min(1, 'Say what the licence allows.'),
  priceMinor: minor,
  yearlyLimit: z.int().min(1).max(1_000_000).nullable(),
  isOffered: z.boolean().default(true),
});

const inKit = idParams('kitId');
const inRevision = idParams('revisionId');
const atGate = inRevision.extend({ gate: z.enum(gateNames) });
const ofVariant = idParams('revisionId', 'partId').extend({ clearance: variantClearance });

export const workshopKitEndpoints = {
  'GET /workshop/kits': endpoint({
    access: 'kits:read',
    summary: 'All kits of the workshop',
    query: pageQuery,
    response: pageOf(workshopKitRow),
  }),
  'POST /workshop/kits': endpoint({
    access: 'kits:write',
    summary: 'Draft a kit',
    body: kitBody,
    response: workshopKit,
    status: 201,
  }),
  'GET /workshop/kits/:kitId': endpoint({
    access: 'kits:read',
    summary: 'One kit with its licences and revisions',
    params: inKit,
    response: workshopKit,
  }),
  'PATCH /workshop/kits/:kitId': endpoint({
    access: 'kits:write',
    summary: 'Change a kit’s words and colour, list or hide it',
    params: inKit,
    body: kitBody.extend({ isListed: z.boolean() }).partial(),
    response: workshopKit,
  }),
  'POST /workshop/kits/:kitId/licences': endpoint({
    access: 'prices:write',
    summary: 'Offer a licence with its price',
    params: inKit,
    body: licenceBody,
    response: workshopKit,
    status: 201,
  }),
  'PUT /workshop/kits/:kitId/licences/:licenceId': endpoint({
    access: 'prices:write',
    summary: 'Change a licence or its price',
    params: idParams('kitId', 'licenceId'),
    body: licenceBody,
    response: workshopKit,
  }),
  'POST /workshop/kits/:kitId/revisions': endpoint({
    access: 'revisions:write',
    summary: 'Start a revision; parts, files and notes of the last one are carried over',
    params: inKit,
    body: z.object({ step: z.enum(['issue', 'mark']), from: id.optional() }),
    response: revisionDetail,
    status: 201,
  }),
  'GET /workshop/revisions/:revisionId': endpoint({
    access: 'kits:read',
    summary: 'One revision in full',
    params: inRevision,
    response: revisionDetail,
  }),
  'PATCH /workshop/revisions/:revisionId': endpoint({
    access: 'revisions:write',
    summary: 'Change notes and specification of a draft',
    params: inRevision,
    body: revisionBody,
    response: revisionDetail,
  }),
  'DELETE /workshop/revisions/:revisionId': endpoint({
    access: 'revisions:write',
    summary: 'Throw a draft away',
    params: inRevision,
    response: null,
    status: 204,
  }),
  'POST /workshop/revisions/:revisionId/offers': endpoint({
    access: 'revisions:write',
    summary: 'Offer files by hash; what is stored already is attached at once, the rest is to be sent',
    params: inRevision,
    body: z.object({ files: z.array(fileOffer).min(1).max(500) }),
    response: z.array(offerAnswer),
  }),
  'POST /workshop/revisions/:revisionId/files': endpoint({
    access: 'revisions:write',
    summary: 'Send one file (multipart field `file`), streamed and hashed',
    params: inRevision,
    response: revisionFile,
    status: 201,
  }),
  'DELETE /workshop/revisions/:revisionId/files/:fileId': endpoint({
    access: 'revisions:write',
    summary: 'Take a file out of a draft',
    params: idParams('revisionId', 'fileId'),
    response: null,
    status: 204,
  }),
  'PUT /workshop/revisions/:revisionId/parts/:partId': endpoint({
    access: 'revisions:write',
    summary: 'Change a part of a draft',
    params: idParams('revisionId', 'partId'),
    body: partBody,
    response: part,
  }),
  'DELETE /workshop/revisions/:revisionId/parts/:partId': endpoint({
    access: 'revisions:write',
    summary: 'Drop a part from a draft',
    params: idParams('revisionId', 'partId'),
    response: null,
    status: 204,
  }),
  'GET /workshop/revisions/:revisionId/parts/:partId/preview': endpoint({
    access: 'kits:read',
    summary: 'A part of any revision as a coarse model to turn about (GLB)',
    params: idParams('revisionId', 'partId'),
    query: previewQuery,
    response: 'stream',
  }),
  'PUT /workshop/revisions/:revisionId/parts/:partId/variants/:clearance': endpoint({
    access: 'revisions:write',
    summary: 'Give a part of a draft another clearance: a mesh of the draft becomes its file',
    params: ofVariant,
    body: variantBody,
    response: part,
  }),
  'DELETE /workshop/revisions/:revisionId/parts/:partId/variants/:clearance': endpoint({
    access: 'revisions:write',
    summary: 'Take a clearance of a part, with its file, out of a draft',
    params: ofVariant,
    response: part,
  }),
  'GET /workshop/revisions/:revisionId/comparison': endpoint({
    access: 'kits:read',
    summary: 'Part by part against an earlier revision; shapes not compared yet are compared next',
    params: inRevision,
    query: z.object({ with: id.optional() }),
    response: comparison,
  }),
  'PUT /workshop/revisions/:revisionId/marks': endpoint({
    access: 'revisions:write',
    summary: 'Say what buyers should do about a changed part',
    params: inRevision,
    body: markBody,
    response: comparison,
  }),
  'PUT /workshop/revisions/:revisionId/waivers/:gate': endpoint({
    access: 'revisions:release',
    summary: 'Waive an open gate of a draft, with a reason',
    params: atGate,
    body: waiverBody,
    response: revisionDetail,
  }),
  'DELETE /workshop/revisions/:revisionId/waivers/:gate': endpoint({
    access: 'revisions:release',
    summary: 'Take a waiver back',
    params: atGate,
    response: revisionDetail,
  }),
  'POST /workshop/revisions/:revisionId/release': endpoint({
    access: 'revisions:release',
    summary: 'Release: gates are checked, the bundle is built and verified',
    params: inRevision,
    response: revisionDetail,
    status: 202,
  }),
  'GET /workshop/revisions/:revisionId/withdrawal': endpoint({
    access: 'revisions:release',
    summary: 'Whom withdrawing a revision concerns, and what the shop falls back to',
    params: inRevision,
    response: withdrawalFacts,
  }),
  'POST /workshop/revisions/:revisionId/withdrawal': endpoint({
    access: 'revisions:release',
    summary: 'Withdraw a released revision: nobody gets it any more, and whoever holds it is told why',
    params: inRevision,
    body: withdrawalBody,
    response: revisionDetail,
  }),
};
