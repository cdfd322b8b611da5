import type { PledgeRecord, PledgeView } from './pledge-record.js';
import type { Standing } from './standing.js';

/** What is to be asked of the payment service so that it agrees with what was wished here. */
export type ServiceDeed =
  | { readonly kind: 'cancel-now' | 'cancel-at-period-end' | 'undo-cancel' | 'pause' | 'resume' }
  | { readonly kind: 'change-amount'; readonly amountMinor: number };

/** A pause is lifted a day before the payment that ends it, for a month that is drawn up is not paused any more. */
const BEFORE_PAYMENT_MS = 86_400_000;

/**
 * The deeds that are still missing, judged by what the service says now: after a crash or a lost answer the
 * same question finds out what was done. What staff did at the service itself, unwished here, stays.
 */
export const missingDeeds = (
  record: Pick<PledgeRecord, 'endWish' | 'pauseWish' | 'amountWish' | 'pausedUntil'>,
  { subscription }: PledgeView,
  standing: Standing,
  now: Date,
): readonly ServiceDeed[] => {
  if (!subscription || subscription.state === 'cancelled' || subscription.state === 'incomplete-expired')
    return [];
  // The grace days went by, or nothing that is paid is left to wait for.
  const isNothingLeft = standing.state === 'grace' || standing.state === 'paused';
  if (standing.state === 'lapsed' || (record.endWish === 'end' && isNothingLeft))
    return [{ kind: 'cancel-now' }];

  const deeds: ServiceDeed[] = [];
  if (record.endWish === 'end' && !subscription.cancelAtPeriodEnd)
    deeds.push({ kind: 'cancel-at-period-end' });
  if (record.endWish === 'keep' && subscription.cancelAtPeriodEnd) deeds.push({ kind: 'undo-cancel' });
  const isPauseWished = isToPause(record, now);
  if (isPauseWished === true && !subscription.isPaused) deeds.push({ kind: 'pause' });
  if (isPauseWished === false && subscription.isPaused) deeds.push({ kind: 'resume' });
  if (record.amountWish !== null && record.amountWish !== subscription.amountMinor)
    deeds.push({ kind: 'change-amount', amountMinor: record.amountWish });
  return deeds;
};

/** @returns null where nobody wished anything */
export const isToPause = (
  { pauseWish, pausedUntil }: Pick<PledgeRecord, 'pauseWish' | 'pausedUntil'>,
  now: Date,
): boolean | null => {
  if (pauseWish === null) return null;
  return pauseWish === 'pause' && pausedUntil !== null && now < resumesAt(pausedUntil);
};

export const resumesAt = (pausedUntil: Date): Date => new Date(pausedUntil.getTime() - BEFORE_PAYMENT_MS);
