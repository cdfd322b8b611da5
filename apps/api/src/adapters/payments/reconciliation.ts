export type BalanceEntryKind =
  | 'payment'
  | 'refund'
  /** A refund that the bank sent back. */
  | 'refund-failed'
  /** Money withdrawn by a dispute, its fee included. */
  | 'dispute'
  /** Money that came back with a dispute won. */
  | 'dispute-reversed'
  | 'payout'
  | 'other';

/** One movement of the shop's balance at the payment service; money that leaves has a minus sign. */
export interface BalanceEntry {
  readonly id: string;
  readonly kind: BalanceEntryKind;
  readonly amountMinor: number;
  readonly feeMinor: number;
  /** `amountMinor - feeMinor` */
  readonly netMinor: number;
  readonly currency: string;
  readonly occurredAt: Date;
  /** The charge, refund or dispute behind it. */
  readonly sourceId: string | null;
  readonly paymentIntentId: string | null;
  readonly description: string | null;
}

export interface BalancePage {
  readonly entries: readonly BalanceEntry[];
  /** Hand it in to read on; null at the end. */
  readonly next: string | null;
}

/** What moved at the payment service, to be held against the shop's own books. */
export abstract class PaymentBalance {
  /** Entries from `from` up to, but not including, `to`, newest first, up to 100 a page. */
  abstract listBalance(from: Date, to: Date, after?: string | null): Promise<BalancePage>;
}
