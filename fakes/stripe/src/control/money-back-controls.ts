import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { closeDispute, escalateDispute, openDispute, reviewDispute } from '../payments/dispute-flow.js';
import { refundFailures, settleRefund } from '../payments/refund-flow.js';
import { disputableCharge, disputeEnds, disputeReasons } from '../resources/disputes.js';
import { refundByHand } from '../resources/refunds.js';
import type { StandIn } from '../stand-in.js';
import type { Control } from './control.js';

/** What happens to money that was paid: refunds made by hand at the service, the bank's word, disputes. */
export function moneyBackControls(standIn: StandIn): Record<string, Control> {
  const refundOf = (id: string) => existing(standIn.state.refunds, 'refund', id);
  const disputeOf = (id: string) => existing(standIn.state.disputes, 'dispute', id);
  return {
    '/refunds': (fields) => refundByHand(standIn, fields),
    '/refunds/hold': (fields) => {
      fields.allowOnly('held');
      standIn.state.areRefundsHeld = fields.boolean('held') ?? true;
      return { held: standIn.state.areRefundsHeld };
    },
    '/refunds/:id/settle': (fields, id) => {
      fields.allowOnly('status', 'failure_reason');
      const status = fields.requiredOneOf('status', ['succeeded', 'failed']);
      const failure = fields.oneOf('failure_reason', refundFailures) ?? undefined;
      return settleRefund(standIn, refundOf(id), status, failure);
    },
    '/disputes': (fields) => openFromFields(standIn, fields),
    '/disputes/:id/review': (_fields, id) => reviewDispute(standIn, disputeOf(id), null),
    '/disputes/:id/escalate': (_fields, id) => escalateDispute(standIn, disputeOf(id)),
    '/disputes/:id/close': (fields, id) => {
      fields.allowOnly('status');
      return closeDispute(standIn, disputeOf(id), fields.requiredOneOf('status', disputeEnds), null);
    },
  };
}

function openFromFields(standIn: StandIn, fields: Fields): Stripe.Dispute {
  fields.allowOnly('payment_intent', 'reason', 'amount', 'evidence_due_by', 'inquiry');
  const charge = disputableCharge(standIn, fields.requiredString('payment_intent'));
  const evidenceDueBy = fields.integer('evidence_due_by');
  if (evidenceDueBy !== null && evidenceDueBy <= standIn.clock.nowSeconds())
    throw badParameter('evidence_due_by', 'evidence_due_by must lie in the future, in unix seconds.');
  return openDispute(standIn, charge, {
    reason: fields.oneOf('reason', disputeReasons) ?? 'fraudulent',
    amount: fields.integer('amount'),
    evidenceDueBy,
    isInquiry: fields.boolean('inquiry') ?? false,
  });
}
