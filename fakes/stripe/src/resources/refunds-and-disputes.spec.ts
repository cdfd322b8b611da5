import Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

describe('refunds and disputes', () => {
  let shop: Shop;
  let intentId: string;
  beforeEach(async () => {
    shop = await Shop.open();
    ({ intentId } = await shop.paidSession());
    await shop.control('/webhooks/flush');
    shop.received.length = 0;
  });
  afterEach(() => shop.close());

  it('refunds the whole where no amount is given', async () => {
    const refund = await shop.stripe.refunds.create({
      payment_intent: intentId,
      reason: 'requested_by_customer',
      metadata: { line: 'all' },
    });
    expect(refund).toMatchObject({
      object: 'refund',
      amount: 3300,
      status: 'succeeded',
      metadata: { line: 'all' },
    });
    const charge = await shop.stripe.charges.retrieve(String(refund.charge), { expand: ['refunds'] });
    expect(charge).toMatchObject({ refunded: true, amount_refunded: 3300 });
    expect(charge.refunds?.data.map(({ id }) => id)).toEqual([refund.id]);
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual(['refund.created', 'charge.refunded', 'refund.updated']);
    const refunded = shop.received[1]?.event as Stripe.ChargeRefundedEvent;
    expect(refunded.data.previous_attributes).toMatchObject({ amount_refunded: 0 });
    expect(refunded.request?.id).toMatch(/^req_/);
  });

  it('refunds in parts that add up, and not a cent more', async () => {
    await shop.stripe.refunds.create({ payment_intent: intentId, amount: 1000 });
    const tooMuch = await errorOf(shop.stripe.refunds.create({ payment_intent: intentId, amount: 2301 }));
    expect(tooMuch).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(tooMuch.message).toBe(
      'Refund amount (€23.01) is greater than unrefunded amount on charge (€23.00)',
    );
    await shop.stripe.refunds.create({ payment_intent: intentId, amount: 2300 });
    const charge = (await shop.stripe.charges.list({ payment_intent: intentId })).data[0];
    expect(charge).toMatchObject({ amount_refunded: 3300, refunded: true });
    const spent = await errorOf(shop.stripe.refunds.create({ payment_intent: intentId }));
    expect(spent.code).toBe('charge_already_refunded');
    const refunds = await shop.stripe.refunds.list({ payment_intent: intentId });
    expect(refunds.data.map(({ amount }) => amount)).toEqual([2300, 1000]);
  });

  it('refuses to refund what was never paid', async () => {
    const session = await shop.openSession();
    await shop.control(`/sessions/${session.id}/pay`, { outcome: 'decline' });
    const { payment_intent: unpaid } = await shop.stripe.checkout.sessions.retrieve(session.id);
    const error = await errorOf(shop.stripe.refunds.create({ payment_intent: String(unpaid) }));
    expect(error.message).toContain('does not have a successful charge');
  });

  it('opens a dispute over a charge, bars refunds meanwhile, and closes it either way', async () => {
    const dispute = await shop.control<Stripe.Dispute>('/disputes', {
      payment_intent: intentId,
      reason: 'fraudulent',
    });
    expect(await shop.stripe.disputes.retrieve(dispute.id)).toMatchObject({
      amount: 3300,
      status: 'needs_response',
    });
    expect((await shop.stripe.charges.retrieve(String(dispute.charge))).disputed).toBe(true);
    const barred = await errorOf(shop.stripe.refunds.create({ payment_intent: intentId }));
    expect(barred.code).toBe('charge_disputed');
    await shop.control(`/disputes/${dispute.id}/close`, { status: 'won' });
    await shop.control('/webhooks/flush');
    expect(shop.types()).toEqual([
      'charge.dispute.created',
      'charge.dispute.funds_withdrawn',
      'charge.dispute.funds_reinstated',
      'charge.dispute.closed',
    ]);
    const found = await shop.stripe.disputes.list({ payment_intent: intentId });
    expect(found.data.map(({ status }) => status)).toEqual(['won']);
  });

  it('takes closing by the API as giving in', async () => {
    const dispute = await shop.control<Stripe.Dispute>('/disputes', {
      payment_intent: intentId,
      reason: 'general',
    });
    expect((await shop.stripe.disputes.close(dispute.id)).status).toBe('lost');
    const error = await errorOf(shop.stripe.disputes.close(dispute.id));
    expect(error.message).toContain('already closed');
  });
});
