import { Router, urlencoded, type Request } from 'express';
import { ApiError } from '../api/errors.js';
import { policy } from '../page/page-router.js';
import type { StandIn } from '../stand-in.js';
import { catchUp } from '../time/catch-up.js';
import type { WebhookSender } from '../webhooks/webhook-sender.js';
import { deskAction } from './desk-actions.js';
import { deskView } from './desk-view.js';

/** A page for what people at the payment service do by hand. */
export function deskRouter(standIn: StandIn, sender: WebhookSender): Router {
  const router = Router();
  router.use('/desk', (_request, response, next) => {
    response.set({
      'content-security-policy': policy,
      'cache-control': 'no-store',
      // Not `no-referrer`: the browser would then not say where a form comes from.
      'referrer-policy': 'same-origin',
      'x-content-type-options': 'nosniff',
    });
    catchUp(standIn);
    next();
  });
  router.get('/desk', (_request, response) => {
    response.send(deskView(standIn, null));
  });
  router.post('/desk', urlencoded({ extended: false, limit: '20kb' }), async (request, response) => {
    if (!isOwnForm(request))
      return void response.status(403).send(deskView(standIn, 'That form was not this page’s.'));
    try {
      const posted = (request.body ?? {}) as Record<string, string>;
      await deskAction(standIn, posted.action ?? '', posted);
      catchUp(standIn);
      standIn.save();
      sender.plan();
      response.redirect(303, '/desk');
    } catch (fault) {
      if (!(fault instanceof ApiError)) throw fault;
      response.status(fault.status).send(deskView(standIn, fault.message));
    }
  });
  return router;
}

/** A page on another site can post forms to a loopback address; a browser says where they come from. */
function isOwnForm(request: Request): boolean {
  const site = request.get('sec-fetch-site');
  return site === undefined || site === 'same-origin' || site === 'none';
}
