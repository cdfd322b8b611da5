/** A payment page at the payment service, as the shop knows it. */
export interface PaymentSession {
  readonly id: string;
  readonly url: string | null;
  readonly state: 'open' | 'paid' | 'expired';
  readonly orderId: string | null;
  readonly paymentIntentId: string | null;
  readonly amountMinor: number;
  readonly currency: string;
  readonly email: string | null;
  /** Country of the billing address typed on the payment page: one piece of location evidence. */
  readonly billingCountry: string | null;
  /** Name and address typed there, line by line without the country. */
  readonly billingName: string | null;
  readonly billingLines: readonly string[];
  readonly expiresAt: Date;
}

export interface PaymentLine {
  readonly name: string;
  readonly description: string;
  readonly amountMinor: number;
}

export interface SessionRequest {
  readonly orderId: string;
  readonly orderNumber: string;
  readonly currency: string;
  readonly lines: readonly PaymentLine[];
  readonly email: string;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly expiresAt: Date;
}

export interface PaymentEvent {
  readonly id: string;
  readonly type: string;
  readonly occurredAt: Date;
  /** The object the event is about, by its id. */
  readonly subjectId: string | null;
  readonly payload: unknown;
}

export interface RefundRequest {
  readonly paymentIntentId: string;
  /** Part of the payment, or all that is left of it. Partial refunds may follow one another. */
  readonly amountMinor: number;
  readonly idempotencyKey: string;
  readonly metadata?: Readonly<Record<string, string>>;
}

export type RefundState = 'pending' | 'needs-action' | 'succeeded' | 'failed' | 'cancelled';

/** Money on its way back to a buyer. A refund that succeeded may still fail later, when the bank sends it back. */
export interface PaymentRefund {
  readonly id: string;
  readonly paymentIntentId: string | null;
  readonly chargeId: string | null;
  readonly amountMinor: number;
  readonly currency: string;
  readonly state: RefundState;
  /** The service's own word for why it failed, such as `expired_or_canceled_card`. */
  readonly failure: string | null;
  readonly metadata: Readonly<Record<string, string>>;
  readonly createdAt: Date;
}

export type DisputeState = 'needs-response' | 'under-review' | 'won' | 'lost' | 'inquiry' | 'inquiry-closed';

/** A buyer's bank asks for the money back. An inquiry takes no money yet. */
export interface PaymentDispute {
  readonly id: string;
  readonly paymentIntentId: string | null;
  readonly chargeId: string;
  readonly amountMinor: number;
  readonly currency: string;
  /** The service's own word, such as `fraudulent` or `product_not_received`. */
  readonly reason: string;
  readonly state: DisputeState;
  /** Until when evidence may be handed in at the payment service. */
  readonly evidenceDueAt: Date | null;
  readonly hasEvidence: boolean;
  readonly createdAt: Date;
}

/** What the shop asks of the payment service about a payment made once. */
export abstract class Payments {
  /** Opens a payment page; the same order with the same end, asked twice, gives the same page. */
  abstract openSession(request: SessionRequest): Promise<PaymentSession>;
  abstract session(sessionId: string): Promise<PaymentSession>;
  /** Closes an open page for good; answers how it stands then, which may be `paid`. */
  abstract expireSession(sessionId: string): Promise<PaymentSession>;
  /** Country of the card's bank, the second piece of location evidence, where the service tells. */
  abstract cardCountry(paymentIntentId: string): Promise<string | null>;
  /**
   * Gives money back; the same key asked twice gives the same refund.
   * @throws PaymentsRefused where more is asked than is left, or the payment is disputed
   */
  abstract refund(request: RefundRequest): Promise<PaymentRefund>;
  abstract findRefund(refundId: string): Promise<PaymentRefund>;
  /** All refunds of a payment, newest first, those made at the payment service's own pages too. */
  abstract refundsOf(paymentIntentId: string): Promise<readonly PaymentRefund[]>;
  abstract findDispute(disputeId: string): Promise<PaymentDispute>;
  abstract disputesOf(paymentIntentId: string): Promise<readonly PaymentDispute[]>;
  /** @throws SignatureRefused */
  abstract readEvent(body: Buffer, signature: string): PaymentEvent;
}

export { CardDeclined, PaymentsRefused, PaymentsUnreachable, SignatureRefused } from './payment-faults.js';
