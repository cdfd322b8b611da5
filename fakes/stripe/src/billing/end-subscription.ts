import type Stripe from 'stripe';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';
import { changeInvoice, subscriptionOf } from './changes.js';

/** Ends it for good. What was paid stays paid; what is owed is no longer collected by itself. */
export function endSubscription(
  standIn: StandIn,
  subscription: Stripe.Subscription,
  reason: Stripe.Subscription.CancellationDetails.Reason,
  cause: Cause,
): void {
  const now = standIn.clock.nowSeconds();
  for (const invoice of standIn.state.invoices.oldestFirst()) {
    if (invoice.status !== 'open' && invoice.status !== 'draft') continue;
    if (subscriptionOf(standIn, invoice) !== subscription) continue;
    changeInvoice(standIn, invoice, cause, () => {
      invoice.auto_advance = false;
      invoice.automatically_finalizes_at = null;
      invoice.next_payment_attempt = null;
    });
  }
  subscription.status = 'canceled';
  subscription.ended_at = now;
  subscription.canceled_at ??= now;
  subscription.cancel_at = null;
  subscription.pause_collection = null;
  if (subscription.cancellation_details) subscription.cancellation_details.reason ??= reason;
  emit(standIn, 'customer.subscription.deleted', subscription, cause);
}
