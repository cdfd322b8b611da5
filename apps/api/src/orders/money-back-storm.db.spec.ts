import { selectRows } from '../database/rows.js';
import { startRefundingShop, type RefundingShop } from '../testing/money-back.js';

/** Of each kind: refunds asked for here, refunds made at the service, disputes lost, disputes won. */
const EACH = 3;

describe('a storm of events about money that goes back', () => {
  let shop: RefundingShop;
  beforeAll(async () => {
    shop = await startRefundingShop();
  });
  afterAll(() => shop.stop());

  it('five times each, shuffled, a third lost: each in the books once, the numbers without a gap', async () => {
    const orders = [];
    for (let n = 0; n < 4 * EACH; n++) orders.push(await shop.buyBoth({ email: `buyer-${n}@mail.example` }));
    const shown = await Promise.all(orders.map(({ orderId }) => shop.show(orderId)));
    const kinds = ['workshop', 'service', 'lost', 'won'] as const;
    const all = shown.map((order, n) => ({ ...order, kind: kinds[n % 4] ?? 'won' }));
    shop.mailer.sent.length = 0;

    await shop.control('/webhooks', { duplicates: 4, shuffle: true, lose: 0.33, seed: 11 });
    for (const { id, kind, lines, paymentIntentId } of all) {
      if (kind === 'workshop') {
        const [knot, plover] = lines;
        const part = [{ orderLineId: knot!.id, amountMinor: 333, keepsEntitlement: true }];
        await shop.askRefund(id, { lines: part }).expect(202);
        const whole = [{ orderLineId: plover!.id, amountMinor: 1999, keepsEntitlement: false }];
        await shop.askRefund(id, { lines: whole }).expect(202);
      } else if (kind === 'service') {
        await shop.control('/refunds', { payment_intent: paymentIntentId, amount: 1234 });
        await shop.control('/refunds', { payment_intent: paymentIntentId, amount: 1665 });
      } else {
        const dispute = await shop.control<{ id: string }>('/disputes', { payment_intent: paymentIntentId });
        await shop.control(`/disputes/${dispute.id}/close`, { status: kind });
      }
    }
    await Promise.all([shop.drain(), shop.deliver(), shop.drain(), shop.drain()]);
    await Promise.all([shop.deliver(), shop.drain()]);
    shop.clock.advance(3601);
    await Promise.all([shop.drain(), shop.drain()]);

    const count = { workshop: 2, service: 2, lost: 1, won: 0 };
    const state = { workshop: 'paid', service: 'refunded', lost: 'refunded', won: 'paid' };
    const back = { workshop: 2332, service: 2899, lost: 2899, won: 0 };
    const rights = {
      workshop: ['active', 'ended'],
      service: ['ended', 'ended'],
      lost: ['ended', 'ended'],
      won: ['active', 'active'],
    };
    for (const { id, kind } of all) {
      const now = await shop.show(id);
      expect([kind, now.state]).toEqual([kind, state[kind]]);
      expect([kind, now.refunds.map((one) => one.state)]).toEqual([
        kind,
        Array(count[kind]).fill('succeeded'),
      ]);
      expect([kind, now.refunded.minor]).toEqual([kind, back[kind]]);
      expect([kind, now.lines.map((line) => line.right)]).toEqual([kind, rights[kind]]);
      expect(now.lines.reduce((sum, line) => sum + line.refunded.minor, 0)).toBe(back[kind]);
      expect(now.disputes).toHaveLength(kind === 'lost' || kind === 'won' ? 1 : 0);
    }
    const notes = await selectRows<{ number: number; refundId: string }>(
      shop.database,
      'SELECT number, refund_id AS refundId FROM credit_notes ORDER BY number',
    );
    expect(notes.map((note) => note.number)).toEqual(Array.from({ length: 5 * EACH }, (_, n) => n + 1));
    expect(new Set(notes.map((note) => note.refundId)).size).toBe(5 * EACH);
    const mailed = shop.mailer.sent.filter((mail) => mail.to.startsWith('buyer-')).map((mail) => mail.to);
    const expected = all.flatMap(({ email, kind }) => Array<string>(count[kind]).fill(email));
    expect(mailed.sort()).toEqual(expected.sort());
    const left = await selectRows(
      shop.database,
      `SELECT id FROM payment_events WHERE handled_at IS NULL UNION SELECT id FROM jobs WHERE state = 'dead'`,
    );
    expect(left).toEqual([]);
  });
});
