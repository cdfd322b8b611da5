/** Revisions as the workshop sees them: files, parts, comparison, gates, release. */
import { z } from 'zod';
import { clearance, variantClearance } from './clearances.js';
import {
  buildVolume,
  drawings,
  hardwareList,
  orientations,
  previewFields,
  printSpec,
  revisionState,
  sizeMm,
} from './kits.js';
import { filamentColour, id, line, moment, prose, sha256, slug } from './values.js';
import { room, voice } from './voices.js';

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
  /** Which clearance of its part a mesh is; null for other files. */
  clearance: clearance.nullable(),
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
  /** Tells a buyer which clearance fits their printer. */
  isGauge: z.boolean(),
  file: revisionFile.nullable(),
  drawings: drawings.nullable(),
  ...previewFields,
  /** The part in other clearances, tightest first; `file` is the zero. */
  variants: z.array(
    z.object({ clearance: variantClearance, file: revisionFile, drawings: drawings.nullable() }),
  ),
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
  isGauge: z.boolean().default(false),
});
export const variantBody = z.object({ fileId: id });

export const differenceKind = z.enum(['same', 're-exported', 'changed', 'new', 'dropped']);
export const reprintMark = z.enum(['reprint needed', 'reprint if it troubles you']);
/** Where a part lies in its file. */
export const boxMm = z.object({ min: sizeMm, max: sizeMm });
/** Surface against surface: how far a changed part lies from what it was, and where most. */
export const deviation = z.object({
  state: z.enum(['waiting', 'compared', 'failed']),
  largestMm: z.number().nullable(),
  /** In the coordinates of the file. */
  placeMm: sizeMm.nullable(),
  /** `before`: the place lies on the earlier shape, the present one is far from it there. */
  placeIsOn: z.enum(['before', 'after']).nullable(),
  /** How the part as a whole moved in its file; null where it has another shape. */
  movedMm: sizeMm.nullable(),
  /** Which clearance this is of, where the part comes in several. */
  clearance: clearance.nullable(),
  boxMm,
  earlierBoxMm: boxMm,
  /** A sentence for a maker: "up to 0.42 mm, at the top (12.0, 3.5, 41.0 mm)", or why nobody knows. */
  where: z.string(),
});
export type Deviation = z.output<typeof deviation>;
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
  /** Null where there are no two shapes to compare. */
  deviation: deviation.nullable(),
  mark: reprintMark.nullable(),
  reason: z.string(),
  /** Clearance by clearance, the zero too, where the part comes in several; `difference` is the strongest of them. */
  variants: z.array(z.object({ clearance, difference: differenceKind, whatDiffers: z.string() })),
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

export const gateNames = [
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
] as const;
export const gate = z.object({
  name: z.enum(gateNames),
  state: z.enum(['passed', 'open', 'waived', 'not-needed']),
  reason: z.string(),
  mayBeWaived: z.boolean(),
  /**
   * It counts while the gate says what it said when it was waived (`against`): the state is then `waived`.
   * With `open` it was written against something else, with `passed` or `not-needed` it has become needless.
   */
  waiver: z.object({ by: z.string(), at: moment, reason: z.string(), against: z.string() }).nullable(),
});
export type Gate = z.output<typeof gate>;
export const waiverBody = z.object({
  reason: z
    .string()
    .trim()
    .min(10, 'Say in at least 10 characters why it may go out like this.')
    .max(500, 'Say it in 500 characters or fewer.'),
});

export const withdrawalBody = z.object({
  reason: z
    .string()
    .trim()
    .min(10, 'Say in at least 10 characters what is wrong with it.')
    .max(500, 'Say it in 500 characters or fewer.'),
});
export const withdrawalFacts = z.object({
  /** Who last fetched it or printed of it. */
  holders: z.int(),
  /** The newest revision that then stands; null where none does, and the kit goes off sale. */
  fallsBackTo: z.string().nullable(),
});

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
  withdrawn: z.object({ at: moment, reason: z.string() }).nullable(),
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
  /** Holds every clearance. */
  bundle: z.object({ sha256, bytes: z.int() }).nullable(),
  /** One for each clearance, where parts come in several. */
  bundles: z.array(z.object({ clearance, sha256, bytes: z.int() })),
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
