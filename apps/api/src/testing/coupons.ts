import type { Handled } from '@windchest/contracts';
import { signInAs } from './sign-in.js';
import type { TestApp } from './test-app.js';

type CouponBody = Handled<'POST /workshop/coupons'>['body'];

export const couponBody = (changes: Partial<CouponBody> = {}): CouponBody => ({
  code: 'WINDFALL',
  label: 'A third off',
  off: { kind: 'fraction', numerator: 1, denominator: 3 },
  kitIds: [],
  startsAt: null,
  endsAt: null,
  cap: null,
  perBuyer: null,
  isForSupporters: false,
  minBasketMinor: null,
  isAnnounced: true,
  isActive: true,
  ...changes,
});

/** A coupon made by a maker of the workshop. */
export const makeCoupon = async (
  shop: TestApp,
  changes: Partial<CouponBody> = {},
): Promise<{ id: string }> => {
  const maker = await signInAs(shop, 'maker');
  const answer = await maker.post('/api/workshop/coupons').send(couponBody(changes)).expect(201);
  return answer.body as { id: string };
};
