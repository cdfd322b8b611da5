import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { productKind, taxTreatment } from './tax.js';
import {
  countryCode,
  currencyCode,
  day,
  id,
  idParams,
  line,
  moment,
  money,
  pageOf,
  pageQuery,
} from './values.js';

/** In percent as decimal text, with three decimals at most: `25.5`. */
export const ratePercent = z
  .string()
  .trim()
  .regex(/^\d{1,2}(\.\d{1,3})?$/, 'Write a percentage with a point, such as 21 or 25.5.');

export const rateStep = z.object({ ratePercent: z.string(), validFrom: day, source: z.string() });
export const countryRates = z.object({
  country: countryCode,
  kind: productKind,
  /** The rate that holds today; null where the first one is still to come. */
  current: rateStep.nullable(),
  next: rateStep.nullable(),
  /** All of them, newest first. */
  steps: z.array(rateStep),
  /** Receipts of the last twelve months. */
  receipts: z.int(),
});
export type CountryRates = z.output<typeof countryRates>;

export const rateBody = z.object({
  country: countryCode,
  kind: productKind.default('electronic-service'),
  ratePercent,
  validFrom: day,
  /** Where the rate was read, for whoever looks at it later. */
  source: line.max(200, 'Write at most 200 characters.'),
});

export const rateChange = z.object({
  id: z.string(),
  at: moment,
  who: z.string(),
  country: countryCode,
  kind: productKind,
  validFrom: day,
  before: z.string().nullable(),
  after: z.string().nullable(),
  source: z.string(),
});

/** Sold to, and no rate entered for it. */
export const missingRate = z.object({ country: countryCode, receipts: z.int(), lastSoldAt: moment });

/** Of one quarter: what was sold, less what went back, at one rate of one country. Credit notes count below zero. */
export const summaryRow = z.object({
  treatment: taxTreatment,
  country: countryCode,
  ratePercent: z.string(),
  currency: currencyCode,
  receipts: z.int(),
  creditNotes: z.int(),
  net: money,
  tax: money,
  gross: money,
});
export type SummaryRow = z.output<typeof summaryRow>;

/** What a business owes the tax for itself, by its number: for the recapitulative statement. */
export const reverseChargeRow = z.object({
  vatNumber: z.string(),
  name: z.string(),
  country: countryCode,
  net: money,
});

export const quarterSummary = z.object({
  year: z.int(),
  quarter: z.int(),
  from: day,
  /** The last day. */
  to: day,
  isOver: z.boolean(),
  closedAt: moment.nullable(),
  closedBy: z.string().nullable(),
  /** Where it was closed: whether the rows still say what they said then. */
  isAsClosed: z.boolean(),
  rows: z.array(summaryRow),
  totals: z.array(z.object({ net: money, tax: money, gross: money })),
  reverseCharge: z.array(reverseChargeRow),
  /** Receipts over nothing, which are in no row. */
  freeReceipts: z.int(),
  /** Receipts counted in another country than the one written on them. */
  settled: z.int(),
  unclear: z.int(),
  missingRates: z.array(countryCode),
});
export type QuarterSummary = z.output<typeof quarterSummary>;

export const quarterRow = z.object({
  year: z.int(),
  quarter: z.int(),
  receipts: z.int(),
  creditNotes: z.int(),
  unclear: z.int(),
  isOver: z.boolean(),
  closedAt: moment.nullable(),
});

/** A receipt whose buyer's country nobody could be sure of. */
export const unclearLocation = z.object({
  receiptId: id,
  receiptNumber: z.string(),
  orderId: id,
  orderNumber: z.string(),
  email: z.string(),
  issuedAt: moment,
  total: money,
  /** What each piece of evidence says. */
  declared: countryCode,
  billing: countryCode.nullable(),
  card: countryCode.nullable(),
  /** Counted in, by now. */
  country: countryCode,
  ratePercent: z.string(),
  settled: z.object({ country: countryCode, reason: z.string(), who: z.string(), at: moment }).nullable(),
  isQuarterClosed: z.boolean(),
});
export type UnclearLocation = z.output<typeof unclearLocation>;

export const settleBody = z.object({
  country: countryCode,
  reason: line.max(500, 'Write at most 500 characters.'),
});

const quarterParams = z.object({
  year: z.coerce.number().int().min(2000).max(2200),
  quarter: z.coerce.number().int().min(1).max(4),
});

export const taxRecordEndpoints = {
  'GET /workshop/ledger/rates': endpoint({
    access: 'ledger:read',
    summary: 'Tax rates by country, with what held before and what comes',
    query: pageQuery,
    response: pageOf(countryRates),
  }),
  'GET /workshop/ledger/rates/missing': endpoint({
    access: 'ledger:read',
    summary: 'Countries sold to in the last twelve months without a rate',
    response: z.array(missingRate),
  }),
  'GET /workshop/ledger/rates/changes': endpoint({
    access: 'ledger:read',
    summary: 'Who changed which rate, newest first',
    query: pageQuery.extend({ country: countryCode.optional() }),
    response: pageOf(rateChange),
  }),
  'POST /workshop/ledger/rates': endpoint({
    access: 'tax:write',
    summary: 'Enter a rate from a day on; receipts that are written stay as they are',
    body: rateBody,
    response: null,
  }),
  'DELETE /workshop/ledger/rates/:country/:kind/:validFrom': endpoint({
    access: 'tax:write',
    summary: 'Take back a rate that does not hold yet',
    params: z.object({ country: countryCode, kind: productKind, validFrom: day }),
    response: null,
  }),
  'GET /workshop/ledger/quarters': endpoint({
    access: 'ledger:read',
    summary: 'Quarters with receipts, newest first',
    query: pageQuery,
    response: pageOf(quarterRow),
  }),
  'GET /workshop/ledger/quarters/:year/:quarter': endpoint({
    access: 'ledger:read',
    summary: 'One quarter by country and rate: net, tax, gross',
    params: quarterParams,
    response: quarterSummary,
  }),
  'GET /workshop/ledger/quarters/:year/:quarter/summary.csv': endpoint({
    access: 'ledger:read',
    summary: 'The same as CSV',
    params: quarterParams,
    response: 'stream',
  }),
  'POST /workshop/ledger/quarters/:year/:quarter/close': endpoint({
    access: 'tax:write',
    summary: 'Close a quarter that is over: its figures stand from then on',
    params: quarterParams,
    response: quarterSummary,
  }),
  'GET /workshop/ledger/locations': endpoint({
    access: 'ledger:read',
    summary: 'Receipts whose buyer’s country is unclear, or was settled by hand',
    query: pageQuery.extend({ state: z.enum(['open', 'settled']).default('open') }),
    response: pageOf(unclearLocation),
  }),
  'GET /workshop/ledger/locations/:receiptId': endpoint({
    access: 'ledger:read',
    summary: 'One of them',
    params: idParams('receiptId'),
    response: unclearLocation,
  }),
  'POST /workshop/ledger/locations/:receiptId': endpoint({
    access: 'tax:write',
    summary: 'Settle the country of a receipt, with a reason, before its quarter is closed',
    params: idParams('receiptId'),
    body: settleBody,
    response: unclearLocation,
  }),
};
