import { z } from 'zod';
import { clearance, variantClearance } from './clearances.js';
import { endpoint } from './endpoint.js';
import { buildVolume, orientations, printSpec, sizeMm } from './kits.js';
import { id, idParams, line, minor, slugParams } from './values.js';

const figure = z.number();
const figures = z.array(figure).readonly();

/**
 * What an estimate of filament and time needs of a mesh, as `profileOf` of the plates package makes it: sums
 * over layers, from which no mesh can be made again.
 */
export const printProfile = z.object({
  version: z.literal(1),
  heightMm: figure,
  volumeMm3: figure,
  sideAreaMm2: figure,
  insetMmSteps: figures,
  insetVolumeMm3: figures,
  bands: z.array(z.object({ heightMm: figure, areaMm2: figure, contourMm: figure })).readonly(),
  wallMmSteps: figures,
  shellMmSteps: figures,
  walls: z
    .array(
      z.object({
        fillMm3: figure,
        ceilingMm2: figure,
        shells: z
          .array(
            z.object({
              sparseMm3: figure,
              smallMm3: figure,
              sparseSideMm2: figure,
              bridgedMm2: figure,
              bridgedSmallMm2: figure,
            }),
          )
          .readonly(),
      }),
    )
    .readonly(),
  isClosed: z.boolean(),
});

/** As much of a printable mesh as the shop shows: its box, its convex outline from above, its profile. */
export const printShape = z.object({
  sizeMm,
  heightMm: figure,
  /** Corners in mm, counter-clockwise; null where the mesh was measured before outlines were kept. */
  footprint: z
    .array(z.tuple([figure, figure]).readonly())
    .readonly()
    .nullable(),
  profile: printProfile.nullable(),
});
export type PrintShape = z.output<typeof printShape>;

export const printSheetPart = printShape.extend({
  code: z.string(),
  name: z.string(),
  quantity: z.int(),
  orientation: z.enum(orientations),
  /** Its own settings, where they differ from the revision's. */
  printSpec: printSpec.nullable(),
  /** Tells which clearance fits a printer: of no use to whom that is known. */
  isGauge: z.boolean(),
  /** The part in other clearances, tightest first; the shape above is its zero. */
  variants: z.array(printShape.extend({ clearance: variantClearance })),
});
export type PrintSheetPart = z.output<typeof printSheetPart>;

/** Everything a browser needs to lay a revision out on plates and to estimate its filament and hours. */
export const printSheet = z.object({
  revision: z.string(),
  printSpec,
  parts: z.array(printSheetPart),
  /** Codes of parts whose files nobody has measured yet. */
  unmeasured: z.array(z.string()),
});
export type PrintSheet = z.output<typeof printSheet>;

export const mostPrinterCards = 20;
export const mostCardMaterials = 10;

const cardMaterial = z.object({
  /** A known material or the person's own word; only known ones have a density, and so grams and a cost. */
  material: z.string().trim().min(1, 'Write which filament this is, for instance PETG.').max(40),
  /** In minor units of the workshop's currency. */
  pricePerKgMinor: minor.nullable(),
});

const hasEachOnce = (materials: readonly { material: string }[]): boolean =>
  new Set(materials.map(({ material }) => material.toLowerCase())).size === materials.length;

export const printerCardFields = z.object({
  name: line.max(60),
  bed: buildVolume,
  nozzleMm: z.number().min(0.1).max(2),
  materials: z
    .array(cardMaterial)
    .min(1, 'Write down at least one filament.')
    .max(mostCardMaterials, 'Ten filaments are the most a card holds.')
    .refine(hasEachOnce, 'One filament stands here twice; keep one of the two.'),
  /** What a gauge part told; null until one was printed. How the printer wants moving parts: with less room than drawn, as drawn, or with more. */
  clearance: clearance.nullable(),
});
/** A card as a visitor's browser keeps it. */
export type PrinterCardFields = z.output<typeof printerCardFields>;

export const printerCardBody = printerCardFields.extend({ isMain: z.boolean() });
export type PrinterCardBody = z.output<typeof printerCardBody>;
export const printerCard = printerCardBody.extend({ id });
export type PrinterCard = z.output<typeof printerCard>;

export const printerEndpoints = {
  'GET /kits/:slug/print': endpoint({
    access: 'public',
    summary: 'What the newest revision takes to print: outlines and profiles, never a mesh',
    params: slugParams,
    response: printSheet,
  }),
  'GET /account/printers': endpoint({
    access: 'signed-in',
    summary: 'One’s own printer cards, the main one first; twenty at most',
    response: z.array(printerCard),
  }),
  'POST /account/printers': endpoint({
    access: 'signed-in',
    summary: 'Keep a printer card; the first one is the main one in any case',
    body: printerCardBody,
    response: printerCard,
    status: 201,
  }),
  'PUT /account/printers/:printerId': endpoint({
    access: 'signed-in',
    summary: 'Change a printer card, or make it the main one',
    params: idParams('printerId'),
    body: printerCardBody,
    response: printerCard,
  }),
  'DELETE /account/printers/:printerId': endpoint({
    access: 'signed-in',
    summary: 'Throw a printer card away; where it was the main one, the oldest of the others takes its place',
    params: idParams('printerId'),
    response: null,
    status: 204,
  }),
};
