import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { closeDispute, reviewDispute } from '../payments/dispute-flow.js';
import type { StandIn } from '../stand-in.js';
import { readEvidence } from './dispute-evidence.js';
import { emit } from './events.js';

export const disputeReasons = [
  'bank_cannot_process', 'check_returned', 'credit_not_processed', 'customer_initiated', 'debit_not_authorized',
  'duplicate', 'fraudulent', 'general', 'incorrect_account_details', 'insufficient_funds', 'noncompliant',
  'product_not_received', 'product_unacceptable', 'subscription_canceled', 'unrecognized',
] as const; // prettier-ignore
export const disputeEnds = ['won', 'lost'] as const;

/** The successful charge of a payment intent, for a dispute. */
export function disputableCharge(standIn: StandIn, intentId: string): Stripe.Charge {
  const intent = existing(standIn.state.paymentIntents, 'payment_intent', intentId, 'payment_intent');
  const charge =
    intent.status === 'succeeded' ? standIn.state.charges.find(String(intent.latest_charge)) : undefined;
  if (!charge)
    throw badParameter('payment_intent', `Nothing was paid by ${intentId}: there is nothing to dispute.`);
  return charge;
}

/** `submit` is true where nothing else is said, as at the service. */
function updateFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.Dispute {
  fields.allowOnly('evidence', 'metadata', 'submit', 'expand');
  const dispute = existing(standIn.state.disputes, 'dispute', id, 'dispute');
  const isSubmitted = fields.boolean('submit') ?? true;
  dispute.metadata = fields.metadata('metadata', dispute.metadata);
  const hasEvidence = readEvidence(dispute.evidence, fields.object('evidence'));
  if (hasEvidence && isSubmitted) return reviewDispute(standIn, dispute, cause);
  const before = { evidence_details: structuredClone(dispute.evidence_details) };
  dispute.evidence_details.has_evidence ||= hasEvidence;
  emit(standIn, 'charge.dispute.updated', dispute, cause, before);
  return dispute;
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
  { method: 'post', path: '/v1/disputes/:id', run: updateFromCall },
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
