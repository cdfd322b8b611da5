import type Stripe from 'stripe';
import { intentOf } from '../billing/changes.js';
import { tryInvoice } from '../billing/collect-invoice.js';
import { expireIncomplete, startSubscription } from '../billing/run-subscription.js';
import { createCustomer } from '../resources/customers.js';
import { attachMethod, createPaymentMethod } from '../resources/payment-methods.js';
import type { StandIn } from '../stand-in.js';
import type { SessionDetail } from '../state/state.js';
import { endOf, readyIntent, refusedStep, refuseIntent } from './charge-intent.js';
import { customerOf, pageUrl, type PageFlow, type Visit } from './page-flow.js';

/**
 * Mode `subscription`: the first try begins a subscription that is incomplete; the try that pays its first
 * invoice makes it active. A page that ends before leaves it expired.
 */
export const paySubscription: PageFlow = {
  start: (visit) => {
    const { standIn, session, card, buyer } = visit;
    const invoice = invoiceFor(visit);
    const intent = intentOf(standIn, invoice);
    if (!intent) throw new Error(`The invoice ${invoice.id} has nothing to pay.`);
    const method = createPaymentMethod(standIn, card, buyer);
    return readyIntent(standIn, intent, method, card.behaviour, pageUrl(standIn, session));
  },

  finish: ({ standIn, session, detail, card }, isAuthenticated) => {
    const { subscription, invoice } = begun(standIn, detail);
    const method = standIn.state.paymentMethods.find(String(intentOf(standIn, invoice)?.payment_method));
    if (!method) throw new Error(`The payment intent of ${invoice.id} has lost its card.`);
    if (endOf(card.behaviour).kind === 'succeeds') {
      attachMethod(standIn, method, String(subscription.customer), null);
      subscription.default_payment_method = method.id;
    }
    const { behaviour } = card;
    const attempt = { method, card, behaviour, isAuthenticated, cause: null };
    const decline = tryInvoice(standIn, invoice, attempt, false);
    if (decline) return decline.message;
    session.subscription = subscription.id;
    session.invoice = invoice.id;
    session.payment_status = 'paid';
    return null;
  },

  refuse: ({ standIn, detail }) => {
    const intent = intentOf(standIn, begun(standIn, detail).invoice);
    if (intent) refuseIntent(standIn, intent);
    return refusedStep;
  },

  drop: (standIn, _session, detail, cause) => {
    if (detail.subscriptionId) expireIncomplete(standIn, begun(standIn, detail).subscription, cause);
  },
};

/** The first invoice, of the subscription that is begun here if it was not yet. */
function invoiceFor(visit: Visit): Stripe.Invoice {
  const { standIn, session, detail, buyer } = visit;
  if (detail.subscriptionId) {
    const { subscription, invoice } = begun(standIn, detail);
    if (subscription.status === 'incomplete') return invoice;
  }
  session.customer ??= createCustomer(standIn, buyer, null).id;
  const customer = standIn.state.customers.find(customerOf(session) ?? '');
  if (!customer) throw new Error(`The session ${session.id} has lost its customer.`);
  const { subscription, invoice } = startSubscription(
    standIn,
    {
      customer,
      parts: detail.lineItems.map((line) => ({
        price: structuredClone(line.price as Stripe.Price),
        quantity: line.quantity ?? 1,
      })),
      currency: session.currency ?? '',
      description: detail.subscriptionData.description,
      metadata: detail.subscriptionData.metadata,
      defaultPaymentMethod: null,
      anchor: null,
    },
    null,
  );
  detail.subscriptionId = subscription.id;
  if (!invoice) throw new Error(`The subscription ${subscription.id} has no first invoice.`);
  return invoice;
}

function begun(
  standIn: StandIn,
  detail: SessionDetail,
): { subscription: Stripe.Subscription; invoice: Stripe.Invoice } {
  const subscription = standIn.state.subscriptions.find(detail.subscriptionId ?? '');
  const invoice = standIn.state.invoices.find(String(subscription?.latest_invoice));
  if (!subscription || !invoice) throw new Error(`The session ${detail.id} has lost its subscription.`);
  return { subscription, invoice };
}
