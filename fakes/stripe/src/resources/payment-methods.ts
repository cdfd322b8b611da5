import type Stripe from 'stripe';
import type { ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import type { Card } from '../payments/cards.js';
import type { StandIn } from '../stand-in.js';
import type { Buyer } from '../state/state.js';
import { addressIn } from './addresses.js';

export const cardExpiry = { exp_month: 12, exp_year: 2049 };

export function createPaymentMethod(standIn: StandIn, card: Card, buyer: Buyer): Stripe.PaymentMethod {
  const method: Stripe.PaymentMethod = {
    id: standIn.newId('pm'),
    object: 'payment_method',
    billing_details: {
      address: addressIn(buyer.country),
      email: buyer.email,
      name: buyer.name,
      phone: null,
      tax_id: null,
    },
    card: {
      ...cardExpiry,
      brand: card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: card.country,
      display_brand: card.brand,
      funding: 'credit',
      generated_from: null,
      last4: card.last4,
      networks: { available: [card.brand], preferred: null },
      regulated_status: 'unregulated',
      three_d_secure_usage: { supported: true },
      wallet: null,
    },
    created: standIn.clock.nowSeconds(),
    customer: null,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'card',
  };
  const { number, country, later, refunds } = card;
  standIn.state.savedCards.add({ id: method.id, number, country, later, refunds });
  return standIn.state.paymentMethods.add(method);
}

export const paymentMethodRoutes: ApiRoute[] = [
  {
    method: 'get',
    path: '/v1/payment_methods/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.paymentMethods, 'payment_method', id);
    },
  },
];
