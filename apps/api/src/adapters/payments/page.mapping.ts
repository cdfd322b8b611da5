import type Stripe from 'stripe';
import type { PaymentSession } from './payments.js';
import { dateOf, idOf } from './stripe-client.js';
import type { PledgePage } from './subscriptions.js';

export const toSession = (session: Stripe.Checkout.Session): PaymentSession => ({
  id: session.id,
  url: session.url,
  state:
    session.status === 'complete' && session.payment_status !== 'unpaid'
      ? 'paid'
      : session.status === 'expired'
        ? 'expired'
        : 'open',
  // The reference of a pledge's page is the pledge, not an order.
  orderId: session.mode === 'payment' ? session.client_reference_id : null,
  paymentIntentId: idOf(session.payment_intent),
  amountMinor: session.amount_total ?? 0,
  currency: (session.currency ?? '').toUpperCase(),
  email: session.customer_details?.email ?? session.customer_email,
  billingCountry: session.customer_details?.address?.country ?? null,
  billingName: session.customer_details?.name ?? null,
  billingLines: addressLines(session.customer_details?.address ?? null),
  expiresAt: dateOf(session.expires_at),
});

const addressLines = (address: Stripe.Address | null): string[] =>
  [
    address?.line1,
    address?.line2,
    [address?.postal_code, address?.city].filter(Boolean).join(' '),
    address?.state,
  ].filter((line): line is string => Boolean(line));

export const toPledgePage = (session: Stripe.Checkout.Session): PledgePage => ({
  id: session.id,
  kind: session.mode === 'setup' ? 'card' : 'pledge',
  url: session.url,
  state: session.status === 'complete' ? 'complete' : session.status === 'expired' ? 'expired' : 'open',
  pledgeId: session.client_reference_id,
  customerId: idOf(session.customer),
  subscriptionId: idOf(session.subscription) ?? session.metadata?.['subscription'] ?? null,
  email: session.customer_details?.email ?? session.customer_email,
  billingCountry: session.customer_details?.address?.country ?? null,
  expiresAt: dateOf(session.expires_at),
});
