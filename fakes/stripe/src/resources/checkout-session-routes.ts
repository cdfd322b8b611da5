import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { detailOf, expireSession } from '../payments/session-flow.js';
import { createSession } from './checkout-sessions.js';

const sessionOf = ({ standIn, id }: ApiCall) =>
  existing(standIn.state.sessions, 'checkout.session', id, 'session');

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'payment_intent', 'subscription', 'customer', 'status', 'created');
  const intentId = call.fields.string('payment_intent');
  const subscription = call.fields.string('subscription');
  const customer = call.fields.string('customer');
  const status = call.fields.oneOf('status', ['open', 'complete', 'expired']);
  const sessions = call.standIn.state.sessions
    .newestFirst()
    .filter((session) => intentId === null || session.payment_intent === intentId)
    .filter((session) => subscription === null || session.subscription === subscription)
    .filter((session) => customer === null || session.customer === customer)
    .filter((session) => status === null || session.status === status)
    .filter(createdFilter(call.fields));
  return pageOf(call, sessions);
}

export const checkoutSessionRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/checkout/sessions', run: createSession },
  { method: 'get', path: '/v1/checkout/sessions', run: listFromCall },
  {
    method: 'get',
    path: '/v1/checkout/sessions/:id',
    run: (call) => {
      call.fields.allowOnly('expand');
      return sessionOf(call);
    },
  },
  {
    method: 'post',
    path: '/v1/checkout/sessions/:id/expire',
    run: (call) => {
      call.fields.allowOnly('expand');
      const session = sessionOf(call);
      expireSession(call.standIn, session, call.cause);
      return session;
    },
  },
  {
    method: 'get',
    path: '/v1/checkout/sessions/:id/line_items',
    run: (call) => {
      call.fields.allowOnly(...pageParameters);
      // Lines keep the order in which the shop gave them.
      return pageOf(call, detailOf(call.standIn, sessionOf(call)).lineItems);
    },
  },
];
