import type Stripe from 'stripe';
import type { ApiCall } from '../api/api-route.js';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { maximumSessionSeconds } from '../options.js';
import { formatAmount, smallestChargeMinor } from '../payments/amounts.js';
import type { StandIn } from '../stand-in.js';
import { readLineItems } from './checkout-line-items.js';

/** The modes on offer. A further one (a subscription) is a line here and a file beside `payments/pay-once.ts`. */
const modes = ['payment'] as const;

const parameters = [
  'mode', 'line_items', 'success_url', 'cancel_url', 'client_reference_id', 'customer', 'customer_email',
  'customer_creation', 'metadata', 'payment_intent_data', 'payment_method_types', 'expires_at', 'currency',
  'billing_address_collection', 'locale', 'submit_type', 'ui_mode', 'expand',
] as const; // prettier-ignore

/** Opens a checkout session: checks all of it, stores it with its lines, and gives its payment page's address. */
export function createSession({ standIn, fields }: ApiCall): Stripe.Checkout.Session {
  fields.allowOnly(...parameters);
  const mode = fields.oneOf('mode', modes);
  if (!mode) throw fields.missing('mode');
  fields.oneOf('ui_mode', ['hosted_page']);
  const times = readExpiry(standIn, fields);
  const successUrl = readUrl(fields, 'success_url');
  if (!successUrl) throw fields.missing('success_url');
  const cancelUrl = readUrl(fields, 'cancel_url');
  const customer = readCustomer(standIn, fields);
  const email = fields.string('customer_email') ?? customer?.email ?? null;
  const metadata = fields.metadata();
  const paymentIntentData = readPaymentIntentData(fields);
  const lineItems = readLineItems(standIn, fields);
  const currency = oneCurrency(lineItems, fields.currency('currency'));
  if (lineItems.some((line) => line.price?.type === 'recurring')) {
    throw badParameter('line_items', 'You specified `payment` mode but passed a recurring price.');
  }
  const total = lineItems.reduce((sum, line) => sum + line.amount_total, 0);
  const smallest = smallestChargeMinor(currency);
  if (total > 0 && total < smallest) {
    throw badParameter(
      'line_items',
      `The Checkout Session's total amount must be 0 or at least ${formatAmount(smallest, currency)}.`,
      'amount_too_small',
    );
  }
  const id = standIn.newId('cs');
  const session: Stripe.Checkout.Session = {
    id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: null,
    amount_subtotal: total,
    amount_total: total,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: fields.oneOf('billing_address_collection', ['auto', 'required']),
    cancel_url: cancelUrl,
    client_reference_id: readReference(fields),
    client_secret: null,
    collected_information: { business_name: null, individual_name: null, shipping_details: null },
    consent: null,
    consent_collection: null,
    created: times.created,
    currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: {
      after_submit: null,
      shipping_address: null,
      submit: null,
      terms_of_service_acceptance: null,
    },
    customer: customer?.id ?? null,
    customer_account: null,
    customer_creation: customer
      ? null
      : (fields.oneOf('customer_creation', ['always', 'if_required']) ?? 'if_required'),
    customer_details: email === null ? null : customerDetails(email, customer?.name ?? null, null),
    customer_email: fields.string('customer_email'),
    discounts: [],
    expires_at: times.expires,
    integration_identifier: null,
    invoice: null,
    invoice_creation: {
      enabled: false,
      invoice_data: {
        account_tax_ids: null,
        custom_fields: null,
        description: null,
        footer: null,
        issuer: null,
        metadata: {},
        rendering_options: null,
      },
    },
    livemode: false,
    locale: fields.string('locale'),
    managed_payments: null,
    metadata,
    mode,
    origin_context: null,
    // The service makes the payment intent when the buyer first tries to pay, not before.
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: readMethodTypes(fields),
    payment_status: total === 0 ? 'no_payment_required' : 'unpaid',
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: fields.oneOf('submit_type', ['auto', 'pay', 'book', 'donate']),
    subscription: null,
    success_url: successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: `${standIn.settings.publicUrl}/pay/${id}`,
    wallet_options: null,
  };
  standIn.state.sessionDetails.add({ id, lineItems, paymentIntentData, waiting: null });
  return standIn.state.sessions.add(session);
}

export function customerDetails(
  email: string,
  name: string | null,
  address: Stripe.Address | null,
): Stripe.Checkout.Session.CustomerDetails {
  return {
    address,
    business_name: null,
    email,
    individual_name: null,
    name,
    phone: null,
    tax_exempt: 'none',
    tax_ids: [],
  };
}

function readExpiry(standIn: StandIn, fields: Fields): { created: number; expires: number } {
  const created = standIn.clock.nowSeconds();
  const expires = fields.integer('expires_at') ?? created + maximumSessionSeconds;
  const { minimumSessionSeconds } = standIn.settings;
  // A second's grace: the caller's clock may have struck just after it reckoned.
  if (expires < created + minimumSessionSeconds - 1) {
    throw badParameter(
      'expires_at',
      `The \`expires_at\` timestamp must be at least ${minimumSessionSeconds} seconds from Checkout Session creation.`,
    );
  }
  if (expires > created + maximumSessionSeconds + 1) {
    throw badParameter(
      'expires_at',
      'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.',
    );
  }
  return { created, expires };
}

function readUrl(fields: Fields, key: string): string | null {
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

function readReference(fields: Fields): string | null {
  const reference = fields.string('client_reference_id');
  if (reference !== null && !/^[\w-]{1,200}$/.test(reference)) {
    throw badParameter('client_reference_id', 'Use up to 200 letters, digits, dashes and underscores.');
  }
  return reference;
}

function readCustomer(standIn: StandIn, fields: Fields): Stripe.Customer | null {
  const id = fields.string('customer');
  const email = fields.string('customer_email');
  if (id && email)
    throw badParameter('customer', 'You may only specify one of these parameters: customer, customer_email.');
  if (email && !/^[^\s@]+@[^\s@]+$/.test(email)) {
    throw badParameter('customer_email', `Invalid email address: ${email}`, 'email_invalid');
  }
  return id ? existing(standIn.state.customers, 'customer', id, 'customer') : null;
}

function readPaymentIntentData(fields: Fields) {
  const data = fields.object('payment_intent_data');
  data?.allowOnly('metadata', 'description', 'receipt_email');
  return {
    metadata: data?.metadata() ?? {},
    description: data?.string('description') ?? null,
    receiptEmail: data?.string('receipt_email') ?? null,
  };
}

function readMethodTypes(fields: Fields): string[] {
  const types = fields.strings('payment_method_types');
  const other = types.find((type) => type !== 'card');
  if (other)
    throw badParameter('payment_method_types', `The local stand-in takes cards alone, not ${other}.`);
  return ['card'];
}

function oneCurrency(lines: readonly Stripe.LineItem[], wanted: string | null): string {
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
