import type { KeepsAfter } from '@windchest/contracts';
import { locate } from '../../payments/location-evidence.js';
import type { InvoiceView, PledgeFlag, PledgeRecord, PledgeView } from './pledge-record.js';
import { standingOf, type Standing } from './standing.js';
import { resumesAt } from './wishes.js';

export const REMIND_BEFORE_GRACE_ENDS_DAYS = 2;
export const REMIND_BEFORE_PAUSE_ENDS_DAYS = 3;

/** A payment that is not written down yet, with what was agreed for its month. */
export interface NewPayment {
  readonly invoice: InvoiceView;
  readonly planId: string;
  readonly isFirst: boolean;
}

/** Something the supporter is told once; `about` tells one occasion from the next. */
export interface PledgeNews {
  readonly kind: 'payment-failed' | 'grace-ends-soon' | 'lapsed' | 'will-end' | 'ended' | 'pause-ends-soon';
  readonly about: string;
}

export interface Consequences {
  readonly after: PledgeRecord;
  readonly payments: readonly NewPayment[];
  readonly news: readonly PledgeNews[];
  readonly history: readonly { readonly what: string; readonly detail: string }[];
  readonly flags: readonly (readonly [flag: PledgeFlag, detail: string])[];
  /** When somebody should look again though nobody says anything. */
  readonly looks: readonly Date[];
}

export interface Circumstances {
  readonly now: Date;
  readonly graceDays: number;
  /** Invoices whose payment is written down. */
  readonly known: ReadonlySet<string>;
}

/**
 * What follows when a pledge is found to stand so: pure, so that every order of looks can be tried. Following the
 * same view again changes nothing, and what it tells was told.
 */
export const consequencesOf = (
  before: PledgeRecord,
  view: PledgeView,
  { now, graceDays, known }: Circumstances,
): Consequences => {
  const standing = standingOf(before, view, now, graceDays);
  const invoices = view.invoices
    .filter(({ id, state }) => state === 'paid' && !known.has(id))
    .sort((a, b) => a.periodStart.getTime() - b.periodStart.getTime());
  const agreed = agreementAfter(before, invoices);
  const payments = invoices.map((invoice, index) => ({
    invoice,
    planId: isOfNextPlan(before, invoice) ? before.nextPlanId! : before.planId,
    isFirst: known.size === 0 && index === 0,
  }));
  const isOver = standing.state === 'lapsed' || standing.state === 'ended';
  const first = before.beganAt ?? beganWith(invoices[0], now);
  const after: PledgeRecord = {
    ...before,
    ...agreed,
    ...settledWishes(before, view, standing),
    state: standing.state,
    beganAt: first,
    paidUntil: standing.paidUntil,
    periodEnd: view.subscription?.currentPeriodEnd ?? before.periodEnd,
    nextPaymentAt: standing.nextPaymentAt,
    endsAt: standing.endsAt,
    failedInvoiceId: standing.failing?.invoiceId ?? null,
    failingSince: standing.failing?.since ?? null,
    graceUntil: standing.failing?.graceUntil ?? null,
    settleUrl: standing.failing?.settleUrl ?? null,
    paymentCountry: before.paymentCountry ?? view.billingCountry ?? invoices[0]?.billingCountry ?? null,
    cardCountry: invoices.at(-1)?.cardCountry ?? before.cardCountry,
    cardLast4: view.subscription?.cardLast4 ?? before.cardLast4,
    endedAt: isOver ? (before.endedAt ?? now) : null,
  };
  return {
    after,
    payments,
    news: newsOf(before, after, standing, now),
    history: historyOf(before, after),
    flags: [...differingAmounts(before, invoices), ...unclearLocation(after, payments)],
    looks: looksOf(after, standing, now),
  };
};

const isOfNextPlan = ({ nextPlanId, nextPlanFrom }: PledgeRecord, { periodStart }: InvoiceView): boolean =>
  nextPlanId !== null && nextPlanFrom !== null && periodStart >= nextPlanFrom;

/** A plan chosen for later holds from the first month that is paid of it. */
const agreementAfter = (
  before: PledgeRecord,
  invoices: readonly InvoiceView[],
): Partial<PledgeRecord> & { keepsAfter: KeepsAfter } => {
  if (!before.nextPlanId || !invoices.some((invoice) => isOfNextPlan(before, invoice)))
    return { keepsAfter: before.keepsAfter };
  return {
    planId: before.nextPlanId,
    amountMinor: before.nextAmountMinor ?? before.amountMinor,
    keepsAfter: before.nextKeepsAfter ?? before.keepsAfter,
    nextPlanId: null,
    nextAmountMinor: null,
    nextKeepsAfter: null,
    nextPlanFrom: null,
    amountWish: null,
  };
};

