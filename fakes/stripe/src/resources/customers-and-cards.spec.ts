import type Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

describe('customers and their cards', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const customer = (more: Stripe.CustomerCreateParams = {}) =>
    shop.stripe.customers.create({ email: 'ada@example.test', name: 'Ada', ...more });
  const openSetup = (id: string, more: Partial<Stripe.Checkout.SessionCreateParams> = {}) =>
    shop.stripe.checkout.sessions.create({
      mode: 'setup',
      currency: 'eur',
      customer: id,
      setup_intent_data: { metadata: { pledge: '1' } },
      success_url: 'http://shop.test/card?session={CHECKOUT_SESSION_ID}',
      cancel_url: 'http://shop.test/pledge',
      ...more,
    });
  const form = { action: 'pay', email: 'ada@example.test', country: 'FR', card: '4242424242424242' };

  it('are found by e-mail, letter by letter, and changed', async () => {
    const { id } = await customer({ metadata: { person: '7' } });
    await customer({ email: 'bo@example.test' });
    expect(
      (await shop.stripe.customers.list({ email: 'ada@example.test' })).data.map((one) => one.id),
    ).toEqual([id]);
    expect((await shop.stripe.customers.list({ email: 'Ada@example.test' })).data).toEqual([]);
    await shop.arrived();
    await shop.stripe.customers.update(id, { email: 'ada@other.test', name: '' });
    await shop.stripe.customers.update(id, { email: 'ada@other.test' });
    expect(await shop.stripe.customers.retrieve(id)).toMatchObject({
      email: 'ada@other.test',
      name: null,
      metadata: { person: '7' },
    });
    // What changes nothing is not told of.
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual(['customer.updated']);
    expect(shop.received[0]?.event.data.previous_attributes).toEqual({
      email: 'ada@example.test',
      name: 'Ada',
    });
  });

  it('are forgotten on request, with their subscriptions', async () => {
    const { customerId, subscriptionId } = await shop.runningPledge();
    await shop.arrived();
    expect(await shop.stripe.customers.del(customerId)).toMatchObject({ id: customerId, deleted: true });
    expect(await shop.arrived()).toEqual(['customer.subscription.deleted', 'customer.deleted']);
    const left = await shop.stripe.subscriptions.retrieve(subscriptionId, { expand: ['customer'] });
    expect(left.customer).toEqual({ id: customerId, object: 'customer', deleted: true });
  });

  it('give a card for later on a page, where nothing is taken', async () => {
    const { id } = await customer();
    const session = await openSetup(id, { client_reference_id: 'pledge-1' });
    expect(session).toMatchObject({
      mode: 'setup',
      amount_total: null,
      payment_status: 'no_payment_required',
      client_reference_id: 'pledge-1',
    });
    const page = await (await fetch(String(session.url))).text();
    expect(page).toContain('Nothing is taken now.');
    expect(page).toContain('Save this card');
    await shop.arrived();
    const asked = await shop.postForm(`/pay/${session.id}`, { ...form, card: '4000002500003155' });
    expect(asked.to).toBe(`/pay/${session.id}/second-step`);
    const question = await (await fetch(`${shop.standIn.url}${asked.to}`)).text();
    expect(question).toContain('do you approve that this card is charged later?');
    const done = await shop.postForm(String(asked.to), { answer: 'approve' });
    expect(done.to).toBe(`http://shop.test/card?session=${session.id}`);
    expect(await shop.arrived()).toEqual([
      'setup_intent.requires_action',
      'payment_method.attached',
      'setup_intent.succeeded',
      'checkout.session.completed',
    ]);
    const complete = await shop.stripe.checkout.sessions.retrieve(session.id, {
      expand: ['setup_intent.payment_method'],
    });
    expect(complete.setup_intent).toMatchObject({
      status: 'succeeded',
      metadata: { pledge: '1' },
      payment_method: { customer: id, card: { last4: '3155' } },
    });
    expect((await shop.stripe.charges.list()).data).toEqual([]);
  });

  it('hear why a card cannot be kept, and may give another', async () => {
    const { id } = await customer();
    const session = await openSetup(id);
    const declined = await shop.postForm(`/pay/${session.id}`, { ...form, card: '4000000000009995' });
    expect(declined.page).toContain('Your card has insufficient funds.');
    const waiting = await shop.stripe.setupIntents.retrieve(String(session.setup_intent));
    expect(waiting).toMatchObject({
      status: 'requires_payment_method',
      last_setup_error: { decline_code: 'insufficient_funds' },
    });
    await shop.postForm(`/pay/${session.id}`, form);
    expect((await shop.stripe.setupIntents.retrieve(String(session.setup_intent))).status).toBe('succeeded');
    const dropped = await openSetup(id);
    await shop.stripe.checkout.sessions.expire(dropped.id);
    const { status } = await shop.stripe.setupIntents.retrieve(String(dropped.setup_intent));
    expect(status).toBe('canceled');
  });

  it('keep a card that can be given but never charged', async () => {
    const { customerId, subscriptionId } = await shop.runningPledge();
    const session = await openSetup(customerId);
    await shop.control(`/sessions/${session.id}/pay`, { card: '4000000000000341' });
    const [card] = (await shop.stripe.customers.listPaymentMethods(customerId)).data;
    expect(card?.card?.last4).toBe('0341');
    await shop.stripe.subscriptions.update(subscriptionId, { default_payment_method: card?.id });
    await shop.control('/clock', { advanceSeconds: 32 * 86_400 });
    expect((await shop.stripe.subscriptions.retrieve(subscriptionId)).status).toBe('past_due');
  });

  it('have a default card, which must be one of theirs', async () => {
    const { customerId } = await shop.runningPledge();
    const other = await shop.runningPledge();
    const [card] = (await shop.stripe.paymentMethods.list({ customer: customerId, type: 'card' })).data;
    const strange = await errorOf(
      shop.stripe.customers.update(other.customerId, {
        invoice_settings: { default_payment_method: card?.id ?? '' },
      }),
    );
    expect(strange.message).toContain('must be attached to the customer');
    const updated = await shop.stripe.customers.update(customerId, {
      invoice_settings: { default_payment_method: card?.id ?? '' },
    });
    expect(updated.invoice_settings.default_payment_method).toBe(card?.id);
    await shop.stripe.paymentMethods.detach(card?.id ?? '');
    expect(await shop.stripe.customers.retrieve(customerId)).toMatchObject({
      invoice_settings: { default_payment_method: null },
    });
    expect((await shop.stripe.customers.listPaymentMethods(customerId)).data).toEqual([]);
  });

  it('keep the card of an order where the shop asks for it', async () => {
    const { id } = await customer();
    const session = await shop.openSession({
      customer: id,
      payment_intent_data: { setup_future_usage: 'off_session' },
    });
    await shop.control(`/sessions/${session.id}/pay`);
    expect((await shop.stripe.customers.listPaymentMethods(id)).data).toHaveLength(1);
    await shop.openSession({ customer: id }).then((one) => shop.control(`/sessions/${one.id}/pay`));
    expect((await shop.stripe.customers.listPaymentMethods(id)).data).toHaveLength(1);
  });

  it('see on the page of a pledge what is taken today and what recurs', async () => {
    const session = await shop.openPledge(1250);
    const page = await (await fetch(String(session.url))).text();
    expect(page).toContain('Pay €12.50 every month');
    expect(page.replace(/\s+/g, ' ')).toContain('€12.50 is taken today, and €12.50 every month from then on');
    const done = await shop.postForm(`/pay/${session.id}`, form);
    expect(done.to).toBe(`http://shop.test/pledged?session=${session.id}`);
    expect(await (await fetch(`${shop.standIn.url}/pay/${session.id}`)).text()).toContain(
      'This subscription has begun',
    );
  });

  it('name a product themselves, once', async () => {
    await shop.stripe.products.create({ id: 'plan_reed', name: 'Reed' });
    const twice = await errorOf(shop.stripe.products.create({ id: 'plan_reed', name: 'Reed' }));
    expect(twice.code).toBe('resource_already_exists');
  });
});
