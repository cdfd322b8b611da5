import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { book, disputeFeeMinor } from '../resources/balance-transactions.js';
import { emptyEvidence } from '../resources/dispute-evidence.js';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';

export type DisputeOrder = {
  reason: string;
  /** Part of the charge; all that was not refunded where none is given. */
  amount: number | null;
  /** Unix seconds. */
  evidenceDueBy: number | null;
  /** The bank asks first, and takes nothing yet. */
  isInquiry: boolean;
};

export type DisputeEnd = 'won' | 'lost';
const secondsToAnswer = 9 * 24 * 3600;

/** A buyer's bank takes the money back, or asks whether it should. */
export function openDispute(standIn: StandIn, charge: Stripe.Charge, order: DisputeOrder): Stripe.Dispute {
  const left = charge.amount - charge.amount_refunded;
  const amount = order.amount ?? left;
  if (charge.disputed) throw refused(`Charge ${charge.id} is disputed already.`, undefined, 'payment_intent');
  if (charge.refunded)
    throw refused(
      `Charge ${charge.id} was refunded: nothing is left to dispute.`,
      undefined,
      'payment_intent',
    );
  if (amount < 1 || amount > left)
    throw refused(`Of charge ${charge.id}, from 1 to ${left} can be disputed.`, undefined, 'amount');
  const now = standIn.clock.nowSeconds();
  const brand = charge.payment_method_details?.card?.brand ?? 'visa';
  const dispute: Stripe.Dispute = {
    id: standIn.newId('dp'),
    object: 'dispute',
    amount,
    balance_transactions: [],
    charge: charge.id,
    created: now,
    currency: charge.currency,
    enhanced_eligibility_types: [],
    evidence: emptyEvidence(),
    evidence_details: {
      due_by: order.evidenceDueBy ?? now + secondsToAnswer,
      enhanced_eligibility: {},
      has_evidence: false,
      past_due: false,
      submission_count: 0,
      submission_method: 'not_submitted',
    },
    intended_submission_method: null,
    is_charge_refundable: order.isInquiry,
    livemode: false,
    metadata: {},
    payment_intent: charge.payment_intent,
    payment_method_details: {
      type: 'card',
      card: {
        brand,
        case_type: order.isInquiry ? 'inquiry' : 'chargeback',
        network: brand,
        network_reason_code: '10.4',
      },
    },
    reason: order.reason,
    status: order.isInquiry ? 'warning_needs_response' : 'needs_response',
  };
  standIn.state.disputes.add(dispute);
  charge.disputed = true;
  if (!order.isInquiry) moveMoney(standIn, dispute, -1);
  emit(standIn, 'charge.dispute.created', dispute, null);
  if (!order.isInquiry) emit(standIn, 'charge.dispute.funds_withdrawn', dispute, null);
  return dispute;
}

/** An inquiry becomes a dispute, and takes the money. */
export function escalateDispute(standIn: StandIn, dispute: Stripe.Dispute): Stripe.Dispute {
  if (!isInquiry(dispute)) throw refused(`Only an open inquiry can be escalated, not a ${dispute.status}.`);
  const before = { status: dispute.status, is_charge_refundable: dispute.is_charge_refundable };
  dispute.status = 'needs_response';
  dispute.is_charge_refundable = false;
  if (dispute.payment_method_details?.card) dispute.payment_method_details.card.case_type = 'chargeback';
  moveMoney(standIn, dispute, -1);
  emit(standIn, 'charge.dispute.updated', dispute, null, before);
  emit(standIn, 'charge.dispute.funds_withdrawn', dispute, null);
  return dispute;
}

/** The shop's evidence goes to the bank. */
export function reviewDispute(standIn: StandIn, dispute: Stripe.Dispute, cause: Cause): Stripe.Dispute {
  if (!isOpen(dispute)) throw refused(`This dispute is already closed (${dispute.status}).`);
  const before = { status: dispute.status, evidence_details: structuredClone(dispute.evidence_details) };
  dispute.status = isInquiry(dispute) ? 'warning_under_review' : 'under_review';
  dispute.evidence_details.has_evidence = true;
  dispute.evidence_details.submission_count += 1;
  dispute.evidence_details.submission_method = 'manual';
  emit(standIn, 'charge.dispute.updated', dispute, cause, before);
  return dispute;
}

/** An inquiry ends without a winner, whatever is asked for. */
export function closeDispute(
  standIn: StandIn,
  dispute: Stripe.Dispute,
  end: DisputeEnd,
  cause: Cause,
): Stripe.Dispute {
  if (!isOpen(dispute)) throw refused(`This dispute is already closed (${dispute.status}).`);
  if (isInquiry(dispute)) dispute.status = 'warning_closed';
  else dispute.status = end;
  if (dispute.status === 'won') {
    moveMoney(standIn, dispute, 1);
    emit(standIn, 'charge.dispute.funds_reinstated', dispute, cause);
  }
  emit(standIn, 'charge.dispute.closed', dispute, cause);
  return dispute;
}

/** The bank waits no longer for an answer: a dispute is lost, an inquiry forgotten. */
export function missEvidence(standIn: StandIn, dispute: Stripe.Dispute): void {
  dispute.evidence_details.past_due = true;
  closeDispute(standIn, dispute, 'lost', null);
}

export const needsAnswer = ({ status }: Stripe.Dispute): boolean =>
  status === 'needs_response' || status === 'warning_needs_response';

const isInquiry = ({ status }: Stripe.Dispute): boolean =>
  status === 'warning_needs_response' || status === 'warning_under_review';

const isOpen = (dispute: Stripe.Dispute): boolean =>
  isInquiry(dispute) || dispute.status === 'needs_response' || dispute.status === 'under_review';

function moveMoney(standIn: StandIn, dispute: Stripe.Dispute, sign: -1 | 1): void {
  const transaction = book(standIn, {
    type: 'adjustment',
    category: sign < 0 ? 'dispute' : 'dispute_reversal',
    amount: sign * dispute.amount,
    // The fee goes back to the shop with a dispute won.
    fee: -sign * disputeFeeMinor,
    currency: dispute.currency,
    source: dispute.id,
    description: sign < 0 ? `Chargeback withdrawal for ${dispute.charge}` : 'Chargeback reversal',
  });
  dispute.balance_transactions.push(structuredClone(transaction));
}
