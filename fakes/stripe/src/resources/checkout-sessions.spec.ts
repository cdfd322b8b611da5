import Stripe from 'stripe';
import { errorOf, lineItem, Shop } from '../testing/shop.js';

describe('checkout sessions', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  it('opens a session with its total, its address and no payment intent yet', async () => {
    const session = await shop.openSession({ customer_email: 'ada@example.test' });
    expect(session).toMatchObject({
      object: 'checkout.session',
      status: 'open',
      payment_status: 'unpaid',
      amount_total: 3300,
      currency: 'eur',
      client_reference_id: 'order-17',
      metadata: { order: '17' },
      payment_intent: null,
      customer_email: 'ada@example.test',
      url: `${shop.standIn.url}/pay/${session.id}`,
    });
    expect(session.id).toMatch(/^cs_test_\w+$/);
    expect(session.expires_at - session.created).toBe(24 * 3600);
  });

  it('lists the lines in the order in which the shop gave them', async () => {
    const session = await shop.openSession();
    const lines = await shop.stripe.checkout.sessions.listLineItems(session.id);
    expect(lines.data.map((line) => [line.description, line.quantity, line.amount_total])).toEqual([
      ['Reed pipes, Mk 2.3', 1, 2400],
      ['Toy ocarina, Mk 1.0', 2, 900],
    ]);
    const expanded = await shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['line_items'] });
    expect(expanded.line_items?.data).toEqual(lines.data);
  });

  it('takes more than twenty lines, the limit of a careless form reader', async () => {
    const lines = Array.from({ length: 30 }, (_, index) => lineItem(`Part ${index}`, 100));
    const session = await shop.openSession({ line_items: lines });
    expect(session.amount_total).toBe(3000);
  });

  it('uses a price that was created before', async () => {
    const product = await shop.stripe.products.create({
      name: 'Thumb piano',
      metadata: { kit: 'thumb-piano' },
    });
    const price = await shop.stripe.prices.create({
      product: product.id,
      unit_amount: 1900,
      currency: 'EUR',
    });
    expect((await shop.stripe.prices.retrieve(price.id)).currency).toBe('eur');
    const session = await shop.openSession({ line_items: [{ price: price.id, quantity: 3 }] });
    expect(session.amount_total).toBe(5700);
    const lines = await shop.stripe.checkout.sessions.listLineItems(session.id);
    expect(lines.data[0]?.description).toBe('Thumb piano');
  });

  it('completes a paid session with buyer, payment intent and charge, expandable in one call', async () => {
    const { session } = await shop.paidSession();
    const full = await shop.stripe.checkout.sessions.retrieve(session.id, {
      expand: ['payment_intent.latest_charge'],
    });
    const intent = full.payment_intent as Stripe.PaymentIntent;
    const charge = intent.latest_charge as Stripe.Charge;
    expect(full).toMatchObject({ status: 'complete', payment_status: 'paid', url: null });
    expect(full.customer_details).toMatchObject({ email: 'ada@example.test', address: { country: 'DE' } });
    expect(intent).toMatchObject({ status: 'succeeded', amount_received: 3300, metadata: { order: '17' } });
    expect(charge).toMatchObject({ paid: true, captured: true, amount: 3300, payment_intent: intent.id });
    expect(charge.payment_method_details?.card).toMatchObject({
      brand: 'visa',
      last4: '4242',
      country: 'US',
    });
    const stored = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect(stored.payment_intent).toBe(intent.id);
  });

  it('finds the session of a payment intent', async () => {
    const { session, intentId } = await shop.paidSession();
    await shop.paidSession();
    const found = await shop.stripe.checkout.sessions.list({ payment_intent: intentId });
    expect(found.data.map(({ id }) => id)).toEqual([session.id]);
  });

  it('asks for no card and makes no payment intent where the total is zero', async () => {
    const session = await shop.openSession({ line_items: [lineItem('Free whistle', 0)] });
    expect(session.payment_status).toBe('no_payment_required');
    const answer = await shop.postForm(`/pay/${session.id}`, {
      action: 'pay',
      email: 'a@example.test',
      country: 'AT',
    });
    expect(answer).toMatchObject({ status: 303, to: `http://shop.test/thanks?session=${session.id}` });
    const done = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect(done).toMatchObject({
      status: 'complete',
      payment_status: 'no_payment_required',
      payment_intent: null,
    });
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual(['checkout.session.completed']);
  });

  it('makes a customer where the shop asks for one always', async () => {
    const { session } = await shop.paidSession({ customer_creation: 'always' });
    const customer = await shop.stripe.customers.retrieve(String(session.customer));
    expect(customer).toMatchObject({ object: 'customer', email: 'ada@example.test' });
  });

  it('ends a session on request, and then no longer takes money for it', async () => {
    const session = await shop.openSession();
    const ended = await shop.stripe.checkout.sessions.expire(session.id);
    expect(ended).toMatchObject({ status: 'expired', url: null, payment_status: 'unpaid' });
    await expect(shop.control(`/sessions/${session.id}/pay`)).rejects.toThrow('status of open');
    const error = await errorOf(shop.stripe.checkout.sessions.expire(session.id));
    expect(error.message).toContain('has a status of expired');
    const page = await fetch(`${shop.standIn.url}/pay/${session.id}`);
    expect(page.status).toBe(410);
    expect(await page.text()).toContain('The time to pay on this page is over');
  });

  it('ends a session by the virtual clock, cancels its open payment intent and tells the shop', async () => {
    const session = await shop.openSession({ expires_at: Math.floor(Date.now() / 1000) + 1800 });
    await shop.control(`/sessions/${session.id}/pay`, { outcome: 'decline' });
    await shop.control('/clock', { advanceSeconds: 1799 - 60 });
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
    await shop.control('/clock', { advanceSeconds: 61 });
    const ended = await shop.stripe.checkout.sessions.retrieve(session.id);
    expect(ended.status).toBe('expired');
    expect((await shop.stripe.paymentIntents.retrieve(String(ended.payment_intent))).status).toBe('canceled');
    await shop.control('/webhooks/flush');
    expect(shop.types()).toContain('checkout.session.expired');
  });

  it('takes the word of a shop whose clock was not moved along, and gives it the time it asked for', async () => {
    await shop.control('/clock', { advanceSeconds: 90 * 86_400 });
    const expiresAt = Math.floor(Date.now() / 1000) + 1800;
    const session = await shop.openSession({ expires_at: expiresAt });
    expect(session.expires_at).toBe(expiresAt);
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
    await shop.control('/clock', { advanceSeconds: 1801 });
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).status).toBe('expired');
  });

  it('keeps a completed session complete when its time runs out', async () => {
    const { session } = await shop.paidSession();
    await shop.control('/clock', { advanceSeconds: 48 * 3600 });
    expect((await shop.stripe.checkout.sessions.retrieve(session.id)).status).toBe('complete');
  });

  it.each([
    ['less than half an hour', { expires_at: Math.floor(Date.now() / 1000) + 600 }, 'expires_at'],
    ['more than a day', { expires_at: Math.floor(Date.now() / 1000) + 90_000 }, 'expires_at'],
    ['no lines', { line_items: [] }, 'line_items'],
    ['two currencies', { currency: 'usd' }, 'line_items'],
    ['a total below the smallest charge', { line_items: [lineItem('Washer', 49)] }, 'line_items'],
    ['an address that is no URL', { success_url: 'thanks' }, 'success_url'],
    ['an unknown customer', { customer: 'cus_nobody' }, 'customer'],
    [
      'a parameter that it does not offer',
      { consent_collection: { promotions: 'auto' as const } },
      'consent_collection',
    ],
    ['a mode that it does not offer', { mode: 'loan' as 'payment' }, 'mode'],
    ['what belongs to another mode', { subscription_data: { description: 'Reed' } }, 'subscription_data'],
    [
      'a subscription without a recurring price',
      { mode: 'subscription' as const, payment_intent_data: undefined },
      'line_items',
    ],
    [
      'a broken price',
      { line_items: [lineItem('Half a cent', 0.5)] },
      'line_items[0][price_data][unit_amount]',
    ],
  ])('refuses %s and names the parameter', async (_case, params, param) => {
    const error = await errorOf(shop.openSession(params));
    expect(error).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(error.param).toBe(param);
  });

  it('lets a test have shorter sessions', async () => {
    const quick = await Shop.open({ minimumSessionSeconds: 1 });
    const session = await quick.openSession({ expires_at: Math.floor(Date.now() / 1000) + 5 });
    expect(session.status).toBe('open');
    await quick.close();
  });
});
