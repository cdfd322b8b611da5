import type { Coupon } from '@windchest/contracts';
import { couponsTexts as texts } from '../../config/texts/workshop-coupons.js';
import { dateTime, number, price } from '../../lib/format.js';

/** `a third`, `15 %`, `€5.00`. */
export function offWords({ off, takenOff }: Pick<Coupon, 'off' | 'takenOff'>): string {
  if (off.kind === 'amount') return price({ minor: off.minor, currency: takenOff.currency });
  const { numerator, denominator } = off;
  if (numerator * 3 === denominator) return texts.third;
  if (numerator * 2 === denominator) return texts.half;
  const percent = (numerator * 100) / denominator;
  return Number.isInteger(percent * 100) ? `${number(percent, 2)} %` : texts.fraction(numerator, denominator);
}

export function windowWords({ startsAt, endsAt }: Pick<Coupon, 'startsAt' | 'endsAt'>): string {
  if (startsAt && endsAt) return texts.between(dateTime(startsAt), dateTime(endsAt));
  if (startsAt) return texts.from(dateTime(startsAt));
  return endsAt ? texts.until(dateTime(endsAt)) : texts.always;
}

export type CouponStanding = keyof typeof texts.states;

/** Whether a code works now, and why not where it does not. */
export function standingOf(coupon: Coupon, now: Date): CouponStanding {
  if (!coupon.isActive) return 'off';
  if (coupon.startsAt && new Date(coupon.startsAt) > now) return 'early';
  if (coupon.endsAt && new Date(coupon.endsAt) <= now) return 'ended';
  return coupon.left === 0 && coupon.held === 0 ? 'usedUp' : 'active';
}
