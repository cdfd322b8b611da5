import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { changeSubscription, intentOf, subscriptionOf } from '../billing/changes.js';
import { tryInvoice } from '../billing/collect-invoice.js';
import { attachMethod, createPaymentMethod } from '../resources/payment-methods.js';
import type { StandIn } from '../stand-in.js';
import type { Buyer, InvoicePage } from '../state/records.js';
import { inTimeOf } from '../time/in-time-of.js';
import type { Card } from './cards.js';
import { readyIntent, refusedStep, refuseIntent } from './charge-intent.js';
import type { PayResult } from './page-flow.js';

export const invoicePageUrl = (standIn: StandIn, page: InvoicePage): string =>
  `${standIn.settings.publicUrl}/invoice/${page.id}`;

/** Somebody pays an open invoice at its own page, with whichever card. */
export function payInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  page: InvoicePage,
  buyer: Buyer,
  card: Card,
): PayResult {
  const intent = payableIntent(standIn, invoice);
  return inTimeOf(standIn, invoice.test_clock as string | null, () => {
    const method = createPaymentMethod(standIn, card, buyer);
    const step = readyIntent(standIn, intent, method, card.behaviour, invoicePageUrl(standIn, page));
    if (step === 'ready') return finish(standIn, invoice, method, card, false);
    page.waiting = { cardNumber: card.number, cardCountry: card.country, buyer };
    return { kind: 'second-step' };
  });
}

export function answerInvoiceStep(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  page: InvoicePage,
  card: Card,
  isApproved: boolean,
): PayResult {
  const intent = payableIntent(standIn, invoice);
  const method = standIn.state.paymentMethods.find(String(intent.payment_method));
  if (!page.waiting || !method) throw refused(`The invoice ${invoice.id} waits for no second step.`);
  page.waiting = null;
  return inTimeOf(standIn, invoice.test_clock as string | null, () => {
    if (isApproved) return finish(standIn, invoice, method, card, true);
    refuseIntent(standIn, intent);
    return { kind: 'declined', message: refusedStep };
  });
}

/** The card that paid is the subscription's from now on. */
function finish(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  method: Stripe.PaymentMethod,
  card: Card,
  isAuthenticated: boolean,
): PayResult {
  const attempt = { method, card, behaviour: card.behaviour, isAuthenticated, cause: null };
  const decline = tryInvoice(standIn, invoice, attempt, false);
  if (decline) return { kind: 'declined', message: decline.message };
  attachMethod(standIn, method, String(invoice.customer), null);
  const subscription = subscriptionOf(standIn, invoice);
  if (subscription && subscription.ended_at === null)
    changeSubscription(standIn, subscription, null, () => {
      subscription.default_payment_method = method.id;
    });
  return { kind: 'complete' };
}

function payableIntent(standIn: StandIn, invoice: Stripe.Invoice): Stripe.PaymentIntent {
  const intent = intentOf(standIn, invoice);
  const isPayable = invoice.status === 'open' || invoice.status === 'uncollectible';
  if (!isPayable || !intent)
    throw refused(`The invoice ${invoice.id} is ${invoice.status}: nothing is to pay.`);
  return intent;
}
