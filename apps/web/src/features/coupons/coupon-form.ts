import type { Coupon } from '@windchest/contracts';
import { amountText, readAmount } from '../../lib/amount-text.js';
import { fromLocalField, toLocalField } from './local-moment.js';
import { offBody, type OffForm, offForm } from './off-form.js';

export interface CouponForm {
  code: string;
  label: string;
  off: OffForm;
  kitIds: string[];
  startsAt: string;
  endsAt: string;
  cap: number;
  perBuyer: number;
  /** As it is typed: `30.00`; empty for any basket. */
  minBasketMinor: string;
  isForSupporters: boolean;
  isAnnounced: boolean;
  isActive: boolean;
}

export const couponForm = (coupon: Coupon | null, currency: string): CouponForm => ({
  code: coupon?.code ?? '',
  label: coupon?.label ?? '',
  off: offForm(coupon?.off ?? null, currency),
  kitIds: coupon?.kits.map((kit) => kit.id) ?? [],
  startsAt: toLocalField(coupon?.startsAt ?? null),
  endsAt: toLocalField(coupon?.endsAt ?? null),
  cap: coupon?.cap ?? NaN,
  perBuyer: coupon?.perBuyer ?? NaN,
  minBasketMinor: coupon?.minBasket ? amountText(coupon.minBasket) : '',
  isForSupporters: coupon?.isForSupporters ?? false,
  isAnnounced: coupon?.isAnnounced ?? false,
  isActive: coupon?.isActive ?? true,
});

const amountOrNull = (text: string, currency: string): number | null => {
  if (text.trim() === '') return null;
  const read = readAmount(text, currency);
  return 'minor' in read ? read.minor : NaN;
};

const orNull = (value: number) => (Number.isNaN(value) ? null : value);

export const couponBodyOf =
  (currency: string) =>
  (form: CouponForm): unknown => ({
    ...form,
    off: offBody(form.off, currency),
    startsAt: fromLocalField(form.startsAt),
    endsAt: fromLocalField(form.endsAt),
    cap: orNull(form.cap),
    perBuyer: orNull(form.perBuyer),
    minBasketMinor: amountOrNull(form.minBasketMinor, currency),
  });
