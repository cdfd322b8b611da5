import { randomUUID } from 'node:crypto';
import { openPledge, runningPledge, type OpenStand, type PaymentStand } from './payment-stand.contract.js';
import { PaymentsRefused } from './payment-faults.js';

const DAY = 86_400_000;

/** What people who pay every month need, at whichever service. */
export const subscriptionsContract = (name: string, open: OpenStand): void => {
  describe(`${name}: subscriptions`, () => {
    let stand: PaymentStand;
    beforeAll(async () => {
      stand = await open();
    });
    afterAll(() => stand.close());

    it('know a person by one customer, also when asked twice at once', async () => {
      const personId = randomUUID();
      const ask = () => stand.subscriptions.ensureCustomer('ada@mail.example', 'Ada', personId);
      const [first, second] = await Promise.all([ask(), ask()]);
      expect(second).toBe(first);
      expect(await ask()).toBe(first);
      const other = await stand.subscriptions.ensureCustomer('ada@mail.example', null, randomUUID());
      expect(other).not.toBe(first);
      await stand.subscriptions.updateCustomer(first, { email: 'ada@other.example', name: null });
      expect(await stand.subscriptions.ensureCustomer('ada@other.example', null, personId)).toBe(first);
    });

    it('begin on a page, which the same key opens once', async () => {
      const personId = randomUUID();
      const { page, pledgeId, customerId } = await openPledge(stand, personId);
      expect(page).toMatchObject({
        kind: 'pledge',
        state: 'open',
        pledgeId,
        customerId,
        subscriptionId: null,
      });
      expect(page.url).toMatch(/^http/);
      await stand.hands.pay(page.id, { fails: 'now' });
      expect((await stand.subscriptions.findPage(page.id)).state).toBe('open');
      await stand.hands.pay(page.id, { country: 'FR' });
      const done = await stand.subscriptions.findPage(page.id);
      expect(done).toMatchObject({
        state: 'complete',
        url: null,
        email: `${personId}@mail.example`,
        billingCountry: 'FR',
      });
      const subscription = await stand.subscriptions.findSubscription(done.subscriptionId ?? '');
      expect(subscription).toMatchObject({
        state: 'active',
        customerId,
        pledgeId,
        amountMinor: 500,
        currency: 'EUR',
        cancelAtPeriodEnd: false,
        isPaused: false,
        cardLast4: '4242',
        endedAt: null,
      });
      const days =
        (subscription.currentPeriodEnd.getTime() - subscription.currentPeriodStart.getTime()) / DAY;
      expect([28, 29, 30, 31]).toContain(days);
      expect((await stand.subscriptions.listSubscriptions(customerId)).map(({ id }) => id)).toEqual([
        subscription.id,
      ]);
    });

    it('do not begin on a page that was closed', async () => {
      const { page, customerId } = await openPledge(stand);
      await stand.hands.pay(page.id, { fails: 'now' });
      expect((await stand.subscriptions.expirePage(page.id)).state).toBe('expired');
      expect((await stand.subscriptions.expirePage(page.id)).state).toBe('expired');
      const all = await stand.subscriptions.listSubscriptions(customerId);
      expect(all.map(({ state }) => state)).toEqual(['incomplete-expired']);
    });

    it('change their amount for the months to come', async () => {
      const { subscriptionId } = await runningPledge(stand);
      const key = randomUUID();
      const change = () => stand.subscriptions.changeSubscriptionAmount(subscriptionId, 900, key);
      expect(await change()).toMatchObject({ amountMinor: 900, state: 'active' });
      expect((await change()).amountMinor).toBe(900);
      expect((await stand.invoices.listInvoices(subscriptionId)).map((one) => one.amountPaidMinor)).toEqual([
        500,
      ]);
    });

    it('pause and resume, as often as they are asked to', async () => {
      const { subscriptionId } = await runningPledge(stand);
      await stand.subscriptions.pause(subscriptionId);
      expect(await stand.subscriptions.pause(subscriptionId)).toMatchObject({
        isPaused: true,
        state: 'active',
      });
      await stand.subscriptions.resume(subscriptionId);
      expect((await stand.subscriptions.resume(subscriptionId)).isPaused).toBe(false);
    });

    it('end with the month or at once, which a second call leaves as it is', async () => {
      const { subscriptionId } = await runningPledge(stand);
      expect((await stand.subscriptions.cancelAtPeriodEnd(subscriptionId)).cancelAtPeriodEnd).toBe(true);
      expect((await stand.subscriptions.undoCancel(subscriptionId)).cancelAtPeriodEnd).toBe(false);
      const ended = await stand.subscriptions.cancelNow(subscriptionId);
      expect(ended.state).toBe('cancelled');
      expect(ended.endedAt).not.toBeNull();
      expect(await stand.subscriptions.cancelNow(subscriptionId)).toEqual(ended);
      await expect(stand.subscriptions.undoCancel(subscriptionId)).rejects.toThrow(PaymentsRefused);
      await expect(stand.subscriptions.cancelNow('sub_nobody')).rejects.toThrow(PaymentsRefused);
    });

    it('take another card from a page where nothing is charged', async () => {
      const { subscriptionId, customerId, pledgeId } = await runningPledge(stand, { fails: 'later' });
      const page = await stand.subscriptions.openCardPage({
        customerId,
        pledgeId,
        subscriptionId,
        currency: 'EUR',
        successUrl: 'http://shop.test/card',
        cancelUrl: 'http://shop.test/pledge',
        idempotencyKey: randomUUID(),
      });
      expect(page).toMatchObject({ kind: 'card', state: 'open', pledgeId, subscriptionId });
      await expect(stand.subscriptions.adoptCard(page.id)).rejects.toThrow(PaymentsRefused);
      await stand.hands.pay(page.id);
      for (let time = 0; time < 2; time += 1) {
        const subscription = await stand.subscriptions.adoptCard(page.id);
        expect(subscription).toMatchObject({ id: subscriptionId, cardLast4: '4242' });
      }
      await stand.hands.advanceDays(32);
      expect((await stand.subscriptions.findSubscription(subscriptionId)).state).toBe('active');
    });
  });
};
