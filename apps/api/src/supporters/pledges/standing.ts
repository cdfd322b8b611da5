import type { PledgeState } from '@windchest/contracts';
import type { InvoiceView, PledgeRecord, PledgeView } from './pledge-record.js';

export interface Standing {
  readonly state: PledgeState;
  readonly paidUntil: Date | null;
  readonly nextPaymentAt: Date | null;
  /** The day after which nothing more is paid, where that is settled. */
  readonly endsAt: Date | null;
  readonly failing: {
    readonly invoiceId: string;
    readonly since: Date;
    readonly graceUntil: Date;
    readonly settleUrl: string | null;
  } | null;
}

const DAY_MS = 86_400_000;

/**
 * How a pledge stands, from what the payment service says of it at one moment, the supporter's own wishes and
 * the time: a pure function, so neither what was heard first nor how often makes a difference.
 */
export const standingOf = (
  record: Pick<PledgeRecord, 'endWish' | 'pausedUntil'>,
  { subscription, invoices, isPageExpired }: PledgeView,
  now: Date,
  graceDays: number,
): Standing => {
  const paid = invoices.filter(({ state }) => state === 'paid');
  if (!subscription || paid.length === 0) {
    const isOver = isPageExpired || (subscription !== null && NEVER_BEGUN.has(subscription.state));
    return { ...NOTHING, state: isOver ? 'ended' : 'opening' };
  }
  const paidUntil = latest(paid.map(({ periodEnd }) => periodEnd));
  const since = invoices.filter(({ periodStart }) => periodStart >= paidUntil);
  const base = { ...NOTHING, paidUntil };

  if (subscription.state === 'cancelled') {
    const isPaidTimeOver =
      now >= paidUntil || (subscription.endedAt !== null && subscription.endedAt >= paidUntil);
    const failing = failingOf(since, graceDays);
    if (failing) return { ...base, failing, state: record.endWish === 'end' ? 'ended' : 'lapsed' };
    return isPaidTimeOver ? { ...base, state: 'ended' } : { ...base, state: 'current', endsAt: paidUntil };
  }

  const owed = failingOf(since.filter(isOwed), graceDays);
  const endsAt = subscription.cancelAtPeriodEnd ? subscription.currentPeriodEnd : null;
  if (owed) return { ...base, failing: owed, endsAt, state: now < owed.graceUntil ? 'grace' : 'lapsed' };

  const isMonthSkipped = since.some(({ state }) => state === 'void');
  const isPaused = isMonthSkipped || (subscription.isPaused && now >= paidUntil);
  const next = nextPayment(record.pausedUntil, subscription, now);
  return { ...base, state: isPaused ? 'paused' : 'current', endsAt, nextPaymentAt: endsAt ? null : next };
};

const NOTHING: Omit<Standing, 'state'> = {
  paidUntil: null,
  nextPaymentAt: null,
  endsAt: null,
  failing: null,
};
const NEVER_BEGUN: ReadonlySet<string> = new Set(['incomplete-expired', 'cancelled']);

const latest = (moments: readonly Date[]): Date => moments.reduce((a, b) => (b > a ? b : a));

const isOwed = ({ state }: InvoiceView): boolean => state === 'open' || state === 'uncollectible';

/** The first month since the last paid one that was asked for in vain. */
const failingOf = (since: readonly InvoiceView[], graceDays: number): Standing['failing'] => {
  const [first] = since
    .filter(({ state, attempts }) => state !== 'paid' && attempts > 0)
    .sort((a, b) => a.periodStart.getTime() - b.periodStart.getTime());
  if (!first) return null;
  return {
    invoiceId: first.id,
    since: first.createdAt,
    graceUntil: new Date(first.createdAt.getTime() + graceDays * DAY_MS),
    settleUrl: first.payUrl,
  };
};

const nextPayment = (
  pausedUntil: Date | null,
  { isPaused, currentPeriodEnd }: NonNullable<PledgeView['subscription']>,
  now: Date,
): Date | null => {
  if (pausedUntil && pausedUntil > now && pausedUntil > currentPeriodEnd) return pausedUntil;
  // Paused at the service itself, and nobody said until when.
  return isPaused && !pausedUntil ? null : currentPeriodEnd;
};
