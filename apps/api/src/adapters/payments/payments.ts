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

/** What the shop asks of the payment service. */
export abstract class Payments {
  /** Opens a payment page; the same order with the same end, asked twice, gives the same page. */
  abstract openSession(request: SessionRequest): Promise<PaymentSession>;
  abstract session(sessionId: string): Promise<PaymentSession>;
  /** Closes an open page for good; answers how it stands then, which may be `paid`. */
  abstract expireSession(sessionId: string): Promise<PaymentSession>;
  /** Country of the card's bank, the second piece of location evidence, where the service tells. */
  abstract cardCountry(paymentIntentId: string): Promise<string | null>;
  /** @throws SignatureRefused */
  abstract readEvent(body: Buffer, signature: string): PaymentEvent;
}

export class SignatureRefused extends Error {}
/** The service could not be reached or asks to be left alone for a while; worth trying again. */
export class PaymentsUnreachable extends Error {}
/** The service refuses the request itself; trying again changes nothing. */
export class PaymentsRefused extends Error {}
