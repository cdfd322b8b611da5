import type { TaxTreatment } from '@windchest/contracts';
import type { ReceiptBuyer, ReceiptSeller } from '../receipt-parties.js';

/** A receipt, an invoice or a credit note as it is typeset: plain facts, nothing to look up. */
export interface ReceiptDocument {
  readonly kind: DocumentKind;
  readonly number: string;
  readonly issuedAt: Date;
  /** When the files were handed over, which is when the order was paid. */
  readonly suppliedAt: Date;
  readonly orderNumber: string;
  /** What a credit note corrects, and why. */
  readonly corrects: {
    readonly kind: 'receipt' | 'invoice';
    readonly number: string;
    readonly issuedAt: Date;
    readonly cause: 'refund' | 'dispute';
  } | null;
  readonly shop: { readonly name: string; readonly address: string };
  readonly seller: ReceiptSeller;
  readonly buyer: ReceiptBuyer;
  readonly treatment: TaxTreatment;
  readonly currency: string;
  readonly locale: string;
  readonly lines: readonly DocumentLine[];
  readonly rates: readonly DocumentRate[];
  readonly totalMinor: number;
}

/** A receipt is a simplified invoice; an invoice names the buyer and where they live. */
export type DocumentKind = 'receipt' | 'invoice' | 'credit-note';

export interface DocumentLine {
  readonly title: string;
  readonly licence: string;
  /** Before a coupon, with the tax; null where nothing came off. */
  readonly before: { readonly priceMinor: number; readonly discountMinor: number } | null;
  /** Without the tax, after the coupon. Files are sold one by one, so it is also the unit's price. */
  readonly netMinor: number;
  readonly ratePercent: string;
  readonly totalMinor: number;
}

export interface DocumentRate {
  readonly ratePercent: string;
  readonly country: string;
  readonly netMinor: number;
  readonly taxMinor: number;
}
