import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter, missing, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { collectInvoice, defaultMethodOf } from '../billing/collect-invoice.js';
import { endSubscription } from '../billing/end-subscription.js';
import { startSubscription } from '../billing/run-subscription.js';
import { inTimeOf, inTimeOfCustomer } from '../time/in-time-of.js';
import { methodOfCustomer } from './payment-methods.js';
import { readParts } from './subscription-parts.js';
import { updateFromCall } from './subscription-updates.js';

const parameters = [
  'customer', 'items', 'default_payment_method', 'description', 'metadata', 'payment_behavior',
  'billing_cycle_anchor', 'proration_behavior', 'collection_method', 'off_session', 'expand',
] as const; // prettier-ignore

const subscriptionOf = ({ standIn, id }: ApiCall) =>
  existing(standIn.state.subscriptions, 'subscription', id, 'id');

function createFromCall(call: ApiCall): Stripe.Subscription {
  const { standIn, fields } = call;
  fields.allowOnly(...parameters);
  fields.oneOf('collection_method', ['charge_automatically']);
  const customer = existing(
    standIn.state.customers,
    'customer',
    fields.requiredString('customer'),
    'customer',
  );
  return inTimeOfCustomer(standIn, customer.id, () => create(call, customer));
}

function create(call: ApiCall, customer: Stripe.Customer): Stripe.Subscription {
  const { standIn, fields, cause } = call;
  const isWaiting =
    fields.oneOf('payment_behavior', ['allow_incomplete', 'default_incomplete']) === 'default_incomplete';
  const method = fields.string('default_payment_method');
  if (method) methodOfCustomer(standIn, method, customer.id, 'default_payment_method');
  if (!isWaiting && !method && !customer.invoice_settings.default_payment_method)
    throw refused(
      'This customer has no attached payment source or default payment method. Please consider adding a default payment method.',
      'resource_missing',
    );
  const anchor = readAnchor(call);
  const { parts, currency } = readParts(standIn, fields);
  const { subscription, invoice } = startSubscription(
    standIn,
    {
      customer,
      parts,
      currency,
      description: fields.string('description'),
      metadata: fields.metadata(),
      defaultPaymentMethod: method,
      anchor,
    },
    cause,
  );
  if (invoice && !isWaiting) {
    collectInvoice(standIn, invoice, {
      isScheduled: false,
      cause,
      method: defaultMethodOf(standIn, invoice) ?? undefined,
    });
  }
  return subscription;
}

function readAnchor({ standIn, fields }: ApiCall): number | null {
  const anchor = fields.integer('billing_cycle_anchor');
  const proration = fields.oneOf('proration_behavior', ['none', 'create_prorations']);
  if (anchor === null) return null;
  if (anchor <= standIn.clock.nowSeconds())
    throw badParameter('billing_cycle_anchor', 'billing_cycle_anchor must lie in the future.');
  if (proration !== 'none')
    throw badParameter(
      'proration_behavior',
      'The local stand-in reckons no parts of a period: say proration_behavior=none.',
    );
  return anchor;
}

function cancelFromCall(call: ApiCall): Stripe.Subscription {
  const { standIn, fields, cause } = call;
  fields.allowOnly('cancellation_details', 'invoice_now', 'prorate', 'expand');
  if (fields.boolean('prorate'))
    throw badParameter('prorate', 'The local stand-in reckons no parts of a period.');
  const subscription = subscriptionOf(call);
  // What has ended cannot be ended: the service then knows nothing at this address.
  if (subscription.ended_at !== null) throw missing('subscription', subscription.id);
  const details = fields.object('cancellation_details');
  details?.allowOnly('comment', 'feedback');
  inTimeOf(standIn, subscription.test_clock as string | null, () => {
    if (subscription.cancellation_details) {
      subscription.cancellation_details.comment ??= details?.string('comment') ?? null;
      subscription.cancellation_details.feedback ??= details?.string('feedback') ?? null;
    }
    endSubscription(standIn, subscription, 'cancellation_requested', cause);
  });
  return subscription;
}

/** Ends the pause of collecting; the service has this address for subscriptions whose status is `paused`. */
function resumeFromCall(call: ApiCall): Stripe.Subscription {
  call.fields.allowOnly('billing_cycle_anchor', 'proration_behavior', 'expand');
  throw refused(
    `Only subscriptions with the status paused can be resumed; ${call.id} is ${subscriptionOf(call).status}. Clear pause_collection instead.`,
  );
}

function listFromCall(call: ApiCall): object {
  const { fields } = call;
  fields.allowOnly(...pageParameters, 'customer', 'status', 'price', 'test_clock', 'created');
  const customer = fields.string('customer');
  const price = fields.string('price');
  const clock = fields.string('test_clock');
  const status = fields.string('status');
  const isWanted = ({ status: current }: Stripe.Subscription) =>
    status === 'all' ||
    (status === null && current !== 'canceled') ||
    (status === 'ended' && (current === 'canceled' || current === 'incomplete_expired')) ||
    current === status;
  const subscriptions = call.standIn.state.subscriptions
    .newestFirst()
    .filter((one) => customer === null || one.customer === customer)
    // Those of test clocks are listed for their clock or their customer alone.
    .filter((one) =>
      clock === null ? customer !== null || one.test_clock === null : one.test_clock === clock,
    )
    .filter((one) => price === null || one.items.data.some((item) => item.price.id === price))
    .filter(isWanted)
    .filter(createdFilter(fields));
  return pageOf(call, subscriptions);
}

export const subscriptionRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/subscriptions', run: createFromCall },
  { method: 'get', path: '/v1/subscriptions', run: listFromCall },
  {
    method: 'get',
    path: '/v1/subscriptions/:id',
    run: (call) => {
      call.fields.allowOnly('expand');
      return subscriptionOf(call);
    },
  },
  {
    method: 'post',
    path: '/v1/subscriptions/:id',
    run: (call) => {
      const subscription = subscriptionOf(call);
      return inTimeOf(call.standIn, subscription.test_clock as string | null, () =>
        updateFromCall(call, subscription),
      );
    },
  },
  { method: 'delete', path: '/v1/subscriptions/:id', run: cancelFromCall },
  { method: 'post', path: '/v1/subscriptions/:id/resume', run: resumeFromCall },
];
