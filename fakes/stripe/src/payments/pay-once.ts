import type Stripe from 'stripe';
import { createCharge } from '../resources/charges.js';
import { emit } from '../resources/events.js';
import { createPaymentIntent } from '../resources/payment-intents.js';
import { createPaymentMethod } from '../resources/payment-methods.js';
import type { StandIn } from '../stand-in.js';
import type { Buyer, SessionDetail } from '../state/state.js';
import type { Card } from './cards.js';

/*
 * What mode `payment` does with a session: one payment intent, one charge for each try.
 */

/** Readies the intent and the card; says whether the bank asks for a second step before the charge. */
export function startOnce(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  detail: SessionDetail,
  card: Card,
  buyer: Buyer,
): 'second-step' | 'ready' {
  const intent =
    standIn.state.paymentIntents.find(String(session.payment_intent)) ??
    createPaymentIntent(
      standIn,
      {
        amount: session.amount_total ?? 0,
        currency: session.currency ?? '',
        customer: typeof session.customer === 'string' ? session.customer : null,
        description: detail.paymentIntentData.description,
        metadata: detail.paymentIntentData.metadata,
        receiptEmail: detail.paymentIntentData.receiptEmail,
      },
      null,
    );
  session.payment_intent = intent.id;
  intent.payment_method = createPaymentMethod(standIn, card, buyer).id;
  intent.last_payment_error = null;
  if (card.behaviour.kind !== 'second-step') return 'ready';
  intent.status = 'requires_action';
  intent.next_action = {
    type: 'redirect_to_url',
    redirect_to_url: {
      url: `${standIn.settings.publicUrl}/pay/${session.id}/second-step`,
      return_url: `${standIn.settings.publicUrl}/pay/${session.id}`,
    },
  };
  emit(standIn, 'payment_intent.requires_action', intent, null);
  return 'second-step';
}

/** Charges the card. Returns the reason where it was declined, else null. */
export function chargeOnce(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  card: Card,
  buyer: Buyer,
  isAuthenticated: boolean,
): string | null {
  const intent = intentOf(standIn, session);
  const paymentMethod = standIn.state.paymentMethods.find(String(intent.payment_method));
  if (!paymentMethod) throw new Error(`The payment intent ${intent.id} has lost its card.`);
  const end = card.behaviour.kind === 'second-step' ? card.behaviour.then : card.behaviour;
  const decline = end.kind === 'declined' ? end : null;
  intent.customer = session.customer;
  intent.next_action = null;
  const charge = createCharge(standIn, { intent, paymentMethod, card, buyer, decline, isAuthenticated });
  intent.latest_charge = charge.id;
  if (!decline) {
    intent.status = 'succeeded';
    intent.amount_received = intent.amount;
    emit(standIn, 'charge.succeeded', charge, null);
    emit(standIn, 'payment_intent.succeeded', intent, null);
    if (card.dispute) standIn.state.disputePlans.add({ id: charge.id, ...card.dispute });
    return null;
  }
  emit(standIn, 'charge.failed', charge, null);
  fail(standIn, intent, {
    type: 'card_error',
    code: decline.code,
    ...(decline.declineCode ? { decline_code: decline.declineCode } : {}),
    message: decline.message,
    charge: charge.id,
    payment_method: structuredClone(paymentMethod),
  });
  return decline.message;
}

/** The buyer, or the bank, says no at the second step. Returns the sentence to show. */
export function refuseSecondStep(standIn: StandIn, session: Stripe.Checkout.Session): string {
  const intent = intentOf(standIn, session);
  const message = 'The second step was refused.';
  fail(standIn, intent, {
    type: 'card_error',
    code: 'payment_intent_authentication_failure',
    message,
  });
  return message;
}

function fail(
  standIn: StandIn,
  intent: Stripe.PaymentIntent,
  error: Stripe.PaymentIntent.LastPaymentError,
): void {
  intent.status = 'requires_payment_method';
  intent.next_action = null;
  intent.payment_method = null;
  intent.last_payment_error = error;
  emit(standIn, 'payment_intent.payment_failed', intent, null);
}

function intentOf(standIn: StandIn, session: Stripe.Checkout.Session): Stripe.PaymentIntent {
  const intent = standIn.state.paymentIntents.find(String(session.payment_intent));
  if (!intent) throw new Error(`The session ${session.id} has no payment intent yet.`);
  return intent;
}
