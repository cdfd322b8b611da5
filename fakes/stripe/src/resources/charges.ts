import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { Declined } from '../payments/card-traits.js';
import type { Card } from '../payments/cards.js';
import type { StandIn } from '../stand-in.js';
import { book, chargeFeeMinor } from './balance-transactions.js';
import { cardExpiry } from './payment-methods.js';

export type ChargeDetails = {
  intent: Stripe.PaymentIntent;
  paymentMethod: Stripe.PaymentMethod;
  card: Card;
  decline: Declined | null;
  isAuthenticated: boolean;
};

/** Takes the money of a payment intent, or writes down that the card was declined. */
export function createCharge(standIn: StandIn, details: ChargeDetails): Stripe.Charge {
  const { intent, decline, paymentMethod } = details;
  const hasSucceeded = decline === null;
  const charge: Stripe.Charge = {
    id: standIn.newId('ch'),
    object: 'charge',
    amount: intent.amount,
    amount_captured: hasSucceeded ? intent.amount : 0,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: structuredClone(paymentMethod.billing_details),
    calculated_statement_descriptor: null,
    captured: hasSucceeded,
    created: standIn.clock.nowSeconds(),
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: decline?.code ?? null,
    failure_message: decline?.message ?? null,
    fraud_details: {},
    livemode: false,
    metadata: { ...intent.metadata },
    on_behalf_of: null,
    outcome: outcomeOf(decline),
    paid: hasSucceeded,
    payment_intent: intent.id,
    payment_method: paymentMethod.id,
    payment_method_details: { type: 'card', card: cardDetails(standIn, details) },
    receipt_email: intent.receipt_email,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: hasSucceeded ? 'succeeded' : 'failed',
    transfer_data: null,
    transfer_group: null,
  };
  if (hasSucceeded) {
    charge.balance_transaction = book(standIn, {
      type: 'charge',
      category: 'charge',
      amount: charge.amount,
      fee: chargeFeeMinor(charge.amount),
      currency: charge.currency,
      source: charge.id,
      description: charge.description,
    }).id;
  }
  return standIn.state.charges.add(charge);
}

function outcomeOf(decline: ChargeDetails['decline']): Stripe.Charge.Outcome {
  return {
    advice_code: decline ? 'try_again_later' : null,
    network_advice_code: null,
    network_decline_code: decline ? '05' : null,
    network_status: decline ? 'declined_by_network' : 'approved_by_network',
    reason: decline?.declineCode ?? decline?.code ?? null,
    risk_level: 'normal',
    risk_score: 5,
    seller_message: decline ? 'The bank declined the payment.' : 'Payment complete.',
    type: decline ? 'issuer_declined' : 'authorized',
  };
}

function cardDetails(standIn: StandIn, details: ChargeDetails): Stripe.Charge.PaymentMethodDetails.Card {
  const { card, intent, decline } = details;
  return {
    ...cardExpiry,
    amount_authorized: decline ? null : intent.amount,
    authorization_code: null,
    brand: card.brand,
    checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
    country: card.country,
    electronic_commerce_indicator: null,
    funding: 'credit',
    installments: null,
    last4: card.last4,
    mandate: null,
    network: card.brand,
    network_transaction_id: decline ? null : standIn.ids.word(15),
    regulated_status: 'unregulated',
    three_d_secure: details.isAuthenticated
      ? {
          authentication_flow: 'challenge',
          electronic_commerce_indicator: '05',
          exemption_indicator: null,
          result: 'authenticated',
          result_reason: null,
          transaction_id: standIn.ids.word(36),
          version: '2.2.0',
        }
      : null,
    transaction_link_id: null,
    wallet: null,
  };
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'payment_intent', 'customer', 'created');
  const intentId = call.fields.string('payment_intent');
  const customerId = call.fields.string('customer');
  const charges = call.standIn.state.charges
    .newestFirst()
    .filter((charge) => intentId === null || charge.payment_intent === intentId)
    .filter((charge) => customerId === null || charge.customer === customerId)
    .filter(createdFilter(call.fields));
  return pageOf(call, charges);
}

export const chargeRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/charges', run: listFromCall },
  {
    method: 'get',
    path: '/v1/charges/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.charges, 'charge', id);
    },
  },
];
