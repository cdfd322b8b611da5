const HOUR = 3600;
const DAY = 24 * HOUR;
/** Card networks let a buyer dispute for 120 days as a rule, in some cases longer; common practice, no source. */
const WATCHED_DAYS = 180;

/**
 * When to ask again whether money of a payment went back: after half the time since it was paid, at least an hour,
 * at most a week, so forty times in all. Events tell sooner; this is for those that were lost.
 * @returns seconds, or null when nothing is to be expected any more
 */
export const nextMoneyLook = (paidAt: Date, now: Date): number | null => {
  const age = (now.getTime() - paidAt.getTime()) / 1000;
  if (age > WATCHED_DAYS * DAY) return null;
  return Math.ceil(Math.min(Math.max(HOUR, age / 2), 7 * DAY));
};
