import type Stripe from 'stripe';
import { Shop } from '../testing/shop.js';

describe('what becomes of a refund', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const paid = async (card?: string) => {
    const session = await shop.openSession();
    await shop.control(`/sessions/${session.id}/pay`, card ? { card } : {});
    const { payment_intent: intent } = await shop.stripe.checkout.sessions.retrieve(session.id);
    await shop.control('/webhooks/flush');
    shop.received.length = 0;
    return String(intent);
  };
  const arrived = async () => {
    await shop.control('/webhooks/flush');
    return shop.types();
  };

  it('waits while refunds are held, and goes through when the bank says so', async () => {
    const intentId = await paid();
    await shop.control('/refunds/hold', { held: true });
    const refund = await shop.stripe.refunds.create({ payment_intent: intentId, amount: 1000 });
    expect(refund).toMatchObject({ status: 'pending', pending_reason: 'processing' });
    expect(await arrived()).toEqual(['refund.created', 'charge.refunded']);
    await shop.control(`/refunds/${refund.id}/settle`, { status: 'succeeded' });
    const after = await shop.stripe.refunds.retrieve(refund.id);
    expect(after.status).toBe('succeeded');
    expect(after).not.toHaveProperty('pending_reason');
    expect(await arrived()).toEqual(['refund.created', 'charge.refunded', 'refund.updated']);
    const update = shop.received.at(-1)?.event as Stripe.RefundUpdatedEvent;
    expect(update.data.previous_attributes).toMatchObject({ status: 'pending' });
  });

  it('fails with a reason, puts the money back and can then be tried again', async () => {
    const intentId = await paid();
    const refund = await shop.stripe.refunds.create({ payment_intent: intentId });
    await shop.control(`/refunds/${refund.id}/settle`, {
      status: 'failed',
      failure_reason: 'expired_or_canceled_card',
    });
    const failed = await shop.stripe.refunds.retrieve(refund.id, {
      expand: ['charge', 'failure_balance_transaction'],
    });
    expect(failed).toMatchObject({
      status: 'failed',
      failure_reason: 'expired_or_canceled_card',
      charge: { amount_refunded: 0, refunded: false },
      failure_balance_transaction: { amount: 3300, type: 'refund_failure' },
    });
    expect(await arrived()).toEqual([
      'refund.created', 'charge.refunded', 'refund.updated',
      'charge.updated', 'refund.updated', 'charge.refund.updated', 'refund.failed',
    ]); // prettier-ignore
    await shop.stripe.refunds.create({ payment_intent: intentId });
    const settling = shop.control(`/refunds/${refund.id}/settle`, { status: 'succeeded' });
    await expect(settling).rejects.toThrow('A refund that is failed cannot become succeeded.');
  });

  it('comes by itself with the cards for it, a minute later', async () => {
    const late = await shop.stripe.refunds.create({ payment_intent: await paid('4000000000007726') });
    const bounced = await shop.stripe.refunds.create({ payment_intent: await paid('4000000000005126') });
    expect([late.status, bounced.status]).toEqual(['pending', 'succeeded']);
    await shop.control('/clock', { advanceSeconds: 61 });
    expect((await shop.stripe.refunds.retrieve(late.id)).status).toBe('succeeded');
    expect((await shop.stripe.refunds.retrieve(bounced.id)).status).toBe('failed');
    expect(await arrived()).toContain('refund.failed');
    const failure = shop.received.find(({ event }) => event.type === 'refund.failed');
    expect(failure?.event.created).toBe(bounced.created + 60);
  });

  it('is heard of by events alone where it was made by hand at the service', async () => {
    const intentId = await paid();
    const refund = await shop.control<Stripe.Refund>('/refunds', { payment_intent: intentId, amount: 800 });
    expect(await arrived()).toEqual(['refund.created', 'charge.refunded', 'refund.updated']);
    const created = shop.received[0]?.event as Stripe.RefundCreatedEvent;
    expect(created).toMatchObject({
      request: { id: null },
      data: { object: { id: refund.id, metadata: {} } },
    });
    const found = await shop.stripe.refunds.list({ payment_intent: intentId });
    expect(found.data.map(({ amount, reason }) => [amount, reason])).toEqual([
      [800, 'requested_by_customer'],
    ]);
    const tooMuch = shop.control('/refunds', { payment_intent: intentId, amount: 2501 });
    await expect(tooMuch).rejects.toThrow('greater than unrefunded amount on charge (€25.00)');
  });
});
