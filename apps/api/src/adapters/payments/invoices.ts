export type InvoiceState = 'draft' | 'open' | 'paid' | 'uncollectible' | 'void';

/** One month of a pledge. */
export interface PaymentInvoice {
  readonly id: string;
  /** None while it is a draft. */
  readonly number: string | null;
  readonly subscriptionId: string | null;
  readonly customerId: string | null;
  readonly pledgeId: string | null;
  readonly amountPaidMinor: number;
  readonly amountDueMinor: number;
  readonly currency: string;
  readonly state: InvoiceState;
  /** The month that is paid for: of the invoice's line, not the one in which it was drawn up. */
  readonly periodStart: Date;
  readonly periodEnd: Date;
  /** The payment that paid it, or the one that waits for a card. */
  readonly paymentIntentId: string | null;
  readonly cardCountry: string | null;
  readonly billingCountry: string | null;
  readonly attempts: number;
  /** When the service tries the card again by itself; null where it does not. */
  readonly nextAttemptAt: Date | null;
  /** A page at the service where it can be paid with any card. */
  readonly payUrl: string | null;
  readonly createdAt: Date;
  readonly paidAt: Date | null;
}

/** What the shop asks of the payment service about the months of a pledge. */
export abstract class Invoices {
  abstract findInvoice(invoiceId: string): Promise<PaymentInvoice>;
  /** Newest first. */
  abstract listInvoices(subscriptionId: string): Promise<readonly PaymentInvoice[]>;
  /** The invoice that a payment was for: refunds and disputes name the payment alone. */
  abstract invoiceOfPayment(paymentIntentId: string): Promise<PaymentInvoice | null>;
  /** Tries the pledge's card now. @throws CardDeclined */
  abstract payInvoice(invoiceId: string): Promise<PaymentInvoice>;
}
