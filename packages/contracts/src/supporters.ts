import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { kitCard } from './kits.js';
import {
  countryCode,
  filamentColour,
  id,
  idParams,
  line,
  minor,
  moment,
  money,
  pageOf,
  pageQuery,
  slug,
  sortBy,
} from './values.js';

/** What stays on the shelf when a pledge ends. */
export const keepsAfter = z.enum(['nothing', 'released-during', 'released-before-end']);
export type KeepsAfter = z.output<typeof keepsAfter>;

/** `grace`: a payment failed and days are given. `lapsed`: they went by. `ended`: by wish, or never begun. */
export const pledgeState = z.enum(['opening', 'current', 'grace', 'paused', 'lapsed', 'ended']);
export type PledgeState = z.output<typeof pledgeState>;

/**
 * What a supporter ticks before files are handed over at once (Directive 2011/83/EU, art. 16 m). The page
 * shows these very words and the pledge keeps them.
 */
export const pledgeConsentText =
  'Put the kits on my shelf at once. I know that I lose my right to withdraw for what is handed over; I can end the pledge at the end of each month all the same.';

/** A plan as everybody sees it, with the kits it includes as they stand in the shop. */
export const plan = z.object({
  id,
  name: z.string(),
  words: z.string(),
  amount: money,
  hasAllKits: z.boolean(),
  keepsAfter,
  kits: z.array(kitCard),
});
export type Plan = z.output<typeof plan>;

export const planBody = z
  .object({
    name: line.max(60),
    words: z.string().trim().max(10_000),
    amountMinor: minor.min(1, 'A pledge is worth something: write an amount.'),
    hasAllKits: z.boolean(),
    kitIds: z.array(id).max(200),
    keepsAfter,
    isOffered: z.boolean(),
  })
  .refine((one) => one.hasAllKits || one.kitIds.length > 0, {
    path: ['kitIds'],
    message: 'Tick at least one kit, or include all.',
  });

export const workshopPlan = z.object({
  id,
  name: z.string(),
  words: z.string(),
  amount: money,
  hasAllKits: z.boolean(),
  kits: z.array(z.object({ id, name: z.string() })),
  keepsAfter,
  isOffered: z.boolean(),
  /** Pledges that are current, in their grace days or paused. */
  supporters: z.int(),
  /** What those of them that pay bring in each month. */
  monthly: money,
  /** Shelves follow a change of the kits in a job. */
  areShelvesUpToDate: z.boolean(),
  createdAt: moment,
  updatedAt: moment,
});
export type WorkshopPlan = z.output<typeof workshopPlan>;

export const pledgeDeed = z.enum([
  'give-up',
  'change-plan',
  'keep-plan',
  'pause',
  'resume',
  'end',
  'keep',
  'card',
]);
export type PledgeDeed = z.output<typeof pledgeDeed>;
export const pauseMonths = z.union([z.literal(1), z.literal(2), z.literal(3)]);

/** A pledge as its supporter sees it. */
export const pledge = z.object({
  id,
  state: pledgeState,
  plan: z.object({ id, name: z.string() }),
  amount: money,
  keepsAfter,
  kits: z.array(z.object({ slug, name: z.string(), colour: filamentColour })),
  /** Chosen already, from the next payment on. */
  nextPlan: z.object({ id, name: z.string(), amount: money, from: moment }).nullable(),
  beganAt: moment.nullable(),
  paidUntil: moment.nullable(),
  nextPaymentAt: moment.nullable(),
  /** The supporter ended it: the last day. */
  endsAt: moment.nullable(),
  pausedUntil: moment.nullable(),
  /** The next payment if the pause were dropped now. */
  resumesAt: moment.nullable(),
  graceUntil: moment.nullable(),
  /** Where the payment that failed can be made with any card. */
  settleUrl: z.string().nullable(),
  paymentUrl: z.string().nullable(),
  cardLast4: z.string().nullable(),
  endedAt: moment.nullable(),
  /** What can be done with it now. */
  deeds: z.array(pledgeDeed),
  /** The payment with which it would go on, for each length of a pause. */
  pauses: z.array(z.object({ months: pauseMonths, nextPaymentAt: moment })),
});
export type Pledge = z.output<typeof pledge>;

