import { z } from 'zod';
import { endpoint } from './endpoint.js';
import {
  buildVolume,
  drawings,
  hardwareList,
  licence,
  licenceKinds,
  orientations,
  printSpec,
  revisionState,
  sizeMm,
} from './kits.js';
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
  sha256,
  slug,
} from './values.js';
import { room, voice } from './voices.js';

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

export const measuringState = z.enum(['not-a-mesh', 'waiting', 'measuring', 'measured', 'refused']);
export const measurement = z.object({
  format: z.enum(['stl-binary', 'stl-ascii', '3mf']),
  triangles: z.int(),
  shells: z.int(),
  sizeMm,
  volumeCm3: z.number(),
  areaCm2: z.number(),
  openEdges: z.int(),
  nonManifoldEdges: z.int(),
  windingFaults: z.int(),
  degenerateTriangles: z.int(),
  isWatertight: z.boolean(),
  unitRemark: z.string().nullable(),
});
export type Measurement = z.output<typeof measurement>;

export const fileKinds = [
  'stl',
  '3mf',
  'step',
  'pdf',
  'text',
  'png',
  'jpeg',
  'webp',
  'wav',
  'mp3',
  'ogg',
  'flac',
] as const;
export const revisionFile = z.object({
  id,
  sha256,
  fileName: z.string(),
  bytes: z.int(),
  kind: z.enum(fileKinds),
  measuring: measuringState,
  measurement: measurement.nullable(),
  /** Why a mesh was refused, in a sentence that names the file and the fault. */
  fault: z.string().nullable(),
  partId: id.nullable(),
  addedAt: moment,
});
export type RevisionFile = z.output<typeof revisionFile>;

export const part = z.object({
  id,
  code: z.string(),
  name: z.string(),
  quantity: z.int(),
  orientation: z.enum(orientations),
  printSpec: printSpec.nullable(),
  voice: voice.nullable(),
  file: revisionFile.nullable(),
  drawings: drawings.nullable(),
});
export type Part = z.output<typeof part>;

export const partBody = z.object({
  code: z
    .string()
    .trim()
    .regex(/^[A-Z]{1,3}-[0-9]{1,3}[a-z]?$/, 'Write a part code as H-03.'),
  name: line.max(120),
  quantity: z.int().min(1).max(999),
  orientation: z.enum(orientations),
  printSpec: printSpec.nullable(),
  voice: voice.nullable(),
});

export const differenceKind = z.enum(['same', 're-exported', 'changed', 'new', 'dropped']);
export const reprintMark = z.enum(['reprint needed', 'reprint if it troubles you']);
export const comparisonRow = z.object({
  code: z.string(),
  name: z.string(),
  quantity: z.int(),
  difference: differenceKind,
  /** What differs, in words with numbers: "+1.50 mm height, +3.1 % volume". */
  whatDiffers: z.string(),
  sizeChangeMm: sizeMm.nullable(),
  volumeChangePercent: z.number().nullable(),
  areaChangePercent: z.number().nullable(),
  mark: reprintMark.nullable(),
  reason: z.string(),
});
export const comparison = z.object({
  with: z.object({ id, label: z.string() }).nullable(),
  rows: z.array(comparisonRow),
});
export type Comparison = z.output<typeof comparison>;
export const markBody = z.object({
  code: z.string(),
  mark: reprintMark.nullable(),
  reason: z.string().trim().max(300),
});

export const gate = z.object({
  name: z.enum([
    'parts-measured',
    'watertight',
    'fits-build-volume',
    'voices-in-tune',
    'assembly-notes',
    'change-notes',
    'changes-marked',
    'cautions',
    'licence-and-price',
    'proof-round',
  ]),
  state: z.enum(['passed', 'open', 'waived', 'not-needed']),
  reason: z.string(),
  mayBeWaived: z.boolean(),
  waiver: z.object({ by: z.string(), at: moment, reason: z.string() }).nullable(),
});
export type Gate = z.output<typeof gate>;

export const releaseProgress = z.object({
  state: z.enum(['not-started', 'waiting', 'building', 'failed', 'done']),
  percent: z.int(),
  fault: z.string().nullable(),
});

export const revisionDetail = z.object({
  id,
  kit: z.object({ id, slug, name: z.string(), colour: filamentColour }),
  label: z.string(),
  state: revisionState,
  createdAt: moment,
  releasedAt: moment.nullable(),
  assemblyNotes: z.string(),
  changeNotes: z.string(),
  cautions: z.string(),
  printSpec,
  hardware: hardwareList,
  buildVolume,
  declaredCents: z.number(),
  room,
  parts: z.array(part),
  /** Files that belong to no part: documents, pictures, sounds. */
  documents: z.array(revisionFile),
  gates: z.array(gate),
  release: releaseProgress,
  bundle: z.object({ sha256, bytes: z.int() }).nullable(),
  totalBytes: z.int(),
  limits: z.object({ fileBytes: z.int(), revisionBytes: z.int() }),
});
export type RevisionDetail = z.output<typeof revisionDetail>;

export const revisionBody = z
  .object({
    assemblyNotes: prose,
    changeNotes: prose,
    cautions: prose,
    printSpec,
    hardware: hardwareList,
    buildVolume,
    declaredCents: z.number().min(0).max(600),
    room,
  })
  .partial();

export const fileOffer = z.object({ fileName: z.string().min(1).max(300), sha256, bytes: z.int().min(0) });
export const offerAnswer = z.object({
  fileName: z.string(),
  sha256,
  answer: z.enum(['attached', 'send', 'refused']),
  detail: z.string(),
});

const inKit = idParams('kitId');
const inRevision = idParams('revisionId');

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
  'GET /workshop/revisions/:revisionId/comparison': endpoint({
    access: 'kits:read',
    summary: 'Part by part against an earlier revision',
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
  'POST /workshop/revisions/:revisionId/release': endpoint({
    access: 'revisions:release',
    summary: 'Release: gates are checked, the bundle is built and verified',
    params: inRevision,
    response: revisionDetail,
    status: 202,
  }),
};
