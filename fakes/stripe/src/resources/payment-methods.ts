import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { pageOf, pageParameters } from '../api/pages.js';
import { readCard, type Card } from '../payments/cards.js';
import type { Cause, StandIn } from '../stand-in.js';
import type { Buyer } from '../state/records.js';
import { addressIn } from './addresses.js';
import { emit } from './events.js';

export const cardExpiry = { exp_month: 12, exp_year: 2049 };

export function createPaymentMethod(standIn: StandIn, card: Card, buyer: Buyer): Stripe.PaymentMethod {
  const method: Stripe.PaymentMethod = {
    id: standIn.newId('pm'),
    object: 'payment_method',
    billing_details: {
      address: addressIn(buyer.country, buyer.street),
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

/** The card behind a payment method, as it behaves now. */
export function cardOf(standIn: StandIn, method: Stripe.PaymentMethod): Card {
  const saved = standIn.state.savedCards.find(method.id);
  const reading = readCard(saved?.number ?? '');
  if (!saved || 'fault' in reading) throw new Error(`The payment method ${method.id} has lost its card.`);
  return { ...reading.card, country: saved.country, later: saved.later, refunds: saved.refunds };
}

/** Keeps a card with a customer, for what falls due later. */
export function attachMethod(
  standIn: StandIn,
  method: Stripe.PaymentMethod,
  customerId: string,
  cause: Cause,
): void {
  if (method.customer === customerId) return;
  method.customer = customerId;
  emit(standIn, 'payment_method.attached', method, cause);
}

/** The payment method, where it is one of the customer's. */
export function methodOfCustomer(
  standIn: StandIn,
  id: string,
  customerId: string,
  param: string,
): Stripe.PaymentMethod {
  const method = existing(standIn.state.paymentMethods, 'PaymentMethod', id, param);
  if (method.customer === customerId) return method;
  throw refused(
    `The customer does not have a payment method with the ID ${id}. The payment method must be attached to the customer.`,
    'resource_missing',
    param,
  );
}

const methodOf = ({ standIn, id }: ApiCall) => existing(standIn.state.paymentMethods, 'PaymentMethod', id);

function attachFromCall(call: ApiCall): Stripe.PaymentMethod {
  call.fields.allowOnly('customer', 'expand');
  const { standIn, cause } = call;
  const method = methodOf(call);
  const customerId = call.fields.requiredString('customer');
  existing(standIn.state.customers, 'customer', customerId, 'customer');
  if (method.customer !== null && method.customer !== customerId)
    throw refused('The payment method you provided has already been attached to a customer.');
  attachMethod(standIn, method, customerId, cause);
  return method;
}

function detachFromCall(call: ApiCall): Stripe.PaymentMethod {
  call.fields.allowOnly('expand');
  const { standIn, cause } = call;
  const method = methodOf(call);
  if (method.customer === null)
    throw refused(
      'The payment method you provided is not attached to a customer so detachment is impossible.',
    );
  const previous = { customer: method.customer };
  const customer = standIn.state.customers.find(String(method.customer));
  if (customer?.invoice_settings.default_payment_method === method.id)
    customer.invoice_settings.default_payment_method = null;
  for (const subscription of standIn.state.subscriptions.oldestFirst()) {
    if (subscription.default_payment_method === method.id) subscription.default_payment_method = null;
  }
  method.customer = null;
  emit(standIn, 'payment_method.detached', method, cause, previous);
  return method;
}

/** Of one customer: the service lists no others by this address either. */
export function listMethodsOf(call: ApiCall, customerId: string): object {
  const type = call.fields.string('type');
  const methods = call.standIn.state.paymentMethods
    .newestFirst()
    .filter((method) => method.customer === customerId)
    .filter((method) => type === null || method.type === type);
  return pageOf(call, methods);
}

export const paymentMethodRoutes: ApiRoute[] = [
  {
    method: 'get',
    path: '/v1/payment_methods',
    run: (call) => {
      call.fields.allowOnly(...pageParameters, 'customer', 'type');
      return listMethodsOf(call, call.fields.requiredString('customer'));
    },
  },
  {
    method: 'get',
    path: '/v1/payment_methods/:id',
    run: (call) => {
      call.fields.allowOnly('expand');
      return methodOf(call);
    },
  },
  { method: 'post', path: '/v1/payment_methods/:id/attach', run: attachFromCall },
  { method: 'post', path: '/v1/payment_methods/:id/detach', run: detachFromCall },
];
