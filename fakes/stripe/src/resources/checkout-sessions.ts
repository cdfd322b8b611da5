import type Stripe from 'stripe';
import type { ApiCall } from '../api/api-route.js';
import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import { formatAmount, smallestChargeMinor } from '../payments/amounts.js';
import type { Cause, StandIn } from '../stand-in.js';
import { readLineItems } from './checkout-line-items.js';
import {
  checkMethodTypes,
  modes,
  oneCurrency,
  readCustomer,
  readCustomerCreation,
  readExpiry,
  readHandedOn,
  readReference,
  readUrl,
  type Mode,
} from './checkout-session-fields.js';
import { sessionObject } from './checkout-session-object.js';
import { createSetupIntent } from './setup-intents.js';
import { checkParts } from './subscription-parts.js';

const parameters = [
  'mode', 'line_items', 'success_url', 'cancel_url', 'client_reference_id', 'customer', 'customer_email',
  'customer_creation', 'metadata', 'payment_intent_data', 'subscription_data', 'setup_intent_data',
  'payment_method_types', 'expires_at', 'currency', 'billing_address_collection', 'locale', 'submit_type',
  'ui_mode', 'expand',
] as const; // prettier-ignore

/** Opens a checkout session: checks all of it, stores it with its lines, and gives its page's address. */
export function createSession({ standIn, fields, cause }: ApiCall): Stripe.Checkout.Session {
  fields.allowOnly(...parameters);
  const mode = fields.requiredOneOf('mode', modes);
  fields.oneOf('ui_mode', ['hosted_page']);
  checkMethodTypes(fields);
  const times = readExpiry(standIn, fields);
  const successUrl = readUrl(fields, 'success_url');
  if (!successUrl) throw fields.missing('success_url');
  const cancelUrl = readUrl(fields, 'cancel_url');
  const customer = readCustomer(standIn, fields);
  const metadata = fields.metadata();
  const handedOn = readHandedOn(fields, mode);
  const goods = mode === 'setup' ? nothing(fields) : readGoods(standIn, fields, mode);
  const id = standIn.newId('cs');
  const session = sessionObject({
    id,
    mode,
    url: `${standIn.settings.publicUrl}/pay/${id}`,
    successUrl,
    cancelUrl,
    created: times.created,
    expires: times.expires,
    total: goods.total,
    currency: goods.currency,
    reference: readReference(fields),
    customer,
    customerCreation: readCustomerCreation(fields, mode, customer),
    customerEmail: fields.string('customer_email'),
    billingAddress: fields.oneOf('billing_address_collection', ['auto', 'required']),
    submitType: fields.oneOf('submit_type', ['auto', 'pay', 'book', 'donate', 'subscribe']),
    locale: fields.string('locale'),
    metadata,
    setupIntent: mode === 'setup' ? setupFor(standIn, customer, handedOn.setup, cause) : null,
  });
  standIn.state.sessionDetails.add({
    id,
    endsAt: times.endsAt,
    lineItems: goods.lines,
    paymentIntentData: handedOn.payment,
    subscriptionData: handedOn.subscription,
    subscriptionId: null,
    waiting: null,
  });
  return standIn.state.sessions.add(session);
}

type Goods = { lines: Stripe.LineItem[]; total: number | null; currency: string | null };

function nothing(fields: Fields): Goods {
  if (fields.has('line_items'))
    throw badParameter('line_items', 'You can not pass `line_items` in `setup` mode.');
  return { lines: [], total: null, currency: fields.currency('currency') };
}

function readGoods(standIn: StandIn, fields: Fields, mode: Mode): Goods {
  const lines = readLineItems(standIn, fields);
  const currency = oneCurrency(lines, fields.currency('currency'));
  if (mode === 'subscription') {
    checkParts(
      lines.map((line) => ({ price: line.price as Stripe.Price, quantity: line.quantity ?? 1 })),
      'line_items',
    );
  } else if (lines.some((line) => line.price?.type === 'recurring')) {
    throw badParameter('line_items', 'You specified `payment` mode but passed a recurring price.');
  }
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  const smallest = smallestChargeMinor(currency);
  if (total > 0 && total < smallest) {
    throw badParameter(
      'line_items',
      `The Checkout Session's total amount must be 0 or at least ${formatAmount(smallest, currency)}.`,
      'amount_too_small',
    );
  }
  return { lines, total, currency };
}

function setupFor(
  standIn: StandIn,
  customer: Stripe.Customer | null,
  details: { metadata: Stripe.Metadata; description: string | null },
  cause: Cause,
): string {
  return createSetupIntent(standIn, { customer: customer?.id ?? null, ...details }, cause).id;
}
