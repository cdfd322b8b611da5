import type Stripe from 'stripe';
import { dateOf, dateOrNull, idOf } from './stripe-client.js';
import type { InvoiceState, PaymentInvoice } from './invoices.js';

const states: Readonly<Record<string, InvoiceState>> = {
  draft: 'draft',
  open: 'open',
  paid: 'paid',
  uncollectible: 'uncollectible',
  void: 'void',
};

/** `charge` is the one that paid it, where there is one: it knows the countries. */
export const toInvoice = (invoice: Stripe.Invoice, charge: Stripe.Charge | null): PaymentInvoice => {
  const parent = invoice.parent?.subscription_details;
  const period = monthOf(invoice);
  const state = states[invoice.status ?? ''] ?? 'draft';
  return {
    id: invoice.id,
    number: invoice.number,
    subscriptionId: idOf(parent?.subscription),
    customerId: idOf(invoice.customer),
    pledgeId: parent?.metadata?.['pledge'] ?? null,
    amountPaidMinor: invoice.amount_paid,
    amountDueMinor: invoice.amount_due,
    currency: invoice.currency.toUpperCase(),
    state,
    periodStart: dateOf(period.start),
    periodEnd: dateOf(period.end),
    paymentIntentId: paymentIntentOf(invoice),
    cardCountry: charge?.payment_method_details?.card?.country ?? null,
    billingCountry: charge?.billing_details.address?.country ?? invoice.customer_address?.country ?? null,
    attempts: invoice.attempt_count,
    nextAttemptAt: dateOrNull(invoice.next_payment_attempt),
    payUrl: state === 'open' ? (invoice.hosted_invoice_url ?? null) : null,
    createdAt: dateOf(invoice.created),
    paidAt: dateOrNull(invoice.status_transitions.paid_at),
  };
};

/** The payment that paid, else the one that waits. Needs `payments` to be asked for. */
export const paymentIntentOf = (invoice: Stripe.Invoice): string | null => {
  const payments = invoice.payments?.data ?? [];
  const payment = payments.find(({ status }) => status === 'paid') ?? payments.find((one) => one.is_default);
  return idOf(payment?.payment.payment_intent);
};

/** `period_start` and `period_end` of the invoice itself are those of the month before it. */
const monthOf = (invoice: Stripe.Invoice): { start: number; end: number } => {
  const lines = invoice.lines.data;
  const line = lines.find(({ parent }) => parent?.subscription_item_details?.proration === false) ?? lines[0];
  return line?.period ?? { start: invoice.period_start, end: invoice.period_end };
};
