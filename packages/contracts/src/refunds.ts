import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { countryCode, id, idParams, minor, moment, money, pageOf, pageQuery, secret } from './values.js';

/** A right to a kit's files, as an order's line shows it; null before the order is paid. */
export const lineRight = z.enum(['active', 'suspended', 'ended']).nullable();

export const refundLine = z.object({ orderLineId: id, amount: money, keepsEntitlement: z.boolean() });

/** Money that went back, as the buyer sees it. `dispute`: the buyer's bank took it back and kept it. */
export const refund = z.object({
  id,
  cause: z.enum(['refund', 'dispute']),
  amount: money,
  at: moment,
  lines: z.array(refundLine),
  creditNote: z.object({ id, number: z.string() }).nullable(),
});
export type Refund = z.output<typeof refund>;

/**
 * `service`: begun at the payment service, not here. `asked`: the payment service has not confirmed it yet.
 * `returned`: it succeeded, and then the buyer's bank sent the money back.
 */
export const workshopRefund = refund.extend({
  origin: z.enum(['workshop', 'service', 'dispute']),
  state: z.enum(['asked', 'succeeded', 'failed', 'returned']),
  reason: z.string(),
  askedBy: z.string().nullable(),
  fault: z.string().nullable(),
});
export type WorkshopRefund = z.output<typeof workshopRefund>;

/** An inquiry takes no money; `closed` is one that ended so. */
export const disputeState = z.enum(['inquiry', 'open', 'won', 'lost', 'closed']);
export const dispute = z.object({
  id,
  state: disputeState,
  amount: money,
  /** The payment service's own word. */
  reason: z.string(),
  answerBy: moment.nullable(),
  openedAt: moment,
  closedAt: moment.nullable(),
  history: z.array(z.object({ at: moment, state: disputeState, detail: z.string() })),
});
export type Dispute = z.output<typeof dispute>;

const oneChoice = 'Say which lines to give back, or that it is the whole order.';
export const refundBody = z
  .object({
    lines: z
      .array(z.object({ orderLineId: id, amountMinor: minor, keepsEntitlement: z.boolean() }))
      .min(1, oneChoice)
      .max(30)
      .optional(),
    /** All that is left of every line. */
    whole: z.object({ keepsEntitlement: z.boolean() }).optional(),
    reason: z.string().trim().min(1, 'Write why, in a line.').max(300),
    /** Sent again after a broken connection, it is the same refund. */
    attempt: id,
  })
  .refine((one) => (one.lines === undefined) !== (one.whole === undefined), {
    path: ['lines'],
    message: oneChoice,
  })
  .refine(({ lines = [] }) => new Set(lines.map((one) => one.orderLineId)).size === lines.length, {
    path: ['lines'],
    message: 'A line stands here twice.',
  });

export const entitlementsBody = z.object({
  lines: z
    .array(z.object({ orderLineId: id, keepsEntitlement: z.boolean() }))
    .min(1)
    .max(30),
});

export const orderFlag = z.enum([
  'location-unclear',
  'amount-differs',
  'paid-after-end',
  'disputed',
  'dispute-lost',
  'refunded-outside',
  'refund-failed',
]);

/** A receipt, or a credit note with its amounts below zero. */
export const receiptRow = z.object({
  id,
  kind: z.enum(['receipt', 'credit-note']),
  number: z.string(),
  issuedAt: moment,
  /** Null for the month of a pledge. */
  orderId: id.nullable(),
  orderNumber: z.string(),
  email: z.string(),
  country: countryCode,
  net: money,
  tax: money,
  total: money,
});
export type ReceiptRow = z.output<typeof receiptRow>;

const receiptFilter = {
  kind: receiptRow.shape.kind.optional(),
  year: z.coerce.number().int().min(2000).max(2200).optional(),
  country: countryCode.optional(),
};
const receiptQuery = pageQuery.extend({
  ...receiptFilter,
  sort: z.enum(['number', 'issuedAt', 'total']).default('issuedAt'),
  order: z.enum(['asc', 'desc']).default('desc'),
});

const withKey = z.object({ key: secret.optional() });

export const refundEndpoints = {
  'POST /workshop/orders/:orderId/refunds': endpoint({
    access: 'orders:refund',
    summary: 'Give money back, by line or whole; the payment service is asked at once',
    params: idParams('orderId'),
    body: refundBody,
    response: workshopRefund,
    status: 202,
  }),
  'PUT /workshop/orders/:orderId/refunds/:refundId/entitlements': endpoint({
    access: 'orders:refund',
    summary: 'Decide which rights to files end with a refund, also afterwards',
    params: idParams('orderId', 'refundId'),
    body: entitlementsBody,
    response: workshopRefund,
  }),
  'DELETE /workshop/orders/:orderId/flags/:flag': endpoint({
    access: 'orders:refund',
    summary: 'Take a flag off an order that was looked at',
    params: z.object({ orderId: id, flag: orderFlag }),
    response: null,
  }),
  'GET /orders/:orderId/receipt.pdf': endpoint({
    access: 'public',
    summary: 'An order’s receipt as PDF, for its buyer or with its key',
    params: idParams('orderId'),
    query: withKey,
    response: 'stream',
  }),
  'GET /orders/:orderId/credit-notes/:creditNoteId.pdf': endpoint({
    access: 'public',
    summary: 'A credit note as PDF, for the order’s buyer or with its key',
    params: idParams('orderId', 'creditNoteId'),
    query: withKey,
    response: 'stream',
  }),
  'GET /workshop/orders/:orderId/receipt.pdf': endpoint({
    access: 'orders:read',
    summary: 'An order’s receipt as PDF',
    params: idParams('orderId'),
    response: 'stream',
  }),
  'GET /workshop/orders/:orderId/credit-notes/:creditNoteId.pdf': endpoint({
    access: 'orders:read',
    summary: 'A credit note as PDF',
    params: idParams('orderId', 'creditNoteId'),
    response: 'stream',
  }),
  'GET /workshop/receipts': endpoint({
    access: 'orders:read',
    summary: 'Receipts and credit notes, filtered, searched, paged',
    query: receiptQuery,
    response: pageOf(receiptRow),
  }),
  'GET /workshop/receipts.csv': endpoint({
    access: 'orders:read',
    summary: 'The same receipts and credit notes as CSV, a row for each rate of tax',
    query: pageQuery.extend(receiptFilter),
    response: 'stream',
  }),
};
