import { after, failedInvoice, invoiceOf, pledgeRecord, viewOf } from '../../testing/pledge-views.js';
import type { PledgeRecord, PledgeView } from './pledge-record.js';
import { standingOf } from './standing.js';
import { missingDeeds } from './wishes.js';

const deeds = (record: Partial<PledgeRecord>, view: PledgeView, now: Date) => {
  const pledge = pledgeRecord(record);
  return missingDeeds(pledge, view, standingOf(pledge, view, now, 7), now);
};
const paid = (subscription: Parameters<typeof viewOf>[1] = {}) => viewOf([invoiceOf(0)], subscription);

describe('what is still to be asked of the payment service', () => {
  it('is nothing where nobody wished anything, whatever staff did there', () => {
    for (const subscription of [{}, { cancelAtPeriodEnd: true }, { isPaused: true }, { amountMinor: 700 }])
      expect(deeds({}, paid(subscription), after(0, 5))).toEqual([]);
  });

  it('is the end with the month, once, and to take it back', () => {
    expect(deeds({ endWish: 'end' }, paid(), after(0, 5))).toEqual([{ kind: 'cancel-at-period-end' }]);
    expect(deeds({ endWish: 'end' }, paid({ cancelAtPeriodEnd: true }), after(0, 5))).toEqual([]);
    expect(deeds({ endWish: 'keep' }, paid({ cancelAtPeriodEnd: true }), after(0, 5))).toEqual([
      { kind: 'undo-cancel' },
    ]);
  });

  it('is the end at once where nothing that is paid is left', () => {
    const failing = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'past-due' });
    expect(deeds({ endWish: 'end' }, failing, after(1, 2))).toEqual([{ kind: 'cancel-now' }]);
    expect(deeds({}, failing, after(1, 2))).toEqual([]);
  });

  it('is the end at once when the grace days are over, so that nothing is charged any more', () => {
    const failing = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'past-due' });
    expect(deeds({}, failing, after(1, 7))).toEqual([{ kind: 'cancel-now' }]);
    const over = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'cancelled', endedAt: after(1, 7) });
    expect(deeds({}, over, after(1, 8))).toEqual([]);
  });

  it('is a pause, and its end a day before the payment that ends it', () => {
    const wish = { pauseWish: 'pause', pausedUntil: after(2) } as const;
    expect(deeds(wish, paid(), after(0, 5))).toEqual([{ kind: 'pause' }]);
    expect(deeds(wish, paid({ isPaused: true }), after(0, 5))).toEqual([]);
    expect(deeds(wish, paid({ isPaused: true }), after(1, 29))).toEqual([{ kind: 'resume' }]);
    expect(deeds(wish, paid(), after(1, 29))).toEqual([]);
    expect(deeds({ pauseWish: 'resume' }, paid({ isPaused: true }), after(0, 5))).toEqual([
      { kind: 'resume' },
    ]);
  });

  it('is another amount until the service has it', () => {
    expect(deeds({ amountWish: 1500 }, paid(), after(0, 5))).toEqual([
      { kind: 'change-amount', amountMinor: 1500 },
    ]);
    expect(deeds({ amountWish: 1500 }, paid({ amountMinor: 1500 }), after(0, 5))).toEqual([]);
  });
});
