import type Stripe from 'stripe';
import { toBalanceEntry } from './balance.mapping.js';
import { toDispute } from './dispute.mapping.js';
import { toInvoice } from './invoice.mapping.js';
import { toPledgePage, toSession } from './page.mapping.js';
import { toRefund } from './refund.mapping.js';
import { toSubscription } from './subscription.mapping.js';

// Fields and their values as in the types of the SDK; only those that are read are given.
const of = <T>(part: object): T => part as T;
const seconds = (text: string) => Date.parse(text) / 1000;

describe('what the payment service says, in the shop’s words', () => {
  it.each([
    ['pending', 'pending'],
    ['requires_action', 'needs-action'],
    ['succeeded', 'succeeded'],
    ['failed', 'failed'],
    ['canceled', 'cancelled'],
    ['something_new', 'pending'],
    [null, 'pending'],
  ])('a refund that is %s is %s', (status, state) => {
    const refund = toRefund(
      of<Stripe.Refund>({
        id: 're_1',
        status,
        amount: 5,
        currency: 'eur',
        created: 60,
        payment_intent: { id: 'pi_1' },
        charge: 'ch_1',
        metadata: null,
      }),
    );
    expect(refund).toEqual({
      id: 're_1',
      paymentIntentId: 'pi_1',
      chargeId: 'ch_1',
      amountMinor: 5,
      currency: 'EUR',
      state,
      failure: null,
      metadata: {},
      createdAt: new Date(60_000),
    });
  });

  it.each([
    ['needs_response', 'needs-response'],
    ['appeal_needs_response', 'needs-response'],
    ['under_review', 'under-review'],
    ['warning_needs_response', 'inquiry'],
    ['warning_under_review', 'inquiry'],
    ['warning_closed', 'inquiry-closed'],
    ['prevented', 'inquiry-closed'],
    ['won', 'won'],
    ['lost', 'lost'],
  ])('a dispute that is %s is %s', (status, state) => {
    const dispute = of<Stripe.Dispute>({
      status,
      currency: 'eur',
      charge: 'ch_1',
      evidence_details: { due_by: null, has_evidence: true },
    });
    expect(toDispute(dispute)).toMatchObject({ state, evidenceDueAt: null, hasEvidence: true });
  });

  it('takes the reference of a page for an order’s on pages of orders alone', () => {
    const page = (mode: string) =>
      of<Stripe.Checkout.Session>({
        mode,
        status: 'complete',
        payment_status: 'paid',
        client_reference_id: 'ref-1',
        subscription: null,
        metadata: { subscription: 'sub_1' },
      });
    expect(toSession(page('payment'))).toMatchObject({ orderId: 'ref-1', state: 'paid' });
    expect(toSession(page('subscription')).orderId).toBeNull();
    expect(toPledgePage(page('subscription'))).toMatchObject({ kind: 'pledge', pledgeId: 'ref-1' });
    expect(toPledgePage(page('setup'))).toMatchObject({ kind: 'card', subscriptionId: 'sub_1' });
  });

  describe('a subscription', () => {
    const subscription = (part: object) =>
      toSubscription(
        of<Stripe.Subscription>({
          status: 'active',
          customer: 'cus_1',
          currency: 'eur',
          metadata: {},
          pause_collection: null,
          items: { data: [] },
          ...part,
        }),
      );

    it('has the period and the amount of its items', () => {
      const item = (amount: number, quantity?: number) => ({
        current_period_start: seconds('2026-01-31T00:00:00Z'),
        current_period_end: seconds('2026-02-28T00:00:00Z'),
        price: { unit_amount: amount },
        quantity,
      });
      expect(subscription({ items: { data: [item(500, 2), item(100)] } })).toMatchObject({
        amountMinor: 1100,
        currentPeriodStart: new Date('2026-01-31T00:00:00Z'),
        currentPeriodEnd: new Date('2026-02-28T00:00:00Z'),
      });
    });

    it('shows its own card before the customer’s, and none of a customer that was deleted', () => {
      const card = (last4: string) => ({ id: 'pm', card: { last4 } });
      const customer = { id: 'cus_1', invoice_settings: { default_payment_method: card('2222') } };
      expect(subscription({ customer, default_payment_method: card('1111') }).cardLast4).toBe('1111');
      expect(subscription({ customer, default_payment_method: null }).cardLast4).toBe('2222');
      const deleted = { id: 'cus_1', deleted: true };
      expect(subscription({ customer: deleted, default_payment_method: null })).toMatchObject({
        customerId: 'cus_1',
        cardLast4: null,
      });
    });

    it.each([
      ['trialing', 'active', false],
      ['paused', 'active', true],
      ['past_due', 'past-due', false],
      ['incomplete_expired', 'incomplete-expired', false],
      ['canceled', 'cancelled', false],
    ])('that is %s is %s, paused: %s', (status, state, isPaused) => {
      expect(subscription({ status })).toMatchObject({ state, isPaused });
    });
  });

  describe('an invoice', () => {
    const invoice = (part: object, charge: object | null = null) =>
      toInvoice(
        of<Stripe.Invoice>({
          status: 'open',
          currency: 'eur',
          created: 0,
          period_start: 10,
          period_end: 20,
          lines: { data: [] },
          hosted_invoice_url: 'http://pay.test/i',
          status_transitions: { paid_at: null },
          parent: null,
          ...part,
        }),
        charge && of<Stripe.Charge>(charge),
      );

    it('is of the month of its line, passing over what makes up for a change', () => {
      const line = (proration: boolean, start: number) => ({
        period: { start, end: start + 5 },
        parent: { subscription_item_details: { proration } },
      });
      const months = invoice({ lines: { data: [line(true, 1), line(false, 100)] } });
      expect([months.periodStart, months.periodEnd]).toEqual([new Date(100_000), new Date(105_000)]);
      expect(invoice({}).periodStart).toEqual(new Date(10_000));
    });

    it('names the payment that paid before the one that waits, and none of a draft', () => {
      const payment = (status: string, id: string) => ({
        status,
        is_default: status === 'open',
        payment: { payment_intent: id },
      });
      const payments = { data: [payment('open', 'pi_1'), payment('paid', 'pi_2')] };
      expect(invoice({ payments }).paymentIntentId).toBe('pi_2');
      expect(invoice({ payments: { data: [payment('open', 'pi_1')] } }).paymentIntentId).toBe('pi_1');
      expect(invoice({ status: 'draft', hosted_invoice_url: null })).toMatchObject({
        paymentIntentId: null,
        payUrl: null,
        state: 'draft',
      });
    });

    it('can be paid at its page while it is open alone', () => {
      expect(invoice({}).payUrl).toBe('http://pay.test/i');
      expect(invoice({ status: 'paid' }).payUrl).toBeNull();
    });

    it('has the country of the billing address from the charge, else from the customer', () => {
      const charge = {
        billing_details: { address: { country: 'FR' } },
        payment_method_details: { card: { country: 'DE' } },
      };
      expect(invoice({}, charge)).toMatchObject({ billingCountry: 'FR', cardCountry: 'DE' });
      expect(invoice({ customer_address: { country: 'AT' } })).toMatchObject({
        billingCountry: 'AT',
        cardCountry: null,
      });
    });
  });

  it.each([
    ['charge', 'charge', 'payment'],
    ['payment', 'charge', 'payment'],
    ['payment_refund', 'refund', 'refund'],
    ['refund_failure', 'refund_failure', 'refund-failed'],
    ['adjustment', 'dispute', 'dispute'],
    ['adjustment', 'dispute_reversal', 'dispute-reversed'],
    ['payout', 'payout', 'payout'],
    ['stripe_fee', 'fee', 'other'],
  ])('a movement %s of the category %s is a %s', (type, category, kind) => {
    const entry = toBalanceEntry(
      of<Stripe.BalanceTransaction>({
        type,
        reporting_category: category,
        currency: 'eur',
        source: { id: 'ch_1', payment_intent: 'pi_1' },
      }),
    );
    expect(entry).toMatchObject({ kind, sourceId: 'ch_1', paymentIntentId: 'pi_1' });
  });
});
