import type { KeepsAfter, PledgeState } from '@windchest/contracts';

/**
 * What staff should look at. `location-unclear`: no two pieces of evidence agree on the supporter's country.
 * `amount-differs`: another amount was paid than was pledged. `paid-after-end`: money came for a pledge that
 * was over while its supporter had begun another. `disputed`, `refunded-outside`: the payment service says so.
 */
export type PledgeFlag =
  'location-unclear' | 'amount-differs' | 'paid-after-end' | 'disputed' | 'refunded-outside';

/** Tax within an amount, at one rate. `ratePercent` is decimal text such as `25.5`. */
export interface TaxLine {
  readonly ratePercent: string;
  readonly netMinor: number;
  readonly taxMinor: number;
}

export interface PledgeRecord {
  readonly id: string;
  readonly personId: string;
  readonly planId: string;
  readonly amountMinor: number;
  readonly currency: string;
  readonly keepsAfter: KeepsAfter;
  readonly nextPlanId: string | null;
  readonly nextAmountMinor: number | null;
  readonly nextKeepsAfter: KeepsAfter | null;
  readonly nextPlanFrom: Date | null;
  readonly state: PledgeState;
  readonly declaredCountry: string;
  readonly paymentCountry: string | null;
  readonly cardCountry: string | null;
  readonly cardLast4: string | null;
  readonly flags: readonly PledgeFlag[];
  readonly sessionId: string | null;
  readonly payUntil: Date | null;
  readonly customerId: string | null;
  readonly subscriptionId: string | null;
  readonly beganAt: Date | null;
  readonly paidUntil: Date | null;
  /** Of the month that runs at the payment service, paid or not. */
  readonly periodEnd: Date | null;
  readonly nextPaymentAt: Date | null;
  readonly endsAt: Date | null;
  /** The day of the payment with which a pause is over. */
  readonly pausedUntil: Date | null;
  readonly failedInvoiceId: string | null;
  readonly failingSince: Date | null;
  readonly graceUntil: Date | null;
  readonly settleUrl: string | null;
  /** What the supporter asked for and the payment service may not know of yet. */
  readonly endWish: 'end' | 'keep' | null;
  readonly pauseWish: 'pause' | 'resume' | null;
  readonly amountWish: number | null;
  readonly cardPageId: string | null;
  /** When the right to new files ended; null while it holds. */
  readonly rightsUntil: Date | null;
  readonly endedAt: Date | null;
  readonly createdAt: Date;
}

/** What the payment service says of a pledge at one moment. */
export interface PledgeView {
  readonly subscription: {
    readonly state: 'incomplete' | 'incomplete-expired' | 'active' | 'past-due' | 'unpaid' | 'cancelled';
    readonly amountMinor: number;
    readonly currentPeriodEnd: Date;
    readonly cancelAtPeriodEnd: boolean;
    readonly isPaused: boolean;
    readonly cardLast4: string | null;
    readonly endedAt: Date | null;
  } | null;
  /** Its payment page ended before anybody paid. */
  readonly isPageExpired: boolean;
  readonly billingCountry: string | null;
  readonly invoices: readonly InvoiceView[];
  /** Asked only where the service spoke of a dispute. */
  readonly disputes: readonly { readonly invoiceId: string; readonly state: 'open' | 'lost' | null }[] | null;
}

export interface InvoiceView {
  readonly id: string;
  readonly amountPaidMinor: number;
  readonly currency: string;
  readonly state: 'draft' | 'open' | 'paid' | 'uncollectible' | 'void';
  readonly periodStart: Date;
  readonly periodEnd: Date;
  readonly paymentIntentId: string | null;
  readonly cardCountry: string | null;
  readonly billingCountry: string | null;
  readonly attempts: number;
  readonly payUrl: string | null;
  readonly createdAt: Date;
  readonly paidAt: Date | null;
}
