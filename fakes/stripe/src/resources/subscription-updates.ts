import type Stripe from 'stripe';
import type { ApiCall } from '../api/api-route.js';
import { badParameter, refused } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import { changeSubscription } from '../billing/changes.js';
import { collectInvoice } from '../billing/collect-invoice.js';
import { finalizeInvoice } from '../billing/invoices.js';
import { beginPeriod, periodEnd } from '../billing/run-subscription.js';
import type { StandIn } from '../stand-in.js';
import { methodOfCustomer } from './payment-methods.js';
import { planOf } from './subscription-object.js';
import { readPrice, readQuantity } from './subscription-parts.js';

const parameters = [
  'items', 'proration_behavior', 'cancel_at_period_end', 'cancel_at', 'cancellation_details', 'metadata',
  'description', 'default_payment_method', 'pause_collection', 'billing_cycle_anchor', 'payment_behavior',
  'off_session', 'expand',
] as const; // prettier-ignore

/** Everything is read and checked before anything is changed. */
export function updateFromCall(call: ApiCall, subscription: Stripe.Subscription): Stripe.Subscription {
  const { standIn, fields, cause } = call;
  fields.allowOnly(...parameters);
  fields.oneOf('payment_behavior', ['allow_incomplete', 'pending_if_incomplete', 'error_if_incomplete']);
  if (subscription.status === 'canceled' || subscription.status === 'incomplete_expired')
    throw refused('A canceled subscription can only update its cancellation_details and metadata.');
  const items = readItems(standIn, fields, subscription);
  const isRestarted = readRestart(fields);
  checkProration(fields, items.isPriceChanged || isRestarted);
  const changes = [
    items.apply,
    readCancel(standIn, fields),
    readPause(standIn, fields),
    readRest(standIn, fields),
  ];
  changeSubscription(standIn, subscription, cause, () => {
    for (const change of changes) change(subscription);
    if (isRestarted) subscription.billing_cycle_anchor = standIn.clock.nowSeconds();
  });
  if (isRestarted) {
    const now = standIn.clock.nowSeconds();
    const invoice = beginPeriod(standIn, subscription, now, 'subscription_update', cause);
    finalizeInvoice(standIn, invoice, cause);
    collectInvoice(standIn, invoice, { isScheduled: true, cause });
  }
  return subscription;
}

/** Since the API of autumn 2026 an object with a type, no longer the bare word. */
function readRestart(fields: Fields): boolean {
  const anchor = fields.object('billing_cycle_anchor');
  anchor?.allowOnly('type');
  return anchor?.oneOf('type', ['now', 'unchanged']) === 'now';
}

type Change = (subscription: Stripe.Subscription) => void;

/** `none` alone: a change counts from the next period on. The service's default would bill the difference. */
function checkProration(fields: Fields, isNeeded: boolean): void {
  const behavior =
    fields.oneOf('proration_behavior', ['none', 'create_prorations', 'always_invoice']) ??
    'create_prorations';
  if (isNeeded && behavior !== 'none')
    throw badParameter(
      'proration_behavior',
      'The local stand-in reckons no parts of a period: say proration_behavior=none.',
    );
}

function readItems(
  standIn: StandIn,
  fields: Fields,
  subscription: Stripe.Subscription,
): { apply: Change; isPriceChanged: boolean } {
  const readings = fields.objects('items').map((entry) => {
    entry.allowOnly('id', 'price', 'price_data', 'quantity');
    const id = entry.requiredString('id');
    const item = subscription.items.data.find((candidate) => candidate.id === id);
    if (!item)
      throw badParameter(entry.nameOf('id'), `No such subscription_item: '${id}'`, 'resource_missing');
    const price = readPrice(standIn, entry);
    const quantity = readQuantity(entry);
    const old = item.price.recurring;
    const isOther =
      price?.recurring?.interval !== old?.interval ||
      price?.recurring?.interval_count !== old?.interval_count;
    if (price && (isOther || price.currency !== subscription.currency || !price.unit_amount))
      throw badParameter(
        entry.nameOf('price'),
        'The local stand-in wants the new price to have the currency and interval of the old one, and an amount.',
      );
    return { item, price, quantity };
  });
  return {
    isPriceChanged: readings.some(({ price, quantity }) => price !== null || quantity !== null),
    apply: () => {
      for (const { item, price, quantity } of readings) {
        if (price) {
          item.price = structuredClone(price);
          item.plan = planOf(price);
        }
        if (quantity !== null) item.quantity = quantity;
      }
    },
  };
}

function readCancel(standIn: StandIn, fields: Fields): Change {
  const atEnd = fields.boolean('cancel_at_period_end');
  const at = fields.integer('cancel_at');
  if (at !== null && at <= standIn.clock.nowSeconds())
    throw badParameter('cancel_at', 'The `cancel_at` timestamp must lie in the future.');
  const details = fields.object('cancellation_details');
  details?.allowOnly('comment', 'feedback');
  return (subscription) => {
    const reasons = subscription.cancellation_details;
    if (details && reasons) {
      reasons.comment = details.string('comment');
      reasons.feedback = details.string('feedback');
    }
    const isKept = atEnd === false || fields.isEmptied('cancel_at');
    if (isKept) {
      subscription.cancel_at_period_end = false;
      subscription.cancel_at = null;
      subscription.canceled_at = null;
      if (reasons) reasons.reason = null;
    }
    const end = atEnd ? periodEnd(subscription) : at;
    if (end === null) return;
    subscription.cancel_at_period_end = atEnd === true;
    subscription.cancel_at = end;
    subscription.canceled_at = standIn.clock.nowSeconds();
    if (reasons) reasons.reason = 'cancellation_requested';
  };
}

function readPause(standIn: StandIn, fields: Fields): Change {
  if (fields.isEmptied('pause_collection'))
    return (subscription) => {
      subscription.pause_collection = null;
    };
  const pause = fields.object('pause_collection');
  if (!pause) return () => {};
  pause.allowOnly('behavior', 'resumes_at');
  const behavior = pause.requiredOneOf('behavior', ['keep_as_draft', 'mark_uncollectible', 'void']);
  const resumesAt = pause.integer('resumes_at');
  if (resumesAt !== null && resumesAt <= standIn.clock.nowSeconds())
    throw badParameter('pause_collection[resumes_at]', 'The time to resume must lie in the future.');
  return (subscription) => {
    subscription.pause_collection = { behavior, resumes_at: resumesAt };
  };
}

function readRest(standIn: StandIn, fields: Fields): Change {
  return (subscription) => {
    const method = fields.string('default_payment_method');
    if (method)
      subscription.default_payment_method = methodOfCustomer(
        standIn,
        method,
        String(subscription.customer),
        'default_payment_method',
      ).id;
    if (fields.has('description') || fields.isEmptied('description'))
      subscription.description = fields.string('description');
    subscription.metadata = fields.metadata('metadata', subscription.metadata);
  };
}
