import { z } from 'zod';
import { buyerOrder, couponCode, orderState } from './basket.js';
import { endpoint } from './endpoint.js';
import { dispute, workshopRefund } from './refunds.js';
import { countryCode, id, idParams, line, minor, moment, money, pageOf, pageQuery } from './values.js';

/** What a coupon takes off: an exact fraction (a third is 1/3, 15 % is 15/100) or a fixed amount. */
export const couponOff = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('fraction'),
    numerator: z.int().min(1).max(1_000_000),
    denominator: z.int().min(1).max(1_000_000),
  }),
  z.object({ kind: z.literal('amount'), minor: minor.min(1) }),
]);
export type CouponOff = z.output<typeof couponOff>;

export const couponBody = z
  .object({
    code: couponCode,
    label: line.max(80),
    off: couponOff,
    /** Empty: all kits. */
    kitIds: z.array(id).max(100),
    startsAt: moment.nullable(),
    endsAt: moment.nullable(),
    cap: z.int().min(1).max(1_000_000).nullable(),
    perBuyer: z.int().min(1).max(1000).nullable(),
    /** Only for people whose pledge is current. */
    isForSupporters: z.boolean().default(false),
    /** The sum of the basket, before the discount, from which on the coupon holds. */
    minBasketMinor: minor.min(1).nullable().default(null),
    isAnnounced: z.boolean(),
    isActive: z.boolean().default(true),
  })
  .refine((one) => one.off.kind !== 'fraction' || one.off.numerator <= one.off.denominator, {
    path: ['off'],
    message: 'A coupon cannot take off more than the whole price.',
  })
  .refine((one) => !one.startsAt || !one.endsAt || one.startsAt < one.endsAt, {
    path: ['endsAt'],
    message: 'The end must come after the start.',
  })
  .refine((one) => !one.cap || !one.perBuyer || one.perBuyer <= one.cap, {
    path: ['perBuyer'],
    message: 'One buyer cannot have more places than there are in all.',
  })
  .refine((one) => !one.isForSupporters || !one.isAnnounced, {
    path: ['isAnnounced'],
    message: 'A coupon for supporters is not announced in the shop. Tell supporters of it in a letter.',
  });

export const coupon = z.object({
  id,
  code: z.string(),
  label: z.string(),
  off: couponOff,
  kits: z.array(z.object({ id, name: z.string() })),
  startsAt: moment.nullable(),
  endsAt: moment.nullable(),
  cap: z.int().nullable(),
  perBuyer: z.int().nullable(),
  isForSupporters: z.boolean(),
  minBasket: money.nullable(),
  isAnnounced: z.boolean(),
  isActive: z.boolean(),
  held: z.int(),
  redeemed: z.int(),
  left: z.int().nullable(),
  takenOff: money,
  createdAt: moment,
});
export type Coupon = z.output<typeof coupon>;

/** Places taken on one day, by what became of them since. Days without any are left out. */
export const couponDay = z.object({
  day: z.string(),
  redeemed: z.int(),
  held: z.int(),
  givenBack: z.int(),
  takenOff: money,
});
export type CouponDay = z.output<typeof couponDay>;

export const orderRow = z.object({
  id,
  number: z.string(),
  state: orderState,
  email: z.string(),
  country: countryCode,
  kits: z.array(z.string()),
  discount: money,
  total: money,
  refunded: money,
  couponCode: z.string().nullable(),
  receiptNumber: z.string().nullable(),
  flags: z.array(z.string()),
  placedAt: moment,
  paidAt: moment.nullable(),
});

/** Orders of which money went back, also in part; orders whose payment was ever in dispute. */
export const moneyBack = z.enum(['refunded', 'disputed']);

