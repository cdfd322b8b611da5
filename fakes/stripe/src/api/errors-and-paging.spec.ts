import Stripe from 'stripe';
import { clientOf, errorOf, Shop } from '../testing/shop.js';

describe('the API as the SDK sees it', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  it('refuses a wrong key without repeating it', async () => {
    const error = await errorOf(clientOf(shop.standIn, 'sk_test_somebody_elses_key').customers.list());
    expect(error).toBeInstanceOf(Stripe.errors.StripeAuthenticationError);
    expect(error.message).not.toContain('somebody_elses');
  });

  it('says what it does not have', async () => {
    const error = await errorOf(shop.stripe.checkout.sessions.retrieve('cs_test_nothing'));
    expect(error).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(error).toMatchObject({
      statusCode: 404,
      code: 'resource_missing',
      message: "No such checkout.session: 'cs_test_nothing'",
    });
    expect(error.requestId).toMatch(/^req_/);
  });

  it('answers an address that it does not know as the service does', async () => {
    const error = await errorOf(shop.stripe.coupons.list());
    expect(error).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(error.statusCode).toBe(404);
    expect(error.message).toContain('Unrecognized request URL (GET: /v1/coupons)');
  });

  it('refuses to expand what is no reference', async () => {
    const session = await shop.openSession();
    const error = await errorOf(
      shop.stripe.checkout.sessions.retrieve(session.id, { expand: ['amount_total'] }),
    );
    expect(error.message).toBe('This property cannot be expanded (amount_total).');
  });

  it('expands four steps deep and no further, as the service does', async () => {
    const path = 'data.payment_intent.latest_charge.balance_transaction.source';
    const error = await errorOf(shop.stripe.checkout.sessions.list({ expand: [path] }));
    expect(error.message).toContain('You cannot expand more than 4 levels');
  });

  it('expands along lists', async () => {
    await shop.paidSession();
    const sessions = await shop.stripe.checkout.sessions.list({
      expand: ['data.payment_intent.latest_charge'],
    });
    const intent = sessions.data[0]?.payment_intent as Stripe.PaymentIntent;
    expect((intent.latest_charge as Stripe.Charge).object).toBe('charge');
  });

  it('turns pages of customers, newest first, until none is left', async () => {
    for (let index = 0; index < 7; index += 1) await shop.stripe.customers.create({ name: `Buyer ${index}` });
    const first = await shop.stripe.customers.list({ limit: 3 });
    expect(first.has_more).toBe(true);
    expect(first.data.map(({ name }) => name)).toEqual(['Buyer 6', 'Buyer 5', 'Buyer 4']);
    const back = await shop.stripe.customers.list({ limit: 3, ending_before: first.data[2]?.id ?? '' });
    expect(back.data.map(({ name }) => name)).toEqual(['Buyer 6', 'Buyer 5']);
    const all: (string | null | undefined)[] = [];
    for await (const customer of shop.stripe.customers.list({ limit: 3 })) all.push(customer.name);
    expect(all).toHaveLength(7);
    const last = await shop.stripe.customers.list({ limit: 7 });
    expect(last.has_more).toBe(false);
  });

  it('turns pages of events of the types asked for', async () => {
    for (let index = 0; index < 5; index += 1) await shop.paidSession();
    const wanted = { types: ['checkout.session.completed', 'charge.succeeded'], limit: 4 };
    const seen: string[] = [];
    for await (const event of shop.stripe.events.list(wanted)) seen.push(event.type);
    expect(seen).toHaveLength(10);
    expect(new Set(seen)).toEqual(new Set(wanted.types));
    const some = await shop.stripe.events.list({ type: 'payment_intent.*' });
    expect(some.data.map(({ type }) => type)).toContain('payment_intent.succeeded');
    expect((await shop.stripe.events.retrieve(some.data[0]?.id ?? '')).id).toBe(some.data[0]?.id);
  });

  it('filters by time', async () => {
    await shop.stripe.customers.create({ name: 'Early' });
    await shop.control('/clock', { advanceSeconds: 3600 });
    const late = await shop.stripe.customers.create({ name: 'Late' });
    const found = await shop.stripe.customers.list({ created: { gte: late.created } });
    expect(found.data.map(({ name }) => name)).toEqual(['Late']);
    const exact = await shop.stripe.customers.list({ created: late.created });
    expect(exact.data).toHaveLength(1);
  });

  it('cancels a payment intent of its own, but not one of a checkout session', async () => {
    const own = await shop.stripe.paymentIntents.create({ amount: 500, currency: 'eur' });
    const ended = await shop.stripe.paymentIntents.cancel(own.id, { cancellation_reason: 'abandoned' });
    expect(ended).toMatchObject({ status: 'canceled', cancellation_reason: 'abandoned' });
    const session = await shop.openSession();
    await shop.control(`/sessions/${session.id}/pay`, { outcome: 'decline' });
    const { payment_intent: intentId } = await shop.stripe.checkout.sessions.retrieve(session.id);
    const error = await errorOf(shop.stripe.paymentIntents.cancel(String(intentId)));
    expect(error.message).toContain('Expire the Checkout Session instead');
  });
});
