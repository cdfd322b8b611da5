import type { CardBehaviour, CardTraits } from '../payments/card-traits.js';

/** What an idempotency key stands for. Kept for 24 hours. */
export type IdempotentAnswer = {
  /** The key itself. */
  id: string;
  path: string;
  bodyHash: string;
  createdMs: number;
  requestId: string;
  /** Null while the first call is under way. */
  answer: { status: number; json: string } | null;
};

/** An event on its way to the webhook endpoint, until it is taken, given up or lost. */
export type Delivery = {
  /** Own id: one event may be under way several times. */
  id: string;
  eventId: string;
  /** Attempts made so far. */
  attempts: number;
  /** Virtual time before which no attempt is made. */
  dueMs: number;
  /** Deliveries of one batch go out side by side: they are the copies of one event. */
  batch: string;
};

/** One line of the delivery log. */
export type DeliveryAttempt = {
  deliveryId: string;
  eventId: string;
  type: string;
  attempt: number;
  atMs: number;
  outcome: 'delivered' | 'failed' | 'lost' | 'given-up';
  /** The endpoint's HTTP status; null where there was no answer. */
  status: number | null;
  detail: string | null;
};

/** The weather between the service and the shop, set through the control API. */
export type WebhookSwitches = {
  /** Every event waits this long before its first attempt. */
  delayMs: number;
  /** Further copies of every event, sent at the same moment. */
  duplicates: number;
  /** Events of a quarter of a second are gathered and sent side by side in random order. */
  shuffle: boolean;
  /** The part (0 to 1) of all events that never arrive, or the types that never do. */
  lose: number | string[];
  /** Nothing is sent until this is false again, or a flush. */
  paused: boolean;
};

export function calmWeather(): WebhookSwitches {
  return { delayMs: 0, duplicates: 0, shuffle: false, lose: 0, paused: false };
}

/** What the buyer typed, kept while a second step waits for an answer. */
export type Waiting = { cardNumber: string; cardCountry: string | null; buyer: Buyer };

export type Buyer = {
  email: string;
  name: string | null;
  country: string;
  /** The rest of the billing address, which the stand-in's page does not ask for. */
  street?: Street;
};
export type Street = { line1: string | null; postalCode: string | null; city: string | null };

/** The card behind a payment method: what the API does not show of it. */
export type SavedCard = {
  /** The payment method's id. */
  id: string;
  number: string;
  country: string;
  later: CardBehaviour;
  refunds: CardTraits['refunds'];
};

/** What a bank will say of a refund, and when. */
export type RefundPlan = { id: string; atMs: number; outcome: 'succeeded' | 'failed' };

/** The dispute that a charge with such a card brings. */
export type DisputePlan = {
  /** The charge's id. */
  id: string;
  reason: string;
  isInquiry: boolean;
};

/** The page where an invoice can be paid. */
export type InvoicePage = {
  /** The last part of the page's address: nobody guesses it. */
  id: string;
  invoiceId: string;
  waiting: Waiting | null;
};

/** How the service collects, set through the control API. */
export type BillingRules = {
  /** Days between one failed attempt and the next. */
  retryDays: number[];
  /** What becomes of a subscription when all of them have failed. */
  afterRetries: 'cancel' | 'mark-unpaid' | 'leave';
  /** How long an invoice of a new period stays a draft. */
  finalizeSeconds: number;
};

export function usualBilling(): BillingRules {
  return { retryDays: [3, 5, 7], afterRetries: 'cancel', finalizeSeconds: 3600 };
}
