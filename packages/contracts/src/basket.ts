import { z } from 'zod';
import { endpoint } from './endpoint.js';
import { problemStatus, type ProblemCode } from './problems.js';
import { lineRight, refund } from './refunds.js';
import { businessBuyer, taxTreatment } from './tax.js';
import { countryCode, email, filamentColour, id, line, moment, money, secret } from './values.js';

export const basketItem = z.object({ licenceId: id });
export const couponCode = z
  .string()
  .trim()
  .toUpperCase()
  .min(3)
  .max(40)
  .regex(/^[A-Z0-9-]+$/, 'Codes have letters, digits and hyphens.');

export const quoteLine = z.object({
  licenceId: id,
  kitSlug: z.string(),
  kitName: z.string(),
  colour: filamentColour,
  licenceName: z.string(),
  revision: z.string(),
  price: money,
  discount: money,
  total: money,
});
export const quote = z.object({
  lines: z.array(quoteLine),
  /** Licences that are no longer sold, dropped from the lines. */
  gone: z.array(id),
  subtotal: money,
  discount: money,
  total: money,
  coupon: z
    .object({
      code: z.string(),
      label: z.string(),
      cap: z.int().nullable(),
      left: z.int().nullable(),
    })
    .nullable(),
  couponFault: z
    .object({
      code: z.enum(Object.keys(problemStatus) as [ProblemCode, ...ProblemCode[]]),
      detail: z.string(),
    })
    .nullable(),
  /** Null until the buyer's country is known, and where nothing is to pay. */
  tax: z
    .object({
      country: countryCode,
      treatment: taxTreatment,
      /** Of the buyer's country; null where the shop knows none. */
      ratePercent: z.string().nullable(),
      net: money,
      tax: money,
    })
    .nullable(),
});
export type Quote = z.output<typeof quote>;

export const quoteBody = z.object({
  items: z.array(basketItem).max(30),
  couponCode: couponCode.optional(),
  country: countryCode.optional(),
  /** Who buys for a business; a number that is no VAT number of the country counts as none. */
  business: businessBuyer.pick({ vatNumber: true }).optional(),
});

/**
 * What the buyer ticks before files are handed over at once (Directive 2011/83/EU, art. 16 m). The page
 * shows these very words and the order keeps them.
 */
export const consentText =
  'Hand the files over at once. I know that I lose my right to withdraw from the purchase when they are handed over.';

/** The whole basket for somebody else. */
export const giftWish = z.object({
  email,
  /** The giver, as the one who gets it knows them. */
  giver: line.max(80, 'Write at most 80 characters.'),
  greeting: z
    .string()
    .trim()
    .min(1, 'Write a line to go with it.')
    .max(300, 'Write at most 300 characters.')
    // The mail goes to somebody who never asked for it, in the shop's name.
    .refine((text) => !/https?:|www\.|:\/\//i.test(text), 'Write words alone, no addresses of web pages.'),
});
export type GiftWish = z.output<typeof giftWish>;

export const checkoutBody = z.object({
  items: z.array(basketItem).min(1, 'The basket is empty.').max(30),
  couponCode: couponCode.optional(),
  email,
  country: countryCode,
  business: businessBuyer.optional(),
  gift: giftWish.optional(),
  /** To `consentText`. */
  hasConsented: z.literal(true, 'Tick the box: files can only be handed over at once with your consent.'),
  /** Sent again after a broken connection, it opens the same checkout, not a second one. */
  attempt: id,
});

export const checkoutOpened = z.object({
  orderId: id,
  /** Opens the order page without an account; it is shown once and stored hashed. */
  orderKey: secret,
  /** Where to pay; null where nothing is to pay. */
  paymentUrl: z.string().nullable(),
});

export const orderState = z.enum(['open', 'paid', 'cancelled', 'expired', 'refunded']);

export const orderLine = z.object({
  id,
  kitSlug: z.string(),
  kitName: z.string(),
  colour: filamentColour,
  licenceName: z.string(),
  revision: z.string(),
  price: money,
  discount: money,
  total: money,
  /** Of the total, what went back. */
  refunded: money,
  right: lineRight,
});

/** An order as its buyer sees it. */
export const buyerOrder = z.object({
  id,
  number: z.string(),
  state: orderState,
  email: z.string(),
  placedAt: moment,
  paidAt: moment.nullable(),
  payUntil: moment.nullable(),
  paymentUrl: z.string().nullable(),
  receiptNumber: z.string().nullable(),
  lines: z.array(orderLine),
  subtotal: money,
  discount: money,
  total: money,
  refunded: money,
  refunds: z.array(refund),
  tax: z.array(z.object({ ratePercent: z.string(), net: money, tax: money })),
  taxTreatment,
  business: businessBuyer.nullable(),
  /** For whom it was bought; the files are theirs alone. */
  gift: giftWish.nullable(),
  couponCode: z.string().nullable(),
  isMine: z.boolean(),
});
export type BuyerOrder = z.output<typeof buyerOrder>;

const orderParams = z.object({ orderId: id });
const withKey = z.object({ key: secret.optional() });

export const basketEndpoints = {
  'POST /basket/quote': endpoint({
    access: 'public',
    summary: 'Price a basket, with a coupon',
    body: quoteBody,
    response: quote,
  }),
  'POST /checkout': endpoint({
    access: 'public',
    summary: 'Place an order, hold the coupon, open the payment page',
    body: checkoutBody,
    response: checkoutOpened,
    status: 201,
  }),
  'GET /orders/:orderId': endpoint({
    access: 'public',
    summary: 'An order, for its buyer or with its key',
    params: orderParams,
    query: withKey,
    response: buyerOrder,
  }),
  'POST /orders/:orderId/refresh': endpoint({
    access: 'public',
    summary: 'Ask the payment service how an open order stands',
    params: orderParams,
    query: withKey,
    response: buyerOrder,
  }),
  'POST /orders/:orderId/cancel': endpoint({
    access: 'public',
    summary: 'Give up an open order; its coupon place is free again',
    params: orderParams,
    query: withKey,
    response: buyerOrder,
  }),
  'GET /account/orders': endpoint({
    access: 'signed-in',
    summary: 'One’s own orders',
    query: z.object({ page: z.coerce.number().int().min(1).default(1) }),
    response: z.object({ items: z.array(buyerOrder), page: z.int(), size: z.int(), total: z.int() }),
  }),
  'POST /payments/webhook': endpoint({
    access: 'public',
    summary: 'Signed events of the payment service',
    response: z.object({ received: z.literal(true) }),
    isCalledFromOutside: true,
  }),
};
