import { Router, urlencoded, type Request, type Response } from 'express';
import type Stripe from 'stripe';
import { readCard } from '../payments/cards.js';
import { answerSecondStep, detailOf, paySession, type PayResult } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';
import { catchUp } from '../time/catch-up.js';
import { expiredView, paidView, secondStepView, unknownView } from './end-views.js';
import { emptyForm, readForm, valuesFrom, type Faults, type FormValues } from './payment-form.js';
import { paymentView } from './payment-view.js';
import { stylesheet } from './stylesheet.js';

// No `form-action`: browsers apply it to the redirect after a form too, and that leads to the shop.
const policy = "default-src 'none'; style-src 'self'; img-src data:; base-uri 'none'; frame-ancestors 'none'";

/** The page where the buyer pays: plain forms, no script. */
export function pageRouter(standIn: StandIn): Router {
  const router = Router();
  router.use('/pay', urlencoded({ extended: false, limit: '20kb' }), (_request, response, next) => {
    response.set({
      'content-security-policy': policy,
      'cache-control': 'no-store',
      'referrer-policy': 'no-referrer',
      'x-content-type-options': 'nosniff',
    });
    catchUp(standIn);
    next();
  });
  router.get('/pay/page.css', (_request, response) => {
    response.type('text/css').send(stylesheet);
  });

  const show = (
    response: Response,
    session: Stripe.Checkout.Session,
    values: FormValues,
    { faults = {}, notice = null }: { faults?: Faults; notice?: string | null } = {},
  ) => {
    const { lineItems } = detailOf(standIn, session);
    response.send(paymentView({ session, lines: lineItems, values, faults, notice }));
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
    if (session) show(response, session, emptyForm(session));
  });
  router.post('/pay/:id', (request, response) => {
    const session = openSession(standIn, request, response);
    if (!session) return;
    const { action, sample } = (request.body ?? {}) as { action?: string; sample?: string };
    const values = valuesFrom(session, request.body);
    if (action === 'back' && session.cancel_url) return response.redirect(303, session.cancel_url);
    if (sample !== undefined) return show(response, session, values);
    const reading = readForm(session, values);
    if ('faults' in reading) return show(response, session, values, { faults: reading.faults });
    goOn(response, session, values, paySession(standIn, session, reading.buyer, reading.card));
  });
  router.get('/pay/:id/second-step', (request, response) => {
    const session = openSession(standIn, request, response);
    if (!session) return;
    if (detailOf(standIn, session).waiting) response.send(secondStepView(session));
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
    const values = { email: buyer.email, country: buyer.country, name: buyer.name ?? '', card: '' };
    goOn(response, session, values, answerSecondStep(standIn, session, card, isApproved));
  });
  return router;
}

/** The session of the address while it is open; else answers with the page that says why not. */
function openSession(standIn: StandIn, request: Request, response: Response): Stripe.Checkout.Session | null {
  const session = standIn.state.sessions.find(String(request.params.id));
  if (!session) response.status(404).send(unknownView());
  else if (session.status === 'complete') response.send(paidView(successAddress(session)));
  else if (session.status === 'expired') response.status(410).send(expiredView(session.cancel_url));
  else return session;
  return null;
}

function successAddress(session: Stripe.Checkout.Session): string | null {
  return session.success_url?.replaceAll('{CHECKOUT_SESSION_ID}', session.id) ?? null;
}
