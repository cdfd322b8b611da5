import { Router, text, type Request, type Response } from 'express';
import qs from 'qs';
import { setTimeout as wait } from 'node:timers/promises';
import { balanceTransactionRoutes } from '../resources/balance-transactions.js';
import { chargeRoutes } from '../resources/charges.js';
import { checkoutSessionRoutes } from '../resources/checkout-session-routes.js';
import { customerRoutes } from '../resources/customers.js';
import { disputeRoutes } from '../resources/disputes.js';
import { apiVersion, eventRoutes } from '../resources/events.js';
import { invoicePaymentRoutes } from '../resources/invoice-payments.js';
import { invoiceRoutes } from '../resources/invoices.js';
import { paymentIntentRoutes } from '../resources/payment-intents.js';
import { paymentMethodRoutes } from '../resources/payment-methods.js';
import { priceRoutes } from '../resources/prices.js';
import { productRoutes } from '../resources/products.js';
import { refundRoutes } from '../resources/refunds.js';
import { setupIntentRoutes } from '../resources/setup-intents.js';
import { subscriptionRoutes } from '../resources/subscriptions.js';
import { testClockRoutes } from '../resources/test-clocks.js';
import type { StandIn } from '../stand-in.js';
import { catchUp } from '../time/catch-up.js';
import type { ApiRoute } from './api-route.js';
import { checkApiKey } from './authentication.js';
import { ApiError, unknownRoute } from './errors.js';
import { expand } from './expand.js';
import { Fields } from './fields.js';
import { claimKey, settleKey } from './idempotency.js';

const routes: ApiRoute[] = [
  ...customerRoutes,
  ...productRoutes,
  ...priceRoutes,
  ...checkoutSessionRoutes,
  ...paymentIntentRoutes,
  ...paymentMethodRoutes,
  ...chargeRoutes,
  ...refundRoutes,
  ...disputeRoutes,
  ...balanceTransactionRoutes,
  ...subscriptionRoutes,
  ...invoiceRoutes,
  ...invoicePaymentRoutes,
  ...setupIntentRoutes,
  ...testClockRoutes,
  ...eventRoutes,
];

type Answer = { status: number; json: string; isRemembered: boolean };

/** All of `/v1`. */
export function apiRouter(standIn: StandIn): Router {
  const router = Router();
  router.use('/v1', text({ type: () => true, limit: '1mb' }));
  for (const route of routes) {
    router[route.method](route.path, (request, response) => handle(standIn, route, request, response));
  }
  router.all('/v1/{*rest}', (request, response) =>
    handle(
      standIn,
      {
        method: 'get',
        path: request.path,
        run: () => {
          throw unknownRoute(request.method, request.path);
        },
      },
      request,
      response,
    ),
  );
  return router;
}

async function handle(
  standIn: StandIn,
  route: ApiRoute,
  request: Request,
  response: Response,
): Promise<void> {
  const requestId = standIn.newId('req');
  const key = (route.method === 'post' && request.get('idempotency-key')) || null;
  response.set({ 'request-id': requestId, 'stripe-version': apiVersion, 'cache-control': 'no-store' });
  if (key) response.set('idempotency-key', key);
  const answer = await answerTo(standIn, route, request, response, { requestId, key });
  // Reading changes nothing; what ran out meanwhile was saved by the sweep.
  if (route.method !== 'get') standIn.save();
  response.status(answer.status).type('application/json').send(answer.json);
}

async function answerTo(
  standIn: StandIn,
  route: ApiRoute,
  request: Request,
  response: Response,
  { requestId, key }: { requestId: string; key: string | null },
): Promise<Answer> {
  try {
    checkApiKey(request.get('authorization'), standIn.settings.apiKey);
    const body = typeof request.body === 'string' ? request.body : '';
    if (!key) return await run(standIn, route, request, body, { requestId, key });
    const lookup = claimKey(standIn, key, request.path, body, requestId);
    if ('replay' in lookup && lookup.replay.answer) {
      response.set({ 'idempotent-replayed': 'true', 'original-request': lookup.replay.requestId });
      return { ...lookup.replay.answer, isRemembered: true };
    }
    const claim = 'claim' in lookup ? lookup.claim : lookup.replay;
    const answer = await run(standIn, route, request, body, { requestId, key }).catch(asAnswer);
    settleKey(standIn, claim, answer);
    return answer;
  } catch (error) {
    return asAnswer(error);
  }
}

async function run(
  standIn: StandIn,
  route: ApiRoute,
  request: Request,
  body: string,
  { requestId, key }: { requestId: string; key: string | null },
): Promise<Answer> {
  if (standIn.settings.latencyMs > 0) await wait(standIn.settings.latencyMs);
  catchUp(standIn);
  const source = route.method === 'post' ? body : (request.originalUrl.split('?')[1] ?? '');
  const fields = new Fields(qs.parse(source, { depth: 10, arrayLimit: 1000, parameterLimit: 5000 }));
  const id = typeof request.params.id === 'string' ? request.params.id : '';
  const cause = { requestId, idempotencyKey: key };
  // A copy: what `expand` puts in must not stay in the stored object.
  const result = structuredClone(route.run({ standIn, id, fields, path: request.path, cause }));
  expand(standIn, result, fields.strings('expand'));
  return { status: 200, json: JSON.stringify(result, null, 2), isRemembered: true };
}

function asAnswer(error: unknown): Answer {
  if (error instanceof ApiError) {
    return {
      status: error.status,
      json: JSON.stringify({ error: error.body }, null, 2),
      isRemembered: error.isRemembered,
    };
  }
  console.error(error);
  const fault = { type: 'api_error', message: 'The stand-in failed at this call; its log says why.' };
  return { status: 500, json: JSON.stringify({ error: fault }, null, 2), isRemembered: true };
}
