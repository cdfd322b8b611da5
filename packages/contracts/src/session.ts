import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { permissions, roles } from './permissions.js';
import { email, id, line, moment, secret } from './values.js';

/** Length only, no rule of composition (NIST SP 800-63B-4): 15 alone; common ones are refused by the server. */
export const passphrase = z.string().min(15, 'Use 15 characters or more; a short sentence is good.').max(256);

export const person = z.object({
  id,
  email: z.string(),
  name: z.string(),
  role: z.enum(roles),
  isVerified: z.boolean(),
});
export type Person = z.output<typeof person>;

export const session = z.object({
  person: person.nullable(),
  permissions: z.array(z.enum(permissions as [string, ...string[]])),
  workshop: z.object({ name: z.string(), currency: z.string(), country: z.string(), locale: z.string() }),
});
export type Session = z.output<typeof session>;

export const joinBody = z.object({ email, name: line.max(80), passphrase });
export const signInBody = z.object({ email, passphrase: z.string().min(1).max(256) });
export const emailBody = z.object({ email });
export const tokenBody = z.object({ token: secret });
export const resetBody = z.object({ token: secret, passphrase });
export const ownSession = z.object({
  id: z.string(),
  startedAt: moment,
  lastSeenAt: moment,
  userAgent: z.string(),
  isThis: z.boolean(),
});

/** Sign-up, sign-in and one's own account. Answers never tell whether an address has an account. */
export const sessionEndpoints = {
  'GET /session': endpoint({
    access: 'public',
    summary: 'Who is signed in, and what they may do',
    response: session,
  }),
  'POST /session': endpoint({
    access: 'public',
    summary: 'Sign in with e-mail and passphrase',
    body: signInBody,
    response: session,
  }),
  'DELETE /session': endpoint({ access: 'public', summary: 'Sign out', response: null, status: 204 }),
  'POST /session/from-link': endpoint({
    access: 'public',
    summary: 'Sign in with the one-time link from an e-mail',
    body: tokenBody,
    response: session,
  }),
  'POST /accounts': endpoint({
    access: 'public',
    summary: 'Join; the address is verified by e-mail',
    body: joinBody,
    response: null,
    status: 202,
  }),
  'POST /accounts/verify': endpoint({
    access: 'public',
    summary: 'Verify an address with the token from the e-mail',
    body: tokenBody,
    response: session,
  }),
  'POST /accounts/sign-in-links': endpoint({
    access: 'public',
    summary: 'Ask for a one-time sign-in link by e-mail',
    body: emailBody,
    response: null,
    status: 202,
  }),
  'POST /accounts/forgotten': endpoint({
    access: 'public',
    summary: 'Ask for a link that resets the passphrase',
    body: emailBody,
    response: null,
    status: 202,
  }),
  'POST /accounts/reset': endpoint({
    access: 'public',
    summary: 'Set a new passphrase with the token from the e-mail',
    body: resetBody,
    response: session,
  }),
  'PATCH /account': endpoint({
    access: 'signed-in',
    summary: 'Change one’s own name',
    body: z.object({ name: line.max(80) }),
    response: session,
  }),
  'POST /account/passphrase': endpoint({
    access: 'signed-in',
    summary: 'Change one’s own passphrase; other sessions end',
    body: z.object({ current: z.string().max(256), next: passphrase }),
    response: null,
    status: 204,
  }),
  'POST /account/verification': endpoint({
    access: 'signed-in',
    summary: 'Send the verification e-mail again',
    response: null,
    status: 202,
  }),
  'GET /account/sessions': endpoint({
    access: 'signed-in',
    summary: 'One’s own open sessions',
    response: z.array(ownSession),
  }),
  'DELETE /account/sessions': endpoint({
    access: 'signed-in',
    summary: 'End all other sessions',
    response: null,
    status: 204,
  }),
};
