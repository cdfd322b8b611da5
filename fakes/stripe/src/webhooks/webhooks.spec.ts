import type Stripe from 'stripe';
import { Shop } from '../testing/shop.js';
import type { DeliveryAttempt } from '../state/records.js';
import { signatureHeader } from './signature.js';

const paidTypes = [
  'payment_intent.created',
  'charge.succeeded',
  'payment_intent.succeeded',
  'checkout.session.completed',
];

describe('webhooks', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const until = async (isReached: () => boolean) => {
    while (!isReached()) await new Promise((resolve) => setTimeout(resolve, 10));
  };

  it('arrive signed, in order, with the object as it was', async () => {
    const { session } = await shop.paidSession();
    await until(() => shop.received.length >= 4);
    expect(shop.types()).toEqual(paidTypes);
    const event = shop.received[3]?.event as Stripe.CheckoutSessionCompletedEvent;
    expect(event).toMatchObject({
      object: 'event',
      api_version: '2026-10-28.endive',
      livemode: false,
      pending_webhooks: 1,
    });
    expect(event.id).toMatch(/^evt_/);
    expect(event.request).toEqual({ id: null, idempotency_key: null });
    expect(event.data.object).toMatchObject({
      id: session.id,
      payment_status: 'paid',
      payment_intent: session.payment_intent,
    });
    await until(() => shop.received.length === 4);
    await shop.control('/webhooks/flush');
    expect((await shop.stripe.events.retrieve(event.id)).pending_webhooks).toBe(0);
  });

  it('name the call and the key that caused them', async () => {
    await shop.stripe.customers.create({ name: 'Ada' }, { idempotencyKey: 'make-ada' });
    await shop.control('/webhooks/flush');
    expect(shop.received[0]?.event).toMatchObject({
      type: 'customer.created',
      request: { idempotency_key: 'make-ada' },
    });
  });

  it('carry a signature that the SDK refuses for another secret, another body or a stale time', () => {
    const now = Math.floor(Date.now() / 1000);
    const body = '{"id": "evt_1", "object": "event"}';
    const check = (text: string, time: number, secret: string) => () =>
      shop.stripe.webhooks.constructEvent(text, signatureHeader(body, 'whsec_a', time), secret);
    expect(check(body, now, 'whsec_a')()).toMatchObject({ id: 'evt_1' });
    expect(check(body, now, 'whsec_b')).toThrow('No signatures found');
    expect(check(`${body} `, now, 'whsec_a')).toThrow('No signatures found');
    expect(check(body, now - 301, 'whsec_a')).toThrow('outside the tolerance');
    expect(signatureHeader(body, 'whsec_a', now)).toBe(
      shop.stripe.webhooks.generateTestHeaderString({ payload: body, secret: 'whsec_a', timestamp: now }),
    );
  });

  it('come again with longer and longer waits until they are taken', async () => {
    shop.statuses.push(500, 302, 400);
    await shop.stripe.customers.create({ name: 'Ada' });
    await until(() => shop.received.length === 4);
    expect(shop.received.map(({ status }) => status)).toEqual([500, 302, 400, 200]);
    expect(new Set(shop.received.map(({ event }) => event.id)).size).toBe(1);
    await shop.control('/webhooks/flush');
    const { attempts } = await shop.peek<{ attempts: DeliveryAttempt[] }>('/deliveries');
    expect(attempts.map(({ attempt, outcome }) => [attempt, outcome])).toEqual([
      [1, 'failed'],
      [2, 'failed'],
      [3, 'failed'],
      [4, 'delivered'],
    ]);
  });

  it('wait for the next step of the schedule, which the virtual clock can bring on', async () => {
    const slow = await Shop.open({ webhookTimeScale: 1, webhookRetrySeconds: [3600] });
    slow.statuses.push(503);
    await slow.stripe.customers.create({ name: 'Ada' });
    await until(() => slow.received.length === 1);
    expect(slow.types()).toEqual([]);
    await slow.control('/clock', { advanceSeconds: 3601 });
    await until(() => slow.received.length === 2);
    expect(slow.types()).toEqual(['customer.created']);
    await slow.close();
  });

  it('are given up after the last step', async () => {
    const short = await Shop.open({ webhookRetrySeconds: [1] });
    short.statuses.push(500, 500);
    await short.stripe.customers.create({ name: 'Ada' });
    await until(() => short.received.length === 2);
    expect(await short.control('/webhooks/flush')).toEqual({ attempted: 0, delivered: 0, stillWaiting: 0 });
    const missed = await short.stripe.events.list({ delivery_success: false });
    expect(missed.data.map(({ type }) => type)).toEqual(['customer.created']);
    await short.close();
  });

  it('come several times at once on request', async () => {
    await shop.control('/webhooks', { duplicates: 2 });
    await shop.stripe.customers.create({ name: 'Ada' });
    await until(() => shop.received.length === 3);
    expect(new Set(shop.received.map(({ event }) => event.id)).size).toBe(1);
  });

  it('come side by side in another order on request', async () => {
    await shop.control('/webhooks', { shuffle: true, paused: true, seed: 5 });
    await shop.paidSession();
    await shop.paidSession();
    await shop.control('/webhooks/flush');
    const types = shop.types();
    expect([...types].sort()).toEqual([...paidTypes, ...paidTypes].sort());
    expect(types).not.toEqual([...paidTypes, ...paidTypes]);
  });

  it('meet the same losses for the same seed', async () => {
    const arrivals = async (seed: number) => {
      await shop.control('/webhooks', { lose: 0.5, paused: true, seed });
      shop.received.length = 0;
      for (let index = 0; index < 5; index += 1) await shop.paidSession();
      await shop.control('/webhooks/flush');
      return shop.types();
    };
    const first = await arrivals(11);
    expect(first.length).toBeGreaterThan(0);
    expect(first.length).toBeLessThan(20);
    expect(await arrivals(11)).toEqual(first);
    expect(await arrivals(12)).not.toEqual(first);
  });

  it('are lost by type or by rate on request, and can be found by reconciliation', async () => {
    await shop.control('/webhooks', { lose: ['checkout.session.completed'] });
    await shop.paidSession();
    await shop.control('/webhooks/flush');
    expect(shop.types()).not.toContain('checkout.session.completed');
    const missed = await shop.stripe.events.list({ delivery_success: false });
    expect(missed.data.map(({ type }) => type)).toEqual(['checkout.session.completed']);
    await shop.control('/webhooks', { lose: 1 });
    shop.received.length = 0;
    await shop.paidSession();
    await shop.control('/webhooks/flush');
    expect(shop.received).toEqual([]);
    await shop.control('/webhooks', { reset: true });
    await shop.control(`/events/${missed.data[0]?.id}/redeliver`, { times: 3 });
    await until(() => shop.received.length === 3);
    expect(shop.types()).toEqual(Array(3).fill('checkout.session.completed'));
  });

  it('are held while paused and late while delayed', async () => {
    await shop.control('/webhooks', { paused: true });
    await shop.stripe.customers.create({ name: 'Ada' });
    expect((await shop.peek<{ waiting: unknown[] }>('/deliveries')).waiting).toHaveLength(1);
    await shop.control('/webhooks', { paused: false, delayMs: 3_600_000 });
    await until(() => shop.received.length === 1);
    await shop.stripe.customers.create({ name: 'Bob' });
    expect((await shop.peek<{ waiting: unknown[] }>('/deliveries')).waiting).toHaveLength(1);
    await shop.control('/clock', { advanceSeconds: 3600 });
    await until(() => shop.received.length === 2);
  });

  it.each([
    [{ lose: 2 }, 'lose must be a rate'],
    [{ duplicates: -1 }, 'duplicates must be 0 or more'],
    [{ shufle: true }, 'unknown parameter: shufle'],
  ])('refuse a switch that makes no sense: %j', async (switches, sentence) => {
    await expect(shop.control('/webhooks', switches)).rejects.toThrow(sentence);
  });
});