/** Wishes that the service has come to agree with, and a pause that is over. */
const settledWishes = (
  { endWish, pauseWish, amountWish, nextPlanId, pausedUntil }: PledgeRecord,
  { subscription }: PledgeView,
  { paidUntil }: Standing,
): Partial<PledgeRecord> => ({
  ...(endWish === 'keep' && subscription && !subscription.cancelAtPeriodEnd ? { endWish: null } : {}),
  ...(pauseWish === 'resume' && subscription && !subscription.isPaused ? { pauseWish: null } : {}),
  ...(amountWish !== null && nextPlanId === null && subscription?.amountMinor === amountWish
    ? { amountWish: null }
    : {}),
  ...(pausedUntil && paidUntil && paidUntil > pausedUntil ? { pausedUntil: null, pauseWish: null } : {}),
});

const beganWith = (invoice: InvoiceView | undefined, now: Date): Date | null =>
  invoice ? earlier(invoice.paidAt ?? now, now) : null;
const earlier = (a: Date, b: Date): Date => (a < b ? a : b);
const daysBefore = (moment: Date, days: number): Date => new Date(moment.getTime() - days * 86_400_000);

const newsOf = (
  before: PledgeRecord,
  after: PledgeRecord,
  { failing }: Standing,
  now: Date,
): readonly PledgeNews[] => {
  const news: PledgeNews[] = [];
  const tell = (kind: PledgeNews['kind'], about: string): void => void news.push({ kind, about });
  if (failing && after.state === 'grace') {
    tell('payment-failed', failing.invoiceId);
    const remindAt = daysBefore(failing.graceUntil, REMIND_BEFORE_GRACE_ENDS_DAYS);
    if (remindAt > failing.since && now >= remindAt) tell('grace-ends-soon', failing.invoiceId);
  }
  if (failing && after.state === 'lapsed') tell('lapsed', failing.invoiceId);
  if (after.endsAt && !before.endsAt && after.state !== 'lapsed') tell('will-end', dayOf(after.endsAt));
  if (after.state === 'ended' && before.state !== 'ended' && after.beganAt) tell('ended', dayOf(now));
  if (after.state === 'paused' && after.pausedUntil && !after.endsAt && now < after.pausedUntil)
    if (now >= daysBefore(after.pausedUntil, REMIND_BEFORE_PAUSE_ENDS_DAYS))
      tell('pause-ends-soon', dayOf(after.pausedUntil));
  return news;
};

const dayOf = (moment: Date): string => moment.toISOString().slice(0, 10);

const historyOf = (before: PledgeRecord, after: PledgeRecord): Consequences['history'] => {
  const history: { what: string; detail: string }[] = [];
  if (before.state !== after.state) {
    const detail =
      after.state === 'grace'
        ? `until ${after.graceUntil?.toISOString() ?? ''}`
        : after.state === 'current'
          ? `paid until ${after.paidUntil?.toISOString() ?? ''}`
          : '';
    const isNeverBegun = after.state === 'ended' && !after.beganAt;
    history.push({ what: isNeverBegun ? 'never begun' : after.state, detail });
  }
  if (before.planId !== after.planId)
    history.push({ what: 'plan changed', detail: `${after.amountMinor} minor units of ${after.currency}` });
  if (!before.endsAt && after.endsAt)
    history.push({ what: 'will end', detail: `on ${after.endsAt.toISOString()}` });
  if (before.endsAt && !after.endsAt && after.state === 'current')
    history.push({ what: 'goes on', detail: 'the end was taken back' });
  return history;
};

const differingAmounts = (before: PledgeRecord, invoices: readonly InvoiceView[]): Consequences['flags'] =>
  invoices.flatMap((invoice) => {
    const expected = isOfNextPlan(before, invoice) ? before.nextAmountMinor : before.amountMinor;
    if (invoice.amountPaidMinor === expected && invoice.currency === before.currency) return [];
    const detail = `${expected} ${before.currency} pledged, ${invoice.amountPaidMinor} ${invoice.currency} paid by ${invoice.id}`;
    return [['amount-differs', detail]] as const;
  });

const unclearLocation = (after: PledgeRecord, payments: readonly NewPayment[]): Consequences['flags'] => {
  if (payments.length === 0) return [];
  const { isClear } = locate(after.declaredCountry, after.paymentCountry, after.cardCountry);
  const detail = `declared ${after.declaredCountry}, billing ${after.paymentCountry ?? 'unknown'}, card ${after.cardCountry ?? 'unknown'}`;
  return isClear ? [] : [['location-unclear', detail]];
};

const looksOf = (after: PledgeRecord, { failing }: Standing, now: Date): readonly Date[] => {
  const moments: (Date | null)[] = [after.state === 'current' ? after.endsAt : null];
  if (failing && after.state === 'grace')
    moments.push(daysBefore(failing.graceUntil, REMIND_BEFORE_GRACE_ENDS_DAYS), failing.graceUntil);
  if (after.pausedUntil && (after.state === 'paused' || after.state === 'current'))
    moments.push(daysBefore(after.pausedUntil, REMIND_BEFORE_PAUSE_ENDS_DAYS), resumesAt(after.pausedUntil));
  return moments.filter((moment): moment is Date => moment !== null && moment > now);
};
