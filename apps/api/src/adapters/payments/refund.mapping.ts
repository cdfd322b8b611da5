import type Stripe from 'stripe';
import type { PaymentRefund, RefundState } from './payments.js';
import { dateOf, idOf } from './stripe-client.js';

const states: Readonly<Record<string, RefundState>> = {
  pending: 'pending',
  requires_action: 'needs-action',
  succeeded: 'succeeded',
  failed: 'failed',
  canceled: 'cancelled',
};

export const toRefund = (refund: Stripe.Refund): PaymentRefund => ({
  id: refund.id,
  paymentIntentId: idOf(refund.payment_intent),
  chargeId: idOf(refund.charge),
  amountMinor: refund.amount,
  currency: refund.currency.toUpperCase(),
  // A state of a later day is one that is not settled yet, as far as the shop can tell.
  state: states[refund.status ?? ''] ?? 'pending',
  failure: refund.failure_reason ?? null,
  metadata: refund.metadata ?? {},
  createdAt: dateOf(refund.created),
});
