import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import { genericDecline, secondStep, succeeds } from '../payments/card-traits.js';
import { readCard, type Card } from '../payments/cards.js';
import { answerSecondStep, paySession } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';

const outcomes = ['succeed', 'decline', 'second-step', 'refuse-second-step'] as const;

/**
 * Does what a buyer does on the payment page. `outcome` bends the card to an end: `second-step` stops
 * where the bank's question is open; without it a second step is approved.
 */
export function payWithoutBrowser(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  fields: Fields,
): object {
  fields.allowOnly('card', 'cardCountry', 'email', 'name', 'country', 'outcome');
  const outcome = fields.oneOf('outcome', outcomes);
  const reading = readCard(fields.string('card') ?? '4242424242424242');
  if ('fault' in reading) throw badParameter('card', reading.fault);
  const card = bend(reading.card, outcome, fields.string('cardCountry'));
  const buyer = {
    email: fields.string('email') ?? session.customer_details?.email ?? 'buyer@example.test',
    name: fields.string('name'),
    country: (fields.string('country') ?? 'DE').toUpperCase(),
  };
  let result = paySession(standIn, session, buyer, card);
  if (result.kind === 'second-step' && outcome !== 'second-step') {
    result = answerSecondStep(standIn, session, card, outcome !== 'refuse-second-step');
  }
  return {
    result,
    session,
    payment_intent: standIn.state.paymentIntents.find(String(session.payment_intent)) ?? null,
  };
}

function bend(card: Card, outcome: (typeof outcomes)[number] | null, country: string | null): Card {
  const behaviour =
    outcome === 'succeed'
      ? succeeds
      : outcome === 'decline'
        ? genericDecline
        : outcome === null
          ? card.behaviour
          : secondStep;
  return { ...card, behaviour, country: country?.toUpperCase() ?? card.country };
}
