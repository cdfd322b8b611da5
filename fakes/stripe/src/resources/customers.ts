import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { endSubscription } from '../billing/end-subscription.js';
import type { Cause, StandIn } from '../stand-in.js';
import { inTimeOf, inTimeOfCustomer } from '../time/in-time-of.js';
import { readAddress } from './addresses.js';
import { previousOf } from './changes.js';
import { emit } from './events.js';
import { attachMethod, listMethodsOf, methodOfCustomer } from './payment-methods.js';

export type CustomerDetails = {
  email: string | null;
  name: string | null;
  phone?: string | null;
  description?: string | null;
  address?: Stripe.Address | null;
  metadata?: Stripe.Metadata;
  testClock?: string | null;
};

export function createCustomer(standIn: StandIn, details: CustomerDetails, cause: Cause): Stripe.Customer {
  const customer: Stripe.Customer = {
    id: standIn.newId('cus'),
    object: 'customer',
    address: details.address ?? null,
    balance: 0,
    created: standIn.clock.nowSeconds(),
    currency: null,
    default_source: null,
    delinquent: false,
    description: details.description ?? null,
    discount: null,
    email: details.email,
    invoice_prefix: standIn.ids.word(8).toUpperCase(),
    invoice_settings: {
      custom_fields: null,
      default_payment_method: null,
      footer: null,
      rendering_options: null,
    },
    livemode: false,
    metadata: details.metadata ?? {},
    name: details.name,
    next_invoice_sequence: 1,
    phone: details.phone ?? null,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: details.testClock ?? null,
  };
  standIn.state.customers.add(customer);
  emit(standIn, 'customer.created', customer, cause);
  return customer;
}

const writable = [
  'email', 'name', 'phone', 'description', 'address', 'metadata', 'invoice_settings', 'expand',
] as const; // prettier-ignore

function createFromCall({ standIn, fields, cause }: ApiCall): Stripe.Customer {
  fields.allowOnly(...writable, 'test_clock', 'payment_method');
  const testClock = fields.string('test_clock');
  if (testClock) existing(standIn.state.testClocks, 'test_clock', testClock, 'test_clock');
  const methodId = fields.string('payment_method');
  const method = methodId
    ? existing(standIn.state.paymentMethods, 'PaymentMethod', methodId, 'payment_method')
    : null;
  const customer = inTimeOf(standIn, testClock, () =>
    createCustomer(
      standIn,
      {
        email: fields.string('email'),
        name: fields.string('name'),
        phone: fields.string('phone'),
        description: fields.string('description'),
        address: readAddress(fields.object('address')),
        metadata: fields.metadata(),
        testClock,
      },
      cause,
    ),
  );
  if (method) attachMethod(standIn, method, customer.id, cause);
  setDefaultMethod(standIn, customer, fields);
  return customer;
}

function setDefaultMethod(standIn: StandIn, customer: Stripe.Customer, fields: Fields): void {
  const settings = fields.object('invoice_settings');
  settings?.allowOnly('default_payment_method');
  const id = settings?.string('default_payment_method') ?? null;
  const param = 'invoice_settings[default_payment_method]';
  if (id)
    customer.invoice_settings.default_payment_method = methodOfCustomer(standIn, id, customer.id, param).id;
  else if (settings?.isEmptied('default_payment_method'))
    customer.invoice_settings.default_payment_method = null;
}

function updateFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.Customer {
  fields.allowOnly(...writable);
  const customer = existing(standIn.state.customers, 'customer', id);
  const before = structuredClone(customer);
  setDefaultMethod(standIn, customer, fields);
  for (const key of ['email', 'name', 'phone', 'description'] as const) {
    if (fields.has(key) || fields.isEmptied(key)) customer[key] = fields.string(key);
  }
  if (fields.has('address')) customer.address = readAddress(fields.object('address'));
  customer.metadata = fields.metadata('metadata', customer.metadata);
  const previous = previousOf(before, customer);
  if (previous) emit(standIn, 'customer.updated', customer, cause, previous);
  return customer;
}

/** The service keeps nothing but that the customer was there; subscriptions end at once. */
export function forgetCustomer(standIn: StandIn, customer: Stripe.Customer, cause: Cause): void {
  const { state } = standIn;
  inTimeOfCustomer(standIn, customer.id, () => {
    for (const subscription of state.subscriptions.oldestFirst()) {
      if (subscription.customer === customer.id && subscription.ended_at === null)
        endSubscription(standIn, subscription, 'cancellation_requested', cause);
    }
  });
  for (const method of state.paymentMethods.oldestFirst()) {
    if (method.customer === customer.id) method.customer = null;
  }
  state.customers.remove(customer.id);
  state.deletedCustomers.add({ id: customer.id, object: 'customer', deleted: true });
  emit(standIn, 'customer.deleted', customer, cause);
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'email', 'test_clock', 'created');
  const clock = call.fields.string('test_clock');
  const email = call.fields.string('email');
  const customers = call.standIn.state.customers
    .newestFirst()
    // The service compares e-mail addresses here letter by letter, upper and lower case apart.
    .filter((customer) => email === null || customer.email === email)
    // Those of test clocks are listed for their clock alone.
    .filter((customer) => customer.test_clock === clock)
    .filter(createdFilter(call.fields));
  return pageOf(call, customers);
}

export const customerRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/customers', run: createFromCall },
  { method: 'get', path: '/v1/customers', run: listFromCall },
  {
    method: 'get',
    path: '/v1/customers/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return standIn.state.deletedCustomers.find(id) ?? existing(standIn.state.customers, 'customer', id);
    },
  },
  { method: 'post', path: '/v1/customers/:id', run: updateFromCall },
  {
    method: 'delete',
    path: '/v1/customers/:id',
    run: ({ standIn, id, fields, cause }) => {
      fields.allowOnly();
      forgetCustomer(standIn, existing(standIn.state.customers, 'customer', id), cause);
      return { id, object: 'customer', deleted: true };
    },
  },
  {
    method: 'get',
    path: '/v1/customers/:id/payment_methods',
    run: (call) => {
      call.fields.allowOnly(...pageParameters, 'type');
      return listMethodsOf(call, existing(call.standIn.state.customers, 'customer', call.id).id);
    },
  },
];
