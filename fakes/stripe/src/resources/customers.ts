import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { Cause, StandIn } from '../stand-in.js';
import { readAddress } from './addresses.js';
import { emit } from './events.js';

export type CustomerDetails = {
  email: string | null;
  name: string | null;
  phone?: string | null;
  description?: string | null;
  address?: Stripe.Address | null;
  metadata?: Stripe.Metadata;
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
    phone: details.phone ?? null,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: null,
  };
  standIn.state.customers.add(customer);
  emit(standIn, 'customer.created', customer, cause);
  return customer;
}

const writable = ['email', 'name', 'phone', 'description', 'address', 'metadata', 'expand'] as const;

function createFromCall({ standIn, fields, cause }: ApiCall): Stripe.Customer {
  fields.allowOnly(...writable);
  return createCustomer(
    standIn,
    {
      email: fields.string('email'),
      name: fields.string('name'),
      phone: fields.string('phone'),
      description: fields.string('description'),
      address: readAddress(fields.object('address')),
      metadata: fields.metadata(),
    },
    cause,
  );
}

function updateFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.Customer {
  fields.allowOnly(...writable);
  const customer = existing(standIn.state.customers, 'customer', id);
  for (const key of ['email', 'name', 'phone', 'description'] as const) {
    if (fields.has(key)) customer[key] = fields.string(key);
  }
  if (fields.has('address')) customer.address = readAddress(fields.object('address'));
  customer.metadata = fields.metadata('metadata', customer.metadata);
  emit(standIn, 'customer.updated', customer, cause);
  return customer;
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'email', 'created');
  const email = call.fields.string('email');
  const customers = call.standIn.state.customers
    .newestFirst()
    // The service compares e-mail addresses here letter by letter, upper and lower case apart.
    .filter((customer) => email === null || customer.email === email)
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
      return existing(standIn.state.customers, 'customer', id);
    },
  },
  { method: 'post', path: '/v1/customers/:id', run: updateFromCall },
];
