export interface PledgePageRequest {
  readonly pledgeId: string;
  readonly customerId: string;
  /** What the page and every invoice call the pledge. */
  readonly planName: string;
  readonly amountMinor: number;
  readonly currency: string;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly expiresAt: Date;
  readonly metadata?: Readonly<Record<string, string>>;
  readonly idempotencyKey: string;
}

export interface CardPageRequest {
  readonly customerId: string;
  /** The pledge whose next payments the card is for. */
  readonly pledgeId: string;
  readonly subscriptionId: string;
  readonly currency: string;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly idempotencyKey: string;
}

/** A page at the payment service where a pledge is begun, or a card is given for later payments. */
export interface PledgePage {
  readonly id: string;
  readonly kind: 'pledge' | 'card';
  readonly url: string | null;
  readonly state: 'open' | 'complete' | 'expired';
  readonly pledgeId: string | null;
  readonly customerId: string | null;
  /** The subscription begun here, or the one the card is for. */
  readonly subscriptionId: string | null;
  readonly email: string | null;
  readonly billingCountry: string | null;
  readonly expiresAt: Date;
}

export type SubscriptionState =
  | 'incomplete'
  | 'incomplete-expired'
  | 'active'
  | 'past-due'
  /** All attempts failed and no more are made; invoices go on being drawn up as drafts. */
  | 'unpaid'
  | 'cancelled';

/** A pledge as the payment service knows it: one amount each month. */
export interface PaymentSubscription {
  readonly id: string;
  readonly state: SubscriptionState;
  readonly customerId: string;
  readonly pledgeId: string | null;
  readonly amountMinor: number;
  readonly currency: string;
  readonly currentPeriodStart: Date;
  readonly currentPeriodEnd: Date;
  readonly cancelAtPeriodEnd: boolean;
  /** Periods go on, but nothing is collected. */
  readonly isPaused: boolean;
  readonly latestInvoiceId: string | null;
  readonly cardLast4: string | null;
  readonly startedAt: Date;
  readonly endedAt: Date | null;
}

export interface PaymentCustomer {
  readonly email: string;
  readonly name: string | null;
}

/** What the shop asks of the payment service about people who pay every month. */
export abstract class Subscriptions {
  /**
   * The id under which the payment service knows a person, opened where there is none yet. Asked twice, also at the
   * same moment, it gives the same one.
   */
  abstract ensureCustomer(email: string, name: string | null, personId: string): Promise<string>;
  abstract updateCustomer(customerId: string, customer: PaymentCustomer): Promise<void>;

  /** Opens the page where a pledge is begun; the same key asked twice gives the same page. */
  abstract openPledgePage(request: PledgePageRequest): Promise<PledgePage>;
  /** Opens the page where another card is given; nothing is charged there. */
  abstract openCardPage(request: CardPageRequest): Promise<PledgePage>;
  abstract findPage(pageId: string): Promise<PledgePage>;
  /** Closes an open page for good; answers how it stands then, which may be `complete`. */
  abstract expirePage(pageId: string): Promise<PledgePage>;
  /**
   * Makes the card of a complete card page the one for this pledge and this customer from now on.
   * May be done again; @throws PaymentsRefused where the page is not complete
   */
  abstract adoptCard(cardPageId: string): Promise<PaymentSubscription>;

  abstract findSubscription(subscriptionId: string): Promise<PaymentSubscription>;
  /** All of a customer's, ended ones too, newest first. */
  abstract listSubscriptions(customerId: string): Promise<readonly PaymentSubscription[]>;
  /** From the next month on; nothing is charged or given back for the running one. */
  abstract changeSubscriptionAmount(
    subscriptionId: string,
    amountMinor: number,
    idempotencyKey: string,
  ): Promise<PaymentSubscription>;
  /** Months go by without a charge until `resume`. */
  abstract pause(subscriptionId: string): Promise<PaymentSubscription>;
  abstract resume(subscriptionId: string): Promise<PaymentSubscription>;
  abstract cancelAtPeriodEnd(subscriptionId: string): Promise<PaymentSubscription>;
  /** @throws PaymentsRefused where the period has ended meanwhile */
  abstract undoCancel(subscriptionId: string): Promise<PaymentSubscription>;
  /** Ends it at once, with nothing given back; one that has ended already stays as it is. */
  abstract cancelNow(subscriptionId: string): Promise<PaymentSubscription>;
}
