import { Router, urlencoded } from 'express';
import type { StandIn } from '../stand-in.js';
import { catchUp } from '../time/catch-up.js';
import { invoicePages } from './invoice-pages.js';
import { sessionPages } from './session-pages.js';
import { stylesheet } from './stylesheet.js';

// No `form-action`: browsers apply it to the redirect after a form too, and that leads to the shop.
export const policy =
  "default-src 'none'; style-src 'self'; img-src data:; base-uri 'none'; frame-ancestors 'none'";

/** The pages where buyers pay: plain forms, no script. */
export function pageRouter(standIn: StandIn): Router {
  const router = Router();
  const form = urlencoded({ extended: false, limit: '20kb' });
  router.use(['/pay', '/invoice'], form, (_request, response, next) => {
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
  sessionPages(standIn, router);
  invoicePages(standIn, router);
  return router;
}
