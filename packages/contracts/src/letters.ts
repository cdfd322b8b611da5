/** Letters from the workshop: writing, whom they concern, sending, and what came of each. */
import { z } from 'zod';
import { entitlementSource } from './delivery.js';
import { endpoint } from './endpoint.js';
import { countryCode, id, idParams, line, moment, pageOf, pageQuery, slug } from './values.js';

/** What may stand in a letter in braces and is filled in for each reader. */
export const letterFields = ['name', 'kit', 'held', 'newest', 'reprint_list', 'download_link'] as const;
export type LetterField = (typeof letterFields)[number];

export const letterKind = z.enum(['service', 'news']);
export const letterStates = ['draft', 'scheduled', 'sending', 'paused', 'cancelled', 'sent'] as const;
export const letterState = z.enum(letterStates);
export const recipientStates = ['queued', 'handed-over', 'sent', 'refused', 'bounced', 'left-out'] as const;
export const recipientState = z.enum(recipientStates);

/** Why somebody whom the facts fit gets no letter. */
export const leftOutReasons = [
  'right-ended',
  'right-suspended',
  'address-dead',
  'never-asked',
  'not-confirmed',
  'stopped',
  'has-newest',
  'fetched-nothing',
  'nothing-to-reprint',
  'cancelled',
] as const;
export const leftOutReason = z.enum(leftOutReasons);
export type LeftOutReason = z.output<typeof leftOutReason>;

/** Facts a reader must fit; what is empty asks nothing. */
export const letterAudience = z.object({
  ownsKit: z.boolean(),
  /** The oldest and the newest revision held; null leaves that end open. */
  heldFromId: id.nullable(),
  heldToId: id.nullable(),
  /** Also those who have fetched no revision yet. */
  withNothingHeld: z.boolean(),
  sources: z.array(entitlementSource).max(4),
  nozzlesMm: z.array(z.number().min(0.1).max(2)).max(20),
  materials: z.array(z.string().trim().min(1).max(40)).max(40),
  reportedParts: z.array(z.string().min(1).max(10)).max(200),
  countries: z.array(countryCode).max(60),
  /** Only those who asked for news; always so for news. */
  askedForNews: z.boolean(),
});
export type LetterAudience = z.output<typeof letterAudience>;

export const letterBody = z.object({
  kind: letterKind,
  subject: line.max(150),
  body: z.string().max(50_000),
  kitId: id.nullable(),
  /** Null stands for the newest one. */
  revisionId: id.nullable(),
  audience: letterAudience,
  /** Those for whom nothing is to be printed get no letter about a revision. */
  leavesOutUnneeded: z.boolean(),
  perMinute: z.int().min(1).max(100_000),
});
export type LetterBody = z.output<typeof letterBody>;

const counts = z.object({
  queued: z.int(),
  handedOver: z.int(),
  sent: z.int(),
  refused: z.int(),
  bounced: z.int(),
  leftOut: z.int(),
});
export const letter = letterBody.extend({
  id,
  state: letterState,
  slug: z.string().nullable(),
  kitName: z.string().nullable(),
  kitSlug: z.string().nullable(),
  /** The revision it is about, as things stand. */
  revisionLabel: z.string().nullable(),
  sendAt: moment.nullable(),
  startedAt: moment.nullable(),
  finishedAt: moment.nullable(),
  updatedAt: moment,
  counts,
  leftOut: z.array(z.object({ reason: leftOutReason, count: z.int() })),
});
export type Letter = z.output<typeof letter>;

export const letterRow = letter.pick({
  id: true,
  kind: true,
  subject: true,
  state: true,
  kitName: true,
  sendAt: true,
  startedAt: true,
  updatedAt: true,
  counts: true,
});

export const letterReader = z.object({
  /** The account's id, or the address of somebody without an account. */
  reader: z.string(),
  email: z.string(),
  name: z.string(),
  held: z.string().nullable(),
  leftOut: leftOutReason.nullable(),
  /** Pieces on this reader's own reprint list; null for a letter about no revision. */
  pieces: z.int().nullable(),
});
export const audienceAnswer = z.object({
  size: z.int(),
  leftOut: z.array(z.object({ reason: leftOutReason, count: z.int() })),
  readers: pageOf(letterReader),
});
export type AudienceAnswer = z.output<typeof audienceAnswer>;

export const letterRecipient = z.object({
  id,
  email: z.string(),
  name: z.string(),
  held: z.string().nullable(),
  state: recipientState,
  reason: z.string().nullable(),
  tries: z.int(),
  sentAt: moment.nullable(),
});

export const letterChoices = z.object({
  kits: z.array(
    z.object({
      id,
      name: z.string(),
      revisions: z.array(z.object({ id, label: z.string() })),
      reportedParts: z.array(z.string()),
    }),
  ),
  materials: z.array(z.string()),
  nozzlesMm: z.array(z.number()),
  countries: z.array(z.string()),
  /** Mails in a minute, unless the letter says otherwise. */
  perMinute: z.int(),
});
export type LetterChoices = z.output<typeof letterChoices>;

