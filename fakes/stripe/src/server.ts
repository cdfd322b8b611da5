import express, { type Express } from 'express';
import { apiRouter } from './api/api-router.js';
import { controlRouter } from './control/control-router.js';
import { deskRouter } from './desk/desk-router.js';
import { pageRouter } from './page/page-router.js';
import type { StandIn } from './stand-in.js';
import type { WebhookSender } from './webhooks/webhook-sender.js';

export function buildServer(standIn: StandIn, sender: WebhookSender): Express {
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.use(controlRouter(standIn, sender));
  app.use(apiRouter(standIn));
  app.use(pageRouter(standIn));
  app.use(deskRouter(standIn, sender));
  app.get('/', (_request, response) => {
    response
      .type('text/plain')
      .send(
        'Local stand-in for a payment service. API at /v1, payment pages at /pay, the desk at /desk, switches at /control/state.\n',
      );
  });
  return app;
}
