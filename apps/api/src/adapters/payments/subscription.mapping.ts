import type Stripe from 'stripe';
import { dateOf, dateOrNull, idOf, objectOf } from './stripe-client.js';
import type { PaymentSubscription, SubscriptionState } from './subscriptions.js';

const states: Readonly<Record<string, SubscriptionState>> = {
  incomplete: 'incomplete',
  incomplete_expired: 'incomplete-expired',
  active: 'active',
  trialing: 'active',
  // The service's own `paused` follows a trial without a card; `isPaused` tells.
  paused: 'active',
  past_due: 'past-due',
  unpaid: 'unpaid',
  canceled: 'cancelled',
};

/** What `toSubscription` needs to see beside the ids. */
export const subscriptionExpand = [
  'default_payment_method',
  'customer.invoice_settings.default_payment_method',
];

export const toSubscription = (subscription: Stripe.Subscription): PaymentSubscription => {
  const items = subscription.items.data;
  const periods = items.map((item) => [item.current_period_start, item.current_period_end] as const);
  return {
    id: subscription.id,
    state: states[subscription.status] ?? 'unpaid',
    customerId: idOf(subscription.customer) ?? '',
    pledgeId: subscription.metadata['pledge'] ?? null,
    amountMinor: items.reduce((sum, item) => sum + (item.price.unit_amount ?? 0) * (item.quantity ?? 1), 0),
    currency: subscription.currency.toUpperCase(),
    currentPeriodStart: dateOf(Math.max(...periods.map(([start]) => start))),
    currentPeriodEnd: dateOf(Math.min(...periods.map(([, end]) => end))),
    cancelAtPeriodEnd: subscription.cancel_at_period_end,
    isPaused: subscription.pause_collection !== null || subscription.status === 'paused',
    latestInvoiceId: idOf(subscription.latest_invoice),
    cardLast4: cardOf(subscription)?.last4 ?? null,
    startedAt: dateOf(subscription.start_date),
    endedAt: dateOrNull(subscription.ended_at),
  };
};

/** The subscription's own card goes before the customer's. */
const cardOf = (subscription: Stripe.Subscription): Stripe.PaymentMethod.Card | null => {
  const customer = objectOf<Stripe.Customer>(subscription.customer);
  const own = objectOf<Stripe.PaymentMethod>(subscription.default_payment_method);
  const method = own ?? objectOf<Stripe.PaymentMethod>(customer?.invoice_settings.default_payment_method);
  return method?.card ?? null;
};
