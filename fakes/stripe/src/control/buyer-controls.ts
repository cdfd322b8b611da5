import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import {
  authenticationRequired,
  expiredCard,
  genericDecline,
  insufficientFunds,
  secondStep,
  succeeds,
  type CardBehaviour,
} from '../payments/card-traits.js';
import { readCard, type Card } from '../payments/cards.js';
import { answerInvoiceStep, payInvoice } from '../payments/pay-invoice.js';
import { answerSecondStep, paySession } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';
import type { Buyer, InvoicePage } from '../state/records.js';

const outcomes = ['succeed', 'decline', 'second-step', 'refuse-second-step'] as const;
type Outcome = (typeof outcomes)[number];

const behaviours: Record<Outcome, CardBehaviour> = {
  succeed: succeeds,
  decline: genericDecline,
  'second-step': secondStep,
  'refuse-second-step': secondStep,
};

/** What a card does when it is charged and nobody is there. */
export const laterOutcomes = {
  succeed: succeeds,
  decline: genericDecline,
  'insufficient-funds': insufficientFunds,
  expired: expiredCard,
  'authentication-required': authenticationRequired,
} satisfies Record<string, CardBehaviour>;

export const laterNames = Object.keys(laterOutcomes) as (keyof typeof laterOutcomes)[];

const parameters = [
  'card',
  'cardCountry',
  'email',
  'name',
  'country',
  'line1',
  'postalCode',
  'city',
  'outcome',
  'later',
] as const;

/**
 * Does what a buyer does on a page. `outcome` bends the card to an end: `second-step` stops where the bank's
 * question is open; without it a second step is approved. `later` bends what the card does afterwards.
 */
export function payWithoutBrowser(
  standIn: StandIn,
  session: Stripe.Checkout.Session,
  fields: Fields,
): object {
  const { card, buyer, outcome } = readBuyer(fields, session.customer_details?.email ?? null);
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

/** The same on the page of an invoice. */
export function payInvoiceWithoutBrowser(
  standIn: StandIn,
  invoice: Stripe.Invoice,
  page: InvoicePage,
  fields: Fields,
): object {
  const { card, buyer, outcome } = readBuyer(fields, invoice.customer_email);
  let result = payInvoice(standIn, invoice, page, buyer, card);
  if (result.kind === 'second-step' && outcome !== 'second-step') {
    result = answerInvoiceStep(standIn, invoice, page, card, outcome !== 'refuse-second-step');
  }
  return { result, invoice };
}

function readBuyer(
  fields: Fields,
  knownEmail: string | null,
): { card: Card; buyer: Buyer; outcome: Outcome | null } {
  fields.allowOnly(...parameters);
  const outcome = fields.oneOf('outcome', outcomes);
  const reading = readCard(fields.string('card') ?? '4242424242424242');
  if ('fault' in reading) throw badParameter('card', reading.fault);
  const { card } = reading;
  const bent = outcome && behaviours[outcome];
  const later = fields.oneOf('later', laterNames);
  return {
    card: {
      ...card,
      behaviour: bent ?? card.behaviour,
      saving: bent ?? card.saving,
      later: later ? laterOutcomes[later] : card.later,
      country: fields.string('cardCountry')?.toUpperCase() ?? card.country,
    },
    buyer: {
      email: fields.string('email') ?? knownEmail ?? 'buyer@example.test',
      name: fields.string('name'),
      country: (fields.string('country') ?? 'DE').toUpperCase(),
      street: {
        line1: fields.string('line1'),
        postalCode: fields.string('postalCode'),
        city: fields.string('city'),
      },
    },
    outcome,
  };
}
