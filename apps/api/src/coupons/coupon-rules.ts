import type { CouponOff, ProblemCode } from '@windchest/contracts';
import { applyCoupon, formatMoney, fraction, money, type CouponWorth, type Money } from '@windchest/money';

/** What the rules look at; a coupon's row has all of it. */
export interface CouponTerms {
  readonly code: string;
  readonly startsAt: Date | null;
  readonly endsAt: Date | null;
  readonly cap: number | null;
  readonly held: number;
  readonly redeemed: number;
  readonly isActive: boolean;
  /** From which sum of the basket on, before any discount, it holds. */
  readonly minBasketMinor: number | null;
}

export interface CouponFault {
  readonly code: ProblemCode;
  readonly detail: string;
}

/** Places left, or null where nobody counts. */
export const placesLeft = ({ cap, held, redeemed }: Pick<CouponTerms, 'cap' | 'held' | 'redeemed'>) =>
  cap === null ? null : Math.max(0, cap - held - redeemed);

/** Why nobody can use the coupon at this moment, whoever asks and whatever is bought; null where they can. */
export const faultOf = (terms: CouponTerms, now: Date): CouponFault | null => {
  if (!terms.isActive) return unknownCoupon(terms.code);
  if (terms.startsAt && now < terms.startsAt)
    return { code: 'coupon-not-started', detail: `The coupon ${terms.code} does not hold yet.` };
  if (terms.endsAt && now >= terms.endsAt)
    return { code: 'coupon-has-ended', detail: `The coupon ${terms.code} has ended.` };
  if (placesLeft(terms) === 0) return usedUp(terms);
  return null;
};

/** A coupon that is switched off looks like one that never was. */
export const unknownCoupon = (code: string): CouponFault => ({
  code: 'coupon-unknown',
  detail: `There is no coupon ${code}. Look at its letters and digits again.`,
});

export const usedUp = ({ code, cap, held }: CouponTerms): CouponFault => ({
  code: 'coupon-is-used-up',
  detail:
    held > 0
      ? `All ${cap} places of the coupon ${code} are taken. ${held} of them ${held === 1 ? 'is' : 'are'} held for people who are paying right now; one may come back.`
      : `All ${cap} places of the coupon ${code} are taken.`,
});

/** A basket below the smallest one the coupon holds for, and by how much; null where it is enough. */
export const tooSmallBasket = (
  { code, minBasketMinor }: Pick<CouponTerms, 'code' | 'minBasketMinor'>,
  subtotalMinor: number,
  { currency, locale }: { currency: string; locale: string },
): CouponFault | null => {
  if (minBasketMinor === null || subtotalMinor >= minBasketMinor) return null;
  const show = (minor: number): string => formatMoney(money(minor, currency), locale);
  return {
    code: 'coupon-basket-too-small',
    detail: `The coupon ${code} holds from ${show(minBasketMinor)} on. This basket is ${show(minBasketMinor - subtotalMinor)} short of that.`,
  };
};

const worthOf = (off: CouponOff, currency: string): CouponWorth =>
  off.kind === 'fraction'
    ? { kind: 'percent', percent: fraction(off.numerator, off.denominator) }
    : { kind: 'amount', amount: money(off.minor, currency) };

/** The discount of each line in minor units; zero on lines of kits the coupon is not for. */
export const discountsOf = (
  off: CouponOff,
  lines: readonly { readonly kitId: string; readonly priceMinor: number }[],
  isForKit: (kitId: string) => boolean,
  currency: string,
): number[] => {
  const priced = lines.map((line) => ({
    price: money(line.priceMinor, currency),
    isEligible: isForKit(line.kitId),
  }));
  return applyCoupon(priced, worthOf(off, currency)).map(({ minor }: Money) => minor);
};
