import type Stripe from 'stripe';
import type { StandIn } from '../stand-in.js';

export type InvoiceOrder = {
  subscription: Stripe.Subscription;
  customer: Stripe.Customer;
  reason: 'subscription_create' | 'subscription_cycle' | 'subscription_update';
  /** From which moment on things could be put on this invoice: the boundary before. */
  since: number;
  /** Unix seconds; null where it stays a draft until somebody acts. */
  finalizesAt: number | null;
};

/** A draft with one line for each item of the subscription, for the period that the items stand in. */
export function invoiceObject(standIn: StandIn, order: InvoiceOrder): Stripe.Invoice {
  const { subscription, customer } = order;
  const id = standIn.newId('in');
  const now = standIn.clock.nowSeconds();
  const lines = subscription.items.data.map((item) => lineOf(standIn, id, subscription, item));
  const total = lines.reduce((sum, line) => sum + line.amount, 0);
  return {
    id,
    object: 'invoice',
    account_country: 'DE',
    account_name: 'Local stand-in',
    account_tax_ids: null,
    amount_due: total,
    amount_overpaid: 0,
    amount_paid: 0,
    amount_remaining: total,
    amount_shipping: 0,
    application: null,
    attempt_count: 0,
    attempted: false,
    auto_advance: order.finalizesAt !== null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null, provider: null, status: null },
    automatically_finalizes_at: order.finalizesAt,
    billing_reason: order.reason,
    collection_method: 'charge_automatically',
    created: now,
    currency: subscription.currency,
    custom_fields: null,
    customer: customer.id,
    customer_account: null,
    customer_address: customer.address ?? null,
    customer_email: customer.email,
    customer_name: customer.name ?? null,
    customer_phone: customer.phone ?? null,
    customer_shipping: null,
    customer_tax_exempt: 'none',
    customer_tax_ids: [],
    default_payment_method: null,
    default_source: null,
    default_tax_rates: [],
    description: null,
    discounts: [],
    due_date: null,
    effective_at: null,
    ending_balance: null,
    footer: null,
    from_invoice: null,
    hosted_invoice_url: null,
    invoice_pdf: null,
    issuer: { type: 'self' },
    last_finalization_error: null,
    latest_revision: null,
    lines: { object: 'list', data: lines, has_more: false, url: `/v1/invoices/${id}/lines` },
    livemode: false,
    metadata: {},
    next_payment_attempt: order.finalizesAt,
    number: null,
    on_behalf_of: null,
    parent: {
      quote_details: null,
      subscription_details: { metadata: { ...subscription.metadata }, subscription: subscription.id },
      type: 'subscription_details',
    },
    payment_settings: { default_mandate: null, payment_method_options: null, payment_method_types: null },
    period_end: now,
    period_start: order.since,
    post_payment_credit_notes_amount: 0,
    pre_payment_credit_notes_amount: 0,
    receipt_number: null,
    rendering: null,
    shipping_cost: null,
    shipping_details: null,
    starting_balance: 0,
    statement_descriptor: null,
    status: 'draft',
    status_transitions: {
      finalized_at: null,
      marked_uncollectible_at: null,
      paid_at: null,
      voided_at: null,
    },
    subtotal: total,
    subtotal_excluding_tax: total,
    test_clock: subscription.test_clock,
    total,
    total_discount_amounts: [],
    total_excluding_tax: total,
    total_pretax_credit_amounts: [],
    total_taxes: [],
    webhooks_delivered_at: now,
  };
}

function lineOf(
  standIn: StandIn,
  invoice: string,
  subscription: Stripe.Subscription,
  item: Stripe.SubscriptionItem,
): Stripe.InvoiceLineItem {
  const quantity = item.quantity ?? 1;
  const amount = (item.price.unit_amount ?? 0) * quantity;
  const product = standIn.state.products.find(String(item.price.product));
  return {
    id: standIn.newId('il'),
    object: 'line_item',
    amount,
    currency: subscription.currency,
    description: `${quantity} × ${product?.name ?? 'Subscription'}`,
    discount_amounts: [],
    discountable: true,
    discounts: [],
    invoice,
    livemode: false,
    metadata: { ...subscription.metadata },
    parent: {
      invoice_item_details: null,
      subscription_item_details: {
        invoice_item: null,
        proration: false,
        proration_details: { credited_items: null },
        subscription: subscription.id,
        subscription_item: item.id,
      },
      type: 'subscription_item_details',
    },
    period: { start: item.current_period_start, end: item.current_period_end },
    pretax_credit_amounts: [],
    pricing: {
      price_details: { price: item.price.id, product: String(item.price.product) },
      type: 'price_details',
      unit_amount_decimal: item.price.unit_amount_decimal,
    },
    quantity,
    // On the wire a decimal is text; the type speaks of the class that the SDK makes of it.
    quantity_decimal: String(quantity) as unknown as Stripe.Decimal,
    subscription: subscription.id,
    subtotal: amount,
    taxes: [],
  };
}