export const pledgePayment = z.object({
  id,
  planName: z.string(),
  amount: money,
  paidAt: moment,
  periodStart: moment,
  periodEnd: moment,
  receiptNumber: z.string().nullable(),
  tax: z.array(z.object({ ratePercent: z.string(), net: money, tax: money })),
});
export type PledgePayment = z.output<typeof pledgePayment>;

export const supporterRow = z.object({
  id,
  name: z.string(),
  email: z.string(),
  plan: z.object({ id, name: z.string() }),
  state: pledgeState,
  amount: money,
  country: countryCode,
  flags: z.array(z.string()),
  beganAt: moment.nullable(),
  nextPaymentAt: moment.nullable(),
  endsAt: moment.nullable(),
  endedAt: moment.nullable(),
  paid: money,
});
export type SupporterRow = z.output<typeof supporterRow>;

export const supporter = pledge
  .omit({ deeds: true, pauses: true, paymentUrl: true, settleUrl: true })
  .extend({
    name: z.string(),
    email: z.string(),
    country: countryCode,
    flags: z.array(z.string()),
    consentText: z.string(),
    consentAt: moment,
    customerId: z.string().nullable(),
    subscriptionId: z.string().nullable(),
    paid: money,
    history: z.array(z.object({ at: moment, what: z.string(), detail: z.string() })),
    mails: z.array(z.object({ id, subject: z.string(), state: z.string(), sentAt: moment.nullable() })),
  });
export type Supporter = z.output<typeof supporter>;

export const supporterFigures = z.object({
  current: z.int(),
  grace: z.int(),
  paused: z.int(),
  /** What the current pledges bring in each month. */
  monthly: money,
  /** The last twelve months, oldest first, those without payments too. */
  months: z.array(z.object({ month: z.string(), payments: z.int(), gross: money })),
});

const supporterFilter = {
  state: pledgeState.optional(),
  planId: id.optional(),
  /** `1`: only those that staff should look at. */
  flagged: z.enum(['1']).optional(),
};
const pledgeParams = idParams('pledgeId');

