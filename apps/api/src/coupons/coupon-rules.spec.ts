import { isChargeable } from '../payments/smallest-charge.js';
import { discountsOf, faultOf, placesLeft, tooSmallBasket } from './coupon-rules.js';

const now = new Date('2026-12-01T12:00:00Z');
const terms = {
  code: 'WINDFALL',
  startsAt: null,
  endsAt: null,
  cap: 150,
  held: 0,
  redeemed: 0,
  isActive: true,
  minBasketMinor: null,
};

describe('the rules of a coupon', () => {
  it('count held and redeemed places against the cap', () => {
    expect(placesLeft({ ...terms, held: 20, redeemed: 129 })).toBe(1);
    expect(faultOf({ ...terms, held: 20, redeemed: 129 }, now)).toBeNull();
    expect(faultOf({ ...terms, held: 21, redeemed: 129 }, now)?.code).toBe('coupon-is-used-up');
    expect(placesLeft({ ...terms, cap: null, redeemed: 9000 })).toBeNull();
  });

  it('start at their first moment and end before their last', () => {
    expect(faultOf({ ...terms, startsAt: now }, now)).toBeNull();
    expect(faultOf({ ...terms, endsAt: now }, now)?.code).toBe('coupon-has-ended');
  });

  it('say by how much a basket is too small', () => {
    const euro = { currency: 'EUR', locale: 'en-IE' };
    const from30 = { ...terms, minBasketMinor: 3000 };
    expect(tooSmallBasket(terms, 0, euro)).toBeNull();
    expect(tooSmallBasket(from30, 3000, euro)).toBeNull();
    expect(tooSmallBasket(from30, 2400, euro)).toEqual({
      code: 'coupon-basket-too-small',
      detail: 'The coupon WINDFALL holds from €30.00 on. This basket is €6.00 short of that.',
    });
  });

  // A third of 24.00 is 8.00 exactly; a third of 25.00 is 8.33 (half-up of 8.333…).
  it('round by line', () => {
    const lines = [
      { kitId: 'curlew', priceMinor: 2400 },
      { kitId: 'knot', priceMinor: 2500 },
    ];
    const third = { kind: 'fraction', numerator: 1, denominator: 3 } as const;
    expect(discountsOf(third, lines, () => true, 'EUR')).toEqual([800, 833]);
    expect(discountsOf(third, lines, (kit) => kit === 'knot', 'EUR')).toEqual([0, 833]);
  });

  it('never take more than there is', () => {
    const amount = { kind: 'amount', minor: 5000 } as const;
    expect(discountsOf(amount, [{ kitId: 'curlew', priceMinor: 2400 }], () => true, 'EUR')).toEqual([2400]);
  });

  it('know what the payment service can charge', () => {
    expect([0, 1, 49, 50, 1600].map((minor) => isChargeable(minor, 'EUR'))).toEqual([
      true,
      false,
      false,
      true,
      true,
    ]);
  });
});
