import type { BalanceEntry } from '../../adapters/payments/reconciliation.js';
import { compareBooks, isDifference, sumsOf } from './compare-books.js';
import type { Movement } from './movements.js';

const at = (text: string) => new Date(`2026-11-${text}Z`);
const span = { from: at('10T00:00:00'), until: at('20T00:00:00') };
const ours = (changes: Partial<Movement> = {}): Movement => ({
  id: 'o1',
  kind: 'payment',
  at: at('12T10:00:00'),
  amountMinor: 2400,
  currency: 'EUR',
  state: 'paid',
  orderId: 'o1',
  subject: 'W-7K2M9Q',
  email: 'wren@mail.example',
  intentId: 'pi_1',
  serviceId: null,
  ...changes,
});
const theirs = (changes: Partial<BalanceEntry> = {}): BalanceEntry => ({
  id: 'txn_1',
  kind: 'payment',
  amountMinor: 2400,
  feeMinor: 60,
  netMinor: 2340,
  currency: 'EUR',
  occurredAt: at('12T10:00:00'),
  sourceId: 'ch_1',
  paymentIntentId: 'pi_1',
  description: null,
  ...changes,
});
const refund = (changes: Partial<Movement> = {}) =>
  ours({ id: 'r1', kind: 'refund', amountMinor: -2400, state: 'succeeded', serviceId: 're_1', ...changes });
const theirRefund = (changes: Partial<BalanceEntry> = {}) =>
  theirs({ id: 'txn_2', kind: 'refund', amountMinor: -2400, feeMinor: 0, sourceId: 're_1', ...changes });
const verdicts = (own: Movement[], other: BalanceEntry[]) =>
  compareBooks(own, other, span).map((row) => row.verdict);

describe('the two books', () => {
  it('agree where payment, refund and dispute stand in both', () => {
    const dispute = ours({ id: 'd1', kind: 'dispute', amountMinor: -2400, state: 'won', serviceId: 'dp_1' });
    const rows = compareBooks(
      [ours(), refund(), dispute, { ...dispute, id: 'd1:back', kind: 'dispute-back', amountMinor: 2400 }],
      [
        theirs(),
        theirRefund(),
        theirs({ id: 'txn_3', kind: 'dispute', amountMinor: -2400, feeMinor: 1500, sourceId: 'dp_1' }),
        theirs({ id: 'txn_4', kind: 'dispute-reversed', amountMinor: 2400, feeMinor: 0, sourceId: 'dp_1' }),
        theirs({ id: 'txn_5', kind: 'payout', amountMinor: -9000, paymentIntentId: null }),
      ],
      span,
    );
    expect(rows.filter(isDifference)).toEqual([]);
    expect(rows.map((row) => row.verdict).sort()).toEqual([
      'agrees',
      'agrees',
      'agrees',
      'agrees',
      'not-ours',
    ]);
    expect(sumsOf(rows)).toMatchObject([
      { kind: 'payment', here: { minor: 2400 }, there: { minor: 2400 }, fees: { minor: 60 }, count: 1 },
      { kind: 'refund', here: { minor: -2400 }, there: { minor: -2400 } },
      { kind: 'dispute', here: { minor: 0 }, there: { minor: 0 }, fees: { minor: 1500 }, count: 2 },
      { kind: 'payout', here: null, there: { minor: -9000 } },
    ]);
  });

  it('differ where one knows what the other does not, or another sum', () => {
    expect(verdicts([], [theirs()])).toEqual(['missing-here']);
    expect(verdicts([ours()], [])).toEqual(['missing-there']);
    expect(verdicts([ours()], [theirs({ amountMinor: 2300 })])).toEqual(['amount-differs']);
    expect(verdicts([ours()], [theirs({ currency: 'USD' })])).toEqual(['currency-differs']);
    // Paid twice there.
    expect(verdicts([ours()], [theirs(), theirs({ id: 'txn_9' })]).sort()).toEqual([
      'agrees',
      'missing-here',
    ]);
  });

  it('agree on a movement whose two moments lie on either side of the edge', () => {
    const own = ours({ at: at('20T00:00:02') });
    expect(verdicts([own], [theirs({ occurredAt: at('19T23:59:58') })])).toEqual(['agrees']);
    expect(verdicts([own], [theirs({ occurredAt: at('20T00:00:00') })])).toEqual([]);
    expect(verdicts([own], [])).toEqual([]);
  });

  it('do not differ by refunds that moved nothing, but by one that came back unnoticed', () => {
    expect(
      verdicts([refund({ state: 'failed' }), refund({ state: 'asked', serviceId: 're_2' })], []),
    ).toEqual([]);
    expect(verdicts([refund({ state: 'asked' })], [theirRefund()])).toEqual(['agrees']);
    const back = theirs({
      id: 'txn_3',
      kind: 'refund-failed',
      amountMinor: 2400,
      feeMinor: 0,
      sourceId: 're_1',
    });
    expect(verdicts([refund()], [theirRefund(), back])).toEqual(['missing-here', 'agrees']);
    const returned = refund({ state: 'returned' });
    const ownBack = refund({ id: 'r1:back', kind: 'refund-back', amountMinor: 2400, state: 'returned' });
    expect(verdicts([returned, ownBack], [theirRefund(), back])).toEqual(['agrees', 'agrees']);
  });

  it('ask nothing of an inquiry, which takes no money', () => {
    const inquiry = ours({ kind: 'dispute', amountMinor: 0, state: 'inquiry', serviceId: 'dp_1' });
    expect(verdicts([inquiry], [])).toEqual([]);
  });

  it('tell differences first, then in the order of time', () => {
    const rows = compareBooks(
      [ours(), ours({ id: 'o2', intentId: 'pi_2', at: at('15T00:00:00') })],
      [theirs()],
      span,
    );
    expect(rows.map((row) => row.verdict)).toEqual(['missing-there', 'agrees']);
  });
});
