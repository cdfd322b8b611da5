import Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

describe('idempotency keys', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  it('gives the first answer again for the same key and parameters, and says so', async () => {
    const first = await shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1' });
    const second = await shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1' });
    expect(second.id).toBe(first.id);
    expect(first.lastResponse.headers['idempotent-replayed']).toBeUndefined();
    expect(second.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(second.lastResponse.headers['original-request']).toBe(first.lastResponse.requestId);
    expect((await shop.stripe.customers.list()).data).toHaveLength(1);
  });

  it('gives the answer as it was, though the object has changed since', async () => {
    const params = { email: 'a@example.test' };
    const { id } = await shop.stripe.customers.create(params, { idempotencyKey: 'k1' });
    await shop.stripe.customers.update(id, { email: 'b@example.test' });
    const again = await shop.stripe.customers.create(params, { idempotencyKey: 'k1' });
    expect(again.email).toBe('a@example.test');
  });

  it('refuses a key that was used with other parameters', async () => {
    await shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1' });
    const error = await errorOf(
      shop.stripe.customers.create({ email: 'b@example.test' }, { idempotencyKey: 'k1' }),
    );
    expect(error).toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
    expect(error.statusCode).toBe(400);
  });

  it('answers 409 while the first call with the key is under way, and the SDK tries again by itself', async () => {
    await shop.control('/api', { latencyMs: 300 });
    const create = (maxNetworkRetries: number) =>
      shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1', maxNetworkRetries });
    const first = create(0);
    await new Promise((resolve) => setTimeout(resolve, 50));
    const patient = create(3);
    const error = await errorOf(create(0));
    expect(error.statusCode).toBe(409);
    expect(error.code).toBe('idempotency_key_in_use');
    expect((await patient).id).toBe((await first).id);
  });

  it('frees the key where the parameters were at fault', async () => {
    await errorOf(
      shop.stripe.paymentIntents.create({ amount: 0, currency: 'eur' }, { idempotencyKey: 'k1' }),
    );
    const intent = await shop.stripe.paymentIntents.create(
      { amount: 100, currency: 'eur' },
      { idempotencyKey: 'k1' },
    );
    expect(intent.amount).toBe(100);
  });

  it('keeps a refusal that came from the state of an object', async () => {
    const { intentId } = await shop.paidSession();
    const tooMuch = () =>
      shop.stripe.refunds.create({ payment_intent: intentId, amount: 9999 }, { idempotencyKey: 'k1' });
    const first = await errorOf(tooMuch());
    const second = await errorOf(tooMuch());
    expect(second.message).toBe(first.message);
    expect(second.headers?.['idempotent-replayed']).toBe('true');
  });

  it('forgets a key after a day', async () => {
    const first = await shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1' });
    await shop.control('/clock', { advanceSeconds: 25 * 3600 });
    const second = await shop.stripe.customers.create({ email: 'a@example.test' }, { idempotencyKey: 'k1' });
    expect(second.id).not.toBe(first.id);
  });
});
