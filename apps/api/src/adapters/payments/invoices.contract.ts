import { randomUUID } from 'node:crypto';
import { paidOrder, runningPledge, type OpenStand, type PaymentStand } from './payment-stand.contract.js';
import { CardDeclined } from './payment-faults.js';

/** What the months of a pledge must tell, at whichever service. */
export const invoicesContract = (name: string, open: OpenStand): void => {
  describe(`${name}: invoices`, () => {
    let stand: PaymentStand;
    beforeAll(async () => {
      stand = await open();
    });
    afterAll(() => stand.close());

    const latest = async (subscriptionId: string) => {
      const { latestInvoiceId } = await stand.subscriptions.findSubscription(subscriptionId);
      return stand.invoices.findInvoice(latestInvoiceId ?? '');
    };

    it('name the month, the payment and two countries, singly and in a list', async () => {
      const { subscriptionId, customerId, pledgeId } = await runningPledge(stand, {
        country: 'FR',
        cardCountry: 'DE',
      });
      const subscription = await stand.subscriptions.findSubscription(subscriptionId);
      const invoice = await latest(subscriptionId);
      expect(invoice).toMatchObject({
        subscriptionId,
        customerId,
        pledgeId,
        amountPaidMinor: 500,
        amountDueMinor: 500,
        currency: 'EUR',
        state: 'paid',
        periodStart: subscription.currentPeriodStart,
        periodEnd: subscription.currentPeriodEnd,
        cardCountry: 'DE',
        billingCountry: 'FR',
        attempts: 1,
        nextAttemptAt: null,
        payUrl: null,
      });
      expect(invoice.number).not.toBeNull();
      expect(invoice.paidAt).not.toBeNull();
      await stand.hands.advanceDays(32);
      const list = await stand.invoices.listInvoices(subscriptionId);
      expect(list).toHaveLength(2);
      expect(list[1]).toEqual(invoice);
      expect(list[0]).toMatchObject({ periodStart: invoice.periodEnd, cardCountry: 'DE' });
    });

    it('are found by their payment; a payment of an order has none', async () => {
      const { subscriptionId } = await runningPledge(stand);
      const invoice = await latest(subscriptionId);
      expect(await stand.invoices.invoiceOfPayment(invoice.paymentIntentId ?? '')).toEqual(invoice);
      const refund = await stand.payments.refund({
        paymentIntentId: invoice.paymentIntentId ?? '',
        amountMinor: 500,
        idempotencyKey: randomUUID(),
      });
      expect(refund.state).toBe('succeeded');
      const { paymentIntentId } = await paidOrder(stand);
      expect(await stand.invoices.invoiceOfPayment(paymentIntentId)).toBeNull();
    });

    it('that were not paid say when they are tried again and where they can be paid', async () => {
      const { subscriptionId } = await runningPledge(stand, { fails: 'later' });
      await stand.hands.advanceDays(31.1);
      const open = await latest(subscriptionId);
      expect(open).toMatchObject({ state: 'open', amountPaidMinor: 0, amountDueMinor: 500, attempts: 1 });
      expect(open.nextAttemptAt?.getTime()).toBeGreaterThan(open.createdAt.getTime());
      expect(open.payUrl).toMatch(/^http/);
      expect((await stand.subscriptions.findSubscription(subscriptionId)).state).toBe('past-due');
      await stand.hands.payInvoice(open.id, { country: 'AT' });
      expect(await latest(subscriptionId)).toMatchObject({
        state: 'paid',
        billingCountry: 'AT',
        payUrl: null,
        nextAttemptAt: null,
      });
      expect((await stand.subscriptions.findSubscription(subscriptionId)).state).toBe('active');
    });

    it('are tried again on request, with the card as it is now', async () => {
      const { subscriptionId, customerId } = await runningPledge(stand, { fails: 'later' });
      await stand.hands.advanceDays(31.1);
      const open = await latest(subscriptionId);
      await expect(stand.invoices.payInvoice(open.id)).rejects.toThrow(CardDeclined);
      await stand.hands.mendCard(customerId);
      expect((await stand.invoices.payInvoice(open.id)).state).toBe('paid');
    });
  });
};
