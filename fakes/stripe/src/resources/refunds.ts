import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { formatAmount } from '../payments/amounts.js';
import { makeRefund } from '../payments/refund-flow.js';
import type { StandIn } from '../stand-in.js';
import { emit } from './events.js';

const refundReasons = ['duplicate', 'fraudulent', 'requested_by_customer'] as const;

function createFromCall({ standIn, fields, cause }: ApiCall): Stripe.Refund {
  fields.allowOnly('amount', 'payment_intent', 'charge', 'reason', 'metadata', 'expand');
  const charge = chargeOf(standIn, fields);
  const reason = fields.oneOf('reason', refundReasons);
  const metadata = fields.metadata();
  const amount = refundableAmount(standIn, fields, charge);
  return makeRefund(standIn, charge, { amount, reason, metadata }, cause);
}

/** What somebody does by hand at the service, without the shop: the shop hears of it by events alone. */
export function refundByHand(standIn: StandIn, fields: Fields): Stripe.Refund {
  fields.allowOnly('amount', 'payment_intent', 'charge', 'reason');
  const charge = chargeOf(standIn, fields);
  const reason = fields.oneOf('reason', refundReasons) ?? 'requested_by_customer';
  const amount = refundableAmount(standIn, fields, charge);
  return makeRefund(standIn, charge, { amount, reason, metadata: {} }, null);
}

function chargeOf(standIn: StandIn, fields: Fields): Stripe.Charge {
  const intentId = fields.string('payment_intent');
  const chargeId = fields.string('charge');
  if (!intentId && !chargeId) {
    throw badParameter(
      'payment_intent',
      'One of the following params should be provided: payment_intent, charge.',
      'parameter_missing',
    );
  }
  if (chargeId) {
    const charge = existing(standIn.state.charges, 'charge', chargeId, 'charge');
    if (intentId && charge.payment_intent !== intentId) {
      throw badParameter('charge', `The charge ${chargeId} is not one of the payment intent ${intentId}.`);
    }
    return charge;
  }
  const intent = existing(standIn.state.paymentIntents, 'payment_intent', intentId ?? '', 'payment_intent');
  const charge =
    intent.status === 'succeeded' ? standIn.state.charges.find(String(intent.latest_charge)) : undefined;
  if (!charge) {
    throw refused(
      `The PaymentIntent ${intent.id} does not have a successful charge to refund.`,
      undefined,
      'payment_intent',
    );
  }
  return charge;
}

function refundableAmount(standIn: StandIn, fields: Fields, charge: Stripe.Charge): number {
  if (!charge.paid)
    throw refused(`Charge ${charge.id} was not paid and cannot be refunded.`, undefined, 'charge');
  const dispute = standIn.state.disputes
    .oldestFirst()
    .find(
      (candidate) =>
        candidate.charge === charge.id && candidate.status !== 'won' && !candidate.is_charge_refundable,
    );
  if (dispute) {
    throw refused(
      `Charge ${charge.id} is disputed (${dispute.id}) and cannot be refunded.`,
      'charge_disputed',
      'charge',
    );
  }
  if (charge.refunded) {
    throw refused(`Charge ${charge.id} has already been refunded.`, 'charge_already_refunded');
  }
  const left = charge.amount_captured - charge.amount_refunded;
  const amount = fields.integer('amount') ?? left;
  if (amount < 1)
    throw badParameter(
      'amount',
      'This value must be greater than or equal to 1.',
      'parameter_invalid_integer',
    );
  if (amount > left) {
    const money = (minor: number) => formatAmount(minor, charge.currency);
    throw refused(
      `Refund amount (${money(amount)}) is greater than unrefunded amount on charge (${money(left)})`,
      undefined,
      'amount',
    );
  }
  return amount;
}

function updateFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.Refund {
  fields.allowOnly('metadata', 'expand');
  const refund = existing(standIn.state.refunds, 'refund', id);
  const previous = { metadata: { ...refund.metadata } };
  refund.metadata = fields.metadata('metadata', refund.metadata ?? {});
  emit(standIn, 'refund.updated', refund, cause, previous);
  return refund;
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'payment_intent', 'charge', 'created');
  const intentId = call.fields.string('payment_intent');
  const chargeId = call.fields.string('charge');
  const refunds = call.standIn.state.refunds
    .newestFirst()
    .filter((refund) => intentId === null || refund.payment_intent === intentId)
    .filter((refund) => chargeId === null || refund.charge === chargeId)
    .filter(createdFilter(call.fields));
  return pageOf(call, refunds);
}

export const refundRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/refunds', run: createFromCall },
  { method: 'get', path: '/v1/refunds', run: listFromCall },
  {
    method: 'get',
    path: '/v1/refunds/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.refunds, 'refund', id);
    },
  },
  { method: 'post', path: '/v1/refunds/:id', run: updateFromCall },
];
