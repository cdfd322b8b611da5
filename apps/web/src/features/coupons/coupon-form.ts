import type { Coupon } from '@windchest/contracts';
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
  isAnnounced: coupon?.isAnnounced ?? false,
  isActive: coupon?.isActive ?? true,
});

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
  });