const inLetter = idParams('letterId');
const readerQuery = z.object({ reader: z.string().max(254).optional() });
const recipientQuery = pageQuery.extend({ state: recipientState.optional() });

export const deadAddress = z.object({ id, email: z.string(), reason: z.string(), since: moment });

export const workshopLetterEndpoints = {
  'GET /workshop/letters': endpoint({
    access: 'letters:read',
    summary: 'Letters, the last changed first',
    query: pageQuery.extend({ state: letterState.optional() }),
    response: pageOf(letterRow),
  }),
  'POST /workshop/letters': endpoint({
    access: 'letters:write',
    summary: 'Draft a letter',
    body: letterBody,
    response: letter,
    status: 201,
  }),
  'GET /workshop/letters/choices': endpoint({
    access: 'letters:read',
    summary: 'What an audience can be built from',
    response: letterChoices,
  }),
  'POST /workshop/letters/audience': endpoint({
    access: 'letters:read',
    summary: 'How many a letter would reach, who, and who is left out and why; changes nothing',
    body: z.object({
      letter: letterBody.pick({
        kind: true,
        kitId: true,
        revisionId: true,
        audience: true,
        leavesOutUnneeded: true,
      }),
      show: z.enum(['readers', 'left-out']).default('readers'),
      page: z.int().min(1).max(10_000).default(1),
      size: z.int().min(1).max(100).default(10),
    }),
    response: audienceAnswer,
  }),
  'GET /workshop/letters/:letterId': endpoint({
    access: 'letters:read',
    summary: 'One letter and how far it is',
    params: inLetter,
    response: letter,
  }),
  'PUT /workshop/letters/:letterId': endpoint({
    access: 'letters:write',
    summary: 'Change a draft',
    params: inLetter,
    body: letterBody,
    response: letter,
  }),
  'DELETE /workshop/letters/:letterId': endpoint({
    access: 'letters:write',
    summary: 'Delete a draft',
    params: inLetter,
    response: null,
  }),
  'GET /workshop/letters/:letterId/preview': endpoint({
    access: 'letters:read',
    summary: 'The mail as one reader gets it: subject and text',
    params: inLetter,
    query: readerQuery,
    response: z.object({ to: z.string(), subject: z.string(), text: z.string() }),
  }),
  'GET /workshop/letters/:letterId/preview.html': endpoint({
    access: 'letters:read',
    summary: 'The same mail as HTML, to be shown in a frame',
    params: inLetter,
    query: readerQuery,
    response: 'stream',
  }),
  'POST /workshop/letters/:letterId/test': endpoint({
    access: 'letters:write',
    summary: 'Mail it to oneself, filled in as for one reader',
    params: inLetter,
    body: z.object({ reader: z.string().max(254).nullable() }),
    response: null,
    status: 202,
  }),
  'POST /workshop/letters/:letterId/sending': endpoint({
    access: 'letters:send',
    summary: 'Send it now or at a time',
    params: inLetter,
    body: z.object({ sendAt: moment.nullable() }),
    response: letter,
  }),
  'POST /workshop/letters/:letterId/pause': endpoint({
    access: 'letters:send',
    summary: 'Stop for a while; nobody is forgotten',
    params: inLetter,
    response: letter,
  }),
  'POST /workshop/letters/:letterId/resume': endpoint({
    access: 'letters:send',
    summary: 'Go on with those who wait',
    params: inLetter,
    response: letter,
  }),
  'POST /workshop/letters/:letterId/cancellation': endpoint({
    access: 'letters:send',
    summary: 'Send it to nobody else; before its time it becomes a draft again',
    params: inLetter,
    response: letter,
  }),
  'GET /workshop/letters/:letterId/recipients': endpoint({
    access: 'letters:read',
    summary: 'What became of each recipient',
    params: inLetter,
    query: recipientQuery,
    response: pageOf(letterRecipient),
  }),
  'GET /workshop/letters/:letterId/recipients.csv': endpoint({
    access: 'letters:read',
    summary: 'The same recipients as CSV',
    params: inLetter,
    query: recipientQuery,
    response: 'stream',
  }),
  'GET /workshop/dead-addresses': endpoint({
    access: 'letters:read',
    summary: 'Addresses that get no letters since their mail server refused one for good',
    query: pageQuery,
    response: pageOf(deadAddress),
  }),
  'DELETE /workshop/dead-addresses/:addressId': endpoint({
    access: 'letters:send',
    summary: 'Write to an address again',
    params: idParams('addressId'),
    response: null,
  }),
};

/** Made of the subject and a part of the letter’s id, so that two of one subject differ. */
export const letterSlug = slug;
