import fc from 'fast-check';
import { after, BEGIN, failedInvoice, invoiceOf, pledgeRecord, viewOf } from '../../testing/pledge-views.js';
import { consequencesOf, type Consequences } from './consequences.js';
import type { InvoiceView, PledgeRecord, PledgeView } from './pledge-record.js';

const GRACE_DAYS = 7;
const follow = (
  record: PledgeRecord,
  view: PledgeView,
  now: Date,
  known: readonly string[] = [],
): Consequences => consequencesOf(record, view, { now, graceDays: GRACE_DAYS, known: new Set(known) });
const told = ({ news }: Consequences) => news.map(({ kind }) => kind);
const running = () => follow(pledgeRecord(), viewOf([invoiceOf(0)]), after(0)).after;

describe('what follows from how a pledge stands', () => {
  it('is, with the first payment, that it has begun', () => {
    const found = follow(pledgeRecord(), viewOf([invoiceOf(0)]), after(0, 1));
    expect(found.after).toMatchObject({
      state: 'current',
      beganAt: BEGIN,
      paidUntil: after(1),
      cardLast4: '4242',
    });
    expect(found.payments).toMatchObject([{ invoice: { id: 'in_0' }, planId: 'tide', isFirst: true }]);
    expect(found.flags).toEqual([]);
  });

  it('is a payment for each month not written down yet, the oldest first', () => {
    const view = viewOf([invoiceOf(2), invoiceOf(1), invoiceOf(0)]);
    const { payments } = follow(running(), view, after(2, 1), ['in_0']);
    expect(payments.map(({ invoice, isFirst }) => [invoice.id, isFirst])).toEqual([
      ['in_1', false],
      ['in_2', false],
    ]);
  });

  it('is nothing new where the same view is followed again', () => {
    const view = viewOf([invoiceOf(1), invoiceOf(0)]);
    const once = follow(running(), view, after(1, 1), ['in_0']);
    const again = follow(once.after, view, after(1, 2), ['in_0', 'in_1']);
    expect(again).toMatchObject({ after: once.after, payments: [], news: [], history: [], flags: [] });
  });

  it('is to tell of a failed payment, again two days before the grace ends, and of the lapse', () => {
    const view = viewOf([failedInvoice(1), invoiceOf(0)], { state: 'past-due' });
    const first = follow(running(), view, after(1, 1), ['in_0']);
    expect(told(first)).toEqual(['payment-failed']);
    expect(first.looks).toEqual([after(1, 5), after(1, 7)]);
    expect(told(follow(first.after, view, after(1, 5), ['in_0']))).toEqual([
      'payment-failed',
      'grace-ends-soon',
    ]);
    const lapsed = follow(first.after, view, after(1, 7), ['in_0']);
    expect(told(lapsed)).toEqual(['lapsed']);
    expect(lapsed.after).toMatchObject({ state: 'lapsed', endedAt: after(1, 7) });
    expect(new Set(lapsed.news.map(({ about }) => about))).toEqual(new Set(['in_1']));
  });

  it('is that a plan chosen for later holds from the first month paid of it', () => {
    const record = {
      ...running(),
      nextPlanId: 'high',
      nextAmountMinor: 1500,
      nextKeepsAfter: 'nothing',
      nextPlanFrom: after(1),
      amountWish: 1500,
    } as const;
    const before = follow(record, viewOf([invoiceOf(0)], { amountMinor: 1500 }), after(0, 9), ['in_0']);
    expect(before.after).toMatchObject({
      planId: 'tide',
      amountMinor: 900,
      nextPlanId: 'high',
      amountWish: 1500,
    });
    const paid = viewOf([invoiceOf(1, { amountPaidMinor: 1500 }), invoiceOf(0)], { amountMinor: 1500 });
    const turned = follow(record, paid, after(1, 1), ['in_0']);
    expect(turned.payments).toMatchObject([{ planId: 'high' }]);
    expect(turned.flags).toEqual([]);
    expect(turned.after).toMatchObject({
      planId: 'high',
      amountMinor: 1500,
      keepsAfter: 'nothing',
      nextPlanId: null,
      amountWish: null,
    });
  });

  it('is a flag for staff where another amount was paid, or nobody can say where the supporter is', () => {
    const other = follow(pledgeRecord(), viewOf([invoiceOf(0, { amountPaidMinor: 899 })]), after(0));
    expect(other.flags.map(([flag]) => flag)).toEqual(['amount-differs']);
    const elsewhere = viewOf(
      [invoiceOf(0, { cardCountry: 'FR', billingCountry: 'AT' })],
      {},
      { billingCountry: 'AT' },
    );
    expect(follow(pledgeRecord(), elsewhere, after(0)).flags.map(([flag]) => flag)).toEqual([
      'location-unclear',
    ]);
  });

  it('forgets a wish once the service agrees, and a pause once it is paid for', () => {
    const kept = follow(
      { ...running(), endWish: 'keep', endsAt: after(1) },
      viewOf([invoiceOf(0)]),
      after(0, 9),
      ['in_0'],
    );
    expect(kept.after).toMatchObject({ endWish: null, endsAt: null });
    const record = { ...running(), pauseWish: 'pause', pausedUntil: after(2) } as const;
    const skipped = invoiceOf(1, { state: 'void', attempts: 0 });
    const paused = follow(record, viewOf([skipped, invoiceOf(0)], { isPaused: true }), after(1, 28), [
      'in_0',
    ]);
    expect(told(paused)).toEqual(['pause-ends-soon']);
    const paid = follow(paused.after, viewOf([invoiceOf(2), skipped, invoiceOf(0)]), after(2, 1), ['in_0']);
    expect(paid.after).toMatchObject({ state: 'current', pausedUntil: null, pauseWish: null });
  });
});

