import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { Cause, StandIn } from '../stand-in.js';
import { emit } from './events.js';

export const disputeReasons = [
  'bank_cannot_process', 'check_returned', 'credit_not_processed', 'customer_initiated', 'debit_not_authorized',
  'duplicate', 'fraudulent', 'general', 'incorrect_account_details', 'insufficient_funds', 'noncompliant',
  'product_not_received', 'product_unacceptable', 'subscription_canceled', 'unrecognized',
] as const; // prettier-ignore
export const disputeEnds = ['won', 'lost'] as const;

const daysToAnswer = 9;

/** A buyer's bank takes the money back. */
export function openDispute(standIn: StandIn, charge: Stripe.Charge, reason: string): Stripe.Dispute {
  if (charge.disputed) throw refused(`Charge ${charge.id} is disputed already.`, undefined, 'payment_intent');
  if (charge.refunded)
    throw refused(
      `Charge ${charge.id} was refunded: nothing is left to dispute.`,
      undefined,
      'payment_intent',
    );
  const now = standIn.clock.nowSeconds();
  const brand = charge.payment_method_details?.card?.brand ?? 'visa';
  const dispute: Stripe.Dispute = {
    id: standIn.newId('dp'),
    object: 'dispute',
    amount: charge.amount - charge.amount_refunded,
    balance_transactions: [],
    charge: charge.id,
    created: now,
    currency: charge.currency,
    enhanced_eligibility_types: [],
    evidence: emptyEvidence(),
    evidence_details: {
      due_by: now + daysToAnswer * 24 * 3600,
      enhanced_eligibility: {},
      has_evidence: false,
      past_due: false,
      submission_count: 0,
      submission_method: 'not_submitted',
    },
    intended_submission_method: null,
    is_charge_refundable: false,
    livemode: false,
    metadata: {},
    payment_intent: charge.payment_intent,
    payment_method_details: {
      type: 'card',
      card: { brand, case_type: 'chargeback', network: brand, network_reason_code: '10.4' },
    },
    reason,
    status: 'needs_response',
  };
  standIn.state.disputes.add(dispute);
  charge.disputed = true;
  emit(standIn, 'charge.dispute.created', dispute, null);
  emit(standIn, 'charge.dispute.funds_withdrawn', dispute, null);
  return dispute;
}

export function closeDispute(
  standIn: StandIn,
  dispute: Stripe.Dispute,
  status: (typeof disputeEnds)[number],
  cause: Cause,
): Stripe.Dispute {
  if (dispute.status === 'won' || dispute.status === 'lost') {
    throw refused(`This dispute is already closed (${dispute.status}).`);
  }
  dispute.status = status;
  if (status === 'won') emit(standIn, 'charge.dispute.funds_reinstated', dispute, cause);
  emit(standIn, 'charge.dispute.closed', dispute, cause);
  return dispute;
}

/** The successful charge of a payment intent, for a dispute. */
export function disputableCharge(standIn: StandIn, intentId: string): Stripe.Charge {
  const intent = existing(standIn.state.paymentIntents, 'payment_intent', intentId, 'payment_intent');
  const charge =
    intent.status === 'succeeded' ? standIn.state.charges.find(String(intent.latest_charge)) : undefined;
  if (!charge)
    throw badParameter('payment_intent', `Nothing was paid by ${intentId}: there is nothing to dispute.`);
  return charge;
}

function emptyEvidence(): Stripe.Dispute.Evidence {
  return {
    access_activity_log: null,
    billing_address: null,
    cancellation_policy: null,
    cancellation_policy_disclosure: null,
    cancellation_rebuttal: null,
    customer_communication: null,
    customer_email_address: null,
    customer_name: null,
    customer_purchase_ip: null,
    customer_signature: null,
    duplicate_charge_documentation: null,
    duplicate_charge_explanation: null,
    duplicate_charge_id: null,
    enhanced_evidence: {},
    product_description: null,
    receipt: null,
    refund_policy: null,
    refund_policy_disclosure: null,
    refund_refusal_explanation: null,
    service_date: null,
    service_documentation: null,
    shipping_address: null,
    shipping_carrier: null,
    shipping_date: null,
    shipping_documentation: null,
    shipping_tracking_number: null,
    uncategorized_file: null,
    uncategorized_text: null,
  };
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'payment_intent', 'charge', 'created');
  const intentId = call.fields.string('payment_intent');
  const chargeId = call.fields.string('charge');
  const disputes = call.standIn.state.disputes
    .newestFirst()
    .filter((dispute) => intentId === null || dispute.payment_intent === intentId)
    .filter((dispute) => chargeId === null || dispute.charge === chargeId)
    .filter(createdFilter(call.fields));
  return pageOf(call, disputes);
}

export const disputeRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/disputes', run: listFromCall },
  {
    method: 'get',
    path: '/v1/disputes/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.disputes, 'dispute', id, 'dispute');
    },
  },
  {
    method: 'post',
    path: '/v1/disputes/:id/close',
    // Closing by the API means giving in.
    run: ({ standIn, id, fields, cause }) => {
      fields.allowOnly('expand');
      return closeDispute(standIn, existing(standIn.state.disputes, 'dispute', id, 'dispute'), 'lost', cause);
    },
  },
];
