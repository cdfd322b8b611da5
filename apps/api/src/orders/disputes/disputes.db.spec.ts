import { makePerson, signInAs } from '../../testing/sign-in.js';
import { startRefundingShop, type RefundingShop } from '../../testing/money-back.js';

describe('disputes', () => {
  let shop: RefundingShop;
  beforeAll(async () => {
    shop = await startRefundingShop();
    await makePerson(shop, 'owner', 'merrin@workshop.example');
    await makePerson(shop, 'helper', 'odo@workshop.example');
  });
  afterAll(() => shop.stop());

  const open = async (orderId: string, more: object = {}): Promise<string> => {
    const { paymentIntentId } = await shop.show(orderId);
    const { id } = await shop.control<{ id: string }>('/disputes', {
      payment_intent: paymentIntentId,
      reason: 'product_not_received',
      ...more,
    });
    return id;
  };
  const rightsOf = async (orderId: string) => (await shop.show(orderId)).lines.map((line) => line.right);
  const mailsAbout = (orderNumber: string, start: RegExp) =>
    shop.mailer.sent
      .filter((mail) => mail.subject.includes(orderNumber) && start.test(mail.subject))
      .map((mail) => mail.to)
      .sort();

  it('rest the rights, tell bookkeeper and owner, and let them go on when they are won', async () => {
    const browser = await signInAs(shop, 'buyer', 'dotterel@mail.example');
    const order = await shop.buyBoth({ browser, email: 'dotterel@mail.example' });
    await shop.control('/webhooks', { duplicates: 2 });
    const disputeId = await open(order.orderId);
    await shop.deliver();

    const disputed = await shop.show(order.orderId);
    expect(disputed).toMatchObject({
      state: 'paid',
      flags: ['disputed'],
      disputes: [{ state: 'open', amount: { minor: 2899 }, reason: 'product_not_received', closedAt: null }],
    });
    expect(await rightsOf(order.orderId)).toEqual(['suspended', 'suspended']);
    const recipients = ['ines@workshop.example', 'merrin@workshop.example'];
    expect(mailsAbout(disputed.number, /answer it in time/)).toEqual(recipients);
    const grant = await browser
      .post('/api/shelf/grants')
      .send({ kitSlug: shop.knot.slug, revisionId: shop.knot.revisionId })
      .expect(403);
    expect(grant.body.detail).toBe('Downloads of this kit rest while its payment is in dispute.');
    expect((await browser.get('/api/shelf').expect(200)).body).toMatchObject({
      total: 0,
      resting: ['Knot', 'Plover'],
    });
    expect((await browser.get(`/api/shelf/${shop.knot.slug}`).expect(403)).body.detail).toBe(
      'Downloads of Knot rest while its payment is in dispute.',
    );
    const token = shop.mailer.tokenFor('dotterel@mail.example', '/collect');
    expect((await shop.browser().get(`/api/collect/${token}`).expect(200)).body.state).toBe('suspended');
    const refused = await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } }).expect(409);
    expect(refused.body.detail).toMatch(/^The payment is in dispute/);

    await shop.control(`/disputes/${disputeId}/close`, { status: 'won' });
    await shop.deliver();
    await shop.control('/webhooks', { reset: true });
    const won = await shop.show(order.orderId);
    expect(won).toMatchObject({ state: 'paid', flags: [], refunds: [], disputes: [{ state: 'won' }] });
    expect(won.disputes[0]?.history.map((turn) => turn.state)).toEqual(['open', 'won']);
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);
    expect(mailsAbout(won.number, /decided for the workshop/)).toEqual(recipients);
  });

  it('end the rights when they are lost, with a credit note over what the bank kept', async () => {
    const order = await shop.buyBoth();
    const { lines } = await shop.show(order.orderId);
    await shop
      .askRefund(order.orderId, {
        lines: [{ orderLineId: lines[0]!.id, amountMinor: 400, keepsEntitlement: true }],
      })
      .expect(202);
    await shop.deliver();
    const disputeId = await open(order.orderId);
    await shop.deliver();
    await shop.control(`/disputes/${disputeId}/close`, { status: 'lost' });
    await shop.deliver();
    const lost = await shop.show(order.orderId);
    expect(lost).toMatchObject({
      state: 'refunded',
      refunded: { minor: 2899 },
      flags: ['dispute-lost'],
      refunds: [
        { origin: 'workshop', cause: 'refund', amount: { minor: 400 } },
        {
          origin: 'dispute',
          cause: 'dispute',
          amount: { minor: 2499 },
          creditNote: { number: expect.stringMatching(/-C\d{5}$/) as string },
        },
      ],
    });
    expect(lost.lines.map((line) => line.refunded.minor)).toEqual([900, 1999]);
    expect(await rightsOf(order.orderId)).toEqual(['ended', 'ended']);
    expect(mailsAbout(lost.number, /: lost$/)).toHaveLength(2);
    expect(mailsAbout(lost.number, /^Credit note over €24\.99/)).toEqual([order.email]);
  });

  it('come to the same where only their end is heard of, or nothing at all', async () => {
    const lost = await shop.buyBoth();
    const won = await shop.buyBoth();
    await shop.control('/webhooks', { lose: ['charge.dispute.created', 'charge.dispute.funds_withdrawn'] });
    await shop.control(`/disputes/${await open(lost.orderId)}/close`, { status: 'lost' });
    await shop.deliver();
    await shop.control('/webhooks', { lose: 1 });
    await shop.control(`/disputes/${await open(won.orderId)}/close`, { status: 'won' });
    await shop.control('/webhooks', { reset: true });
    shop.clock.advance(3601);
    await shop.drain();
    expect(await shop.show(lost.orderId)).toMatchObject({ state: 'refunded', disputes: [{ state: 'lost' }] });
    expect(await rightsOf(lost.orderId)).toEqual(['ended', 'ended']);
    expect(await shop.show(won.orderId)).toMatchObject({
      state: 'paid',
      flags: [],
      disputes: [{ state: 'won' }],
    });
    expect(await rightsOf(won.orderId)).toEqual(['active', 'active']);
  });

  it('begin as an inquiry that takes no money and rests nothing, until it becomes a dispute', async () => {
    const order = await shop.buyBoth();
    const disputeId = await open(order.orderId, { inquiry: true });
    await shop.deliver();
    expect(await shop.show(order.orderId)).toMatchObject({
      flags: ['disputed'],
      disputes: [{ state: 'inquiry' }],
    });
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);
    await shop.control(`/disputes/${disputeId}/escalate`);
    await shop.deliver();
    expect(await rightsOf(order.orderId)).toEqual(['suspended', 'suspended']);
  });

  it('are found in the list of orders', async () => {
    const { body } = await shop.bookkeeper
      .get('/api/workshop/orders')
      .query({ moneyBack: 'disputed' })
      .expect(200);
    expect(body.total).toBe(5);
  });
});
