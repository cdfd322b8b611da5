/** What readers see of letters: news asked for and stopped, mails about revisions, the archive. */
import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { letterKind, letterSlug } from './letters.js';
import { email, id, idParams, moment, pageOf, pageQuery, secret, slugParams } from './values.js';

export const newsState = z.enum(['none', 'asked', 'confirmed', 'stopped']);
const news = z.object({ state: newsState });
const watching = z.object({ isOn: z.boolean() });
const byToken = z.object({ token: secret });
export const stoppable = z.object({
  kind: z.enum(['news', 'revisions']),
  email: z.string(),
  kitName: z.string().nullable(),
  isStopped: z.boolean(),
});
export type Stoppable = z.output<typeof stoppable>;

export const archivedLetter = z.object({ slug: letterSlug, subject: z.string(), sentAt: moment });
export const ownLetter = z.object({ id, subject: z.string(), kind: letterKind, sentAt: moment });

export const newsEndpoints = {
  'POST /news': endpoint({
    access: 'public',
    summary: 'Ask for news; a link to confirm is mailed',
    body: z.object({ email }),
    response: null,
    status: 202,
  }),
  'POST /news/confirmation': endpoint({
    access: 'public',
    summary: 'Confirm by the mailed link',
    body: byToken,
    response: z.object({ email: z.string() }),
  }),
  'GET /account/news': endpoint({
    access: 'signed-in',
    summary: 'Whether one gets news',
    response: news,
  }),
  'PUT /account/news': endpoint({
    access: 'signed-in',
    summary: 'Ask for news or stop them',
    body: z.object({ isWanted: z.boolean() }),
    response: news,
  }),
  'GET /shelf/:slug/watching': endpoint({
    access: 'signed-in',
    summary: 'Whether one is told of new revisions of a kit',
    params: slugParams,
    response: watching,
  }),
  'PUT /shelf/:slug/watching': endpoint({
    access: 'signed-in',
    summary: 'Be told of new revisions of a kit, or not',
    params: slugParams,
    body: watching,
    response: watching,
  }),
  'GET /unsubscribe/:token': endpoint({
    access: 'public',
    summary: 'For people who open the address of a mail’s header: leads to the page with the button',
    params: byToken,
    response: 'stream',
  }),
  'POST /unsubscribe/:token': endpoint({
    access: 'public',
    summary: 'Stop such mails at once (RFC 8058); needs no session',
    params: byToken,
    response: null,
    isCalledFromOutside: true,
  }),
  'GET /unsubscribe/:token/about': endpoint({
    access: 'public',
    summary: 'What a link to stop mails stands for; stops nothing',
    params: byToken,
    response: stoppable,
  }),
  'GET /letters': endpoint({
    access: 'public',
    summary: 'News sent so far, newest first',
    query: pageQuery,
    response: pageOf(archivedLetter),
  }),
  'GET /letters/:slug': endpoint({
    access: 'public',
    summary: 'One of them, without what was each reader’s own',
    params: z.object({ slug: letterSlug }),
    response: archivedLetter.extend({ body: z.string() }),
  }),
  'GET /account/letters': endpoint({
    access: 'signed-in',
    summary: 'Letters one was sent, newest first',
    query: pageQuery,
    response: pageOf(ownLetter),
  }),
  'GET /account/letters/:recipientId': endpoint({
    access: 'signed-in',
    summary: 'One of them, as it was written to oneself',
    params: idParams('recipientId'),
    response: ownLetter.extend({ body: z.string() }),
  }),
  'POST /mails/bounces': endpoint({
    access: 'public',
    summary: 'A delivery report (RFC 3464) from the mail server, signed',
    response: null,
    isCalledFromOutside: true,
  }),
};
