import { randomUUID } from 'node:crypto';
import { selectRows } from '../../database/rows.js';
import { makeCoupon } from '../../testing/coupons.js';
import { startRefundingShop, type RefundingShop } from '../../testing/money-back.js';
import { signInAs } from '../../testing/sign-in.js';

describe('refunds', () => {
  let shop: RefundingShop;
  beforeAll(async () => {
    shop = await startRefundingShop();
    await makeCoupon(shop, { code: 'WINDFALL' });
  });
  afterAll(() => shop.stop());

  const refundsAtService = async (orderId: string): Promise<number[]> => {
    const { stripe } = shop;
    const { paymentIntentId } = await shop.show(orderId);
    const answer = await fetch(`${stripe.url}/v1/refunds?payment_intent=${paymentIntentId}`, {
      headers: { authorization: `Bearer ${stripe.apiKey}` },
    });
    const { data } = (await answer.json()) as { data: { amount: number }[] };
    return data.map((one) => one.amount).reverse();
  };
  const rightsOf = async (orderId: string) => (await shop.show(orderId)).lines.map((line) => line.right);
  const mailsTo = (email: string, subject: RegExp) =>
    shop.mailer.sent.filter((mail) => mail.to === email && subject.test(mail.subject));
  const taxOfNotes = async (orderId: string) => {
    const rows = await selectRows<{ total: number; tax: unknown }>(
      shop.database,
      'SELECT total_minor AS total, tax FROM credit_notes WHERE order_id = :orderId ORDER BY number',
      { orderId },
    );
    return rows.map(({ total, tax }) => ({
      total,
      ...((typeof tax === 'string' ? JSON.parse(tax) : tax) as { netMinor: number; taxMinor: number }[])[0],
    }));
  };

  it('by line go back once, keep or end the right to the files, and add up under a coupon', async () => {
    // A third off: 9.00 and 19.99 become 6.00 and 13.33; 19.33 with 19 % in it has 16.24 net (Python decimal).
    const order = await shop.buyBoth({ couponCode: 'WINDFALL' });
    const [knot, plover] = (await shop.show(order.orderId)).lines;
    expect([knot?.total.minor, plover?.total.minor]).toEqual([600, 1333]);

    const asked = await shop
      .askRefund(order.orderId, {
        lines: [{ orderLineId: plover!.id, amountMinor: 333, keepsEntitlement: true }],
      })
      .expect(202);
    expect(asked.body).toMatchObject({ state: 'asked', amount: { minor: 333 }, creditNote: null });
    const own = shop.browser().get(`/api/orders/${order.orderId}`).query({ key: order.orderKey });
    expect((await own.expect(200)).body.refunds).toEqual([]);
    await shop.deliver();

    const after = await shop.show(order.orderId);
    expect(after).toMatchObject({ state: 'paid', refunded: { minor: 333 }, flags: [] });
    expect(after.refunds).toMatchObject([
      {
        state: 'succeeded',
        origin: 'workshop',
        creditNote: { number: expect.stringMatching(/^\d{4}-C00001$/) as string },
      },
    ]);
    expect(after.lines.map((line) => [line.refunded.minor, line.right])).toEqual([
      [0, 'active'],
      [333, 'active'],
    ]);
    const [mail] = mailsTo(order.email, /^Refund of €3\.33/);
    expect(mail?.text).toContain('Plover stays on your shelf.');
    expect(mail?.text).toContain('WINDFALL');

    // More than what was paid for the line under the coupon is not there to go back.
    const tooMuch = await shop
      .askRefund(order.orderId, {
        lines: [{ orderLineId: plover!.id, amountMinor: 1001, keepsEntitlement: false }],
      })
      .expect(422);
    expect(tooMuch.body).toMatchObject({
      code: 'refund-refused',
      detail: 'For Plover no more than €10.00 can go back. Ask for that or less.',
    });

    await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } }).expect(202);
    await shop.deliver();
    const whole = await shop.show(order.orderId);
    expect(whole).toMatchObject({ state: 'refunded', refunded: { minor: 1933 } });
    expect(await rightsOf(order.orderId)).toEqual(['ended', 'ended']);
    expect(mailsTo(order.email, /^Refund of €16\.00/)[0]?.text).toContain(
      'your right to the files of Knot and Plover ends',
    );
    expect(await refundsAtService(order.orderId)).toEqual([333, 1600]);
    const notes = await taxOfNotes(order.orderId);
    expect(notes.map((note) => note.total)).toEqual([333, 1600]);
    expect(notes.reduce((sum, note) => sum + (note.netMinor ?? 0), 0)).toBe(1624);
    expect(notes.reduce((sum, note) => sum + (note.taxMinor ?? 0), 0)).toBe(309);
    expect((await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } })).status).toBe(409);
  });

  it('are one, however often the form is sent and however often the service tells', async () => {
    const order = await shop.buyBoth();
    const attempt = randomUUID();
    await shop.control('/webhooks', { duplicates: 3, shuffle: true, seed: 3 });
    const answers = await Promise.all(
      [1, 2, 3].map(() => shop.askRefund(order.orderId, { whole: { keepsEntitlement: true } }, attempt)),
    );
    expect(answers.map((answer) => answer.status)).toEqual([202, 202, 202]);
    expect(new Set(answers.map((answer) => (answer.body as { id: string }).id)).size).toBe(1);
    await Promise.all([shop.drain(), shop.drain(), shop.deliver()]);
    await shop.deliver();
    await shop.control('/webhooks', { reset: true });
    expect(await refundsAtService(order.orderId)).toEqual([2899]);
    const after = await shop.show(order.orderId);
    expect(after.history.filter((entry) => entry.what === 'refunded')).toHaveLength(1);
    expect(mailsTo(order.email, /^Refund/)).toHaveLength(1);
    // Kept although all went back.
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);
  });

  it('never ask for the same money twice while one waits for the bank', async () => {
    const order = await shop.buyBoth();
    await shop.control('/refunds/hold', { held: true });
    await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } }).expect(202);
    await shop.deliver();
    await shop.control('/refunds/hold', { held: false });
    const waiting = await shop.show(order.orderId);
    expect(waiting).toMatchObject({ state: 'paid', refunded: { minor: 0 }, refunds: [{ state: 'asked' }] });
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);
    expect((await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } })).body.detail).toBe(
      'Nothing is left to give back for this order.',
    );
    const [row] = await selectRows<{ id: string }>(
      shop.database,
      'SELECT service_id AS id FROM refunds WHERE order_id = :orderId',
      { ...order },
    );
    // No event comes through: the job that asked for the refund asks how it stands.
    await shop.control('/webhooks', { lose: 1 });
    await shop.control(`/refunds/${row?.id}/settle`, { status: 'succeeded' });
    await shop.control('/webhooks', { reset: true });
    shop.clock.advance(120);
    await shop.drain();
    expect(await shop.show(order.orderId)).toMatchObject({
      state: 'refunded',
      refunds: [{ state: 'succeeded' }],
    });
  });

  it('that fail change nothing, tell staff and nobody else; one that the bank sends back is flagged', async () => {
    const order = await shop.buyBoth();
    const [knot] = (await shop.show(order.orderId)).lines;
    await shop.control('/refunds/hold', { held: true });
    await shop
      .askRefund(order.orderId, {
        lines: [{ orderLineId: knot!.id, amountMinor: 900, keepsEntitlement: false }],
      })
      .expect(202);
    await shop.deliver();
    await shop.control('/refunds/hold', { held: false });
    const idAtService = async () =>
      (
        await selectRows<{ id: string }>(
          shop.database,
          'SELECT service_id AS id FROM refunds WHERE order_id = :orderId ORDER BY created_at DESC LIMIT 1',
          { ...order },
        )
      )[0]?.id;
    await shop.control(`/refunds/${await idAtService()}/settle`, { status: 'failed' });
    await shop.deliver();
    const failed = await shop.show(order.orderId);
    expect(failed).toMatchObject({
      state: 'paid',
      refunded: { minor: 0 },
      flags: ['refund-failed'],
      refunds: [{ state: 'failed', fault: expect.any(String) as string, creditNote: null }],
    });
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);
    expect(mailsTo(order.email, /^Refund/)).toHaveLength(0);

    await shop.bookkeeper.delete(`/api/workshop/orders/${order.orderId}/flags/refund-failed`).expect(204);
    expect((await shop.show(order.orderId)).flags).toEqual([]);
    // What failed is free to be asked for again.
    await shop.askRefund(order.orderId, { whole: { keepsEntitlement: false } }).expect(202);
    await shop.deliver();
    expect((await shop.show(order.orderId)).state).toBe('refunded');
    await shop.control(`/refunds/${await idAtService()}/settle`, { status: 'failed' });
    await shop.deliver();
    expect(await shop.show(order.orderId)).toMatchObject({
      state: 'refunded',
      flags: ['refund-failed'],
      refunds: [{ state: 'failed' }, { state: 'returned' }],
    });
  });

  it('begun at the payment service are noticed, spread over the lines, and left to staff to decide', async () => {
    const order = await shop.buyBoth();
    const { paymentIntentId, lines } = await shop.show(order.orderId);
    await shop.control('/refunds', { payment_intent: paymentIntentId, amount: 1000 });
    await shop.deliver();
    const part = await shop.show(order.orderId);
    // 10.00 over 9.00 and 19.99: 3.1045 and 6.8955, the cent left over to the larger remainder.
    expect(part.lines.map((line) => line.refunded.minor)).toEqual([310, 690]);
    expect(part).toMatchObject({
      state: 'paid',
      flags: ['refunded-outside'],
      refunds: [{ origin: 'service', state: 'succeeded', amount: { minor: 1000 } }],
    });
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);

    const refundId = part.refunds[0]?.id;
    await shop.bookkeeper
      .put(`/api/workshop/orders/${order.orderId}/refunds/${refundId}/entitlements`)
      .send({ lines: [{ orderLineId: lines[0]!.id, keepsEntitlement: false }] })
      .expect(200);
    expect(await rightsOf(order.orderId)).toEqual(['ended', 'active']);
    expect((await shop.show(order.orderId)).flags).toEqual([]);
    await shop.bookkeeper
      .put(`/api/workshop/orders/${order.orderId}/refunds/${refundId}/entitlements`)
      .send({ lines: [{ orderLineId: lines[0]!.id, keepsEntitlement: true }] })
      .expect(200);
    expect(await rightsOf(order.orderId)).toEqual(['active', 'active']);

    // The rest, with all news of it lost: found by looking again, and all rights end.
    await shop.control('/webhooks', { lose: 1 });
    await shop.control('/refunds', { payment_intent: paymentIntentId });
    await shop.control('/webhooks', { reset: true });
    shop.clock.advance(3601);
    await shop.drain();
    expect(await shop.show(order.orderId)).toMatchObject({ state: 'refunded', refunded: { minor: 2899 } });
    expect(await rightsOf(order.orderId)).toEqual(['ended', 'ended']);
    const notes = await taxOfNotes(order.orderId);
    expect(notes.map((note) => note.total)).toEqual([1000, 1899]);
    const owner = await signInAs(shop, 'owner');
    const { body: log } = await owner.get('/api/workshop/log').query({ search: 'rights' }).expect(200);
    expect(log.items[0]).toMatchObject({
      what: 'decided on rights after a refund',
      who: 'Test bookkeeper (bookkeeper)',
    });
  });

  it('are refused where nothing was paid', async () => {
    const placed = await shop.checkout([shop.knot.licenceId]);
    const answer = await shop.askRefund(placed.orderId, { whole: { keepsEntitlement: false } }).expect(409);
    expect(answer.body.detail).toMatch(/^Nothing was paid for order W-/);
    expect((await shop.askRefund(placed.orderId, {})).status).toBe(422);
  });

  it('are found in the list of orders, and leave as CSV', async () => {
    const { body } = await shop.bookkeeper
      .get('/api/workshop/orders')
      .query({ moneyBack: 'refunded' })
      .expect(200);
    expect(body.total).toBeGreaterThan(3);
    for (const row of body.items as { refunded: { minor: number } }[])
      expect(row.refunded.minor).toBeGreaterThan(0);
    const csv = await shop.bookkeeper
      .get('/api/workshop/orders.csv')
      .query({ moneyBack: 'refunded' })
      .expect(200);
    expect(csv.text).toContain(',EUR,28.99,9.66,19.33,19.33,WINDFALL,');
  });
});
