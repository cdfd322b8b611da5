import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { Cause, StandIn } from '../stand-in.js';
import { emit } from './events.js';

export type IntentDetails = {
  amount: number;
  currency: string;
  customer: string | null;
  description: string | null;
  metadata: Stripe.Metadata;
  receiptEmail: string | null;
  /** The card is to be kept for what falls due later. */
  isCardKept: boolean;
};

export function createPaymentIntent(
  standIn: StandIn,
  details: IntentDetails,
  cause: Cause,
): Stripe.PaymentIntent {
  const id = standIn.newId('pi');
  const intent: Stripe.PaymentIntent = {
    id,
    object: 'payment_intent',
    allowed_payment_method_types: null,
    amount: details.amount,
    amount_capturable: 0,
    amount_details: { tip: {} },
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: `${id}_secret_${standIn.ids.word(25)}`,
    confirmation_method: 'automatic',
    created: standIn.clock.nowSeconds(),
    currency: details.currency,
    customer: details.customer,
    customer_account: null,
    description: details.description,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: { ...details.metadata },
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: null,
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: details.receiptEmail,
    review: null,
    setup_future_usage: details.isCardKept ? 'off_session' : null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
  };
  standIn.state.paymentIntents.add(intent);
  emit(standIn, 'payment_intent.created', intent, cause);
  return intent;
}

/** Ends an intent that has not been paid. The caller has checked that it may be. */
export function cancelIntent(
  standIn: StandIn,
  intent: Stripe.PaymentIntent,
  reason: Stripe.PaymentIntent.CancellationReason | null,
  cause: Cause,
): void {
  intent.status = 'canceled';
  intent.canceled_at = standIn.clock.nowSeconds();
  intent.cancellation_reason = reason;
  intent.next_action = null;
  emit(standIn, 'payment_intent.canceled', intent, cause);
}

function createFromCall({ standIn, fields, cause }: ApiCall): Stripe.PaymentIntent {
  fields.allowOnly('amount', 'currency', 'customer', 'description', 'metadata', 'receipt_email', 'expand');
  const amount = fields.requiredInteger('amount');
  if (amount < 1)
    throw badParameter(
      'amount',
      'This value must be greater than or equal to 1.',
      'parameter_invalid_integer',
    );
  const currency = fields.currency('currency');
  if (!currency) throw fields.missing('currency');
  const customer = fields.string('customer');
  if (customer) existing(standIn.state.customers, 'customer', customer, 'customer');
  return createPaymentIntent(
    standIn,
    {
      amount,
      currency,
      customer,
      description: fields.string('description'),
      metadata: fields.metadata(),
      receiptEmail: fields.string('receipt_email'),
      isCardKept: false,
    },
    cause,
  );
}

function cancelFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.PaymentIntent {
  fields.allowOnly('cancellation_reason', 'expand');
  const intent = existing(standIn.state.paymentIntents, 'payment_intent', id, 'intent');
  const reasons = ['abandoned', 'duplicate', 'fraudulent', 'requested_by_customer'] as const;
  const reason = fields.oneOf('cancellation_reason', reasons);
  if (intent.status === 'canceled' || intent.status === 'succeeded') {
    throw refused(
      `You cannot cancel this PaymentIntent because it has a status of ${intent.status}.`,
      'payment_intent_unexpected_state',
    );
  }
  if (standIn.state.sessions.oldestFirst().some((session) => session.payment_intent === id)) {
    throw refused(
      'You cannot cancel the PaymentIntent of a Checkout Session. Expire the Checkout Session instead.',
      'payment_intent_unexpected_state',
    );
  }
  cancelIntent(standIn, intent, reason, cause);
  return intent;
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'customer', 'created');
  const customer = call.fields.string('customer');
  const intents = call.standIn.state.paymentIntents
    .newestFirst()
    .filter((intent) => customer === null || intent.customer === customer)
    .filter(createdFilter(call.fields));
  return pageOf(call, intents);
}

export const paymentIntentRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/payment_intents', run: createFromCall },
  { method: 'get', path: '/v1/payment_intents', run: listFromCall },
  {
    method: 'get',
    path: '/v1/payment_intents/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand', 'client_secret');
      return existing(standIn.state.paymentIntents, 'payment_intent', id, 'intent');
    },
  },
  { method: 'post', path: '/v1/payment_intents/:id/cancel', run: cancelFromCall },
];
