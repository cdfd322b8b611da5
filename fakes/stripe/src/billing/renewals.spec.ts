import type Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

const day = 86_400;
const renewed = [
  'customer.subscription.updated', 'invoice.created',
  'invoice.finalized', 'payment_intent.created', 'charge.succeeded', 'payment_intent.succeeded',
  'invoice_payment.paid', 'invoice.paid', 'invoice.payment_succeeded',
]; // prettier-ignore
const failed = [
  'charge.failed',
  'payment_intent.payment_failed',
  'invoice.updated',
  'invoice.payment_failed',
];

describe('renewals', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const pledge = async (pay: object = {}) => {
    const running = await shop.runningPledge(pay);
    await shop.arrived();
    return running;
  };
  const advance = (days: number) => shop.control('/clock', { advanceSeconds: Math.round(days * day) });
  const subscription = (id: string) => shop.stripe.subscriptions.retrieve(id, { expand: ['latest_invoice'] });
  const latest = async (id: string) => (await subscription(id)).latest_invoice as Stripe.Invoice;

  it('draw an invoice up at the boundary and collect it an hour later', async () => {
    const { subscriptionId } = await pledge();
    const end = Number((await subscription(subscriptionId)).items.data[0]?.current_period_end);
    await shop.control('/clock', { now: end + 60 });
    expect(await latest(subscriptionId)).toMatchObject({
      status: 'draft',
      number: null,
      billing_reason: 'subscription_cycle',
      created: end,
      automatically_finalizes_at: end + 3600,
      hosted_invoice_url: null,
    });
    expect(await shop.arrived()).toEqual(renewed.slice(0, 2));
    await shop.control('/clock', { now: end + 3601 });
    expect(await latest(subscriptionId)).toMatchObject({
      status: 'paid',
      attempt_count: 1,
      status_transitions: { finalized_at: end + 3600, paid_at: end + 3600 },
    });
    expect(await shop.arrived()).toEqual(renewed.slice(2));
  });

  it('all happen, each at its own moment, when time is moved on by months', async () => {
    const { subscriptionId } = await pledge();
    await advance(100);
    const invoices = (await shop.stripe.invoices.list({ subscription: subscriptionId })).data;
    expect(invoices.map(({ status }) => status)).toEqual(['paid', 'paid', 'paid', 'paid']);
    expect(invoices.map(({ number }) => number?.slice(-4))).toEqual(['0004', '0003', '0002', '0001']);
    const periods = invoices.map(({ lines }) => lines.data[0]?.period).reverse();
    for (const [index, period] of periods.slice(1).entries()) expect(period?.start).toBe(periods[index]?.end);
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual([...renewed, ...renewed, ...renewed]);
    const created = shop.received.map(({ event }) => event.created);
    expect(created).toEqual([...created].sort((a, b) => a - b));
    expect(new Set(created).size).toBe(6);
  });

  it('fail, are tried again on the days that are set, and end the subscription at last', async () => {
    const { subscriptionId, customerId } = await pledge({ card: '4000000000099210' });
    await advance(31.1);
    const invoice = await latest(subscriptionId);
    const firstTry = Number(invoice.status_transitions.finalized_at);
    expect(invoice).toMatchObject({
      status: 'open',
      attempt_count: 1,
      next_payment_attempt: firstTry + 3 * day,
      amount_remaining: 500,
    });
    expect((await subscription(subscriptionId)).status).toBe('past_due');
    expect(await shop.stripe.customers.retrieve(customerId)).toMatchObject({ delinquent: true });
    expect(await shop.arrived()).toEqual([
      ...renewed.slice(0, 4), ...failed, 'customer.subscription.updated',
    ]); // prettier-ignore
    await advance(3);
    expect(await latest(subscriptionId)).toMatchObject({
      attempt_count: 2,
      next_payment_attempt: firstTry + 8 * day,
    });
    expect(await shop.arrived()).toEqual(failed);
    await advance(12);
    expect(await latest(subscriptionId)).toMatchObject({
      status: 'open',
      attempt_count: 4,
      next_payment_attempt: null,
      auto_advance: false,
    });
    expect(await subscription(subscriptionId)).toMatchObject({
      status: 'canceled',
      ended_at: firstTry + 15 * day,
      cancellation_details: { reason: 'payment_failed' },
    });
    expect(await shop.arrived()).toEqual([...failed, ...failed, 'customer.subscription.deleted']);
  });

  it('leave the subscription unpaid or past due instead, where that is set', async () => {
    await shop.control('/billing', { retryDays: [1], afterRetries: 'mark-unpaid', finalizeSeconds: 0 });
    const { subscriptionId } = await pledge({ later: 'insufficient-funds' });
    await advance(33);
    expect((await subscription(subscriptionId)).status).toBe('unpaid');
    await advance(31);
    expect(await latest(subscriptionId)).toMatchObject({ status: 'draft', auto_advance: false });
    await shop.control('/billing', { retryDays: [], afterRetries: 'leave' });
    const other = await pledge({ later: 'decline' });
    await advance(33);
    expect((await subscription(other.subscriptionId)).status).toBe('past_due');
  });

  it('are paid on the invoice page with another card, which the subscription keeps', async () => {
    const { subscriptionId, customerId } = await pledge({ later: 'expired' });
    await advance(31.1);
    await shop.arrived();
    const invoice = await latest(subscriptionId);
    const path = new URL(String(invoice.hosted_invoice_url)).pathname;
    const page = await (await fetch(`${shop.standIn.url}${path}`)).text();
    expect(page).toContain(`Invoice ${invoice.number}`);
    expect(page).toContain('Pay €5.00');
    expect(page).toContain('value="ada@example.test"');
    const form = { action: 'pay', country: 'FR', card: '4000000000000002' };
    const declined = await shop.postForm(path, form);
    expect(declined.page).toContain('Your card was declined. Nothing was taken.');
    expect(await latest(subscriptionId)).toMatchObject({ attempt_count: 1, status: 'open' });
    const asked = await shop.postForm(path, { ...form, card: '4000002500003155' });
    expect(asked.to).toBe(`${path}/second-step`);
    expect(await (await fetch(`${shop.standIn.url}${path}/second-step`)).text()).toContain('€5.00');
    const done = await shop.postForm(`${path}/second-step`, { answer: 'approve' });
    expect(done).toMatchObject({ status: 303, to: path });
    expect(await (await fetch(`${shop.standIn.url}${path}`)).text()).toContain('This invoice is paid');
    expect((await latest(subscriptionId)).status).toBe('paid');
    const now = await shop.stripe.subscriptions.retrieve(subscriptionId, {
      expand: ['default_payment_method'],
    });
    expect(now).toMatchObject({ status: 'active', default_payment_method: { card: { last4: '3155' } } });
    expect(await shop.stripe.customers.retrieve(customerId)).toMatchObject({ delinquent: false });
    // Authenticated once, the new card pays the next month without a question.
    await advance(31);
    expect((await latest(subscriptionId)).status).toBe('paid');
  });

  it('want the buyer where the card asks each time', async () => {
    const { subscriptionId } = await pledge({ card: '4000002760003184' });
    await advance(31.1);
    const types = await shop.arrived();
    expect(types.slice(4)).toEqual([
      'charge.failed', 'payment_intent.payment_failed', 'invoice.updated',
      'invoice.payment_action_required', 'invoice.payment_failed', 'customer.subscription.updated',
    ]); // prettier-ignore
    const paid = await shop.control<{ invoice: Stripe.Invoice }>(
      `/invoices/${(await latest(subscriptionId)).id}/pay`,
      { card: '4000002760003184' },
    );
    expect(paid.invoice.status).toBe('paid');
  });

  it('can be asked for by the API, which answers as a declined card does', async () => {
    const { subscriptionId, customerId } = await pledge({ later: 'insufficient-funds' });
    await advance(31.1);
    const invoice = await latest(subscriptionId);
    const error = await errorOf(shop.stripe.invoices.pay(invoice.id));
    expect(error).toMatchObject({ type: 'StripeCardError', decline_code: 'insufficient_funds' });
    expect((await latest(subscriptionId)).attempt_count).toBe(1);
    const [card] = (await shop.stripe.customers.listPaymentMethods(customerId)).data;
    await shop.control(`/payment-methods/${card?.id}`, { later: 'succeed' });
    expect((await shop.stripe.invoices.pay(invoice.id)).status).toBe('paid');
    expect((await subscription(subscriptionId)).status).toBe('active');
    const again = await errorOf(shop.stripe.invoices.pay(invoice.id));
    expect(again.code).toBe('invoice_already_paid');
  });

  it('owe nothing once the invoice is void', async () => {
    const { subscriptionId } = await pledge({ later: 'decline' });
    await advance(31.1);
    const invoice = await latest(subscriptionId);
    expect((await shop.stripe.invoices.voidInvoice(invoice.id)).status).toBe('void');
    expect((await subscription(subscriptionId)).status).toBe('active');
    const page = await fetch(String(invoice.hosted_invoice_url));
    expect([page.status, await page.text()]).toEqual([410, expect.stringContaining('no longer due')]);
  });

  it('can be refunded and disputed as any payment can', async () => {
    const { subscriptionId } = await pledge();
    await advance(31.1);
    const invoice = await latest(subscriptionId);
    const [payment] = (await shop.stripe.invoicePayments.list({ invoice: invoice.id })).data;
    const intent = String(payment?.payment.payment_intent);
    await shop.stripe.refunds.create({ payment_intent: intent, amount: 200 });
    await shop.control('/disputes', { payment_intent: intent, reason: 'subscription_canceled' });
    const [charge] = (await shop.stripe.charges.list({ payment_intent: intent })).data;
    expect(charge).toMatchObject({ amount_refunded: 200, disputed: true });
    expect((await shop.stripe.disputes.list({ payment_intent: intent })).data[0]?.amount).toBe(300);
  });

  it('arrive twice, late and in another order where the weather is so', async () => {
    await shop.control('/webhooks', { shuffle: true, duplicates: 1, paused: true, seed: 4 });
    await shop.runningPledge();
    await advance(31.1);
    const types = await shop.arrived();
    expect(types.filter((type) => type === 'invoice.paid')).toHaveLength(4);
    expect(types.indexOf('invoice.paid')).toBeLessThan(types.lastIndexOf('customer.subscription.created'));
    await shop.control('/webhooks', { reset: true, lose: ['invoice.paid'] });
    await advance(31);
    expect(await shop.arrived()).not.toContain('invoice.paid');
  });
});
