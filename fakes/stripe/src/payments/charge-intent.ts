import type Stripe from 'stripe';
import { createCharge } from '../resources/charges.js';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';
import type { CardBehaviour, Declined, Succeeds } from './card-traits.js';
import type { Card } from './cards.js';

/*
 * One try of a card at a payment intent, whether a buyer is at a page or an invoice falls due.
 */

/** Puts the card to the intent. `url` is the page where the bank's question would be answered. */
export function readyIntent(
  standIn: StandIn,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  behaviour: CardBehaviour,
  url: string,
): 'second-step' | 'ready' {
  intent.payment_method = method.id;
  intent.last_payment_error = null;
  if (behaviour.kind !== 'second-step') return 'ready';
  intent.status = 'requires_action';
  intent.next_action = {
    type: 'redirect_to_url',
    redirect_to_url: { url: `${url}/second-step`, return_url: url },
  };
  emit(standIn, 'payment_intent.requires_action', intent, null);
  return 'second-step';
}

export type Try = {
  method: Stripe.PaymentMethod;
  card: Card;
  behaviour: CardBehaviour;
  isAuthenticated: boolean;
  cause: Cause;
};

/** Charges the card. Returns why it was declined, or null. */
export function chargeIntent(standIn: StandIn, intent: Stripe.PaymentIntent, attempt: Try): Declined | null {
  const { method, card, cause } = attempt;
  const end = endOf(attempt.behaviour);
  const decline = end.kind === 'declined' ? end : null;
  intent.payment_method = method.id;
  intent.next_action = null;
  const charge = createCharge(standIn, {
    intent,
    paymentMethod: method,
    card,
    decline,
    isAuthenticated: attempt.isAuthenticated,
  });
  intent.latest_charge = charge.id;
  if (decline) {
    emit(standIn, 'charge.failed', charge, cause);
    failIntent(standIn, intent, errorOf(decline, charge.id, method), cause);
    return decline;
  }
  intent.status = 'succeeded';
  intent.amount_received = intent.amount;
  intent.last_payment_error = null;
  emit(standIn, 'charge.succeeded', charge, cause);
  emit(standIn, 'payment_intent.succeeded', intent, cause);
  if (card.dispute) standIn.state.disputePlans.add({ id: charge.id, ...card.dispute });
  return null;
}

/** What happens once nothing is left to ask. */
export const endOf = (behaviour: CardBehaviour): Succeeds | Declined =>
  behaviour.kind === 'second-step' ? behaviour.afterwards : behaviour;

export const refusedStep = 'The second step was refused.';

/** The buyer, or the bank, says no at the second step. */
export function refuseIntent(standIn: StandIn, intent: Stripe.PaymentIntent): void {
  const code = 'payment_intent_authentication_failure';
  failIntent(standIn, intent, { type: 'card_error', code, message: refusedStep }, null);
}

function failIntent(
  standIn: StandIn,
  intent: Stripe.PaymentIntent,
  error: Stripe.PaymentIntent.LastPaymentError,
  cause: Cause,
): void {
  intent.status = 'requires_payment_method';
  intent.next_action = null;
  intent.payment_method = null;
  intent.last_payment_error = error;
  emit(standIn, 'payment_intent.payment_failed', intent, cause);
}

function errorOf(
  decline: Declined,
  charge: string,
  method: Stripe.PaymentMethod,
): Stripe.PaymentIntent.LastPaymentError {
  return {
    type: 'card_error',
    code: decline.code,
    ...(decline.declineCode ? { decline_code: decline.declineCode } : {}),
    message: decline.message,
    charge,
    payment_method: structuredClone(method),
  };
}
