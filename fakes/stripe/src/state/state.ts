import type Stripe from 'stripe';
import { Collection } from './collection.js';
import {
  calmWeather,
  usualBilling,
  type BillingRules,
  type Delivery,
  type DeliveryAttempt,
  type DisputePlan,
  type IdempotentAnswer,
  type InvoicePage,
  type RefundPlan,
  type SavedCard,
  type Waiting,
  type WebhookSwitches,
} from './records.js';

/** What a session needs beside the object that the API shows. */
export type SessionDetail = {
  /** The session's id. */
  id: string;
  /** Unix seconds of the stand-in's own time. */
  endsAt: number | null;
  lineItems: Stripe.LineItem[];
  paymentIntentData: {
    metadata: Stripe.Metadata;
    description: string | null;
    receiptEmail: string | null;
    isCardKept: boolean;
  };
  subscriptionData: { metadata: Stripe.Metadata; description: string | null };
  /** The subscription that the first try begins. */
  subscriptionId: string | null;
  waiting: Waiting | null;
};

/**
 * All that the stand-in remembers. A further kind of object is one more collection here, one more file in
 * `resources/` and one more line in `resources/registry.ts`.
 */
export type State = {
  customers: Collection<Stripe.Customer>;
  products: Collection<Stripe.Product>;
  prices: Collection<Stripe.Price>;
  sessions: Collection<Stripe.Checkout.Session>;
  sessionDetails: Collection<SessionDetail>;
  paymentIntents: Collection<Stripe.PaymentIntent>;
  paymentMethods: Collection<Stripe.PaymentMethod>;
  charges: Collection<Stripe.Charge>;
  refunds: Collection<Stripe.Refund>;
  disputes: Collection<Stripe.Dispute>;
  balanceTransactions: Collection<Stripe.BalanceTransaction>;
  subscriptions: Collection<Stripe.Subscription>;
  invoices: Collection<Stripe.Invoice>;
  invoicePayments: Collection<Stripe.InvoicePayment>;
  invoicePages: Collection<InvoicePage>;
  setupIntents: Collection<Stripe.SetupIntent>;
  testClocks: Collection<Stripe.TestHelpers.TestClock>;
  deletedCustomers: Collection<Stripe.DeletedCustomer>;
  billing: BillingRules;
  savedCards: Collection<SavedCard>;
  refundPlans: Collection<RefundPlan>;
  disputePlans: Collection<DisputePlan>;
  /** Refunds wait until they are settled by the control API. */
  areRefundsHeld: boolean;
  events: Collection<Stripe.Event>;
  idempotentAnswers: Collection<IdempotentAnswer>;
  deliveries: Collection<Delivery>;
  attempts: DeliveryAttempt[];
  switches: WebhookSwitches;
  clockOffsetMs: number;
  idRandomState: number;
  weatherRandomState: number;
};

/** The state of a stand-in just started, or the one that `saved` (a parsed snapshot) describes. */
export function openState(seed: number, saved: Partial<Record<keyof State, unknown>> = {}): State {
  const collection = <T extends { id: string }>(key: keyof State) =>
    new Collection<T>((saved[key] as T[] | undefined) ?? []);
  return {
    customers: collection('customers'),
    products: collection('products'),
    prices: collection('prices'),
    sessions: collection('sessions'),
    sessionDetails: new Collection(
      ((saved.sessionDetails as SessionDetail[] | undefined) ?? []).map(completed),
    ),
    paymentIntents: collection('paymentIntents'),
    paymentMethods: collection('paymentMethods'),
    charges: collection('charges'),
    refunds: collection('refunds'),
    disputes: collection('disputes'),
    balanceTransactions: collection('balanceTransactions'),
    subscriptions: collection('subscriptions'),
    invoices: collection('invoices'),
    invoicePayments: collection('invoicePayments'),
    invoicePages: collection('invoicePages'),
    setupIntents: collection('setupIntents'),
    testClocks: collection('testClocks'),
    deletedCustomers: collection('deletedCustomers'),
    billing: { ...usualBilling(), ...(saved.billing as Partial<BillingRules> | undefined) },
    savedCards: collection('savedCards'),
    refundPlans: collection('refundPlans'),
    disputePlans: collection('disputePlans'),
    areRefundsHeld: (saved.areRefundsHeld as boolean | undefined) ?? false,
    events: collection('events'),
    // A call that was under way when the process ended will never be answered: its key is free again.
    idempotentAnswers: new Collection(
      ((saved.idempotentAnswers as IdempotentAnswer[] | undefined) ?? []).filter(
        (kept) => kept.answer !== null,
      ),
    ),
    deliveries: collection('deliveries'),
    attempts: (saved.attempts as DeliveryAttempt[] | undefined) ?? [],
    switches: { ...calmWeather(), ...(saved.switches as Partial<WebhookSwitches> | undefined) },
    clockOffsetMs: (saved.clockOffsetMs as number | undefined) ?? 0,
    idRandomState: (saved.idRandomState as number | undefined) ?? seed,
    weatherRandomState: (saved.weatherRandomState as number | undefined) ?? seed,
  };
}

/** Files of an earlier day know sessions of the mode `payment` alone. */
function completed(detail: SessionDetail): SessionDetail {
  return {
    ...detail,
    endsAt: detail.endsAt ?? null,
    paymentIntentData: {
      ...detail.paymentIntentData,
      isCardKept: detail.paymentIntentData.isCardKept ?? false,
    },
    subscriptionData: detail.subscriptionData ?? { metadata: {}, description: null },
    subscriptionId: detail.subscriptionId ?? null,
  };
}
