import type Stripe from 'stripe';

export type SessionOrder = {
  id: string;
  mode: 'payment' | 'subscription' | 'setup';
  url: string;
  successUrl: string;
  cancelUrl: string | null;
  created: number;
  expires: number;
  /** Null where nothing is paid. */
  total: number | null;
  currency: string | null;
  reference: string | null;
  customer: Stripe.Customer | null;
  customerCreation: 'always' | 'if_required' | null;
  customerEmail: string | null;
  billingAddress: 'auto' | 'required' | null;
  submitType: 'auto' | 'pay' | 'book' | 'donate' | 'subscribe' | null;
  locale: string | null;
  metadata: Stripe.Metadata;
  setupIntent: string | null;
};

export function sessionObject(order: SessionOrder): Stripe.Checkout.Session {
  const { total, customer, mode } = order;
  const email = order.customerEmail ?? customer?.email ?? null;
  return {
    id: order.id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: null,
    amount_subtotal: total,
    amount_total: total,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: order.billingAddress,
    cancel_url: order.cancelUrl,
    client_reference_id: order.reference,
    client_secret: null,
    collected_information: { business_name: null, individual_name: null, shipping_details: null },
    consent: null,
    consent_collection: null,
    created: order.created,
    currency: order.currency,
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
    customer_creation: order.customerCreation,
    customer_details: email === null ? null : customerDetails(email, customer?.name ?? null, null),
    customer_email: order.customerEmail,
    discounts: [],
    expires_at: order.expires,
    integration_identifier: null,
    invoice: null,
    invoice_creation: mode === 'payment' ? noInvoice() : null,
    livemode: false,
    locale: order.locale,
    managed_payments: null,
    metadata: order.metadata,
    mode,
    origin_context: null,
    // The service makes the payment intent when the buyer first tries to pay, not before.
    payment_intent: null,
    payment_link: null,
    payment_method_collection: mode === 'payment' ? 'if_required' : 'always',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_status: !total ? 'no_payment_required' : 'unpaid',
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: order.setupIntent,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: order.submitType,
    subscription: null,
    success_url: order.successUrl,
    total_details: total === null ? null : { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: order.url,
    wallet_options: null,
  };
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

function noInvoice(): Stripe.Checkout.Session.InvoiceCreation {
  return {
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
  };
}
