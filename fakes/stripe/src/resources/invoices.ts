import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { ApiError, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import { changeInvoice, subscriptionOf } from '../billing/changes.js';
import { collectInvoice, defaultMethodOf } from '../billing/collect-invoice.js';
import { finalizeInvoice, giveUpInvoice, voidInvoice } from '../billing/invoices.js';
import { inTimeOf } from '../time/in-time-of.js';
import { methodOfCustomer } from './payment-methods.js';

const invoiceOf = ({ standIn, id }: ApiCall) => existing(standIn.state.invoices, 'invoice', id, 'invoice');

/** An address that does something to one invoice, at the moment of its customer's clock. */
function acting(
  action: (call: ApiCall, invoice: Stripe.Invoice) => void,
  ...parameters: string[]
): ApiRoute['run'] {
  return (call) => {
    call.fields.allowOnly(...parameters, 'expand');
    const invoice = invoiceOf(call);
    inTimeOf(call.standIn, invoice.test_clock as string | null, () => action(call, invoice));
    return invoice;
  };
}

function pay({ standIn, fields, cause }: ApiCall, invoice: Stripe.Invoice): void {
  if (invoice.status === 'draft') finalizeInvoice(standIn, invoice, cause);
  if (invoice.status === 'paid') throw refused('Invoice is already paid', 'invoice_already_paid');
  if (invoice.status !== 'open' && invoice.status !== 'uncollectible')
    throw refused(`This invoice is ${invoice.status} and cannot be paid.`);
  const id = fields.string('payment_method');
  const method = id
    ? methodOfCustomer(standIn, id, String(invoice.customer), 'payment_method')
    : defaultMethodOf(standIn, invoice);
  if (!method)
    throw refused(
      'There is no `default_payment_method` set on this Customer or Invoice. Please specify a payment method or set a default.',
    );
  const decline = collectInvoice(standIn, invoice, { isScheduled: false, cause, method });
  if (!decline) return;
  const { code, declineCode, message } = decline;
  const body = { type: 'card_error' as const, code, message };
  throw new ApiError(402, declineCode ? { ...body, decline_code: declineCode } : body, true);
}

function update({ standIn, fields, cause }: ApiCall, invoice: Stripe.Invoice): void {
  const isAdvancing = fields.boolean('auto_advance');
  const metadata = fields.metadata('metadata', invoice.metadata ?? {});
  changeInvoice(standIn, invoice, cause, () => {
    invoice.metadata = metadata;
    if (fields.has('description')) invoice.description = fields.string('description');
    if (isAdvancing === null) return;
    invoice.auto_advance = isAdvancing;
    if (!isAdvancing) invoice.next_payment_attempt = null;
    if (invoice.status === 'draft')
      invoice.automatically_finalizes_at = isAdvancing
        ? standIn.clock.nowSeconds() + standIn.state.billing.finalizeSeconds
        : null;
  });
}

function listFromCall(call: ApiCall): object {
  const { fields, standIn } = call;
  fields.allowOnly(...pageParameters, 'customer', 'subscription', 'status', 'created');
  const customer = fields.string('customer');
  const subscription = fields.string('subscription');
  const status = fields.oneOf('status', ['draft', 'open', 'paid', 'uncollectible', 'void']);
  const invoices = standIn.state.invoices
    .newestFirst()
    .filter((invoice) => customer === null || invoice.customer === customer)
    .filter((invoice) => subscription === null || subscriptionOf(standIn, invoice)?.id === subscription)
    .filter((invoice) => status === null || invoice.status === status)
    .filter(createdFilter(fields));
  return pageOf(call, invoices);
}

export const invoiceRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/invoices', run: listFromCall },
  { method: 'get', path: '/v1/invoices/:id', run: acting(() => {}) },
  {
    method: 'post',
    path: '/v1/invoices/:id',
    run: acting(update, 'auto_advance', 'metadata', 'description'),
  },
  { method: 'post', path: '/v1/invoices/:id/pay', run: acting(pay, 'payment_method', 'off_session') },
  {
    method: 'post',
    path: '/v1/invoices/:id/finalize',
    run: acting(({ standIn, cause }, invoice) => finalizeInvoice(standIn, invoice, cause)),
  },
  {
    method: 'post',
    path: '/v1/invoices/:id/void',
    run: acting(({ standIn, cause }, invoice) => {
      if (invoice.status === 'draft') throw refused('You can only void an invoice that is open.');
      voidInvoice(standIn, invoice, cause);
    }),
  },
  {
    method: 'post',
    path: '/v1/invoices/:id/mark_uncollectible',
    run: acting(({ standIn, cause }, invoice) => giveUpInvoice(standIn, invoice, cause)),
  },
  {
    method: 'get',
    path: '/v1/invoices/:id/lines',
    run: (call) => {
      call.fields.allowOnly(...pageParameters);
      return pageOf(call, invoiceOf(call).lines.data);
    },
  },
];
