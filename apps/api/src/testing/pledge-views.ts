import type { InvoiceView, PledgeRecord, PledgeView } from '../supporters/pledges/pledge-record.js';

const DAY_MS = 86_400_000;
export const BEGIN = new Date('2026-01-12T09:00:00.000Z');
/** So many months of thirty days, and days, after the pledge of these builders began. */
export const after = (months: number, days = 0): Date =>
  new Date(BEGIN.getTime() + (months * 30 + days) * DAY_MS);

/** The invoice of the month that begins `month` months after the pledge. */
export const invoiceOf = (month: number, changes: Partial<InvoiceView> = {}): InvoiceView => ({
  id: `in_${month}`,
  amountPaidMinor: 900,
  currency: 'EUR',
  state: 'paid',
  periodStart: after(month),
  periodEnd: after(month + 1),
  paymentIntentId: `pi_${month}`,
  cardCountry: 'DE',
  billingCountry: 'DE',
  attempts: 1,
  payUrl: null,
  createdAt: after(month),
  paidAt: after(month),
  ...changes,
});

export const failedInvoice = (month: number, changes: Partial<InvoiceView> = {}): InvoiceView =>
  invoiceOf(month, {
    state: 'open',
    amountPaidMinor: 0,
    paidAt: null,
    payUrl: 'https://pay.example/in',
    ...changes,
  });

export const viewOf = (
  invoices: readonly InvoiceView[],
  subscription: Partial<NonNullable<PledgeView['subscription']>> | null = {},
  changes: Partial<PledgeView> = {},
): PledgeView => ({
  subscription: subscription && {
    state: 'active',
    amountMinor: 900,
    currentPeriodEnd: after(Math.max(1, invoices.length)),
    cancelAtPeriodEnd: false,
    isPaused: false,
    cardLast4: '4242',
    endedAt: null,
    ...subscription,
  },
  isPageExpired: false,
  billingCountry: 'DE',
  invoices,
  disputes: null,
  ...changes,
});

export const pledgeRecord = (changes: Partial<PledgeRecord> = {}): PledgeRecord => ({
  id: '01900000-0000-7000-8000-000000000001',
  personId: '01900000-0000-7000-8000-000000000002',
  planId: 'tide',
  amountMinor: 900,
  currency: 'EUR',
  keepsAfter: 'released-during',
  nextPlanId: null,
  nextAmountMinor: null,
  nextKeepsAfter: null,
  nextPlanFrom: null,
  state: 'opening',
  declaredCountry: 'DE',
  paymentCountry: null,
  cardCountry: null,
  cardLast4: null,
  flags: [],
  sessionId: 'cs_1',
  payUntil: after(0),
  customerId: 'cus_1',
  subscriptionId: null,
  beganAt: null,
  paidUntil: null,
  periodEnd: null,
  nextPaymentAt: null,
  endsAt: null,
  pausedUntil: null,
  failedInvoiceId: null,
  failingSince: null,
  graceUntil: null,
  settleUrl: null,
  endWish: null,
  pauseWish: null,
  amountWish: null,
  cardPageId: null,
  rightsUntil: null,
  endedAt: null,
  createdAt: BEGIN,
  ...changes,
});
