import type Stripe from 'stripe';
import type { StandIn } from '../stand-in.js';
import type { State } from '../state/state.js';

/** Id prefix -> where objects with such an id are kept. */
const collections = {
  cus: 'customers',
  prod: 'products',
  price: 'prices',
  cs: 'sessions',
  pi: 'paymentIntents',
  pm: 'paymentMethods',
  ch: 'charges',
  re: 'refunds',
  dp: 'disputes',
  evt: 'events',
  txn: 'balanceTransactions',
  sub: 'subscriptions',
  in: 'invoices',
  inpay: 'invoicePayments',
  seti: 'setupIntents',
  clock: 'testClocks',
} as const satisfies Record<string, keyof State>;

/** Any object by its id, for `expand`. */
export function findObject(standIn: StandIn, id: string): object | undefined {
  const prefix = id.slice(0, id.indexOf('_'));
  const name = Object.hasOwn(collections, prefix)
    ? collections[prefix as keyof typeof collections]
    : undefined;
  const found = name && standIn.state[name].find(id);
  // A product may have an id of the shop's own choice; of a deleted customer, that it was there is left.
  return found ?? standIn.state.products.find(id) ?? standIn.state.deletedCustomers.find(id);
}

/** Fields that an object shows only where `expand` asks for them. */
export function includable(
  standIn: StandIn,
  owner: { object?: string; id?: string },
  field: string,
): Stripe.ApiList<object> | undefined {
  const id = owner.id ?? '';
  const list = (url: string, data: object[]) =>
    ({ object: 'list', url, has_more: false, data: structuredClone(data) }) satisfies Stripe.ApiList<object>;
  if (owner.object === 'checkout.session' && field === 'line_items') {
    return list(
      `/v1/checkout/sessions/${id}/line_items`,
      standIn.state.sessionDetails.find(id)?.lineItems ?? [],
    );
  }
  if (owner.object === 'charge' && field === 'refunds') {
    const refunds = standIn.state.refunds.newestFirst().filter((refund) => refund.charge === id);
    return list(`/v1/charges/${id}/refunds`, refunds);
  }
  if (owner.object === 'invoice' && field === 'payments') {
    const payments = standIn.state.invoicePayments.newestFirst().filter(({ invoice }) => invoice === id);
    return list(`/v1/invoice_payments?invoice=${id}`, payments);
  }
  if (owner.object === 'customer' && field === 'subscriptions') {
    const subscriptions = standIn.state.subscriptions.newestFirst();
    return list(
      `/v1/customers/${id}/subscriptions`,
      subscriptions.filter(({ customer, status }) => customer === id && status !== 'canceled'),
    );
  }
  return undefined;
}
