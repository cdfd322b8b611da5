import type { Invoices } from './invoices.js';
import type { Payments } from './payments.js';
import type { PaymentBalance } from './reconciliation.js';
import type { Subscriptions } from './subscriptions.js';

/** What buyers, banks and time do at a payment service, for the contracts of this folder. */
export interface PaymentHands {
  /** Pays, or gives a card, at a page as its visitor does. */
  pay(pageId: string, options?: { card?: string; country?: string; cardCountry?: string }): Promise<void>;
  holdRefunds(): Promise<void>;
  settleRefund(refundId: string, outcome: 'succeeded' | 'failed'): Promise<void>;
  /** By somebody at the service, past the shop. */
  refundByHand(paymentIntentId: string, amountMinor: number): Promise<void>;
  openDispute(paymentIntentId: string, reason: string): Promise<string>;
  winDispute(disputeId: string): Promise<void>;
  advance(seconds: number): Promise<void>;
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
