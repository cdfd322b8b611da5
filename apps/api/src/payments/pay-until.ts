const MOST_SLACK_SECONDS = 120;

/**
 * When a payment page opened now closes. A little later than asked for: the payment service counts the
 * shortest time it allows from when it hears of the page, which is some moments after now.
 */
export const payUntil = (now: Date, checkoutMinutes: number): Date => {
  const seconds = checkoutMinutes * 60;
  return new Date(now.getTime() + Math.ceil(seconds + Math.min(MOST_SLACK_SECONDS, seconds / 10)) * 1000);
};

/** Enough time is left to open a page that closes then. */
export const isStillWorthOpening = (until: Date | null, now: Date, checkoutMinutes: number): boolean =>
  until !== null && until.getTime() - now.getTime() >= checkoutMinutes * 60_000;
