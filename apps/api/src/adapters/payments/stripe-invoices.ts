import type Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import { paymentIntentOf, toInvoice } from './invoice.mapping.js';
import { Invoices, type PaymentInvoice } from './invoices.js';
import { calling, idOf, objectOf, openStripe } from './stripe-client.js';

const PAGE = 100;

export class StripeInvoices extends Invoices {
  private readonly stripe: Stripe;

  constructor(config: Config) {
    super();
    this.stripe = openStripe(config);
  }

  async findInvoice(invoiceId: string): Promise<PaymentInvoice> {
    return this.withCharge(await calling(this.stripe.invoices.retrieve(invoiceId, { expand: ['payments'] })));
  }

  async listInvoices(subscriptionId: string): Promise<readonly PaymentInvoice[]> {
    const list = this.stripe.invoices.list({
      subscription: subscriptionId,
      limit: PAGE,
      expand: ['data.payments'],
    });
    const invoices = await calling(list.autoPagingToArray({ limit: 1000 }));
    const charges = await this.chargesOf(idOf(invoices[0]?.customer));
    return invoices.map((invoice) => toInvoice(invoice, charges.get(paymentIntentOf(invoice) ?? '') ?? null));
  }

  async invoiceOfPayment(paymentIntentId: string): Promise<PaymentInvoice | null> {
    const found = await calling(
      this.stripe.invoicePayments.list({
        payment: { type: 'payment_intent', payment_intent: paymentIntentId },
      }),
    );
    const invoiceId = idOf(found.data[0]?.invoice);
    return invoiceId ? this.findInvoice(invoiceId) : null;
  }

  async payInvoice(invoiceId: string): Promise<PaymentInvoice> {
    return this.withCharge(await calling(this.stripe.invoices.pay(invoiceId, { expand: ['payments'] })));
  }

  /** A path to expand has four steps at most, and the charge of an invoice is five away. */
  private async withCharge(invoice: Stripe.Invoice): Promise<PaymentInvoice> {
    const paymentIntentId = paymentIntentOf(invoice);
    if (!paymentIntentId) return toInvoice(invoice, null);
    const intent = await calling(
      this.stripe.paymentIntents.retrieve(paymentIntentId, { expand: ['latest_charge'] }),
    );
    return toInvoice(invoice, objectOf<Stripe.Charge>(intent.latest_charge));
  }

  /** Charges that went through, by their payment: one list instead of a call for each invoice. */
  private async chargesOf(customerId: string | null): Promise<Map<string, Stripe.Charge>> {
    if (!customerId) return new Map();
    const list = this.stripe.charges.list({ customer: customerId, limit: PAGE });
    const charges = await calling(list.autoPagingToArray({ limit: 1000 }));
    return new Map(
      charges.filter(({ paid }) => paid).map((charge) => [idOf(charge.payment_intent) ?? '', charge]),
    );
  }
}
