import {
  advanceDraft,
  expireIncomplete,
  periodEnd,
  renewSubscription,
  secondsToComplete,
} from '../billing/run-subscription.js';
import { changeSubscription } from '../billing/changes.js';
import { collectInvoice } from '../billing/collect-invoice.js';
import { endSubscription } from '../billing/end-subscription.js';
import { missEvidence, needsAnswer, openDispute } from '../payments/dispute-flow.js';
import { settleRefund } from '../payments/refund-flow.js';
import { expireSession } from '../payments/session-flow.js';
import type Stripe from 'stripe';
import type { StandIn } from '../stand-in.js';
import type { DisputePlan } from '../state/records.js';

/** Something that happens by itself at a moment. Once run, it is no longer due. */
export type Due = { atMs: number; run: () => void };

/** All that will happen by the stand-in's own time. */
export function* duesOf(standIn: StandIn): Generator<Due> {
  const { state } = standIn;
  for (const session of state.sessions.oldestFirst()) {
    if (session.status === 'open')
      yield {
        atMs: (state.sessionDetails.find(session.id)?.endsAt ?? session.expires_at) * 1000,
        run: () => expireSession(standIn, session, null),
      };
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
  yield* billingDuesOf(standIn, null);
}

/** What subscriptions and invoices bring about: those of one test clock, or those of none. */
export function* billingDuesOf(standIn: StandIn, clockId: string | null): Generator<Due> {
  for (const invoice of standIn.state.invoices.oldestFirst()) {
    if (invoice.test_clock !== clockId) continue;
    if (invoice.status === 'draft' && invoice.automatically_finalizes_at !== null)
      yield { atMs: invoice.automatically_finalizes_at * 1000, run: () => advanceDraft(standIn, invoice) };
    if (invoice.status === 'open' && invoice.next_payment_attempt !== null)
      yield {
        atMs: invoice.next_payment_attempt * 1000,
        run: () => collectInvoice(standIn, invoice, { isScheduled: true, cause: null }),
      };
  }
  for (const subscription of standIn.state.subscriptions.oldestFirst()) {
    if (subscription.test_clock === clockId) yield* subscriptionDues(standIn, subscription);
  }
}

function* subscriptionDues(standIn: StandIn, subscription: Stripe.Subscription): Generator<Due> {
  if (subscription.ended_at !== null) return;
  if (subscription.status === 'incomplete') {
    const atMs = (subscription.created + secondsToComplete) * 1000;
    return yield { atMs, run: () => expireIncomplete(standIn, subscription, null) };
  }
  const resumesAt = subscription.pause_collection?.resumes_at ?? null;
  if (resumesAt !== null)
    yield {
      atMs: resumesAt * 1000,
      run: () =>
        changeSubscription(standIn, subscription, null, () => {
          subscription.pause_collection = null;
        }),
    };
  if (subscription.cancel_at !== null && !subscription.cancel_at_period_end)
    yield {
      atMs: subscription.cancel_at * 1000,
      run: () => endSubscription(standIn, subscription, 'cancellation_requested', null),
    };
  yield { atMs: periodEnd(subscription) * 1000, run: () => renewSubscription(standIn, subscription) };
}

function disputeAsPlanned(standIn: StandIn, charge: Stripe.Charge, plan: DisputePlan): void {
  standIn.state.disputePlans.remove(plan.id);
  if (charge.disputed || charge.refunded) return;
  openDispute(standIn, charge, { ...plan, amount: null, evidenceDueBy: null });
}
