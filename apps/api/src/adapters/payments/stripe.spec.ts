import { startFakeStripe } from '@windchest/fake-stripe';
import { readEnvironment } from '../../config/environment.js';
import { invoicesContract } from './invoices.contract.js';
import type { OpenStand, PageVisit } from './payment-stand.contract.js';
import { paymentsContract } from './payments.contract.js';
import { reconciliationContract } from './reconciliation.contract.js';
import { StripeBalance } from './stripe-balance.js';
import { StripeInvoices } from './stripe-invoices.js';
import { StripePayments } from './stripe-payments.js';
import { StripeSubscriptions } from './stripe-subscriptions.js';
import { subscriptionsContract } from './subscriptions.contract.js';

const open: OpenStand = async () => {
  const standIn = await startFakeStripe({ seed: 1 });
  const config = readEnvironment({
    BASE_URL: 'http://shop.test',
    DB_NAME: 'none',
    DB_USER: 'none',
    DB_PASSWORD: 'none',
    SESSION_SECRET: 's'.repeat(32),
    LINK_SECRET: 'l'.repeat(32),
    FILES_DIR: '/none',
    SMTP_URL: 'smtp://127.0.0.1:1',
    MAIL_FROM: 'Workshop <bench@saltmarsh.example>',
    STRIPE_KEY: standIn.apiKey,
    STRIPE_WEBHOOK_SECRET: standIn.webhookSecret,
    STRIPE_HOST: standIn.host,
    STRIPE_PORT: String(standIn.port),
    STRIPE_PROTOCOL: 'http',
  });
  const control = async <T = unknown>(path: string, body: object = {}): Promise<T> => {
    const answer = await fetch(`${standIn.url}/control${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    });
    if (!answer.ok) throw new Error(`${path}: ${await answer.text()}`);
    return (await answer.json()) as T;
  };
  return {
    payments: new StripePayments(config),
    subscriptions: new StripeSubscriptions(config),
    invoices: new StripeInvoices(config),
    balance: new StripeBalance(config),
    hands: {
      pay: async (pageId, visit = {}) => {
        await control(`/sessions/${pageId}/pay`, bodyOf(visit));
      },
      holdRefunds: async () => {
        await control('/refunds/hold', { held: true });
      },
      settleRefund: async (refundId, status) => {
        await control(`/refunds/${refundId}/settle`, { status });
      },
      refundByHand: async (paymentIntentId, amount) => {
        await control('/refunds', { payment_intent: paymentIntentId, amount });
      },
      openDispute: async (paymentIntentId, reason) =>
        (await control<{ id: string }>('/disputes', { payment_intent: paymentIntentId, reason })).id,
      winDispute: async (disputeId) => {
        await control(`/disputes/${disputeId}/close`, { status: 'won' });
      },
      payInvoice: async (invoiceId, visit = {}) => {
        await control(`/invoices/${invoiceId}/pay`, bodyOf(visit));
      },
      mendCard: async (customerId) => {
        const answer = await fetch(`${standIn.url}/v1/customers/${customerId}/payment_methods`, {
          headers: { authorization: `Bearer ${standIn.apiKey}` },
        });
        const { data } = (await answer.json()) as { data: { id: string }[] };
        for (const { id } of data) await control(`/payment-methods/${id}`, { later: 'succeed' });
      },
      advanceDays: async (days) => {
        await control('/clock', { advanceSeconds: Math.round(days * 86_400) });
      },
    },
    close: () => standIn.stop(),
  };
};

const bodyOf = ({ fails, ...visit }: PageVisit): object => ({
  ...visit,
  ...(fails === 'now' ? { outcome: 'decline' } : {}),
  ...(fails === 'later' ? { later: 'decline' } : {}),
});

const name = 'Stripe through its SDK';
paymentsContract(name, open);
reconciliationContract(name, open);
subscriptionsContract(name, open);
invoicesContract(name, open);
