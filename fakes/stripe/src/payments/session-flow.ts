import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { addressIn } from '../resources/addresses.js';
import { customerDetails } from '../resources/checkout-sessions.js';
import { createCustomer } from '../resources/customers.js';
import { emit } from '../resources/events.js';
import { cancelIntent } from '../resources/payment-intents.js';
import type { Cause, StandIn } from '../stand-in.js';
import type { Buyer, SessionDetail } from '../state/state.js';
import type { Card } from './cards.js';
import { chargeOnce, refuseSecondStep, startOnce } from './pay-once.js';

/** How one try of the buyer ended. */
export type PayResult =
  { kind: 'complete' } | { kind: 'second-step' } | { kind: 'declined'; message: string };

export function detailOf(standIn: StandIn, session: Stripe.Checkout.Session): SessionDetail {
  const detail = standIn.state.sessionDetails.find(session.id);
  if (!detail) throw new Error(`The session ${session.id} has lost its lines.`);
  return detail;
}

/** The buyer presses "Pay". `card` may be null where nothing is to be paid. */
export function paySession(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  buyer: Buyer,
  card: Card | null,
): PayResult {
  assertOpen(session);
  if (session.amount_total === 0) {
    complete(standIn, session, buyer);
    return { kind: 'complete' };
  }
  if (!card) throw refused('A card is needed to pay this session.', undefined, 'card');
  const started = startOnce(standIn, session, detailOf(standIn, session), card, buyer);
  if (started === 'second-step') {
    detailOf(standIn, session).waiting = { cardNumber: card.number, cardCountry: card.country, buyer };
    return { kind: 'second-step' };
  }
  return finish(standIn, session, card, buyer, false);
}

/** The buyer answers the bank's question of the second step. */
export function answerSecondStep(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  card: Card,
  isApproved: boolean,
): PayResult {
  assertOpen(session);
  const detail = detailOf(standIn, session);
  if (!detail.waiting) throw refused(`The session ${session.id} waits for no second step.`);
  const { buyer } = detail.waiting;
  detail.waiting = null;
  if (!isApproved) return { kind: 'declined', message: refuseSecondStep(standIn, session) };
  return finish(standIn, session, card, buyer, true);
}

function finish(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  card: Card,
  buyer: Buyer,
  isAuthenticated: boolean,
): PayResult {
  if (
    card.behaviour.kind !== 'declined' &&
    session.customer === null &&
    session.customer_creation === 'always'
  ) {
    session.customer = createCustomer(standIn, { email: buyer.email, name: buyer.name }, null).id;
  }
  const decline = chargeOnce(standIn, session, card, buyer, isAuthenticated);
  if (decline) return { kind: 'declined', message: decline };
  session.payment_status = 'paid';
  complete(standIn, session, buyer);
  return { kind: 'complete' };
}

function complete(standIn: StandIn, session: Stripe.Checkout.Session, buyer: Buyer): void {
  session.status = 'complete';
  session.url = null;
  session.customer_details = customerDetails(buyer.email, buyer.name, addressIn(buyer.country));
  emit(standIn, 'checkout.session.completed', session, null);
}

function assertOpen(session: Stripe.Checkout.Session): void {
  if (session.status !== 'open') {
    throw refused(`Only Checkout Sessions with a status of open can be paid; this one is ${session.status}.`);
  }
}

/** Ends an open session: by the API, by the control API, or because its time is over. */
export function expireSession(standIn: StandIn, session: Stripe.Checkout.Session, cause: Cause): void {
  if (session.status !== 'open') {
    throw refused(
      `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of ${session.status}.`,
    );
  }
  session.status = 'expired';
  session.url = null;
  detailOf(standIn, session).waiting = null;
  const intent = standIn.state.paymentIntents.find(String(session.payment_intent));
  if (intent && intent.status !== 'canceled') cancelIntent(standIn, intent, 'expired', cause);
  emit(standIn, 'checkout.session.expired', session, cause);
}
