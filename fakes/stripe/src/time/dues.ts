import type Stripe from 'stripe';
import { missEvidence, needsAnswer, openDispute } from '../payments/dispute-flow.js';
import { settleRefund } from '../payments/refund-flow.js';
import { expireSession } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';
import type { DisputePlan } from '../state/records.js';

/** Something that happens by itself at a moment. Once run, it is no longer due. */
export type Due = { atMs: number; run: () => void };

/** All that will happen by the stand-in's own time. */
export function* duesOf(standIn: StandIn): Generator<Due> {
  const { state } = standIn;
  for (const session of state.sessions.oldestFirst()) {
    if (session.status === 'open')
      yield { atMs: session.expires_at * 1000, run: () => expireSession(standIn, session, null) };
  }
  for (const { id, atMs, outcome } of state.refundPlans.oldestFirst()) {
    const refund = state.refunds.find(id);
    if (refund) yield { atMs, run: () => settleRefund(standIn, refund, outcome) };
  }
  for (const plan of state.disputePlans.oldestFirst()) {
    const charge = state.charges.find(plan.id);
    if (charge) yield { atMs: charge.created * 1000, run: () => disputeAsPlanned(standIn, charge, plan) };
  }
  for (const dispute of state.disputes.oldestFirst()) {
    const dueBy = dispute.evidence_details.due_by;
    if (needsAnswer(dispute) && dueBy !== null)
      yield { atMs: dueBy * 1000, run: () => missEvidence(standIn, dispute) };
  }
}

function disputeAsPlanned(standIn: StandIn, charge: Stripe.Charge, plan: DisputePlan): void {
  standIn.state.disputePlans.remove(plan.id);
  if (charge.disputed || charge.refunded) return;
  openDispute(standIn, charge, { ...plan, amount: null, evidenceDueBy: null });
}
