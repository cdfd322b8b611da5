import Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

// The order of events and the shape of objects follow the service's pages on subscriptions and the types of its
// SDK; written from memory of those pages.
describe('subscriptions', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const full = async (id: string) =>
    shop.stripe.subscriptions.retrieve(id, {
      expand: ['latest_invoice.payments', 'default_payment_method', 'customer'],
    });

  it('begin on a page: invoice, payment, then active, each told of in its turn', async () => {
    const { subscriptionId, sessionId, customerId } = await shop.runningPledge();
    expect(await shop.arrived()).toEqual([
      'customer.created',
      'customer.subscription.created', 'invoice.created', 'invoice.finalized', 'payment_intent.created',
      'payment_method.attached', 'charge.succeeded', 'payment_intent.succeeded',
      'invoice_payment.paid', 'invoice.paid', 'invoice.payment_succeeded',
      'customer.subscription.updated', 'checkout.session.completed',
    ]); // prettier-ignore
    const subscription = await full(subscriptionId);
    const invoice = subscription.latest_invoice as Stripe.Invoice;
    expect(subscription).toMatchObject({
      status: 'active',
      customer: { id: customerId },
      metadata: { pledge: '1' },
      description: 'Reed supporter',
      default_payment_method: { customer: customerId, card: { last4: '4242' } },
      items: { data: [{ price: { unit_amount: 500, recurring: { interval: 'month' } }, quantity: 1 }] },
    });
    // Since the API of 2025 the period stands on the item, not on the subscription.
    const item = subscription.items.data[0];
    expect(subscription).not.toHaveProperty('current_period_end');
    expect(item?.current_period_start).toBe(subscription.billing_cycle_anchor);
    expect(invoice).toMatchObject({
      status: 'paid',
      billing_reason: 'subscription_create',
      amount_paid: 500,
      amount_remaining: 0,
      attempt_count: 1,
      parent: {
        type: 'subscription_details',
        subscription_details: { subscription: subscriptionId, metadata: { pledge: '1' } },
      },
      lines: { data: [{ amount: 500, period: { end: item?.current_period_end } }] },
    });
    expect(invoice.number).toMatch(/^[A-Z0-9]{8}-0001$/);
    const payment = invoice.payments?.data[0];
    expect(payment).toMatchObject({ status: 'paid', amount_paid: 500, is_default: true });
    const linked = await shop.stripe.invoicePayments.list({
      payment: { type: 'payment_intent', payment_intent: String(payment?.payment.payment_intent) },
    });
    expect(linked.data.map((one) => one.invoice)).toEqual([invoice.id]);
    expect(await shop.stripe.checkout.sessions.retrieve(sessionId)).toMatchObject({
      status: 'complete',
      payment_status: 'paid',
      mode: 'subscription',
      subscription: subscriptionId,
      invoice: invoice.id,
      payment_intent: null,
    });
  });

  it('wait for another card when the first is declined, and then need no second subscription', async () => {
    const session = await shop.openPledge();
    await shop.control(`/sessions/${session.id}/pay`, { card: '4000000000000002' });
    const incomplete = (await shop.stripe.subscriptions.list({ status: 'incomplete' })).data;
    expect(incomplete).toHaveLength(1);
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).subscription).toBeNull();
    await shop.control(`/sessions/${session.id}/pay`);
    const all = (await shop.stripe.subscriptions.list({ status: 'all' })).data;
    expect(all.map(({ id, status }) => [id, status])).toEqual([[incomplete[0]?.id, 'active']]);
  });

  it('expire with their page where nobody paid, and void what was asked', async () => {
    const session = await shop.openPledge();
    await shop.control(`/sessions/${session.id}/pay`, { outcome: 'refuse-second-step' });
    await shop.stripe.checkout.sessions.expire(session.id);
    const [subscription] = (await shop.stripe.subscriptions.list({ status: 'all' })).data;
    expect(await full(String(subscription?.id))).toMatchObject({
      status: 'incomplete_expired',
      latest_invoice: { status: 'void', payments: { data: [{ status: 'canceled' }] } },
    });
    expect((await shop.arrived()).slice(-4)).toEqual([
      'customer.subscription.updated',
      'payment_intent.canceled',
      'invoice.voided',
      'checkout.session.expired',
    ]);
  });

  it('make a customer of a visitor whom the shop named by e-mail alone', async () => {
    const session = await shop.openPledge(500, { customer_email: 'bo@example.test' });
    await shop.control(`/sessions/${session.id}/pay`, { name: 'Bo' });
    const [subscription] = (await shop.stripe.subscriptions.list({ expand: ['data.customer'] })).data;
    expect(subscription?.customer).toMatchObject({ email: 'bo@example.test', name: 'Bo' });
  });

  it('change their price from the next period on, once for one key', async () => {
    const { subscriptionId } = await shop.runningPledge();
    const [item] = (await shop.stripe.subscriptions.retrieve(subscriptionId)).items.data;
    const change: Stripe.SubscriptionUpdateParams = {
      items: [
        {
          id: item?.id,
          price_data: {
            currency: 'eur',
            unit_amount: 900,
            recurring: { interval: 'month' },
            product: String(item?.price.product),
          },
        },
      ],
      proration_behavior: 'none',
    };
    await shop.arrived();
    for (let time = 0; time < 2; time += 1)
      await shop.stripe.subscriptions.update(subscriptionId, change, { idempotencyKey: 'more' });
    expect(await shop.arrived()).toEqual(['customer.subscription.updated']);
    expect((await shop.stripe.invoices.list({ subscription: subscriptionId })).data).toHaveLength(1);
    await shop.control('/clock', { advanceSeconds: 32 * 86_400 });
    const invoices = (await shop.stripe.invoices.list({ subscription: subscriptionId })).data;
    expect(invoices.map(({ amount_paid: paid }) => paid)).toEqual([900, 500]);
    const billed = await errorOf(
      shop.stripe.subscriptions.update(subscriptionId, { items: [{ id: item?.id, quantity: 2 }] }),
    );
    expect(billed.param).toBe('proration_behavior');
  });

  it('end with their period, unless that is taken back before', async () => {
    const { subscriptionId } = await shop.runningPledge();
    const ending = await shop.stripe.subscriptions.update(subscriptionId, { cancel_at_period_end: true });
    const end = ending.items.data[0]?.current_period_end;
    expect(ending).toMatchObject({
      status: 'active',
      cancel_at: end,
      cancellation_details: { reason: 'cancellation_requested' },
    });
    const kept = await shop.stripe.subscriptions.update(subscriptionId, { cancel_at_period_end: false });
    expect(kept).toMatchObject({ cancel_at: null, canceled_at: null, cancel_at_period_end: false });
    await shop.stripe.subscriptions.update(subscriptionId, { cancel_at_period_end: true });
    await shop.arrived();
    await shop.control('/clock', { advanceSeconds: 32 * 86_400 });
    expect(await full(subscriptionId)).toMatchObject({ status: 'canceled', ended_at: end });
    expect(await shop.arrived()).toEqual(['customer.subscription.deleted']);
    await shop.control('/clock', { advanceSeconds: 32 * 86_400 });
    expect((await shop.stripe.invoices.list({ subscription: subscriptionId })).data).toHaveLength(1);
  });

  it('end at once by the API or by hand, and are then no longer there to be ended', async () => {
    const one = await shop.runningPledge();
    const ended = await shop.stripe.subscriptions.cancel(one.subscriptionId, {
      cancellation_details: { comment: 'Moved house' },
    });
    expect(ended).toMatchObject({
      status: 'canceled',
      cancellation_details: { comment: 'Moved house', reason: 'cancellation_requested' },
    });
    const again = await errorOf(shop.stripe.subscriptions.cancel(one.subscriptionId));
    expect(again).toMatchObject({ statusCode: 404, code: 'resource_missing' });
    const change = await errorOf(shop.stripe.subscriptions.update(one.subscriptionId, { description: 'x' }));
    expect(change.message).toContain('A canceled subscription');
    const other = await shop.runningPledge();
    await shop.control(`/subscriptions/${other.subscriptionId}/cancel`);
    expect((await shop.stripe.subscriptions.list()).data).toEqual([]);
    expect((await shop.stripe.subscriptions.list({ status: 'ended' })).data).toHaveLength(2);
  });

  it('collect nothing while paused, by each of the three ways, and go on after', async () => {
    const statuses: Record<string, unknown> = {};
    for (const behavior of ['void', 'keep_as_draft', 'mark_uncollectible'] as const) {
      const { subscriptionId } = await shop.runningPledge();
      const paused = await shop.stripe.subscriptions.update(subscriptionId, {
        pause_collection: { behavior },
      });
      expect(paused).toMatchObject({ status: 'active', pause_collection: { behavior, resumes_at: null } });
      statuses[behavior] = subscriptionId;
    }
    await shop.control('/clock', { advanceSeconds: 32 * 86_400 });
    for (const [behavior, id] of Object.entries(statuses)) {
      const { latest_invoice: invoice } = await full(String(id));
      statuses[behavior] = (invoice as Stripe.Invoice).status;
      const resumed = await shop.stripe.subscriptions.update(String(id), { pause_collection: '' });
      expect(resumed.pause_collection).toBeNull();
    }
    expect(statuses).toEqual({ void: 'void', keep_as_draft: 'draft', mark_uncollectible: 'uncollectible' });
    await shop.control('/clock', { advanceSeconds: 31 * 86_400 });
    const latest = (await shop.stripe.subscriptions.list({ expand: ['data.latest_invoice'] })).data;
    expect(latest.map(({ latest_invoice: invoice }) => (invoice as Stripe.Invoice).status)).toEqual([
      'paid',
      'paid',
      'paid',
    ]);
    expect((await shop.stripe.charges.list()).data).toHaveLength(6);
  });

  it('resume by themselves at a day that was set', async () => {
    const { subscriptionId } = await shop.runningPledge();
    const resumesAt = Math.floor(Date.now() / 1000) + 10 * 86_400;
    await shop.stripe.subscriptions.update(subscriptionId, {
      pause_collection: { behavior: 'void', resumes_at: resumesAt },
    });
    await shop.control('/clock', { advanceSeconds: 11 * 86_400 });
    expect((await full(subscriptionId)).pause_collection).toBeNull();
  });

  it('begin by the API with the card of a customer, or wait for one', async () => {
    const { customerId } = await shop.runningPledge();
    const price = await shop.stripe.prices.create({
      currency: 'eur',
      unit_amount: 700,
      recurring: { interval: 'week' },
      product_data: { name: 'Weekly reed' },
    });
    const order = { customer: customerId, items: [{ price: price.id }] };
    const bare = await errorOf(shop.stripe.subscriptions.create(order));
    expect(bare.code).toBe('resource_missing');
    const waiting = await shop.stripe.subscriptions.create({
      ...order,
      payment_behavior: 'default_incomplete',
    });
    expect(waiting.status).toBe('incomplete');
    const [card] = (await shop.stripe.customers.listPaymentMethods(customerId)).data;
    await shop.stripe.customers.update(customerId, {
      invoice_settings: { default_payment_method: card?.id ?? '' },
    });
    const running = await shop.stripe.subscriptions.create(order);
    const item = running.items.data[0];
    expect(running.status).toBe('active');
    expect(Number(item?.current_period_end) - Number(item?.current_period_start)).toBe(7 * 86_400);
    await shop.control('/clock', { advanceSeconds: 24 * 3600 });
    expect((await full(waiting.id)).status).toBe('incomplete_expired');
  });

  it('may begin their months on a later day, and take nothing before it', async () => {
    const { customerId } = await shop.runningPledge();
    const [card] = (await shop.stripe.customers.listPaymentMethods(customerId)).data;
    const anchor = Math.floor(Date.now() / 1000) + 10 * 86_400;
    const price = await shop.stripe.prices.create({
      currency: 'eur',
      unit_amount: 700,
      recurring: { interval: 'month' },
      product_data: { name: 'Reed' },
    });
    const begun = await shop.stripe.subscriptions.create({
      customer: customerId,
      items: [{ price: price.id }],
      default_payment_method: card?.id,
      billing_cycle_anchor: anchor,
      proration_behavior: 'none',
    });
    expect(begun).toMatchObject({
      status: 'active',
      latest_invoice: null,
      billing_cycle_anchor: anchor,
      items: { data: [{ current_period_end: anchor }] },
    });
    await shop.control('/clock', { advanceSeconds: 11 * 86_400 });
    expect(await full(begun.id)).toMatchObject({
      latest_invoice: { status: 'paid', amount_paid: 700, lines: { data: [{ period: { start: anchor } }] } },
    });
    const moved = await shop.stripe.subscriptions.update(begun.id, {
      billing_cycle_anchor: { type: 'now' },
      proration_behavior: 'none',
    });
    expect(moved.billing_cycle_anchor).toBeGreaterThan(anchor);
    expect((await full(begun.id)).latest_invoice).toMatchObject({
      status: 'paid',
      billing_reason: 'subscription_update',
    });
  });
});
