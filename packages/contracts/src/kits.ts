import { z } from 'zod';
import { clearance } from './clearances.js';
import { endpoint } from './endpoint.js';
import { filamentColour, id, moment, money, pageOf, pageQuery, sha256, slug, slugParams } from './values.js';
import { rankVoice, room } from './voices.js';

export const licenceKinds = ['personal', 'small-run', 'classroom'] as const;
export const orientations = ['as-exported', 'may-turn', 'may-lie'] as const;
export const sizeMm = z.object({ x: z.number(), y: z.number(), z: z.number() });
export const buildVolume = z.object({
  xMm: z.number().positive().max(2000),
  yMm: z.number().positive().max(2000),
  zMm: z.number().positive().max(3000),
});

/** What the maker prints with; a part may carry its own where it differs. */
export const printSpec = z.object({
  nozzleMm: z.number().min(0.1).max(2),
  layerMm: z.number().min(0.04).max(1.2),
  perimeters: z.int().min(1).max(20),
  topLayers: z.int().min(0).max(50),
  bottomLayers: z.int().min(0).max(50),
  infill: z.number().min(0).max(1),
  material: z.string().trim().min(1).max(40),
  supports: z.enum(['none', 'where-told', 'everywhere']).default('none'),
  remarks: z.string().max(2000).default(''),
});
export type PrintSpecification = z.output<typeof printSpec>;

export const hardwareItem = z.object({
  quantity: z.number().positive().max(10_000),
  unit: z.string().trim().max(20).default(''),
  name: z.string().trim().min(1).max(120),
  remark: z.string().trim().max(300).default(''),
});
export const hardwareList = z.array(hardwareItem).max(200);
export type HardwareItem = z.output<typeof hardwareItem>;

/**
 * A drawing made from a mesh: SVG paths in mm. `path` is the silhouette with its holes (fill it even-odd,
 * stroke it), `edges` what is seen inside it (stroke only).
 */
export const drawing = z.object({
  path: z.string(),
  edges: z.string().default(''),
  widthMm: z.number(),
  heightMm: z.number(),
  viewBox: z.string(),
});
export const drawings = z.object({ front: drawing, side: drawing, top: drawing });

/**
 * A coarse likeness of a part to turn about, never the printable mesh: how large it is, and the hash that its
 * address may name so that browsers keep it. Null where there is none.
 */
export const previewFields = { previewBytes: z.int().nullable(), previewSha256: sha256.nullable() };
/** With the preview's hash in `v` the answer may be kept for good. */
export const previewQuery = z.object({ v: sha256.optional() });

export const licence = z.object({
  id,
  kind: z.enum(licenceKinds),
  name: z.string(),
  terms: z.string(),
  price: money,
  yearlyLimit: z.int().nullable(),
});
export type Licence = z.output<typeof licence>;

/** A coupon the shop announces on the kit's page; `left` is null where nobody counts. */
export const launchOffer = z.object({
  kitSlug: slug,
  licenceId: id,
  code: z.string(),
  label: z.string(),
  price: money,
  cap: z.int().nullable(),
  left: z.int().nullable(),
  endsAt: moment.nullable(),
});

export const revisionState = z.enum(['draft', 'proving', 'released', 'withdrawn']);
export const printEstimate = z.object({
  plates: z.int(),
  massG: z.number(),
  lengthM: z.number(),
  hoursLow: z.number(),
  hoursHigh: z.number(),
  bed: buildVolume,
});

export const kitCard = z.object({
  slug,
  name: z.string(),
  tagline: z.string(),
  colour: filamentColour,
  revision: z.string(),
  releasedAt: moment,
  compass: z.string(),
  rank: z.array(rankVoice),
  /** Height of the tallest part as it stands on the bed. */
  tallestPartMm: z.number(),
  /** The longest side of any part. */
  longestPartMm: z.number(),
  partCount: z.int(),
  printEstimate: printEstimate.nullable(),
  /** Of the licence for one's own prints, or the cheapest offered. */
  price: money,
});
export type KitCard = z.output<typeof kitCard>;

export const kitPage = kitCard.extend({
  id,
  description: z.string(),
  licences: z.array(licence),
  bundleBytes: z.int(),
  declaredCents: z.number(),
  room,
  buildVolume,
  printSpec,
  hardware: hardwareList,
  cautions: z.string(),
  revisions: z.array(z.object({ label: z.string(), releasedAt: moment, changeNotes: z.string() })),
});
export type KitPage = z.output<typeof kitPage>;

export const kitPart = z.object({
  code: z.string(),
  name: z.string(),
  quantity: z.int(),
  orientation: z.enum(orientations),
  sizeMm,
  volumeMm3: z.number(),
  areaMm2: z.number(),
  printSpec: printSpec.nullable(),
  /** Printed first: it tells which clearance fits a printer. */
  isGauge: z.boolean(),
  /** Those the part comes in, tightest first; none where there is only the one file. */
  clearances: z.array(clearance),
  /** Shown on the sheet: the side that tells most about the part. */
  drawing: drawing.nullable(),
  ...previewFields,
});
export type KitPart = z.output<typeof kitPart>;

const fitsMm = (most: number) => z.coerce.number().positive().max(most).optional();
/** The bed of a printer, in mm: all three figures or none. */
const fitsQuery = { fitsX: fitsMm(2000), fitsY: fitsMm(2000), fitsZ: fitsMm(3000) };
const isWholeBed = ({ fitsX, fitsY, fitsZ }: { fitsX?: number; fitsY?: number; fitsZ?: number }): boolean =>
  new Set([fitsX, fitsY, fitsZ].map((one) => one === undefined)).size === 1;

export const kitEndpoints = {
  'GET /offers': endpoint({
    access: 'public',
    summary: 'Coupons the shop announces, with what is left of them, by kit and licence',
    response: z.array(launchOffer),
  }),
  'GET /kits': endpoint({
    access: 'public',
    summary: 'Kits on sale, newest first; with fitsX, fitsY, fitsZ only those that print on such a bed',
    query: pageQuery
      .extend({ sort: z.enum(['newest', 'name', 'price', 'size']).default('newest'), ...fitsQuery })
      .refine(isWholeBed, { path: ['fitsX'], message: 'Give width, depth and height of the bed.' }),
    response: pageOf(kitCard),
  }),
  'GET /kits/:slug': endpoint({
    access: 'public',
    summary: 'One kit: its newest revision, licences, rank and notes',
    params: slugParams,
    response: kitPage,
  }),
  'GET /kits/:slug/parts': endpoint({
    access: 'public',
    summary: 'The parts of a kit’s newest revision, drawn',
    params: slugParams,
    response: z.array(kitPart),
  }),
  'GET /kits/:slug/parts/:code/preview': endpoint({
    access: 'public',
    summary: 'A part of a kit’s newest revision as a coarse model to turn about (GLB), not to print',
    params: slugParams.extend({ code: z.string().min(1).max(20) }),
    query: previewQuery,
    response: 'stream',
  }),
};
