import { randomUUID } from 'node:crypto';
import { paidOrder, type OpenStand, type PaymentStand } from './payment-stand.contract.js';
import { PaymentsRefused } from './payments.js';

/** What a payment made once must do, at whichever service. */
export const paymentsContract = (name: string, open: OpenStand): void => {
  describe(`${name}: payments made once`, () => {
    let stand: PaymentStand;
    beforeAll(async () => {
      stand = await open();
    });
    afterAll(() => stand.close());

    it('are paid at a page that says how it stands, with two countries as evidence', async () => {
      const { sessionId, paymentIntentId } = await paidOrder(stand);
      expect(await stand.payments.session(sessionId)).toMatchObject({
        state: 'paid',
        amountMinor: 3300,
        currency: 'EUR',
        billingCountry: 'FR',
      });
      expect(await stand.payments.cardCountry(paymentIntentId)).toBe('DE');
      expect((await stand.payments.expireSession(sessionId)).state).toBe('paid');
    });

    it('are refunded in parts, each once however often it is asked for', async () => {
      const { paymentIntentId } = await paidOrder(stand);
      const part = {
        paymentIntentId,
        amountMinor: 1000,
        idempotencyKey: randomUUID(),
        metadata: { refund: 'r-1' },
      };
      const refund = await stand.payments.refund(part);
      expect(refund).toMatchObject({
        paymentIntentId,
        amountMinor: 1000,
        currency: 'EUR',
        state: 'succeeded',
        failure: null,
        metadata: { refund: 'r-1' },
      });
      expect((await stand.payments.refund(part)).id).toBe(refund.id);
      await expect(stand.payments.refund({ ...part, amountMinor: 900 })).rejects.toThrow(PaymentsRefused);
      await stand.payments.refund({ ...part, amountMinor: 2300, idempotencyKey: randomUUID() });
      const all = await stand.payments.refundsOf(paymentIntentId);
      expect(all.map(({ amountMinor }) => amountMinor)).toEqual([2300, 1000]);
      const more = stand.payments.refund({ ...part, amountMinor: 1, idempotencyKey: randomUUID() });
      await expect(more).rejects.toThrow(PaymentsRefused);
    });

    it('show refunds that others made, and their fate', async () => {
      const { paymentIntentId } = await paidOrder(stand);
      await stand.hands.refundByHand(paymentIntentId, 500);
      const [refund] = await stand.payments.refundsOf(paymentIntentId);
      expect(refund).toMatchObject({ amountMinor: 500, state: 'succeeded', metadata: {} });
      await stand.hands.settleRefund(refund?.id ?? '', 'failed');
      expect(await stand.payments.findRefund(refund?.id ?? '')).toMatchObject({
        state: 'failed',
        failure: 'unknown',
      });
    });

    it('may have a refund that waits', async () => {
      const { paymentIntentId } = await paidOrder(stand);
      await stand.hands.holdRefunds();
      const refund = await stand.payments.refund({
        paymentIntentId,
        amountMinor: 3300,
        idempotencyKey: randomUUID(),
      });
      expect(refund.state).toBe('pending');
      await stand.hands.settleRefund(refund.id, 'succeeded');
      expect((await stand.payments.findRefund(refund.id)).state).toBe('succeeded');
    });

    it('are disputed, cannot be refunded meanwhile, and are won back', async () => {
      const { paymentIntentId } = await paidOrder(stand);
      const disputeId = await stand.hands.openDispute(paymentIntentId, 'product_not_received');
      const dispute = await stand.payments.findDispute(disputeId);
      expect(dispute).toMatchObject({
        paymentIntentId,
        amountMinor: 3300,
        currency: 'EUR',
        reason: 'product_not_received',
        state: 'needs-response',
        hasEvidence: false,
      });
      expect(dispute.evidenceDueAt?.getTime()).toBeGreaterThan(Date.now());
      const refund = stand.payments.refund({
        paymentIntentId,
        amountMinor: 100,
        idempotencyKey: randomUUID(),
      });
      await expect(refund).rejects.toThrow(PaymentsRefused);
      await stand.hands.winDispute(disputeId);
      const [closed] = await stand.payments.disputesOf(paymentIntentId);
      expect(closed).toMatchObject({ id: disputeId, state: 'won' });
    });
  });
};
