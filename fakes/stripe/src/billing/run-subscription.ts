import type Stripe from 'stripe';
import { emit } from '../resources/events.js';
import { subscriptionObject, type Part } from '../resources/subscription-object.js';
import type { Cause, StandIn } from '../stand-in.js';
import { changeSubscription, customerOf, subscriptionOf } from './changes.js';
import { collectInvoice } from './collect-invoice.js';
import { endSubscription } from './end-subscription.js';
import { draftInvoice, finalizeInvoice, giveUpInvoice, voidInvoice } from './invoices.js';
import { boundary, boundaryAfter, type Rhythm } from './periods.js';

/** How long the first payment may take. */
export const secondsToComplete = 23 * 3600;

export type StartOrder = {
  customer: Stripe.Customer;
  parts: readonly Part[];
  currency: string;
  description: string | null;
  metadata: Stripe.Metadata;
  defaultPaymentMethod: string | null;
  /** A later day on which months begin; nothing is taken until then. */
  anchor: number | null;
};

/** Begins a subscription, with its first invoice ready to be paid; what becomes of it depends on that payment. */
export function startSubscription(
  standIn: StandIn,
  order: StartOrder,
  cause: Cause,
): { subscription: Stripe.Subscription; invoice: Stripe.Invoice | null } {
  const now = standIn.clock.nowSeconds();
  const anchor = order.anchor ?? now;
  const end = order.anchor ?? boundary(now, rhythmOf(order.parts.map(({ price }) => price)), 1);
  const subscription = standIn.state.subscriptions.add(
    subscriptionObject(standIn, {
      ...order,
      anchor,
      period: { start: now, end },
      status: order.anchor === null ? 'incomplete' : 'active',
    }),
  );
  order.customer.currency ??= order.currency;
  if (order.anchor !== null) {
    emit(standIn, 'customer.subscription.created', subscription, cause);
    return { subscription, invoice: null };
  }
  const invoice = draftInvoice(standIn, {
    subscription,
    customer: order.customer,
    reason: 'subscription_create',
    since: now,
    finalizesAt: now,
  });
  subscription.latest_invoice = invoice.id;
  emit(standIn, 'customer.subscription.created', subscription, cause);
  emit(standIn, 'invoice.created', invoice, cause);
  finalizeInvoice(standIn, invoice, cause);
  return { subscription, invoice };
}

/** The first payment did not come in time. */
export function expireIncomplete(standIn: StandIn, subscription: Stripe.Subscription, cause: Cause): void {
  changeSubscription(standIn, subscription, cause, () => {
    subscription.status = 'incomplete_expired';
    subscription.ended_at = standIn.clock.nowSeconds();
  });
  const invoice = standIn.state.invoices.find(String(subscription.latest_invoice));
  if (invoice?.status === 'open') voidInvoice(standIn, invoice, cause);
}

/** A period is over: the subscription ends, or the next one begins with an invoice. */
export function renewSubscription(standIn: StandIn, subscription: Stripe.Subscription): void {
  const end = periodEnd(subscription);
  if (subscription.cancel_at_period_end) {
    return endSubscription(standIn, subscription, 'cancellation_requested', null);
  }
  beginPeriod(standIn, subscription, end, 'subscription_cycle', null);
}

/** Begins a period at `start`, and draws its invoice up. It is finalized an hour later, or as it is set. */
export function beginPeriod(
  standIn: StandIn,
  subscription: Stripe.Subscription,
  start: number,
  reason: 'subscription_cycle' | 'subscription_update',
  cause: Cause,
): Stripe.Invoice {
  const { state } = standIn;
  const since = Math.min(...subscription.items.data.map((item) => item.current_period_start));
  const rhythm = rhythmOf(subscription.items.data.map(({ price }) => price));
  const before = { items: structuredClone(subscription.items), latest_invoice: subscription.latest_invoice };
  for (const item of subscription.items.data) {
    item.current_period_start = start;
    item.current_period_end = boundaryAfter(subscription.billing_cycle_anchor, rhythm, start);
  }
  const isKept =
    subscription.status === 'unpaid' || subscription.pause_collection?.behavior === 'keep_as_draft';
  const invoice = draftInvoice(standIn, {
    subscription,
    customer: customerOf(standIn, subscription),
    reason,
    since,
    finalizesAt: isKept ? null : standIn.clock.nowSeconds() + state.billing.finalizeSeconds,
  });
  subscription.latest_invoice = invoice.id;
  emit(standIn, 'customer.subscription.updated', subscription, cause, before);
  emit(standIn, 'invoice.created', invoice, cause);
  return invoice;
}

/** The hour of a draft is over: it is finalized and collected, or dropped where collection is paused. */
export function advanceDraft(standIn: StandIn, invoice: Stripe.Invoice): void {
  const pause = subscriptionOf(standIn, invoice)?.pause_collection?.behavior;
  finalizeInvoice(standIn, invoice, null, !pause);
  if (pause === 'void') voidInvoice(standIn, invoice, null);
  else if (pause) giveUpInvoice(standIn, invoice, null);
  else collectInvoice(standIn, invoice, { isScheduled: true, cause: null });
}

export const periodEnd = (subscription: Stripe.Subscription): number =>
  Math.min(...subscription.items.data.map((item) => item.current_period_end));

/** All parts of a subscription have one rhythm; that was checked when it began. */
export function rhythmOf(prices: readonly Stripe.Price[]): Rhythm {
  const recurring = prices[0]?.recurring;
  if (!recurring) throw new Error('A subscription without a recurring price.');
  return recurring;
}
