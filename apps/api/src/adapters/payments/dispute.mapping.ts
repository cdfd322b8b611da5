import type Stripe from 'stripe';
import type { DisputeState, PaymentDispute } from './payments.js';
import { dateOf, dateOrNull, idOf } from './stripe-client.js';

const states: Readonly<Record<string, DisputeState>> = {
  needs_response: 'needs-response',
  appeal_needs_response: 'needs-response',
  under_review: 'under-review',
  appeal_under_review: 'under-review',
  won: 'won',
  lost: 'lost',
  warning_needs_response: 'inquiry',
  warning_under_review: 'inquiry',
  warning_closed: 'inquiry-closed',
  // Ended before it took any money.
  prevented: 'inquiry-closed',
};

export const toDispute = (dispute: Stripe.Dispute): PaymentDispute => ({
  id: dispute.id,
  paymentIntentId: idOf(dispute.payment_intent),
  chargeId: idOf(dispute.charge) ?? '',
  amountMinor: dispute.amount,
  currency: dispute.currency.toUpperCase(),
  reason: dispute.reason,
  state: states[dispute.status] ?? 'under-review',
  evidenceDueAt: dateOrNull(dispute.evidence_details.due_by),
  hasEvidence: dispute.evidence_details.has_evidence,
  createdAt: dateOf(dispute.created),
});
