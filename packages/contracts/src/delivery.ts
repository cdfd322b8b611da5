import { z } from 'zod';
import { clearance } from './clearances.js';
import { endpoint } from './endpoint.js';
import { reprintList } from './print-record.js';
import { email, filamentColour, id, moment, pageOf, secret, sha256, slug, slugParams } from './values.js';
import { rankVoice, room } from './voices.js';

/**
 * What may be fetched: the whole bundle of a revision, its bundle of one clearance, or one document of it.
 */
export const grantBody = z.object({
  kitSlug: slug,
  revisionId: id,
  file: sha256.optional(),
  clearance: clearance.optional(),
});
export const grant = z.object({
  url: z.string(),
  expiresAt: moment,
  fileName: z.string(),
  bytes: z.int(),
  sha256,
});

export const shelfRevision = z.object({
  id,
  label: z.string(),
  releasedAt: moment,
  bundleBytes: z.int(),
  bundleSha256: sha256,
  /** Of one clearance each, tightest first; none where no part comes in several. */
  bundles: z.array(z.object({ clearance, bytes: z.int(), sha256 })),
  changeNotes: z.string(),
  isWithdrawn: z.boolean(),
  /** What the workshop says about it; null where it stands. */
  withdrawnReason: z.string().nullable(),
});
export const entitlementSource = z.enum(['purchase', 'pledge', 'gift', 'staff']);

export const shelfItem = z.object({
  slug,
  name: z.string(),
  tagline: z.string(),
  colour: filamentColour,
  source: entitlementSource,
  since: moment,
  /** All that holds it on the shelf: one may end and leave the other. */
  sources: z.array(
    z.object({
      source: entitlementSource,
      since: moment,
      /** Of a pledge: how far it is paid. */
      until: moment.nullable(),
      /** What stays after a pledge: revisions released before this moment. */
      releasedBefore: moment.nullable(),
    }),
  ),
  licenceName: z.string(),
  held: shelfRevision.nullable(),
  /** The newest one that is theirs. */
  newest: shelfRevision,
  /** A newer one that a pledge which is over does not include. */
  newerNotIncluded: z.string().nullable(),
});
export type ShelfItem = z.output<typeof shelfItem>;

export const shelfKit = shelfItem.extend({
  orderId: id.nullable(),
  /** Of the newest revision. */
  clearance: z.object({
    hasVariants: z.boolean(),
    gauge: z.object({ code: z.string(), name: z.string() }).nullable(),
    /** What this person prints: said for this kit, else the habit of their printer. */
    chosen: clearance.nullable(),
    /** What was said for this kit alone. */
    said: clearance.nullable(),
    /** The habit of their main printer, and what they call it. */
    habit: z.object({ clearance, printer: z.string() }).nullable(),
  }),
  revisions: z.array(shelfRevision),
  /** From what is printed, as far as it is known, to the newest revision. */
  reprint: reprintList,
  documents: z.array(z.object({ sha256, fileName: z.string(), bytes: z.int() })),
  licenceTerms: z.string(),
  cautions: z.string(),
  /** What the tuner listens for: the voices of the revision held, of the newest where none is. */
  rank: z.array(rankVoice),
  room,
  declaredCents: z.number(),
  downloads: z.array(
    z.object({ at: moment, revision: z.string(), fileName: z.string(), isComplete: z.boolean() }),
  ),
});
export type ShelfKit = z.output<typeof shelfKit>;

/** What a mailed link opens: a page, never the file itself, since mail scanners open links. */
export const collection = z.object({
  orderNumber: z.string(),
  expiresAt: moment,
  usesLeft: z.int(),
  /** `suspended`: the payment is in dispute. `ended`: no right of the order is left. */
  state: z.enum(['open', 'expired', 'used-up', 'replaced', 'suspended', 'ended']),
  kits: z.array(
    z.object({
      slug,
      name: z.string(),
      colour: filamentColour,
      licenceName: z.string(),
      newest: shelfRevision,
    }),
  ),
});
export type Collection = z.output<typeof collection>;

const tokenParams = z.object({ token: secret });

export const deliveryEndpoints = {
  'GET /shelf/owned': endpoint({
    access: 'signed-in',
    summary: 'Slugs of the kits one owns, to notice them in the shop',
    response: z.array(slug),
  }),
  'GET /shelf': endpoint({
    access: 'signed-in',
    summary: 'One’s own kits',
    query: z.object({ page: z.coerce.number().int().min(1).default(1) }),
    response: pageOf(shelfItem).extend({
      /** Kits whose downloads rest while a payment is in dispute, by name. */
      resting: z.array(z.string()),
      /** Kits that are theirs by a pledge alone, while the pledge rests. */
      restingWithPledge: z.array(z.string()),
    }),
  }),
  'GET /shelf/:slug': endpoint({
    access: 'signed-in',
    summary: 'One kit on the shelf: held, newest, what differs',
    params: slugParams,
    response: shelfKit,
  }),
  'POST /shelf/:slug/held': endpoint({
    access: 'signed-in',
    summary: 'Say that one has printed all of a revision',
    params: slugParams,
    body: z.object({ revisionId: id }),
    response: shelfKit,
  }),
  'PUT /shelf/:slug/clearance': endpoint({
    access: 'signed-in',
    summary: 'Say which clearance one prints of a kit; bundle and reprint list then keep to it',
    params: slugParams,
    body: z.object({ clearance: clearance.nullable() }),
    response: shelfKit,
  }),
  'POST /shelf/grants': endpoint({
    access: 'signed-in',
    summary: 'A short-lived signed address of a file one is entitled to',
    body: grantBody,
    response: grant,
    status: 201,
  }),
  'GET /collect/:token': endpoint({
    access: 'public',
    summary: 'What a mailed link stands for; opening it uses nothing up',
    params: tokenParams,
    response: collection,
  }),
  'POST /collect/:token/grants': endpoint({
    access: 'public',
    summary: 'A signed address by a mailed link; counts as one use',
    params: tokenParams,
    body: grantBody,
    response: grant,
    status: 201,
  }),
  'POST /collect/:token/replacement': endpoint({
    access: 'public',
    summary: 'Mail a fresh link to the order’s own address',
    params: tokenParams,
    response: null,
    status: 202,
  }),
  'POST /collect/lost': endpoint({
    access: 'public',
    summary: 'Mail fresh links for all orders of an address',
    body: z.object({ email }),
    response: null,
    status: 202,
  }),
  'GET /files/:grant': endpoint({
    access: 'public',
    summary: 'The file of a signed address; answers ranges',
    params: z.object({ grant: z.string().min(20).max(2000) }),
    response: 'stream',
  }),
};
