import { json, Router, type NextFunction, type Request, type Response } from 'express';
import { ApiError, badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { expireSession } from '../payments/session-flow.js';
import type { StandIn } from '../stand-in.js';
import { catchUp } from '../time/catch-up.js';
import type { WebhookSender } from '../webhooks/webhook-sender.js';
import { payWithoutBrowser } from './buyer-controls.js';
import { moveClock, summary } from './clock-and-summary.js';
import { billingControls } from './billing-controls.js';
import type { Control } from './control.js';
import { fieldsOf } from './control-fields.js';
import { moneyBackControls } from './money-back-controls.js';
import { setSwitches } from './webhook-controls.js';

/** `/control`: what tests and developers do to the stand-in from outside. JSON in, JSON out. */
export function controlRouter(standIn: StandIn, sender: WebhookSender): Router {
  const router = Router();
  // A page on another site can post forms to a loopback address, but not JSON.
  router.post('/control/{*rest}', (request, response, next) => {
    if (
      request.is('application/json') ||
      !request.get('content-length') ||
      request.get('content-length') === '0'
    )
      next();
    else response.status(415).json({ error: { message: 'Send JSON with content-type: application/json.' } });
  });
  router.use('/control', json());
  const post = (path: string, control: Control) =>
    router.post(`/control${path}`, async (request, response) => {
      catchUp(standIn);
      const result = await control(fieldsOf(request.body), idIn(request));
      standIn.save();
      response.json(result);
    });
  const sessionOf = (id: string) => existing(standIn.state.sessions, 'checkout.session', id);

  router.get('/control/state', (_request, response) => {
    catchUp(standIn);
    response.json(summary(standIn));
  });
  router.get('/control/deliveries', (_request, response) => {
    const waiting = standIn.state.deliveries.oldestFirst();
    response.json({ attempts: standIn.state.attempts, waiting });
  });
  post('/webhooks', (fields) => setSwitches(standIn, sender, fields));
  post('/webhooks/flush', () => sender.flush());
  post('/sessions/:id/pay', (fields, id) => payWithoutBrowser(standIn, sessionOf(id), fields));
  post('/sessions/:id/expire', (_fields, id) => {
    const session = sessionOf(id);
    expireSession(standIn, session, null);
    return session;
  });
  const switches = { ...moneyBackControls(standIn), ...billingControls(standIn) };
  for (const [path, control] of Object.entries(switches)) post(path, control);
  post('/events/:id/redeliver', (fields, id) => {
    fields.allowOnly('times');
    const times = fields.integer('times') ?? 1;
    if (times < 1 || times > 100) throw badParameter('times', 'times must be from 1 to 100.');
    const event = existing(standIn.state.events, 'event', id);
    sender.redeliver(event.id, times);
    return event;
  });
  post('/clock', (fields) => {
    moveClock(standIn, fields);
    catchUp(standIn);
    sender.plan();
    return summary(standIn).clock;
  });
  post('/api', (fields) => {
    fields.allowOnly('latencyMs');
    const latencyMs = fields.requiredInteger('latencyMs');
    if (latencyMs < 0) throw badParameter('latencyMs', 'latencyMs must be 0 or more.');
    standIn.settings.latencyMs = latencyMs;
    return { latencyMs };
  });
  router.use('/control', (request, response) => {
    const message = `The control API has no ${request.method} ${request.originalUrl}.`;
    response.status(404).json({ error: { message } });
  });
  router.use('/control', fault);
  return router;
}

function idIn(request: Request): string {
  return typeof request.params.id === 'string' ? request.params.id : '';
}

// Express knows an error handler by its four parameters.
function fault(error: unknown, _request: Request, response: Response, _next: NextFunction): void {
  if (error instanceof ApiError) response.status(error.status).json({ error: error.body });
  else if (error instanceof SyntaxError)
    response.status(400).json({ error: { message: `Not JSON: ${error.message}` } });
  else {
    console.error(error);
    response.status(500).json({ error: { message: 'The stand-in failed at this call; its log says why.' } });
  }
}
