import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { StandIn } from '../stand-in.js';

/** Ties an invoice to the payment intent that is to pay it. */
export function createInvoicePayment(standIn: StandIn, invoice: Stripe.Invoice, intent: string): void {
  standIn.state.invoicePayments.add({
    id: standIn.newId('inpay'),
    object: 'invoice_payment',
    amount_paid: null,
    amount_requested: invoice.amount_due,
    created: standIn.clock.nowSeconds(),
    currency: invoice.currency,
    invoice: invoice.id,
    is_default: true,
    livemode: false,
    payment: { type: 'payment_intent', payment_intent: intent },
    status: 'open',
    status_transitions: { canceled_at: null, paid_at: null },
  });
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'invoice', 'payment', 'status', 'created');
  const invoice = call.fields.string('invoice');
  const status = call.fields.oneOf('status', ['open', 'paid', 'canceled']);
  const payment = call.fields.object('payment');
  payment?.allowOnly('type', 'payment_intent');
  payment?.requiredOneOf('type', ['payment_intent']);
  const intent = payment?.requiredString('payment_intent') ?? null;
  const payments = call.standIn.state.invoicePayments
    .newestFirst()
    .filter((one) => invoice === null || one.invoice === invoice)
    .filter((one) => status === null || one.status === status)
    .filter((one) => intent === null || one.payment.payment_intent === intent)
    .filter(createdFilter(call.fields));
  return pageOf(call, payments);
}

export const invoicePaymentRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/invoice_payments', run: listFromCall },
  {
    method: 'get',
    path: '/v1/invoice_payments/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.invoicePayments, 'invoice_payment', id);
    },
  },
];
