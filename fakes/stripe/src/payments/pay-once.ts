import type Stripe from 'stripe';
import { createCustomer } from '../resources/customers.js';
import { cancelIntent, createPaymentIntent } from '../resources/payment-intents.js';
import { attachMethod, createPaymentMethod } from '../resources/payment-methods.js';
import type { StandIn } from '../stand-in.js';
import { chargeIntent, endOf, readyIntent, refusedStep, refuseIntent } from './charge-intent.js';
import { customerOf, pageUrl, type PageFlow, type Visit } from './page-flow.js';

/** Mode `payment`: one payment intent, one charge for each try. */
export const payOnce: PageFlow = {
  start: (visit) => {
    const { standIn, session, card, buyer } = visit;
    const intent = intentFor(visit);
    session.payment_intent = intent.id;
    const method = createPaymentMethod(standIn, card, buyer);
    return readyIntent(standIn, intent, method, card.behaviour, pageUrl(standIn, session));
  },

  finish: ({ standIn, session, detail, card, buyer }, isAuthenticated) => {
    const intent = intentOf(standIn, session);
    const method = standIn.state.paymentMethods.find(String(intent.payment_method));
    if (!method) throw new Error(`The payment intent ${intent.id} has lost its card.`);
    const willSucceed = endOf(card.behaviour).kind === 'succeeds';
    if (willSucceed && session.customer === null && session.customer_creation === 'always')
      session.customer = createCustomer(standIn, buyer, null).id;
    intent.customer = session.customer;
    const customer = customerOf(session);
    if (willSucceed && customer && detail.paymentIntentData.isCardKept)
      attachMethod(standIn, method, customer, null);
    const { behaviour } = card;
    const decline = chargeIntent(standIn, intent, { method, card, behaviour, isAuthenticated, cause: null });
    if (decline) return decline.message;
    session.payment_status = 'paid';
    return null;
  },

  refuse: ({ standIn, session }) => {
    refuseIntent(standIn, intentOf(standIn, session));
    return refusedStep;
  },

  drop: (standIn, session, _detail, cause) => {
    const intent = standIn.state.paymentIntents.find(String(session.payment_intent));
    if (intent && intent.status !== 'canceled') cancelIntent(standIn, intent, 'expired', cause);
  },
};

function intentFor({ standIn, session, detail }: Visit): Stripe.PaymentIntent {
  const known = standIn.state.paymentIntents.find(String(session.payment_intent));
  if (known) return known;
  const { description, metadata, receiptEmail, isCardKept } = detail.paymentIntentData;
  return createPaymentIntent(
    standIn,
    {
      amount: session.amount_total ?? 0,
      currency: session.currency ?? '',
      customer: customerOf(session),
      description,
      metadata,
      receiptEmail,
      isCardKept,
    },
    null,
  );
}

function intentOf(standIn: StandIn, session: Stripe.Checkout.Session): Stripe.PaymentIntent {
  const intent = standIn.state.paymentIntents.find(String(session.payment_intent));
  if (!intent) throw new Error(`The session ${session.id} has no payment intent yet.`);
  return intent;
}
