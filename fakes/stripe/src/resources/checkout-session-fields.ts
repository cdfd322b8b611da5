import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { maximumSessionSeconds } from '../options.js';
import type { StandIn } from '../stand-in.js';

export const modes = ['payment', 'subscription', 'setup'] as const;
export type Mode = (typeof modes)[number];

/**
 * When a page ends: `expires` as the shop says it, `endsAt` by the stand-in's own time. The two differ where
 * that time was moved and the shop, whose clock was not, reckons from today.
 */
export function readExpiry(
  standIn: StandIn,
  fields: Fields,
): { created: number; expires: number; endsAt: number } {
  const created = standIn.clock.nowSeconds();
  const expires = fields.integer('expires_at') ?? created + maximumSessionSeconds;
  const real = created - Math.round(standIn.clock.offsetMs / 1000);
  const fault = faultOfExpiry(standIn, expires, created);
  if (fault && faultOfExpiry(standIn, expires, real)) throw fault;
  return { created, expires, endsAt: fault ? expires + created - real : expires };
}

function faultOfExpiry(standIn: StandIn, expires: number, now: number): Error | null {
  const { minimumSessionSeconds } = standIn.settings;
  // A second's grace: the caller's clock may have struck just after it reckoned.
  if (expires < now + minimumSessionSeconds - 1)
    return badParameter(
      'expires_at',
      `The \`expires_at\` timestamp must be at least ${minimumSessionSeconds} seconds from Checkout Session creation.`,
    );
  if (expires > now + maximumSessionSeconds + 1)
    return badParameter(
      'expires_at',
      'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.',
    );
  return null;
}

export function readUrl(fields: Fields, key: string): string | null {
  const value = fields.string(key);
  if (value === null) return null;
  if (!/^https?:\/\//.test(value) || !URL.canParse(value)) {
    throw badParameter(
      key,
      `Not a valid URL: ${value}. It must begin with http:// or https://.`,
      'url_invalid',
    );
  }
  return value;
}

export function readReference(fields: Fields): string | null {
  const reference = fields.string('client_reference_id');
  if (reference !== null && !/^[\w-]{1,200}$/.test(reference)) {
    throw badParameter('client_reference_id', 'Use up to 200 letters, digits, dashes and underscores.');
  }
  return reference;
}

export function readCustomer(standIn: StandIn, fields: Fields): Stripe.Customer | null {
  const id = fields.string('customer');
  const email = fields.string('customer_email');
  if (id && email)
    throw badParameter('customer', 'You may only specify one of these parameters: customer, customer_email.');
  if (email && !/^[^\s@]+@[^\s@]+$/.test(email)) {
    throw badParameter('customer_email', `Invalid email address: ${email}`, 'email_invalid');
  }
  return id ? existing(standIn.state.customers, 'customer', id, 'customer') : null;
}

/** What the page hands on to what it makes; each mode has its own, and the service refuses another's. */
export function readHandedOn(fields: Fields, mode: Mode) {
  const owners = {
    payment_intent_data: 'payment',
    subscription_data: 'subscription',
    setup_intent_data: 'setup',
  };
  for (const [key, owner] of Object.entries(owners)) {
    if (fields.has(key) && owner !== mode)
      throw badParameter(key, `You can not pass \`${key}\` in \`${mode}\` mode.`);
  }
  const payment = fields.object('payment_intent_data');
  payment?.allowOnly('metadata', 'description', 'receipt_email', 'setup_future_usage');
  const usage = payment?.oneOf('setup_future_usage', ['on_session', 'off_session']) ?? null;
  const subscription = fields.object('subscription_data');
  subscription?.allowOnly('metadata', 'description');
  const setup = fields.object('setup_intent_data');
  setup?.allowOnly('metadata', 'description');
  return {
    payment: {
      metadata: payment?.metadata() ?? {},
      description: payment?.string('description') ?? null,
      receiptEmail: payment?.string('receipt_email') ?? null,
      isCardKept: usage !== null,
    },
    subscription: {
      metadata: subscription?.metadata() ?? {},
      description: subscription?.string('description') ?? null,
    },
    setup: { metadata: setup?.metadata() ?? {}, description: setup?.string('description') ?? null },
  };
}

/** Who the customer will be: a subscription always has one, and takes no word on it. */
export function readCustomerCreation(
  fields: Fields,
  mode: Mode,
  customer: Stripe.Customer | null,
): 'always' | 'if_required' | null {
  const creation = fields.oneOf('customer_creation', ['always', 'if_required']);
  if (creation && mode === 'subscription')
    throw badParameter(
      'customer_creation',
      '`customer_creation` can only be used in `payment` and `setup` mode.',
    );
  if (customer) return null;
  return mode === 'subscription' ? 'always' : (creation ?? 'if_required');
}

/** @throws ApiError for anything but cards */
export function checkMethodTypes(fields: Fields): void {
  const types = fields.strings('payment_method_types');
  const other = types.find((type) => type !== 'card');
  if (other)
    throw badParameter('payment_method_types', `The local stand-in takes cards alone, not ${other}.`);
}

export function oneCurrency(lines: readonly Stripe.LineItem[], wanted: string | null): string {
  const currencies = new Set(lines.map((line) => line.currency));
  if (wanted) currencies.add(wanted);
  const [currency, ...others] = currencies;
  if (!currency || others.length > 0) {
    throw badParameter(
      'line_items',
      `All line items must have one currency, not ${[...currencies].join(' and ')}.`,
    );
  }
  return currency;
}
