import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { taxRecordEndpoints } from './tax-records.js';
import { countryCode, currencyCode, day, id, idParams, moment, money, pageOf, pageQuery } from './values.js';

export const salesOfMonth = z.object({ month: z.string(), orders: z.int(), gross: money, refunded: money });
export const salesFigures = z.object({
  months: z.array(salesOfMonth),
  countries: z.array(z.object({ country: countryCode, orders: z.int(), gross: money })),
  kits: z.array(z.object({ kitId: id, name: z.string(), sold: z.int(), gross: money })),
});
export type SalesFigures = z.output<typeof salesFigures>;

export const paymentKinds = ['payment', 'refund', 'dispute', 'pledge'] as const;
export const paymentRow = z.object({
  id: z.string(),
  kind: z.enum(paymentKinds),
  at: moment,
  /** Below zero where it leaves the shop. */
  amount: money,
  state: z.string(),
  orderId: id.nullable(),
  /** The order's number, or what else it is for. */
  subject: z.string(),
  email: z.string(),
  /** At the payment service. */
  reference: z.string().nullable(),
});

export const workState = z.enum(['waiting', 'running', 'done', 'failed']);
export const yearExport = z.object({
  id,
  year: z.int(),
  state: workState,
  percent: z.int(),
  bytes: z.int().nullable(),
  sha256: z.string().nullable(),
  fault: z.string().nullable(),
  askedBy: z.string(),
  createdAt: moment,
  finishedAt: moment.nullable(),
});
export type YearExport = z.output<typeof yearExport>;

/** What the two books say of one movement of money. */
export const verdicts = [
  'agrees',
  'missing-here',
  'missing-there',
  'amount-differs',
  'currency-differs',
  'not-ours',
] as const;
export const verdict = z.enum(verdicts);
export type Verdict = z.output<typeof verdict>;
export const movementKinds = ['payment', 'refund', 'dispute', 'payout', 'other'] as const;

export const reconciliation = z.object({
  id,
  from: day,
  to: day,
  state: workState,
  percent: z.int(),
  differences: z.int().nullable(),
  sums: z
    .array(
      z.object({
        kind: z.enum(movementKinds),
        currency: currencyCode,
        here: money.nullable(),
        there: money,
        fees: money,
        count: z.int(),
      }),
    )
    .nullable(),
  fault: z.string().nullable(),
  askedBy: z.string(),
  createdAt: moment,
  finishedAt: moment.nullable(),
});
export type Reconciliation = z.output<typeof reconciliation>;

export const reconciliationRow = z.object({
  position: z.int(),
  kind: z.enum(movementKinds),
  verdict,
  at: moment,
  here: money.nullable(),
  there: money.nullable(),
  fee: money.nullable(),
  serviceId: z.string().nullable(),
  paymentIntentId: z.string().nullable(),
  orderId: id.nullable(),
  subject: z.string().nullable(),
});
export type ReconciliationRow = z.output<typeof reconciliationRow>;

const paymentQuery = pageQuery.extend({
  kind: z.enum(paymentKinds).optional(),
  from: day.optional(),
  to: day.optional(),
});

export const ledgerEndpoints = {
  ...taxRecordEndpoints,
  'GET /workshop/ledger/sales': endpoint({
    access: 'ledger:read',
    summary: 'Sales by month, by country and by kit',
    query: z.object({ months: z.coerce.number().int().min(1).max(60).default(12) }),
    response: salesFigures,
  }),
  'GET /workshop/ledger/payments': endpoint({
    access: 'ledger:read',
    summary: 'Money that came and went: payments, refunds, disputes, pledges',
    query: paymentQuery,
    response: pageOf(paymentRow),
  }),
  'GET /workshop/ledger/payments.csv': endpoint({
    access: 'ledger:read',
    summary: 'The same as CSV',
    query: paymentQuery,
    response: 'stream',
  }),
  'GET /workshop/ledger/exports': endpoint({
    access: 'ledger:read',
    summary: 'Exports of whole years, newest first',
    query: pageQuery,
    response: pageOf(yearExport),
  }),
  'POST /workshop/ledger/exports': endpoint({
    access: 'ledger:read',
    summary: 'Have all records of a year written into one zip',
    body: z.object({ year: z.int().min(2000).max(2200) }),
    response: yearExport,
    status: 202,
  }),
  'GET /workshop/ledger/exports/:exportId': endpoint({
    access: 'ledger:read',
    summary: 'How far an export is',
    params: idParams('exportId'),
    response: yearExport,
  }),
  'GET /workshop/ledger/exports/:exportId/file': endpoint({
    access: 'ledger:read',
    summary: 'The zip',
    params: idParams('exportId'),
    response: 'stream',
  }),
  'GET /workshop/ledger/reconciliations': endpoint({
    access: 'ledger:read',
    summary: 'Comparisons with the payment service, newest first',
    query: pageQuery,
    response: pageOf(reconciliation),
  }),
  'POST /workshop/ledger/reconciliations': endpoint({
    access: 'ledger:read',
    summary: 'Compare a span of days with the payment service',
    body: z.object({ from: day, to: day }).refine(({ from, to }) => from <= to, {
      path: ['to'],
      message: 'The last day must not be before the first.',
    }),
    response: reconciliation,
    status: 202,
  }),
  'GET /workshop/ledger/reconciliations/:reconciliationId': endpoint({
    access: 'ledger:read',
    summary: 'One comparison, with how far it is',
    params: idParams('reconciliationId'),
    response: reconciliation,
  }),
  'GET /workshop/ledger/reconciliations/:reconciliationId/rows': endpoint({
    access: 'ledger:read',
    summary: 'Its movements of money, the differing ones first',
    params: idParams('reconciliationId'),
    query: pageQuery.extend({ verdict: verdict.optional(), kind: z.enum(movementKinds).optional() }),
    response: pageOf(reconciliationRow),
  }),
};
