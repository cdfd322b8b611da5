import type Stripe from 'stripe';
import { Shop } from '../testing/shop.js';

describe('the balance', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  it('moves with payments less a fee, refunds, refunds sent back and disputes', async () => {
    const { intentId } = await shop.paidSession();
    const refund = await shop.stripe.refunds.create({ payment_intent: intentId, amount: 1000 });
    await shop.control(`/refunds/${refund.id}/settle`, { status: 'failed' });
    const dispute = await shop.control<Stripe.Dispute>('/disputes', { payment_intent: intentId });
    await shop.control(`/disputes/${dispute.id}/close`, { status: 'won' });
    const { data } = await shop.stripe.balanceTransactions.list({ expand: ['data.source'] });
    const rows = data.map(({ type, reporting_category: category, amount, fee, net, source }) => [
      type, category, amount, fee, net, (source as { object: string }).object,
    ]).reverse(); // prettier-ignore
    // 1.5 % of €33.00, rounded to the cent (0.495 becomes 0.50), and 25 cents.
    expect(rows).toEqual([
      ['charge', 'charge', 3300, 75, 3225, 'charge'],
      ['refund', 'refund', -1000, 0, -1000, 'refund'],
      ['refund_failure', 'refund_failure', 1000, 0, 1000, 'refund'],
      ['adjustment', 'dispute', -3300, 2000, -5300, 'dispute'],
      ['adjustment', 'dispute_reversal', 3300, -2000, 5300, 'dispute'],
    ]);
  });

  it('hangs on the charge and the refund that moved it, and not on a charge that failed', async () => {
    const { intentId } = await shop.paidSession();
    const refund = await shop.stripe.refunds.create({ payment_intent: intentId });
    const [charge] = (await shop.stripe.charges.list({ expand: ['data.balance_transaction'] })).data;
    expect(charge?.balance_transaction).toMatchObject({ source: charge?.id, currency: 'eur' });
    const moved = await shop.stripe.balanceTransactions.retrieve(String(refund.balance_transaction));
    expect(moved).toMatchObject({ source: refund.id, type: 'refund' });
    const session = await shop.openSession();
    await shop.control(`/sessions/${session.id}/pay`, { outcome: 'decline' });
    const [failed] = (await shop.stripe.charges.list()).data;
    expect(failed).toMatchObject({ status: 'failed', balance_transaction: null });
  });

  it('is listed for a span of time, page by page, as charges and refunds are', async () => {
    const early = await shop.paidSession();
    await shop.control('/clock', { advanceSeconds: 86_400 });
    for (let index = 0; index < 3; index += 1) await shop.paidSession();
    await shop.stripe.refunds.create({ payment_intent: early.intentId });
    await shop.control('/clock', { advanceSeconds: 86_400 });
    await shop.paidSession();
    const now = Math.floor(Date.now() / 1000);
    const day = { gte: now + 43_200, lt: now + 43_200 + 86_400 };
    const first = await shop.stripe.balanceTransactions.list({ created: day, limit: 3 });
    expect([first.data.length, first.has_more]).toEqual([3, true]);
    const rest = await shop.stripe.balanceTransactions.list({
      created: day,
      limit: 3,
      starting_after: first.data[2]?.id ?? '',
    });
    expect([...first.data, ...rest.data].map(({ type }) => type)).toEqual([
      'refund', 'charge', 'charge', 'charge',
    ]); // prettier-ignore
    expect(rest.has_more).toBe(false);
    expect((await shop.stripe.charges.list({ created: day })).data).toHaveLength(3);
    expect((await shop.stripe.refunds.list({ created: day })).data).toHaveLength(1);
    expect((await shop.stripe.balanceTransactions.list({ type: 'refund' })).data).toHaveLength(1);
  });
});