export const supporterEndpoints = {
  'GET /plans': endpoint({
    access: 'public',
    summary: 'Pledge plans on offer, the smallest amount first',
    query: pageQuery,
    response: pageOf(plan),
  }),
  'GET /account/pledges': endpoint({
    access: 'signed-in',
    summary: 'One’s own pledges, newest first; those that were never begun are left out',
    query: z.object({ page: z.coerce.number().int().min(1).default(1) }),
    response: pageOf(pledge),
  }),
  'POST /pledges': endpoint({
    access: 'signed-in',
    summary: 'Open the payment page of a pledge',
    body: z.object({
      planId: id,
      country: countryCode,
      /** To `pledgeConsentText`. */
      hasConsented: z.literal(true, 'Tick the box: kits can only be handed over at once with your consent.'),
      /** Sent again after a broken connection, it opens the same page, not a second one. */
      attempt: id,
    }),
    response: z.object({ pledgeId: id, paymentUrl: z.string() }),
    status: 201,
  }),
  'GET /pledges/:pledgeId': endpoint({
    access: 'signed-in',
    summary: 'One’s own pledge',
    params: pledgeParams,
    response: pledge,
  }),
  'GET /pledges/:pledgeId/payments': endpoint({
    access: 'signed-in',
    summary: 'What was paid for it, newest first',
    params: pledgeParams,
    query: pageQuery,
    response: pageOf(pledgePayment),
  }),
  'POST /pledges/:pledgeId/refresh': endpoint({
    access: 'signed-in',
    summary: 'Ask the payment service how a pledge stands',
    params: pledgeParams,
    response: pledge,
  }),
  'POST /pledges/:pledgeId/give-up': endpoint({
    access: 'signed-in',
    summary: 'Close the payment page of a pledge that was not begun',
    params: pledgeParams,
    response: pledge,
  }),
  'PUT /pledges/:pledgeId/plan': endpoint({
    access: 'signed-in',
    summary: 'Choose another plan from the next payment on',
    params: pledgeParams,
    body: z.object({ planId: id }),
    response: pledge,
  }),
  'DELETE /pledges/:pledgeId/plan': endpoint({
    access: 'signed-in',
    summary: 'Stay with the plan one has',
    params: pledgeParams,
    response: pledge,
    status: 200,
  }),
  'POST /pledges/:pledgeId/pause': endpoint({
    access: 'signed-in',
    summary: 'Skip the next one, two or three payments',
    params: pledgeParams,
    body: z.object({ months: pauseMonths }),
    response: pledge,
  }),
  'POST /pledges/:pledgeId/resume': endpoint({
    access: 'signed-in',
    summary: 'Pay again from the next payment day on',
    params: pledgeParams,
    response: pledge,
  }),
  'POST /pledges/:pledgeId/end': endpoint({
    access: 'signed-in',
    summary: 'End it when the month that is paid is over',
    params: pledgeParams,
    response: pledge,
  }),
  'POST /pledges/:pledgeId/keep': endpoint({
    access: 'signed-in',
    summary: 'Take the end back while the month is not over',
    params: pledgeParams,
    response: pledge,
  }),
  'POST /pledges/:pledgeId/card': endpoint({
    access: 'signed-in',
    summary: 'Open the payment service’s page for another card',
    params: pledgeParams,
    /** One press of the button. */
    body: z.object({ attempt: id }),
    response: z.object({ url: z.string() }),
    status: 201,
  }),

  'GET /workshop/plans': endpoint({
    access: 'supporters:read',
    summary: 'Pledge plans with what they bring in',
    query: pageQuery,
    response: pageOf(workshopPlan),
  }),
  'POST /workshop/plans': endpoint({
    access: 'plans:write',
    summary: 'Make a pledge plan',
    body: planBody,
    response: workshopPlan,
    status: 201,
  }),
  'GET /workshop/plans/:planId': endpoint({
    access: 'supporters:read',
    summary: 'One pledge plan',
    params: idParams('planId'),
    response: workshopPlan,
  }),
  'PUT /workshop/plans/:planId': endpoint({
    access: 'plans:write',
    summary: 'Change a pledge plan; a new amount is for new pledges only',
    params: idParams('planId'),
    body: planBody,
    response: workshopPlan,
  }),
  'GET /workshop/supporters': endpoint({
    access: 'supporters:read',
    summary: 'Supporters, filtered, searched, paged',
    query: pageQuery
      .extend(supporterFilter)
      .extend(sortBy(['beganAt', 'amount', 'nextPaymentAt'], 'beganAt').shape),
    response: pageOf(supporterRow),
  }),
  'GET /workshop/supporters.csv': endpoint({
    access: 'supporters:read',
    summary: 'The same supporters as CSV',
    query: pageQuery.extend(supporterFilter),
    response: 'stream',
  }),
  'GET /workshop/supporter-figures': endpoint({
    access: 'supporters:read',
    summary: 'How many there are, what they bring in, month by month',
    response: supporterFigures,
  }),
  'GET /workshop/supporters/:pledgeId': endpoint({
    access: 'supporters:read',
    summary: 'One supporter’s pledge with its whole history',
    params: pledgeParams,
    response: supporter,
  }),
  'GET /workshop/supporters/:pledgeId/payments': endpoint({
    access: 'supporters:read',
    summary: 'What this supporter paid, newest first',
    params: pledgeParams,
    query: pageQuery,
    response: pageOf(pledgePayment),
  }),
};