export const orderHistoryEntry = z.object({ at: moment, what: z.string(), detail: z.string() });
export const workshopOrder = buyerOrder.extend({
  country: countryCode,
  flags: z.array(z.string()),
  refunds: z.array(workshopRefund),
  disputes: z.array(dispute),
  paymentSessionId: z.string().nullable(),
  paymentIntentId: z.string().nullable(),
  consentText: z.string(),
  consentAt: moment,
  history: z.array(orderHistoryEntry),
  mails: z.array(z.object({ id, subject: z.string(), state: z.string(), sentAt: moment.nullable() })),
  downloads: z.int(),
});
export type WorkshopOrder = z.output<typeof workshopOrder>;

export const overview = z.object({
  /** Sales by day of the last thirty days, oldest first; days without sales are there with zero. */
  sales: z.array(z.object({ day: z.string(), orders: z.int(), gross: money })).nullable(),
  waiting: z.array(
    z.object({
      kind: z.enum([
        'draft',
        'flagged-order',
        'dead-job',
        'coupon-low',
        'refused-file',
        'fit-report',
        'letter',
      ]),
      label: z.string(),
      count: z.int(),
      link: z.string(),
    }),
  ),
});

export const holder = z.object({
  email: z.string(),
  kitName: z.string(),
  source: z.enum(['purchase', 'pledge', 'gift', 'staff']),
  state: z.enum(['active', 'suspended', 'ended']),
  since: moment,
  held: z.string().nullable(),
  downloads: z.int(),
});

const orderFilters = {
  state: orderState.optional(),
  moneyBack: moneyBack.optional(),
  /** `1`: only those that staff should look at. */
  flagged: z.enum(['1']).optional(),
  couponId: id.optional(),
};

export const workshopSalesEndpoints = {
  'GET /workshop/holders': endpoint({
    access: 'buyers:read',
    summary: 'Who is entitled to which kit, by which source, and the revision they hold',
    query: pageQuery.extend({ kitId: id.optional() }),
    response: pageOf(holder),
  }),
  'GET /workshop/overview': endpoint({
    access: 'workshop:enter',
    summary: 'What waits for me; sales by day for those who see money',
    response: overview,
  }),
  'GET /workshop/coupons': endpoint({
    access: 'coupons:read',
    summary: 'Coupons with what is held and redeemed',
    query: pageQuery,
    response: pageOf(coupon),
  }),
  'POST /workshop/coupons': endpoint({
    access: 'coupons:write',
    summary: 'Make a coupon',
    body: couponBody,
    response: coupon,
    status: 201,
  }),
  'GET /workshop/coupons/:couponId': endpoint({
    access: 'coupons:read',
    summary: 'One coupon',
    params: idParams('couponId'),
    response: coupon,
  }),
  'GET /workshop/coupons/:couponId/uses': endpoint({
    access: 'coupons:read',
    summary: 'How a coupon was used, day by day, oldest first',
    params: idParams('couponId'),
    response: z.array(couponDay),
  }),
  'PUT /workshop/coupons/:couponId': endpoint({
    access: 'coupons:write',
    summary: 'Change a coupon',
    params: idParams('couponId'),
    body: couponBody,
    response: coupon,
  }),
  'GET /workshop/orders': endpoint({
    access: 'orders:read',
    summary: 'Orders, filtered, searched, paged',
    query: pageQuery.extend({
      ...orderFilters,
      sort: z.enum(['placedAt', 'total', 'number']).default('placedAt'),
      order: z.enum(['asc', 'desc']).default('desc'),
    }),
    response: pageOf(orderRow),
  }),
  'GET /workshop/orders.csv': endpoint({
    access: 'orders:read',
    summary: 'The same orders as CSV',
    query: pageQuery.extend(orderFilters),
    response: 'stream',
  }),
  'GET /workshop/orders/:orderId': endpoint({
    access: 'orders:read',
    summary: 'One order with its whole history',
    params: idParams('orderId'),
    response: workshopOrder,
  }),
  'POST /workshop/orders/:orderId/link': endpoint({
    access: 'links:resend',
    summary: 'Mail the buyer a fresh download link',
    params: idParams('orderId'),
    response: null,
    status: 202,
  }),
};
