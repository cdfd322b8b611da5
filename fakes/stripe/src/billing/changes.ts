import type Stripe from 'stripe';
import { previousOf } from '../resources/changes.js';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';

/** Changes a subscription and tells of it, where anything changed. */
export function changeSubscription(
  standIn: StandIn,
  subscription: Stripe.Subscription,
  cause: Cause,
  change: (subscription: Stripe.Subscription) => void,
): void {
  const before = structuredClone(subscription);
  change(subscription);
  const previous = previousOf(before, subscription);
  if (previous) emit(standIn, 'customer.subscription.updated', subscription, cause, previous);
}

/** Changes an invoice and tells of it, where anything changed. */
export function changeInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  cause: Cause,
  change: (invoice: Stripe.Invoice) => void,
): void {
  const before = structuredClone(invoice);
  change(invoice);
  const previous = previousOf(before, invoice);
  if (previous) emit(standIn, 'invoice.updated', invoice, cause, previous);
}

/** The subscription that an invoice is a month of. */
export function subscriptionOf(standIn: StandIn, invoice: Stripe.Invoice): Stripe.Subscription | null {
  const id = invoice.parent?.subscription_details?.subscription;
  return standIn.state.subscriptions.find(String(id)) ?? null;
}

export function customerOf(standIn: StandIn, owner: Stripe.Subscription | Stripe.Invoice): Stripe.Customer {
  const customer = standIn.state.customers.find(String(owner.customer));
  if (!customer) throw new Error(`${owner.id} has lost its customer.`);
  return customer;
}

/** The payment intent of a finalized invoice, where there was something to pay. */
export function intentOf(standIn: StandIn, invoice: Stripe.Invoice): Stripe.PaymentIntent | null {
  const payment = paymentOf(standIn, invoice);
  return standIn.state.paymentIntents.find(String(payment?.payment.payment_intent)) ?? null;
}

export function paymentOf(standIn: StandIn, invoice: Stripe.Invoice): Stripe.InvoicePayment | null {
  const payments = standIn.state.invoicePayments.oldestFirst();
  return payments.find((payment) => payment.invoice === invoice.id) ?? null;
}
