import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { emit } from '../resources/events.js';
import { invoiceObject, type InvoiceOrder } from '../resources/invoice-object.js';
import { createInvoicePayment } from '../resources/invoice-payments.js';
import { cancelIntent, createPaymentIntent } from '../resources/payment-intents.js';
import type { Cause, StandIn } from '../stand-in.js';
import { changeSubscription, customerOf, intentOf, paymentOf, subscriptionOf } from './changes.js';

/** Draws an invoice up. The caller tells of it (`invoice.created`) once the subscription names it. */
export function draftInvoice(standIn: StandIn, order: InvoiceOrder): Stripe.Invoice {
  return standIn.state.invoices.add(invoiceObject(standIn, order));
}

/**
 * Gives a draft its number, its page and, where something is to be collected, its payment intent. From here on
 * its amounts are fixed.
 */
export function finalizeInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  cause: Cause,
  isCollected = true,
): void {
  if (invoice.status !== 'draft') throw refused(`This invoice is already finalized (${invoice.status}).`);
  const customer = customerOf(standIn, invoice);
  const now = standIn.clock.nowSeconds();
  const sequence = customer.next_invoice_sequence ?? 1;
  customer.next_invoice_sequence = sequence + 1;
  invoice.number = `${customer.invoice_prefix ?? 'INV'}-${String(sequence).padStart(4, '0')}`;
  invoice.status = 'open';
  invoice.effective_at = now;
  invoice.status_transitions.finalized_at = now;
  invoice.automatically_finalizes_at = null;
  invoice.next_payment_attempt = null;
  invoice.starting_balance = 0;
  invoice.ending_balance = 0;
  const page = standIn.ids.word(40);
  standIn.state.invoicePages.add({ id: page, invoiceId: invoice.id, waiting: null });
  invoice.hosted_invoice_url = `${standIn.settings.publicUrl}/invoice/${page}`;
  emit(standIn, 'invoice.finalized', invoice, cause);
  if (!isCollected || invoice.amount_due === 0) return;
  const isFirst = invoice.billing_reason === 'subscription_create';
  const intent = createPaymentIntent(
    standIn,
    {
      amount: invoice.amount_due,
      currency: invoice.currency,
      customer: customer.id,
      description: isFirst ? 'Subscription creation' : 'Subscription update',
      metadata: {},
      receiptEmail: null,
      isCardKept: true,
    },
    cause,
  );
  createInvoicePayment(standIn, invoice, intent.id);
}

/** Nobody is to pay it any more. */
export function voidInvoice(standIn: StandIn, invoice: Stripe.Invoice, cause: Cause): void {
  close(standIn, invoice, 'void', cause);
  invoice.status_transitions.voided_at = standIn.clock.nowSeconds();
  const intent = intentOf(standIn, invoice);
  if (intent && intent.status !== 'succeeded' && intent.status !== 'canceled')
    cancelIntent(standIn, intent, 'void_invoice', cause);
  const payment = paymentOf(standIn, invoice);
  if (payment) {
    payment.status = 'canceled';
    payment.status_transitions.canceled_at = standIn.clock.nowSeconds();
  }
  emit(standIn, 'invoice.voided', invoice, cause);
  clearDebt(standIn, invoice, cause);
}

/** Nobody is expected to pay it; it can be paid all the same. */
export function giveUpInvoice(standIn: StandIn, invoice: Stripe.Invoice, cause: Cause): void {
  close(standIn, invoice, 'uncollectible', cause);
  invoice.status_transitions.marked_uncollectible_at = standIn.clock.nowSeconds();
  emit(standIn, 'invoice.marked_uncollectible', invoice, cause);
  clearDebt(standIn, invoice, cause);
}

function close(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  status: 'void' | 'uncollectible',
  cause: Cause,
): void {
  if (invoice.status === 'draft') finalizeInvoice(standIn, invoice, cause, false);
  if (invoice.status !== 'open' && invoice.status !== 'uncollectible')
    throw refused(`This invoice is ${invoice.status} and cannot become ${status}.`);
  invoice.status = status;
  invoice.auto_advance = false;
  invoice.next_payment_attempt = null;
}

/** A subscription owes nothing once its latest invoice is out of the world. */
export function clearDebt(standIn: StandIn, invoice: Stripe.Invoice, cause: Cause): void {
  const subscription = subscriptionOf(standIn, invoice);
  if (!subscription || subscription.latest_invoice !== invoice.id) return;
  const isOwing = subscription.status === 'past_due' || subscription.status === 'unpaid';
  if (!isOwing && !(subscription.status === 'incomplete' && invoice.status === 'paid')) return;
  changeSubscription(standIn, subscription, cause, () => {
    subscription.status = 'active';
  });
  customerOf(standIn, subscription).delinquent = false;
}
