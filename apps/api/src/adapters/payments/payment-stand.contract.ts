import type { Invoices } from './invoices.js';
import type { Payments } from './payments.js';
import type { PaymentBalance } from './reconciliation.js';
import type { Subscriptions } from './subscriptions.js';

export interface PageVisit {
  readonly country?: string;
  readonly cardCountry?: string;
  /** Whether the card fails now, or once it is charged again later. */
  readonly fails?: 'now' | 'later';
}

/** What buyers, banks and time do at a payment service, for the contracts of this folder. */
export interface PaymentHands {
  /** Pays, or gives a card, at a page as its visitor does. */
  pay(pageId: string, options?: PageVisit): Promise<void>;
  holdRefunds(): Promise<void>;
  settleRefund(refundId: string, outcome: 'succeeded' | 'failed'): Promise<void>;
  /** By somebody at the service, past the shop. */
  refundByHand(paymentIntentId: string, amountMinor: number): Promise<void>;
  openDispute(paymentIntentId: string, reason: string): Promise<string>;
  winDispute(disputeId: string): Promise<void>;
  /** Pays an invoice at its page. */
  payInvoice(invoiceId: string, options?: PageVisit): Promise<void>;
  /** The card that a customer's subscription is charged with works again. */
  mendCard(customerId: string): Promise<void>;
  advanceDays(days: number): Promise<void>;
}

export interface PaymentStand {
  readonly payments: Payments;
  readonly subscriptions: Subscriptions;
  readonly invoices: Invoices;
  readonly balance: PaymentBalance;
  readonly hands: PaymentHands;
  close(): Promise<void>;
}

export type OpenStand = () => Promise<PaymentStand>;

/** An order's payment page that was paid, and its payment. */
export const paidOrder = async (
  { payments, hands }: PaymentStand,
  amountMinor = 3300,
): Promise<{ sessionId: string; paymentIntentId: string }> => {
  const session = await payments.openSession({
    orderId: crypto.randomUUID(),
    orderNumber: 'W-1001',
    currency: 'EUR',
    lines: [{ name: 'Dunlin Mk 1.0', description: 'Personal licence', amountMinor }],
    email: 'ada@mail.example',
    successUrl: 'http://shop.test/thanks',
    cancelUrl: 'http://shop.test/basket',
    expiresAt: new Date(Date.now() + 3600_000),
  });
  await hands.pay(session.id, { country: 'FR', cardCountry: 'DE' });
  const { paymentIntentId } = await payments.session(session.id);
  if (!paymentIntentId) throw new Error('The page was not paid.');
  return { sessionId: session.id, paymentIntentId };
};

/** The page of a new pledge of somebody new. */
export const openPledge = async ({ subscriptions }: PaymentStand, personId = crypto.randomUUID()) => {
  const pledgeId = crypto.randomUUID();
  const customerId = await subscriptions.ensureCustomer(`${personId}@mail.example`, 'Ada', personId);
  const page = await subscriptions.openPledgePage({
    pledgeId,
    customerId,
    planName: 'Reed supporter',
    amountMinor: 500,
    currency: 'EUR',
    successUrl: 'http://shop.test/pledged',
    cancelUrl: 'http://shop.test/plans',
    expiresAt: new Date(Date.now() + 3600_000),
    idempotencyKey: `pledge-${pledgeId}`,
  });
  return { pledgeId, customerId, page };
};

/** A pledge that runs. */
export const runningPledge = async (stand: PaymentStand, visit: PageVisit = {}) => {
  const { pledgeId, customerId, page } = await openPledge(stand);
  await stand.hands.pay(page.id, visit);
  const { subscriptionId } = await stand.subscriptions.findPage(page.id);
  if (!subscriptionId) throw new Error('The pledge did not begin.');
  return { pledgeId, customerId, subscriptionId, pageId: page.id };
};
