import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { roles } from './permissions.js';
import { email, id, idParams, line, moment, pageOf, pageQuery } from './values.js';

export const personRow = z.object({
  id,
  email: z.string(),
  name: z.string(),
  role: z.enum(roles),
  isVerified: z.boolean(),
  joinedAt: moment,
});
export const logEntry = z.object({
  id: z.string(),
  at: moment,
  who: z.string(),
  what: z.string(),
  subject: z.string(),
  before: z.unknown(),
  after: z.unknown(),
});

export const peopleEndpoints = {
  'GET /workshop/people': endpoint({
    access: 'people:read',
    summary: 'People with accounts',
    query: pageQuery.extend({ role: z.enum(roles).optional() }),
    response: pageOf(personRow),
  }),
  'PATCH /workshop/people/:personId': endpoint({
    access: 'people:write',
    summary: 'Give a person another role',
    params: idParams('personId'),
    body: z.object({ role: z.enum(roles) }),
    response: personRow,
  }),
  'POST /workshop/invitations': endpoint({
    access: 'people:write',
    summary: 'Invite staff by e-mail',
    body: z.object({ email, name: line.max(80), role: z.enum(['helper', 'bookkeeper', 'maker', 'owner']) }),
    response: null,
    status: 202,
  }),
  'GET /workshop/log': endpoint({
    access: 'log:read',
    summary: 'Every change by staff: who, what, when, before and after',
    query: pageQuery,
    response: pageOf(logEntry),
  }),
};
