import type { Request, Response, Router } from 'express';
import type Stripe from 'stripe';
import { formatAmount } from '../payments/amounts.js';
import { laterSampleCards, readCard, sampleCards } from '../payments/cards.js';
import type { PayResult } from '../payments/page-flow.js';
import { answerSecondStep, detailOf, isCardNeeded, paySession } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';
import { doneView, expiredView, secondStepView, unknownView } from './end-views.js';
import { orderView } from './order-view.js';
import {
  emptyForm,
  readForm,
  valuesFrom,
  valuesOf,
  type Faults,
  type FormShape,
  type FormValues,
} from './payment-form.js';
import { paymentView } from './payment-view.js';
import { rhythmWords } from './rhythm-words.js';

/** The pages of checkout sessions: an order is paid, a subscription begun, or a card given for later. */
export function sessionPages(standIn: StandIn, router: Router): void {
  const show = (
    response: Response,
    session: Stripe.Checkout.Session,
    values: FormValues,
    { faults = {}, notice = null }: { faults?: Faults; notice?: string | null } = {},
  ) => {
    const { lineItems } = detailOf(standIn, session);
    response.send(
      paymentView({
        path: `/pay/${session.id}`,
        ...wordsOf(session, lineItems),
        summary: orderView(session, lineItems),
        shape: shapeOf(session),
        samples: session.mode === 'payment' ? sampleCards : laterSampleCards,
        canGoBack: session.cancel_url !== null,
        values,
        faults,
        notice,
      }),
    );
  };
  const goOn = (
    response: Response,
    session: Stripe.Checkout.Session,
    values: FormValues,
    result: PayResult,
  ) => {
    standIn.save();
    if (result.kind === 'complete') response.redirect(303, successAddress(session) ?? '/');
    else if (result.kind === 'second-step') response.redirect(303, `/pay/${session.id}/second-step`);
    else show(response, session, values, { notice: `${result.message} Nothing was taken.` });
  };

  router.get('/pay/:id', (request, response) => {
    const session = openSession(standIn, request, response);
    if (session) show(response, session, emptyForm(shapeOf(session)));
  });
  router.post('/pay/:id', (request, response) => {
    const session = openSession(standIn, request, response);
    if (!session) return;
    const { action, sample } = (request.body ?? {}) as { action?: string; sample?: string };
    const shape = shapeOf(session);
    const values = valuesFrom(shape, request.body);
    if (action === 'back' && session.cancel_url) return response.redirect(303, session.cancel_url);
    if (sample !== undefined) return show(response, session, values);
    const reading = readForm(shape, values);
    if ('faults' in reading) return show(response, session, values, { faults: reading.faults });
    goOn(response, session, values, paySession(standIn, session, reading.buyer, reading.card));
  });
  router.get('/pay/:id/second-step', (request, response) => {
    const session = openSession(standIn, request, response);
    if (!session) return;
    if (detailOf(standIn, session).waiting)
      response.send(secondStepView(`/pay/${session.id}/second-step`, askedFor(session)));
    else response.redirect(303, `/pay/${session.id}`);
  });
  router.post('/pay/:id/second-step', (request, response) => {
    const session = openSession(standIn, request, response);
    if (!session) return;
    const { waiting } = detailOf(standIn, session);
    const reading = readCard(waiting?.cardNumber ?? '');
    if (!waiting || 'fault' in reading) return response.redirect(303, `/pay/${session.id}`);
    const { buyer, cardCountry } = waiting;
    const card = { ...reading.card, country: cardCountry ?? reading.card.country };
    const isApproved = (request.body as { answer?: string } | undefined)?.answer === 'approve';
    goOn(response, session, valuesOf(buyer), answerSecondStep(standIn, session, card, isApproved));
  });
}

const shapeOf = (session: Stripe.Checkout.Session): FormShape => ({
  fixedEmail: session.customer_details?.email ?? null,
  isCardNeeded: isCardNeeded(session),
});

const totalOf = (session: Stripe.Checkout.Session): string =>
  formatAmount(session.amount_total ?? 0, session.currency ?? 'eur');

function wordsOf(
  session: Stripe.Checkout.Session,
  lines: readonly Stripe.LineItem[],
): { title: string; heading: string; action: string } {
  const recurring = lines[0]?.price?.recurring;
  if (session.mode === 'setup')
    return { title: 'A card for later', heading: 'Your card', action: 'Save this card' };
  if (!isCardNeeded(session))
    return { title: 'Complete the order', heading: 'Nothing to pay', action: 'Complete the order' };
  const action = recurring ? `Pay ${totalOf(session)} ${rhythmWords(recurring)}` : `Pay ${totalOf(session)}`;
  return { title: 'Pay', heading: 'Pay by card', action };
}

function askedFor(session: Stripe.Checkout.Session): string {
  if (session.mode === 'setup') return 'that this card is charged later';
  const later = session.mode === 'subscription' ? ', and the later ones' : '';
  return `this payment of ${totalOf(session)}${later}`;
}

const doneWords: Record<string, string> = {
  payment: 'This order is complete',
  subscription: 'This subscription has begun',
  setup: 'This card is saved',
};

/** The session of the address while it is open; else answers with the page that says why not. */
function openSession(standIn: StandIn, request: Request, response: Response): Stripe.Checkout.Session | null {
  const session = standIn.state.sessions.find(String(request.params.id));
  if (!session) response.status(404).send(unknownView());
  else if (session.status === 'complete')
    response.send(doneView(doneWords[session.mode] ?? 'Done', successAddress(session)));
  else if (session.status === 'expired') response.status(410).send(expiredView(session.cancel_url));
  else return session;
  return null;
}

function successAddress(session: Stripe.Checkout.Session): string | null {
  return session.success_url?.replaceAll('{CHECKOUT_SESSION_ID}', session.id) ?? null;
}
