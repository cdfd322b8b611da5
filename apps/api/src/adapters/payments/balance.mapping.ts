import type Stripe from 'stripe';
import type { BalanceEntry, BalanceEntryKind } from './reconciliation.js';
import { dateOf, idOf } from './stripe-client.js';

const kinds: Readonly<Record<string, BalanceEntryKind>> = {
  charge: 'payment',
  payment: 'payment',
  refund: 'refund',
  payment_refund: 'refund',
  refund_failure: 'refund-failed',
  payment_failure_refund: 'refund-failed',
  payout: 'payout',
  payout_cancel: 'payout',
  payout_failure: 'payout',
};

/** Money of disputes moves as an adjustment; the reporting category says which way. */
const adjustments: Readonly<Record<string, BalanceEntryKind>> = {
  dispute: 'dispute',
  dispute_reversal: 'dispute-reversed',
};

export const toBalanceEntry = (entry: Stripe.BalanceTransaction): BalanceEntry => ({
  id: entry.id,
  kind: kinds[entry.type] ?? adjustments[entry.reporting_category] ?? 'other',
  amountMinor: entry.amount,
  feeMinor: entry.fee,
  netMinor: entry.net,
  currency: entry.currency.toUpperCase(),
  occurredAt: dateOf(entry.created),
  sourceId: idOf(entry.source),
  paymentIntentId: paymentIntentOf(entry.source),
  description: entry.description,
});

/** Charges, refunds and disputes name it; payouts do not. Needs `source` to be asked for. */
const paymentIntentOf = (source: Stripe.BalanceTransaction['source']): string | null =>
  typeof source === 'object' && source !== null && 'payment_intent' in source
    ? idOf(source.payment_intent)
    : null;
