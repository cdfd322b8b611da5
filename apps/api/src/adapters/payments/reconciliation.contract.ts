import { randomUUID } from 'node:crypto';
import { paidOrder, type OpenStand, type PaymentStand } from './payment-stand.contract.js';
import type { BalanceEntry } from './reconciliation.js';

/** What the list of movements must tell, at whichever service. */
export const reconciliationContract = (name: string, open: OpenStand): void => {
  describe(`${name}: the balance`, () => {
    let stand: PaymentStand;
    beforeAll(async () => {
      stand = await open();
    });
    afterAll(() => stand.close());

    const between = async (from: Date, to: Date): Promise<BalanceEntry[]> => {
      const entries: BalanceEntry[] = [];
      let after: string | null = null;
      do {
        const page = await stand.balance.listBalance(from, to, after);
        entries.push(...page.entries);
        after = page.next;
      } while (after);
      return entries.reverse();
    };
    const hours = (count: number): Date => new Date(Date.now() + count * 3600_000);

    it('names the payment behind every movement of a span of time', async () => {
      const { paymentIntentId } = await paidOrder(stand);
      await stand.payments.refund({ paymentIntentId, amountMinor: 1000, idempotencyKey: randomUUID() });
      const disputeId = await stand.hands.openDispute(paymentIntentId, 'fraudulent');
      await stand.hands.winDispute(disputeId);
      const entries = await between(hours(-1), hours(1));
      expect(entries.map(({ kind, amountMinor }) => [kind, amountMinor])).toEqual([
        ['payment', 3300],
        ['refund', -1000],
        ['dispute', -2300],
        ['dispute-reversed', 2300],
      ]);
      expect(new Set(entries.map((entry) => entry.paymentIntentId))).toEqual(new Set([paymentIntentId]));
      expect(
        entries.every(({ amountMinor, feeMinor, netMinor }) => netMinor === amountMinor - feeMinor),
      ).toBe(true);
      expect(entries[0]?.feeMinor).toBeGreaterThan(0);
      expect(entries.at(-1)?.sourceId).toBe(disputeId);
    });

    it('ends before the second it is asked to end at', async () => {
      const [first] = await between(hours(-1), hours(1));
      const at = first?.occurredAt ?? new Date();
      expect(await between(hours(-1), at)).toEqual([]);
      expect(await between(at, hours(1))).not.toEqual([]);
    });

    it('turns its pages until the end', async () => {
      for (let index = 0; index < 101; index += 1) await paidOrder(stand, 100 + index);
      const payments = (await between(hours(-1), hours(1))).filter(({ kind }) => kind === 'payment');
      expect(payments).toHaveLength(102);
      expect(new Set(payments.map(({ id }) => id)).size).toBe(102);
    });
  });
};