/** One life of a pledge at the payment service: how it looks there after each thing that happened. */
const lives = fc
  .array(fc.constantFrom('paid', 'failed', 'paid-late', 'skipped', 'cancelled'), {
    minLength: 1,
    maxLength: 6,
  })
  .map((months) => {
    const invoices: InvoiceView[] = [invoiceOf(0)];
    const views: { at: Date; view: PledgeView }[] = [
      { at: after(0), view: viewOf([], null) },
      { at: after(0), view: viewOf([...invoices]) },
    ];
    const add = (at: Date, subscription: Parameters<typeof viewOf>[1]) =>
      views.push({ at, view: viewOf([...invoices].reverse(), subscription) });
    for (const [index, what] of months.entries()) {
      const month = index + 1;
      const period = { currentPeriodEnd: after(month + 1) };
      if (what === 'cancelled') {
        add(after(month), { ...period, state: 'cancelled', endedAt: after(month) });
        break;
      }
      if (what === 'skipped') {
        invoices.push(invoiceOf(month, { state: 'void', attempts: 0 }));
        add(after(month), { ...period, isPaused: true });
        continue;
      }
      if (what !== 'paid') {
        invoices.push(failedInvoice(month));
        add(after(month, 1), { ...period, state: 'past-due' });
        if (what === 'failed') {
          add(after(month, 7), { ...period, state: 'cancelled', endedAt: after(month, 7) });
          break;
        }
        invoices.pop();
      }
      invoices.push(invoiceOf(month, { paidAt: after(month, what === 'paid' ? 0 : 3) }));
      add(after(month, what === 'paid' ? 0 : 3), period);
    }
    return views;
  });

describe('a pledge', () => {
  it('comes to the same end in whatever order, and however often, its looks are followed', () => {
    fc.assert(
      fc.property(
        lives,
        fc.array(fc.record({ asked: fc.nat(), followed: fc.nat() }), { maxLength: 12 }),
        (views, wild) => {
          const last = views.at(-1)!;
          const now = new Date(last.at.getTime() + 1000);
          // Looks are numbered in the order in which they ask, so a later one sees no less; the last is the job's.
          const looks = wild
            .map(({ asked, followed }) => ({ view: views[asked % views.length]!, followed }))
            .sort((a, b) => a.view.at.getTime() - b.view.at.getTime())
            .map((one, index) => ({ ...one, number: index + 1 }));
          const final = { view: last, number: looks.length + 1, followed: 0 };
          const inSomeOrder = [...looks, ...looks].sort((a, b) => a.followed - b.followed);

          let record = pledgeRecord();
          let followedLook = 0;
          const payments: string[] = [];
          for (const { view, number } of [...inSomeOrder, final, ...looks]) {
            if (number <= followedLook) continue;
            followedLook = number;
            const found = follow(record, view.view, number === final.number ? now : view.at, payments);
            record = found.after;
            payments.push(...found.payments.map(({ invoice }) => invoice.id));
          }

          const straight = follow(pledgeRecord(), last.view, now);
          const { endedAt, ...reached } = record;
          const { endedAt: straightEnd, ...expected } = straight.after;
          expect(reached).toEqual(expected);
          expect(endedAt === null).toBe(straightEnd === null);
          // Each month that was paid is written down once.
          expect([...payments].sort()).toEqual(straight.payments.map(({ invoice }) => invoice.id).sort());
        },
      ),
      { numRuns: 300 },
    );
  });
});
