import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { book } from '../resources/balance-transactions.js';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';

export const refundFailures = [
  'lost_or_stolen_card', 'expired_or_canceled_card', 'charge_for_pending_refund_disputed', 'insufficient_funds',
  'declined', 'merchant_request', 'unknown',
] as const; // prettier-ignore
export type RefundFailure = (typeof refundFailures)[number];

export type RefundOrder = {
  amount: number;
  reason: Stripe.Refund.Reason | null;
  metadata: Stripe.Metadata;
};

/** How long the bank of a card whose refunds are late, or come back, takes to say so. */
const bankSeconds = 60;

/**
 * Gives part of a charge back. What the caller is answered is the refund as it was just made: what the bank
 * adds to it comes later, by an event of its own.
 */
export function makeRefund(
  standIn: StandIn,
  charge: Stripe.Charge,
  order: RefundOrder,
  cause: Cause,
): Stripe.Refund {
  const temper = temperOf(standIn, charge);
  const isPending = temper === 'late' || temper === 'held';
  const refund: Stripe.Refund = {
    id: standIn.newId('re'),
    object: 'refund',
    amount: order.amount,
    balance_transaction: null,
    charge: charge.id,
    created: standIn.clock.nowSeconds(),
    currency: charge.currency,
    customer: charge.customer,
    customer_account: null,
    destination_details: {
      type: 'card',
      card: { reference_status: 'pending', reference_type: 'acquirer_reference_number', type: 'refund' },
    },
    metadata: order.metadata,
    payment_intent: charge.payment_intent,
    payment_method: charge.payment_method,
    ...(isPending ? { pending_reason: 'processing' } : {}),
    reason: order.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: isPending ? 'pending' : 'succeeded',
    transfer_reversal: null,
  };
  refund.balance_transaction = bookRefund(standIn, refund, -1);
  standIn.state.refunds.add(refund);
  const before = { amount_refunded: charge.amount_refunded, refunded: charge.refunded };
  addToCharge(charge, order.amount);
  emit(standIn, 'refund.created', refund, cause);
  emit(standIn, 'charge.refunded', charge, cause, before);
  const answer = structuredClone(refund);
  if (temper === 'at-once') giveReference(standIn, refund);
  else if (temper !== 'held') {
    const outcome = temper === 'late' ? ('succeeded' as const) : ('failed' as const);
    const atMs = standIn.clock.nowMs() + bankSeconds * 1000;
    standIn.state.refundPlans.add({ id: refund.id, atMs, outcome });
  }
  return answer;
}

/** The bank's word on a refund that waits, or on one that it sends back although it had gone through. */
export function settleRefund(
  standIn: StandIn,
  refund: Stripe.Refund,
  outcome: 'succeeded' | 'failed',
  failure: RefundFailure = 'unknown',
): Stripe.Refund {
  if (refund.status !== 'pending' && !(refund.status === 'succeeded' && outcome === 'failed')) {
    throw refused(`A refund that is ${refund.status} cannot become ${outcome}.`);
  }
  standIn.state.refundPlans.remove(refund.id);
  const before = { status: refund.status };
  refund.status = outcome;
  delete refund.pending_reason;
  if (outcome === 'succeeded') {
    giveReference(standIn, refund, before);
    return refund;
  }
  refund.failure_reason = failure;
  refund.failure_balance_transaction = bookRefund(standIn, refund, 1);
  const charge = standIn.state.charges.find(String(refund.charge));
  if (charge) {
    const chargeBefore = { amount_refunded: charge.amount_refunded, refunded: charge.refunded };
    addToCharge(charge, -refund.amount);
    emit(standIn, 'charge.updated', charge, null, chargeBefore);
  }
  emit(standIn, 'refund.updated', refund, null, before);
  emit(standIn, 'charge.refund.updated', refund, null, before);
  emit(standIn, 'refund.failed', refund, null);
  return refund;
}

function addToCharge(charge: Stripe.Charge, amount: number): void {
  charge.amount_refunded += amount;
  charge.refunded = charge.amount_refunded === charge.amount_captured;
}

/** Out of the balance (-1), or back into it (1) where the bank sent it back. */
function bookRefund(standIn: StandIn, refund: Stripe.Refund, sign: -1 | 1): string {
  const type = sign < 0 ? 'refund' : 'refund_failure';
  return book(standIn, {
    type,
    category: type,
    amount: sign * refund.amount,
    fee: 0,
    currency: refund.currency,
    source: refund.id,
    description: sign < 0 ? 'Refund' : 'Refund failure',
  }).id;
}

/** Card networks name a refund some time after it was made; the service tells of it by `refund.updated`. */
function giveReference(standIn: StandIn, refund: Stripe.Refund, before: Partial<Stripe.Refund> = {}): void {
  const previous = structuredClone(refund.destination_details);
  refund.destination_details = {
    type: 'card',
    card: {
      reference: String(Math.floor(standIn.ids.next() * 1e12)).padStart(12, '0'),
      reference_status: 'available',
      reference_type: 'acquirer_reference_number',
      type: 'refund',
    },
  };
  emit(standIn, 'refund.updated', refund, null, { ...before, destination_details: previous });
}

/** `held` refunds wait until somebody settles them by the control API. */
function temperOf(standIn: StandIn, charge: Stripe.Charge): 'at-once' | 'late' | 'bounce' | 'held' {
  if (standIn.state.areRefundsHeld) return 'held';
  return standIn.state.savedCards.find(String(charge.payment_method))?.refunds ?? 'at-once';
}
