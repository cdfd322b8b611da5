import type Stripe from 'stripe';
import { errorOf, Shop } from '../testing/shop.js';

describe('disputes', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const open = async (more: object = {}) => {
    const { intentId } = await shop.paidSession();
    const dispute = await shop.control<Stripe.Dispute>('/disputes', { payment_intent: intentId, ...more });
    return { intentId, dispute };
  };
  const arrived = async () => {
    await shop.control('/webhooks/flush');
    return shop.types().filter((type) => type.startsWith('charge.dispute.'));
  };

  it('take the amount asked for with a fee, and a day until which an answer is due', async () => {
    const dueBy = Math.floor(Date.now() / 1000) + 5 * 86_400;
    const { dispute } = await open({ reason: 'product_not_received', amount: 900, evidence_due_by: dueBy });
    const full = await shop.stripe.disputes.retrieve(dispute.id, { expand: ['charge'] });
    expect(full).toMatchObject({
      amount: 900,
      reason: 'product_not_received',
      status: 'needs_response',
      evidence_details: { due_by: dueBy, has_evidence: false },
      charge: { disputed: true, amount: 3300 },
    });
    expect(full.balance_transactions.map(({ amount, fee, net }) => [amount, fee, net])).toEqual([
      [-900, 2000, -2900],
    ]);
  });

  it('go to the bank with evidence, and come back won with the money and the fee', async () => {
    const { dispute } = await open();
    const draft = await shop.stripe.disputes.update(dispute.id, {
      evidence: { customer_name: 'Ada' },
      submit: false,
    });
    expect(draft).toMatchObject({ status: 'needs_response', evidence_details: { has_evidence: true } });
    const sent = await shop.stripe.disputes.update(dispute.id, {
      evidence: { uncategorized_text: 'Downloaded twice.' },
    });
    expect(sent).toMatchObject({
      status: 'under_review',
      evidence: { customer_name: 'Ada', uncategorized_text: 'Downloaded twice.' },
      evidence_details: { submission_count: 1 },
    });
    const won = await shop.control<Stripe.Dispute>(`/disputes/${dispute.id}/close`, { status: 'won' });
    expect(won.balance_transactions.reduce((sum, { net }) => sum + net, 0)).toBe(0);
    expect(await arrived()).toEqual([
      'charge.dispute.created', 'charge.dispute.funds_withdrawn', 'charge.dispute.updated',
      'charge.dispute.updated', 'charge.dispute.funds_reinstated', 'charge.dispute.closed',
    ]); // prettier-ignore
  });

  it('are lost when the day goes by without an answer', async () => {
    const { dispute } = await open();
    await shop.control('/clock', { advanceSeconds: 9 * 86_400 + 1 });
    expect(await shop.stripe.disputes.retrieve(dispute.id)).toMatchObject({
      status: 'lost',
      evidence_details: { past_due: true },
    });
    expect(await arrived()).toEqual([
      'charge.dispute.created',
      'charge.dispute.funds_withdrawn',
      'charge.dispute.closed',
    ]);
    const late = await errorOf(
      shop.stripe.disputes.update(dispute.id, { evidence: { customer_name: 'Ada' } }),
    );
    expect(late.message).toContain('already closed');
  });

  it('may begin as an inquiry, which takes nothing, lets refunds through, and may grow into a dispute', async () => {
    const { dispute, intentId } = await open({ inquiry: true });
    expect(dispute).toMatchObject({ status: 'warning_needs_response', balance_transactions: [] });
    await shop.stripe.refunds.create({ payment_intent: intentId, amount: 100 });
    const grown = await shop.control<Stripe.Dispute>(`/disputes/${dispute.id}/escalate`);
    expect(grown).toMatchObject({ status: 'needs_response', balance_transactions: [{ amount: -3300 }] });
    expect(await arrived()).toEqual([
      'charge.dispute.created',
      'charge.dispute.updated',
      'charge.dispute.funds_withdrawn',
    ]);
    const other = await open({ inquiry: true });
    const closed = await shop.control<Stripe.Dispute>(`/disputes/${other.dispute.id}/close`, {
      status: 'lost',
    });
    expect(closed.status).toBe('warning_closed');
  });

  it('follow a payment with one of the cards for it', async () => {
    const session = await shop.openSession();
    await shop.control(`/sessions/${session.id}/pay`, { card: '4000000000002685' });
    const found = await shop.stripe.disputes.list({ limit: 1 });
    expect(found.data[0]).toMatchObject({ reason: 'product_not_received', status: 'needs_response' });
    await shop.control('/webhooks/flush');
    expect(shop.types().slice(-3)).toEqual([
      'checkout.session.completed',
      'charge.dispute.created',
      'charge.dispute.funds_withdrawn',
    ]);
  });

  it.each([
    [{ amount: 3301 }, 'from 1 to 3300 can be disputed'],
    [{ reason: 'boredom' }, 'must be one of'],
    [{ evidence_due_by: 1 }, 'must lie in the future'],
  ])('refuse to open with %j', async (more, sentence) => {
    await expect(open(more)).rejects.toThrow(sentence);
  });
});
