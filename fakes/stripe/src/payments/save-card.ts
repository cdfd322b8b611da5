import type Stripe from 'stripe';
import { createCustomer } from '../resources/customers.js';
import { attachMethod, createPaymentMethod } from '../resources/payment-methods.js';
import { cancelSetup, failSetup, readySetup, succeedSetup } from '../resources/setup-intents.js';
import type { StandIn } from '../stand-in.js';
import { endOf, refusedStep } from './charge-intent.js';
import { customerOf, pageUrl, type PageFlow } from './page-flow.js';

/** Mode `setup`: a card is given for later, and nothing is charged. */
export const saveCard: PageFlow = {
  start: ({ standIn, session, card, buyer }) =>
    readySetup(standIn, setupOf(standIn, session), {
      method: createPaymentMethod(standIn, card, buyer),
      behaviour: card.saving,
      url: pageUrl(standIn, session),
    }),

  finish: ({ standIn, session, card, buyer }) => {
    const setup = setupOf(standIn, session);
    const method = standIn.state.paymentMethods.find(String(setup.payment_method));
    if (!method) throw new Error(`The setup intent ${setup.id} has lost its card.`);
    const end = endOf(card.saving);
    if (end.kind === 'declined') {
      const { code, declineCode, message } = end;
      failSetup(standIn, setup, { code, ...(declineCode ? { decline_code: declineCode } : {}), message });
      return message;
    }
    if (session.customer === null && session.customer_creation === 'always')
      session.customer = createCustomer(standIn, buyer, null).id;
    setup.customer = session.customer;
    const customer = customerOf(session);
    if (customer) attachMethod(standIn, method, customer, null);
    succeedSetup(standIn, setup);
    return null;
  },

  refuse: ({ standIn, session }) => {
    const code = 'setup_intent_authentication_failure';
    failSetup(standIn, setupOf(standIn, session), { code, message: refusedStep });
    return refusedStep;
  },

  drop: (standIn, session, _detail, cause) => {
    cancelSetup(standIn, setupOf(standIn, session), cause);
  },
};

function setupOf(standIn: StandIn, session: Stripe.Checkout.Session): Stripe.SetupIntent {
  const setup = standIn.state.setupIntents.find(String(session.setup_intent));
  if (!setup) throw new Error(`The session ${session.id} has lost its setup intent.`);
  return setup;
}
