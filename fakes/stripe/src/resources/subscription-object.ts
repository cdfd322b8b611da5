import type Stripe from 'stripe';
import type { StandIn } from '../stand-in.js';

export type Part = { price: Stripe.Price; quantity: number };
export type Period = { start: number; end: number };

export type SubscriptionOrder = {
  customer: Stripe.Customer;
  parts: readonly Part[];
  currency: string;
  period: Period;
  anchor: number;
  status: 'incomplete' | 'active';
  description: string | null;
  metadata: Stripe.Metadata;
  defaultPaymentMethod: string | null;
};

/** A subscription as it is before its first invoice. */
export function subscriptionObject(standIn: StandIn, order: SubscriptionOrder): Stripe.Subscription {
  const id = standIn.newId('sub');
  const now = standIn.clock.nowSeconds();
  return {
    id,
    object: 'subscription',
    application: null,
    application_fee_percent: null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null },
    billing_cycle_anchor: order.anchor,
    billing_cycle_anchor_config: null,
    billing_mode: { flexible: { proration_discounts: 'included' }, type: 'flexible' },
    billing_schedules: [],
    billing_thresholds: null,
    cancel_at: null,
    cancel_at_period_end: false,
    canceled_at: null,
    cancellation_details: { comment: null, feedback: null, feedback_option: null, reason: null },
    collection_method: 'charge_automatically',
    created: now,
    currency: order.currency,
    customer: order.customer.id,
    customer_account: null,
    days_until_due: null,
    default_payment_method: order.defaultPaymentMethod,
    default_source: null,
    default_tax_rates: [],
    description: order.description,
    discounts: [],
    ended_at: null,
    invoice_settings: {
      account_tax_ids: null,
      custom_fields: null,
      description: null,
      footer: null,
      issuer: { type: 'self' },
    },
    items: {
      object: 'list',
      data: order.parts.map((part) => itemOf(standIn, id, part, order.period)),
      has_more: false,
      url: `/v1/subscription_items?subscription=${id}`,
    },
    latest_invoice: null,
    livemode: false,
    managed_payments: null,
    metadata: { ...order.metadata },
    next_pending_invoice_item_invoice: null,
    on_behalf_of: null,
    pause_collection: null,
    payment_settings: {
      payment_method_options: null,
      payment_method_types: null,
      save_default_payment_method: 'off',
    },
    pending_invoice_item_interval: null,
    pending_setup_intent: null,
    pending_update: null,
    schedule: null,
    start_date: now,
    status: order.status,
    test_clock: order.customer.test_clock ?? null,
    transfer_data: null,
    trial_end: null,
    trial_settings: {
      end_behavior: { billing_cycle_anchor: null, missing_payment_method: 'create_invoice' },
    },
    trial_start: null,
  };
}

function itemOf(standIn: StandIn, subscription: string, part: Part, period: Period): Stripe.SubscriptionItem {
  return {
    id: standIn.newId('si'),
    object: 'subscription_item',
    billing_thresholds: null,
    created: standIn.clock.nowSeconds(),
    current_period_end: period.end,
    current_period_start: period.start,
    current_trial: null,
    discounts: [],
    metadata: {},
    plan: planOf(part.price),
    price: structuredClone(part.price),
    quantity: part.quantity,
    subscription,
    tax_rates: [],
  };
}

/** The older shape of a recurring price, which every item still carries. */
export function planOf(price: Stripe.Price): Stripe.Plan {
  return {
    id: price.id,
    object: 'plan',
    active: price.active,
    amount: price.unit_amount,
    amount_decimal: price.unit_amount_decimal,
    billing_scheme: 'per_unit',
    created: price.created,
    currency: price.currency,
    interval: price.recurring?.interval ?? 'month',
    interval_count: price.recurring?.interval_count ?? 1,
    livemode: false,
    metadata: price.metadata,
    meter: null,
    nickname: price.nickname,
    product: price.product,
    tiers_mode: null,
    transform_usage: null,
    trial_period_days: null,
    usage_type: 'licensed',
  };
}
