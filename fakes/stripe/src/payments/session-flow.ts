import type Stripe from 'stripe';
import { refused } from '../api/errors.js';
import { addressIn } from '../resources/addresses.js';
import { customerDetails } from '../resources/checkout-session-object.js';
import { emit } from '../resources/events.js';
import type { Cause, StandIn } from '../stand-in.js';
import type { Buyer } from '../state/records.js';
import type { SessionDetail } from '../state/state.js';
import { inTimeOfCustomer } from '../time/in-time-of.js';
import type { Card } from './cards.js';
import { customerOf, type PageFlow, type PayResult, type Visit } from './page-flow.js';
import { payOnce } from './pay-once.js';
import { paySubscription } from './pay-subscription.js';
import { saveCard } from './save-card.js';

const flows: Record<string, PageFlow> = {
  payment: payOnce,
  subscription: paySubscription,
  setup: saveCard,
};

export function detailOf(standIn: StandIn, session: Stripe.Checkout.Session): SessionDetail {
  const detail = standIn.state.sessionDetails.find(session.id);
  if (!detail) throw new Error(`The session ${session.id} has lost its lines.`);
  return detail;
}

/** An order of nothing needs no card; a pledge and a card given for later do. */
export const isCardNeeded = (session: Stripe.Checkout.Session): boolean =>
  session.mode !== 'payment' || session.amount_total !== 0;

/** The buyer presses the button. `card` may be null where none is needed. */
export function paySession(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  buyer: Buyer,
  card: Card | null,
): PayResult {
  assertOpen(session);
  if (!isCardNeeded(session)) {
    complete(standIn, session, buyer);
    return { kind: 'complete' };
  }
  if (!card) throw refused('A card is needed to pay this session.', undefined, 'card');
  const detail = detailOf(standIn, session);
  const visit = { standIn, session, detail, card, buyer };
  return inTimeOfCustomer(standIn, customerOf(session), () => {
    if (flowOf(session).start(visit) === 'ready') return finish(visit, false);
    detail.waiting = { cardNumber: card.number, cardCountry: card.country, buyer };
    return { kind: 'second-step' };
  });
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
  const visit = { standIn, session, detail, card, buyer: detail.waiting.buyer };
  detail.waiting = null;
  return inTimeOfCustomer(standIn, customerOf(session), () =>
    isApproved ? finish(visit, true) : { kind: 'declined', message: flowOf(session).refuse(visit) },
  );
}

function finish(visit: Visit, isAuthenticated: boolean): PayResult {
  const fault = flowOf(visit.session).finish(visit, isAuthenticated);
  if (fault !== null) return { kind: 'declined', message: fault };
  complete(visit.standIn, visit.session, visit.buyer);
  return { kind: 'complete' };
}

function complete(standIn: StandIn, session: Stripe.Checkout.Session, buyer: Buyer): void {
  session.status = 'complete';
  session.url = null;
  session.customer_details = customerDetails(buyer.email, buyer.name, addressIn(buyer.country, buyer.street));
  emit(standIn, 'checkout.session.completed', session, null);
}

function flowOf(session: Stripe.Checkout.Session): PageFlow {
  const flow = flows[session.mode];
  if (!flow) throw new Error(`The session ${session.id} has the unknown mode ${session.mode}.`);
  return flow;
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
  const detail = detailOf(standIn, session);
  detail.waiting = null;
  flowOf(session).drop(standIn, session, detail, cause);
  emit(standIn, 'checkout.session.expired', session, cause);
}
