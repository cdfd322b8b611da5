import { after, failedInvoice, invoiceOf, pledgeRecord, viewOf } from '../../testing/pledge-views.js';
import type { PledgeRecord, PledgeView } from './pledge-record.js';
import { standingOf } from './standing.js';

const GRACE_DAYS = 7;
const standing = (view: PledgeView, now: Date, record: Partial<PledgeRecord> = {}) =>
  standingOf(pledgeRecord(record), view, now, GRACE_DAYS);

describe('how a pledge stands', () => {
  it('is opening until something is paid, and never begun when its page or first payment runs out', () => {
    expect(standing(viewOf([], null), after(0)).state).toBe('opening');
    expect(standing(viewOf([failedInvoice(0)], { state: 'incomplete' }), after(0)).state).toBe('opening');
    expect(standing(viewOf([], null, { isPageExpired: true }), after(0)).state).toBe('ended');
    expect(standing(viewOf([failedInvoice(0)], { state: 'incomplete-expired' }), after(0, 2)).state).toBe(
      'ended',
    );
  });

  it('is current until the end of what is paid, and while the next month is being drawn up', () => {
    expect(standing(viewOf([invoiceOf(0)]), after(0, 12))).toMatchObject({
      state: 'current',
      paidUntil: after(1),
      nextPaymentAt: after(1),
      endsAt: null,
    });
    const drawnUp = viewOf([invoiceOf(1, { state: 'draft', attempts: 0 }), invoiceOf(0)]);
    expect(standing(drawnUp, after(1, 0)).state).toBe('current');
  });

  describe('when a payment fails', () => {
    const view = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'past-due' });

    it('is in its grace days, counted from the day of that payment whenever it is heard of', () => {
      expect(standing(view, after(1, 1))).toMatchObject({
        state: 'grace',
        failing: { invoiceId: 'in_1', graceUntil: after(1, 7), settleUrl: 'https://pay.example/in' },
      });
      expect(standing(view, after(1, 6)).failing?.graceUntil).toEqual(after(1, 7));
    });

    it('has lapsed when they are over, and not a moment before', () => {
      expect(standing(view, new Date(after(1, 7).getTime() - 1)).state).toBe('grace');
      expect(standing(view, after(1, 7)).state).toBe('lapsed');
    });

    it('is current again once it is paid, however late', () => {
      const paid = viewOf([invoiceOf(1, { paidAt: after(1, 20) }), invoiceOf(0)]);
      expect(standing(paid, after(1, 20))).toMatchObject({ state: 'current', failing: null });
    });

    it('has lapsed where the service gave up and cancelled it by itself', () => {
      const given = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'cancelled', endedAt: after(1, 5) });
      expect(standing(given, after(1, 5)).state).toBe('lapsed');
    });

    it('goes by the first month that failed when later ones are drawn up in vain', () => {
      const invoices = [failedInvoice(2, { state: 'draft', attempts: 0 }), failedInvoice(1), invoiceOf(0)];
      expect(standing(viewOf(invoices, { state: 'unpaid' }), after(2, 1)).failing?.invoiceId).toBe('in_1');
    });
  });

  describe('when its end is asked for', () => {
    it('stays current to the last paid day, then has ended', () => {
      const view = viewOf([invoiceOf(0)], { cancelAtPeriodEnd: true });
      expect(standing(view, after(0, 20))).toMatchObject({
        state: 'current',
        endsAt: after(1),
        nextPaymentAt: null,
      });
      const over = viewOf([invoiceOf(0)], { state: 'cancelled', endedAt: after(1) });
      expect(standing(over, after(1)).state).toBe('ended');
      // The service's clock may be a little before ours.
      expect(standing(over, new Date(after(1).getTime() - 5000)).state).toBe('ended');
    });

    it('lets what is paid run out where staff end it at the service at once', () => {
      const view = viewOf([invoiceOf(0)], { state: 'cancelled', endedAt: after(0, 3) });
      expect(standing(view, after(0, 4))).toMatchObject({ state: 'current', endsAt: after(1) });
      expect(standing(view, after(1)).state).toBe('ended');
    });

    it('has ended, not lapsed, where the wish came while a payment was open', () => {
      const view = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'cancelled', endedAt: after(1, 2) });
      expect(standing(view, after(1, 2), { endWish: 'end' }).state).toBe('ended');
    });

    it('is honoured to the end of the month where a payment slipped in at the last moment', () => {
      const view = viewOf([invoiceOf(1), invoiceOf(0)], { state: 'cancelled', endedAt: after(1, 7) });
      expect(standing(view, after(1, 8))).toMatchObject({ state: 'current', endsAt: after(2) });
    });
  });

  describe('when it is paused', () => {
    const record = { pauseWish: 'pause', pausedUntil: after(3) } as const;
    const skipped = invoiceOf(1, { state: 'void', attempts: 0, paidAt: null, amountPaidMinor: 0 });

    it('is current while the paid month runs, and names the payment after the pause', () => {
      expect(standing(viewOf([invoiceOf(0)], { isPaused: true }), after(0, 20), record)).toMatchObject({
        state: 'current',
        nextPaymentAt: after(3),
      });
    });

    it('rests then, also after it was taken up again, until a month is paid', () => {
      const paused = viewOf([skipped, invoiceOf(0)], { isPaused: true });
      expect(standing(paused, after(1, 3), record).state).toBe('paused');
      const takenUp = viewOf([skipped, invoiceOf(0)]);
      expect(standing(takenUp, after(1, 5))).toMatchObject({ state: 'paused', nextPaymentAt: after(2) });
      expect(standing(viewOf([invoiceOf(2), skipped, invoiceOf(0)]), after(2, 1)).state).toBe('current');
    });

    it('does not know the next payment where staff paused it at the service', () => {
      const view = viewOf([invoiceOf(0)], { isPaused: true });
      expect(standing(view, after(0, 20)).nextPaymentAt).toBeNull();
    });
  });
});
