import type { CouponOff } from '@windchest/contracts';
import { formatMoney, fraction, money, percentOf } from '@windchest/money';
import { discountsOf } from './coupon-rules.js';
import { isChargeable, smallestChargeOf } from '../payments/smallest-charge.js';

/** A coupon as it is about to be kept. */
export interface WantedCoupon {
  readonly off: CouponOff;
  readonly endsAt: string | null;
  readonly minBasketMinor: number | null;
}

export interface PricedLicence {
  readonly kitId: string;
  readonly kitName: string;
  readonly licenceName: string;
  readonly priceMinor: number;
}

export interface Surroundings {
  readonly now: Date;
  readonly currency: string;
  readonly locale: string;
  /** The offered licences the coupon would be for. */
  readonly licences: readonly PricedLicence[];
  /** The end it has already; one that has passed may stay. */
  readonly endsAtBefore: string | null;
}

export interface CouponRefusal {
  readonly field: 'off' | 'endsAt' | 'minBasketMinor';
  readonly sentence: string;
}

/**
 * Why a coupon cannot be kept as wanted, or null. What could not be paid is refused here, not at a buyer's
 * checkout: every basket the coupon holds for must come to nothing or to enough for the payment service.
 */
export const whyRefused = (wanted: WantedCoupon, around: Surroundings): CouponRefusal | null =>
  endedAlready(wanted, around) ??
  (wanted.minBasketMinor === null ? tooLittleLeft(wanted, around) : tooLittleOfBasket(wanted, around)) ??
  takesNothingOff(around);

const endedAlready = ({ endsAt }: WantedCoupon, { now, endsAtBefore }: Surroundings): CouponRefusal | null =>
  endsAt !== null && new Date(endsAt) <= now && endsAt !== endsAtBefore
    ? {
        field: 'endsAt',
        sentence: 'This end has passed already. Choose a later one, or switch the coupon off.',
      }
    : null;

const shown =
  ({ currency, locale }: Surroundings) =>
  (minor: number): string =>
    formatMoney(money(minor, currency), locale);

/** Each licence by itself is the smallest basket there can be. */
const tooLittleLeft = ({ off }: WantedCoupon, around: Surroundings): CouponRefusal | null => {
  const { currency, licences } = around;
  const show = shown(around);
  const least = smallestChargeOf(currency);
  for (const { kitName, licenceName, priceMinor, kitId } of licences) {
    if (priceMinor === 0) continue;
    const name = `${kitName} (${licenceName})`;
    if (off.kind === 'amount' && off.minor >= priceMinor)
      return {
        field: 'off',
        sentence: `${name} costs ${show(priceMinor)}, no more than the ${show(off.minor)} taken off. Take off less, ask for a basket of ${show(off.minor + least)} or more, or take off 100 % to make it free.`,
      };
    const [discount = 0] = discountsOf(off, [{ kitId, priceMinor }], () => true, currency);
    const price = priceMinor - discount;
    if (isChargeable(price, currency)) continue;
    return {
      field: 'off',
      sentence: `${name} would cost ${show(price)}. The payment service charges nothing below ${show(least)}: take off less, or the whole price.`,
    };
  }
  return null;
};

/** With a smallest basket that basket decides: licences cheaper than it are only ever bought with others. */
const tooLittleOfBasket = (
  { off, minBasketMinor }: WantedCoupon,
  around: Surroundings,
): CouponRefusal | null => {
  const basket = money(minBasketMinor ?? 0, around.currency);
  const discount =
    off.kind === 'amount' ? off.minor : percentOf(basket, fraction(off.numerator, off.denominator)).minor;
  const rest = basket.minor - discount;
  const least = smallestChargeOf(around.currency);
  if (rest >= least || (off.kind === 'fraction' && rest === 0)) return null;
  const show = shown(around);
  return {
    field: 'minBasketMinor',
    sentence:
      rest > 0
        ? `The smallest basket would cost ${show(rest)}. The payment service charges nothing below ${show(least)}.`
        : `The smallest basket must be ${show(off.kind === 'amount' ? off.minor + least : least)} or more, for ${show(discount)} are taken off.`,
  };
};

const takesNothingOff = ({ licences }: Surroundings): CouponRefusal | null =>
  licences.length > 0 && licences.every(({ priceMinor }) => priceMinor === 0)
    ? { field: 'off', sentence: 'All these kits are free. Choose one that costs something.' }
    : null;
