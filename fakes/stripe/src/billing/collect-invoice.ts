import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import type { Declined } from '../payments/card-traits.js';
import { chargeIntent, type Try } from '../payments/charge-intent.js';
import { emit } from '../resources/events.js';
import { cardOf } from '../resources/payment-methods.js';
import type { Cause, StandIn } from '../stand-in.js';
import {
  changeInvoice,
  changeSubscription,
  customerOf,
  intentOf,
  paymentOf,
  subscriptionOf,
} from './changes.js';
import { clearDebt } from './invoices.js';
import { endSubscription } from './end-subscription.js';

const noCard: Declined = {
  kind: 'declined',
  code: 'missing',
  declineCode: null,
  message: 'There is no default payment method on this subscription or its customer.',
};

/** The card that is charged without being asked for: the subscription's own, else the customer's. */
export function defaultMethodOf(standIn: StandIn, invoice: Stripe.Invoice): Stripe.PaymentMethod | null {
  const { paymentMethods } = standIn.state;
  const id =
    subscriptionOf(standIn, invoice)?.default_payment_method ??
    customerOf(standIn, invoice).invoice_settings.default_payment_method;
  return paymentMethods.find(String(id)) ?? null;
}

/**
 * Tries to collect an open invoice while nobody is there to answer a bank. `isScheduled` tells the attempts of
 * the service's own schedule from those that somebody asks for.
 */
export function collectInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  options: { isScheduled: boolean; cause: Cause; method?: Stripe.PaymentMethod },
): Declined | null {
  const { isScheduled, cause } = options;
  if (invoice.amount_due === 0) {
    settleInvoice(standIn, invoice, cause);
    return null;
  }
  const method = options.method ?? defaultMethodOf(standIn, invoice);
  if (!method) {
    failInvoice(standIn, invoice, noCard, isScheduled, cause);
    return noCard;
  }
  const card = cardOf(standIn, method);
  const attempt = { method, card, behaviour: card.later, isAuthenticated: false, cause };
  return tryInvoice(standIn, invoice, attempt, isScheduled);
}

/** One try of one card, by whoever. */
export function tryInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  attempt: Try,
  isScheduled: boolean,
): Declined | null {
  const intent = intentOf(standIn, invoice);
  if (!intent) throw refused(`The invoice ${invoice.id} has nothing to pay.`);
  const decline = chargeIntent(standIn, intent, attempt);
  if (decline) failInvoice(standIn, invoice, decline, isScheduled, attempt.cause);
  else settleInvoice(standIn, invoice, attempt.cause);
  return decline;
}

function settleInvoice(standIn: StandIn, invoice: Stripe.Invoice, cause: Cause): void {
  const now = standIn.clock.nowSeconds();
  invoice.status = 'paid';
  invoice.attempted = true;
  if (invoice.attempt_count === 0) invoice.attempt_count = 1;
  invoice.auto_advance = false;
  invoice.next_payment_attempt = null;
  invoice.amount_paid = invoice.amount_due;
  invoice.amount_remaining = 0;
  invoice.status_transitions.paid_at = now;
  const payment = paymentOf(standIn, invoice);
  if (payment) {
    payment.status = 'paid';
    payment.amount_paid = invoice.amount_due;
    payment.status_transitions.paid_at = now;
    emit(standIn, 'invoice_payment.paid', payment, cause);
  }
  emit(standIn, 'invoice.paid', invoice, cause);
  emit(standIn, 'invoice.payment_succeeded', invoice, cause);
  clearDebt(standIn, invoice, cause);
}

/** Writes the failure down, and what follows for the subscription: another try, or the end of trying. */
function failInvoice(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  decline: Declined,
  isScheduled: boolean,
  cause: Cause,
): void {
  const subscription = subscriptionOf(standIn, invoice);
  const isFirstPayment = subscription?.status === 'incomplete';
  // Only the first attempt and those of the schedule count.
  const counts = isScheduled || invoice.attempt_count === 0;
  changeInvoice(standIn, invoice, cause, () => {
    invoice.attempted = true;
    if (!counts) return;
    invoice.attempt_count += 1;
    invoice.next_payment_attempt = isFirstPayment ? null : nextAttempt(standIn, invoice);
    if (invoice.next_payment_attempt === null) invoice.auto_advance = false;
  });
  if (decline.code === 'authentication_required')
    emit(standIn, 'invoice.payment_action_required', invoice, cause);
  emit(standIn, 'invoice.payment_failed', invoice, cause);
  if (!subscription || isFirstPayment) return;
  if (subscription.status === 'active') {
    changeSubscription(standIn, subscription, cause, () => {
      subscription.status = 'past_due';
    });
    customerOf(standIn, subscription).delinquent = true;
  }
  if (isScheduled && invoice.next_payment_attempt === null) giveUp(standIn, subscription);
}

function nextAttempt(standIn: StandIn, invoice: Stripe.Invoice): number | null {
  const days = standIn.state.billing.retryDays[invoice.attempt_count - 1];
  return days === undefined ? null : standIn.clock.nowSeconds() + Math.round(days * 86_400);
}

/** The schedule is at its end. */
function giveUp(standIn: StandIn, subscription: Stripe.Subscription): void {
  const { afterRetries } = standIn.state.billing;
  if (subscription.status !== 'past_due' || afterRetries === 'leave') return;
  if (afterRetries === 'cancel') return endSubscription(standIn, subscription, 'payment_failed', null);
  changeSubscription(standIn, subscription, null, () => {
    subscription.status = 'unpaid';
  });
}
