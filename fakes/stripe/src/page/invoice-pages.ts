import type { Request, Response, Router } from 'express';
import type Stripe from 'stripe';
import { intentOf } from '../billing/changes.js';
import { formatAmount } from '../payments/amounts.js';
import { laterSampleCards, readCard } from '../payments/cards.js';
import type { PayResult } from '../payments/page-flow.js';
import { answerInvoiceStep, payInvoice } from '../payments/pay-invoice.js';
import type { StandIn } from '../stand-in.js';
import type { InvoicePage } from '../state/records.js';
import { doneView, secondStepView, unknownView } from './end-views.js';
import { invoiceView } from './order-view.js';
import {
  emptyForm,
  readForm,
  valuesFrom,
  valuesOf,
  type Faults,
  type FormShape,
  type FormValues,
} from './payment-form.js';
import { paymentView } from './payment-view.js';

type Open = { page: InvoicePage; invoice: Stripe.Invoice; path: string };

/** The page of an invoice: who owes a month pays it here, with whichever card. */
export function invoicePages(standIn: StandIn, router: Router): void {
  const show = (
    response: Response,
    { invoice, path }: Open,
    values: FormValues,
    { faults = {}, notice = null }: { faults?: Faults; notice?: string | null } = {},
  ) => {
    response.send(
      paymentView({
        path,
        title: 'Pay an invoice',
        heading: 'Pay by card',
        action: `Pay ${amountOf(invoice)}`,
        summary: invoiceView(invoice),
        shape: shapeOf(invoice),
        samples: laterSampleCards,
        canGoBack: false,
        values,
        faults,
        notice,
      }),
    );
  };
  const goOn = (response: Response, open: Open, values: FormValues, result: PayResult) => {
    standIn.save();
    if (result.kind === 'complete') response.redirect(303, open.path);
    else if (result.kind === 'second-step') response.redirect(303, `${open.path}/second-step`);
    else show(response, open, values, { notice: `${result.message} Nothing was taken.` });
  };

  router.get('/invoice/:key', (request, response) => {
    const open = openInvoice(standIn, request, response);
    if (open) show(response, open, emptyForm(shapeOf(open.invoice)));
  });
  router.post('/invoice/:key', (request, response) => {
    const open = openInvoice(standIn, request, response);
    if (!open) return;
    const { page, invoice } = open;
    const shape = shapeOf(invoice);
    const values = valuesFrom(shape, request.body);
    if ((request.body as { sample?: string } | undefined)?.sample !== undefined)
      return show(response, open, values);
    const reading = readForm(shape, values);
    if ('faults' in reading) return show(response, open, values, { faults: reading.faults });
    if (reading.card)
      goOn(response, open, values, payInvoice(standIn, invoice, page, reading.buyer, reading.card));
  });
  router.get('/invoice/:key/second-step', (request, response) => {
    const open = openInvoice(standIn, request, response);
    if (!open) return;
    const what = `this payment of ${amountOf(open.invoice)}`;
    if (open.page.waiting) response.send(secondStepView(`${open.path}/second-step`, what));
    else response.redirect(303, open.path);
  });
  router.post('/invoice/:key/second-step', (request, response) => {
    const open = openInvoice(standIn, request, response);
    if (!open) return;
    const { waiting } = open.page;
    const reading = readCard(waiting?.cardNumber ?? '');
    if (!waiting || 'fault' in reading) return response.redirect(303, open.path);
    const card = { ...reading.card, country: waiting.cardCountry ?? reading.card.country };
    const isApproved = (request.body as { answer?: string } | undefined)?.answer === 'approve';
    const result = answerInvoiceStep(standIn, open.invoice, open.page, card, isApproved);
    goOn(response, open, valuesOf(waiting.buyer), result);
  });
}

const shapeOf = (invoice: Stripe.Invoice): FormShape => ({
  fixedEmail: invoice.customer_email,
  isCardNeeded: true,
});

const amountOf = (invoice: Stripe.Invoice): string =>
  formatAmount(invoice.amount_remaining, invoice.currency);

/** The invoice of the address while it can be paid; else answers with the page that says why not. */
function openInvoice(standIn: StandIn, request: Request, response: Response): Open | null {
  const page = standIn.state.invoicePages.find(String(request.params.key));
  const invoice = page && standIn.state.invoices.find(page.invoiceId);
  if (!page || !invoice) response.status(404).send(unknownView());
  else if (invoice.status === 'paid') response.send(doneView('This invoice is paid', null));
  else if (!intentOf(standIn, invoice) || invoice.status === 'void')
    response.status(410).send(doneView('This invoice is no longer due', null));
  else return { page, invoice, path: `/invoice/${page.id}` };
  return null;
}
