import { Shop } from '../testing/shop.js';

describe('the desk', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const page = async () => (await fetch(`${shop.standIn.url}/desk`)).text();
  const press = (action: string, id: string, more: Record<string, string> = {}) =>
    shop.postForm('/desk', { action, id, ...more });

  it('gives part of a payment back and lets the bank send it back, past the shop', async () => {
    const { intentId } = await shop.paidSession();
    const [charge] = (await shop.stripe.charges.list()).data;
    expect(await page()).toContain('€33.00');
    await shop.arrived();
    expect(await press('refund', charge?.id ?? '', { amount: '12,50' })).toMatchObject({
      status: 303,
      to: '/desk',
    });
    const [refund] = (await shop.stripe.refunds.list({ payment_intent: intentId })).data;
    expect(refund?.amount).toBe(1250);
    await press('refund-fails', refund?.id ?? '');
    expect(await shop.arrived()).toContain('refund.failed');
    const odd = await press('refund', charge?.id ?? '', { amount: 'all' });
    expect([odd.status, odd.page]).toEqual([
      400,
      expect.stringContaining('&#34;all&#34; is not an amount. Type it as 12.50.'),
    ]);
    const tooMuch = await press('refund', charge?.id ?? '', { amount: '33.01' });
    expect(tooMuch.page).toContain('greater than unrefunded amount');
  });

  it('opens a dispute and ends it either way', async () => {
    await shop.paidSession();
    const [charge] = (await shop.stripe.charges.list()).data;
    await press('dispute', charge?.id ?? '', { reason: 'duplicate' });
    const [dispute] = (await shop.stripe.disputes.list()).data;
    expect(dispute).toMatchObject({ reason: 'duplicate', status: 'needs_response' });
    await press('dispute-lost', dispute?.id ?? '');
    expect(await page()).toContain('lost');
  });

  it('bends a saved card, moves time on, shows what is owed and ends a subscription', async () => {
    const { subscriptionId } = await shop.runningPledge();
    const { default_payment_method: card } = await shop.stripe.subscriptions.retrieve(subscriptionId);
    await press('card', String(card), { later: 'expired' });
    await press('time', '', { days: '32' });
    const [invoice] = (await shop.stripe.invoices.list({ status: 'open' })).data;
    expect(await page()).toContain(String(invoice?.hosted_invoice_url));
    await press('real-time', '');
    expect(await page()).toContain('The real time.');
    await press('end', subscriptionId);
    expect((await shop.stripe.subscriptions.retrieve(subscriptionId)).status).toBe('canceled');
  });

  it('takes no form from another site', async () => {
    const answer = await fetch(`${shop.standIn.url}/desk`, {
      method: 'POST',
      headers: { 'sec-fetch-site': 'cross-site' },
      body: new URLSearchParams({ action: 'time', days: '31' }),
    });
    expect(answer.status).toBe(403);
    const { clock } = await shop.peek<{ clock: { offsetSeconds: number } }>('/state');
    expect(clock.offsetSeconds).toBe(0);
  });
});
