import type { Reconciliation, ReconciliationRow, Verdict } from '@windchest/contracts';
import type { BalanceEntry, BalanceEntryKind } from '../../adapters/payments/reconciliation.js';
import type { Movement, MovementKind } from './movements.js';

type ShownKind = ReconciliationRow['kind'];

/** A row before it has its place. */
export interface ComparedRow {
  readonly kind: ShownKind;
  readonly verdict: Verdict;
  readonly at: Date;
  readonly currency: string;
  readonly hereMinor: number | null;
  readonly thereMinor: number | null;
  readonly feeMinor: number | null;
  readonly serviceId: string | null;
  readonly paymentIntentId: string | null;
  readonly orderId: string | null;
  readonly subject: string | null;
}

export interface Span {
  readonly from: Date;
  /** The first moment after it. */
  readonly until: Date;
}

const shownOurs: Record<MovementKind, ShownKind> = {
  payment: 'payment',
  pledge: 'payment',
  refund: 'refund',
  'refund-back': 'refund',
  dispute: 'dispute',
  'dispute-back': 'dispute',
};
const shownTheirs: Record<BalanceEntryKind, ShownKind> = {
  payment: 'payment',
  refund: 'refund',
  'refund-failed': 'refund',
  dispute: 'dispute',
  'dispute-reversed': 'dispute',
  payout: 'payout',
  other: 'other',
};

/** What one movement is known by on both sides; null for what the shop keeps no book of. */
const keyOfTheirs = ({ kind, sourceId, paymentIntentId }: BalanceEntry): string | null => {
  if (kind === 'payment') return paymentIntentId && `payment ${paymentIntentId}`;
  if (kind === 'refund') return sourceId && `refund ${sourceId}`;
  if (kind === 'refund-failed') return sourceId && `refund-back ${sourceId}`;
  if (kind === 'dispute') return sourceId && `dispute ${sourceId}`;
  return kind === 'dispute-reversed' ? sourceId && `dispute-back ${sourceId}` : null;
};
const keyOfOurs = ({ kind, intentId, serviceId }: Movement): string | null => {
  if (kind === 'payment' || kind === 'pledge') return intentId && `payment ${intentId}`;
  return serviceId && `${kind} ${serviceId}`;
};

/** Asked for or failed, a refund may have moved nothing; an inquiry takes no money. */
const hasMoved = ({ kind, state, amountMinor }: Movement): boolean => {
  if (amountMinor === 0) return false;
  return kind !== 'refund' || state === 'succeeded' || state === 'returned';
};

/**
 * Holds the shop's book against the payment service's. Both lists reach over the span on either side, since the two
 * clocks differ: what is matched across its edge agrees, and only what lies within it is told.
 */
export const compareBooks = (
  ours: readonly Movement[],
  theirs: readonly BalanceEntry[],
  span: Span,
): ComparedRow[] => {
  const open = new Map<string, Movement[]>();
  for (const one of ours) {
    const key = keyOfOurs(one);
    if (key) open.set(key, [...(open.get(key) ?? []), one]);
  }
  const rows: ComparedRow[] = [];
  const matched = new Set<Movement>();
  for (const entry of theirs) {
    const key = keyOfTheirs(entry);
    const own = key ? open.get(key)?.shift() : undefined;
    if (own) matched.add(own);
    if (isWithin(entry.occurredAt, span) || (own && isWithin(own.at, span)))
      rows.push(rowOf(entry, own, key));
  }
  for (const own of ours)
    if (!matched.has(own) && hasMoved(own) && isWithin(own.at, span)) rows.push(missingThere(own));
  return rows.sort(
    (a, b) =>
      Number(isDifference(b)) - Number(isDifference(a)) ||
      a.at.getTime() - b.at.getTime() ||
      (a.serviceId ?? '').localeCompare(b.serviceId ?? '', 'en'),
  );
};

export const isDifference = ({ verdict }: Pick<ComparedRow, 'verdict'>): boolean =>
  verdict !== 'agrees' && verdict !== 'not-ours';

const isWithin = (at: Date, { from, until }: Span): boolean => at >= from && at < until;

const rowOf = (entry: BalanceEntry, own: Movement | undefined, key: string | null): ComparedRow => ({
  kind: shownTheirs[entry.kind],
  verdict: verdictOf(entry, own, key),
  at: entry.occurredAt,
  currency: entry.currency,
  hereMinor: own?.amountMinor ?? null,
  thereMinor: entry.amountMinor,
  feeMinor: entry.feeMinor,
  serviceId: entry.sourceId ?? entry.id,
  paymentIntentId: entry.paymentIntentId,
  orderId: own?.orderId ?? null,
  subject: own?.subject ?? entry.description,
});

const verdictOf = (entry: BalanceEntry, own: Movement | undefined, key: string | null): Verdict => {
  if (!own)
    return key === null && (entry.kind === 'payout' || entry.kind === 'other') ? 'not-ours' : 'missing-here';
  if (own.currency !== entry.currency) return 'currency-differs';
  return own.amountMinor === entry.amountMinor ? 'agrees' : 'amount-differs';
};

const missingThere = (own: Movement): ComparedRow => ({
  kind: shownOurs[own.kind],
  verdict: 'missing-there',
  at: own.at,
  currency: own.currency,
  hereMinor: own.amountMinor,
  thereMinor: null,
  feeMinor: null,
  serviceId: own.serviceId,
  paymentIntentId: own.intentId,
  orderId: own.orderId,
  subject: own.subject,
});

type Sums = NonNullable<Reconciliation['sums']>;

/** Both sides added up by kind and currency; of payouts and the like the shop has no side. */
export const sumsOf = (rows: readonly ComparedRow[]): Sums => {
  const sums = new Map<string, Sums[number]>();
  for (const { kind, currency, hereMinor, thereMinor, feeMinor } of rows) {
    const key = `${kind} ${currency}`;
    const sum = sums.get(key);
    const money = (minor: number) => ({ minor, currency });
    sums.set(key, {
      kind,
      currency,
      here: kind === 'payout' || kind === 'other' ? null : money((sum?.here?.minor ?? 0) + (hereMinor ?? 0)),
      there: money((sum?.there.minor ?? 0) + (thereMinor ?? 0)),
      fees: money((sum?.fees.minor ?? 0) + (feeMinor ?? 0)),
      count: (sum?.count ?? 0) + 1,
    });
  }
  const order: readonly ShownKind[] = ['payment', 'refund', 'dispute', 'payout', 'other'];
  return [...sums.values()].sort(
    (a, b) => order.indexOf(a.kind) - order.indexOf(b.kind) || a.currency.localeCompare(b.currency, 'en'),
  );
};
