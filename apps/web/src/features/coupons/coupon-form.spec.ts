import { type Coupon, couponBody } from '@windchest/contracts';
import { couponBodyOf, couponForm } from './coupon-form.js';
import { fractionOfPercent, offBody, offForm } from './off-form.js';

const kitId = '0b9f6f0e-6f0a-4f0e-8a52-0d3b1a1f2c31';
const coupon: Coupon = {
  id: '5f0dd8a4-9f3e-4f43-9df1-0a4a6f4f1b11',
  code: 'WINDFALL',
  label: 'a third off for the first 150',
  off: { kind: 'fraction', numerator: 1, denominator: 3 },
  kits: [{ id: kitId, name: 'Curlew' }],
  startsAt: '2026-11-12T08:00:00.000Z',
  endsAt: null,
  cap: 150,
  perBuyer: 1,
  isForSupporters: false,
  minBasket: { minor: 3000, currency: 'EUR' },
  isAnnounced: true,
  isActive: true,
  held: 2,
  redeemed: 107,
  left: 41,
  takenOff: { minor: 85600, currency: 'EUR' },
  createdAt: '2026-11-01T08:00:00.000Z',
};

describe('the form of a coupon', () => {
  it('gives a coupon back as it was', () => {
    expect(couponBody.parse(couponBodyOf('EUR')(couponForm(coupon, 'EUR')))).toEqual({
      code: 'WINDFALL',
      label: coupon.label,
      off: coupon.off,
      kitIds: [kitId],
      startsAt: coupon.startsAt,
      endsAt: null,
      cap: 150,
      perBuyer: 1,
      isForSupporters: false,
      minBasketMinor: 3000,
      isAnnounced: true,
      isActive: true,
    });
  });

  it('takes an empty smallest basket as none and refuses what is no amount', () => {
    const bodyWith = (minBasketMinor: string) =>
      couponBody.safeParse(couponBodyOf('EUR')({ ...couponForm(coupon, 'EUR'), minBasketMinor }));
    expect(bodyWith(' ').data?.minBasketMinor).toBeNull();
    expect(bodyWith('12.5').data?.minBasketMinor).toBe(1250);
    expect(bodyWith('12,50').error?.issues[0]?.path).toEqual(['minBasketMinor']);
  });

  it('keeps a third a third, which no percentage is', () => {
    expect(offForm(coupon.off, 'EUR').kind).toBe('third');
    expect(offBody({ ...offForm(null, 'EUR'), kind: 'third' }, 'EUR')).toEqual(coupon.off);
  });

  it('shows a fraction that is no round percentage as a fraction', () => {
    expect(offForm({ kind: 'fraction', numerator: 2, denominator: 7 }, 'EUR')).toMatchObject({
      kind: 'fraction',
      numerator: 2,
      denominator: 7,
    });
    expect(offForm({ kind: 'fraction', numerator: 15, denominator: 100 }, 'EUR')).toMatchObject({
      kind: 'percent',
      percent: 15,
    });
  });

  it.each([
    [15, { numerator: 3, denominator: 20 }],
    [12.5, { numerator: 1, denominator: 8 }],
    [33.33, { numerator: 3333, denominator: 10000 }],
    [100, { numerator: 1, denominator: 1 }],
    [8.1, { numerator: 81, denominator: 1000 }],
  ])('takes %d %% as an exact fraction', (percent, expected) => {
    expect(fractionOfPercent(percent)).toEqual(expected);
  });

  it('refuses a percentage with more than two decimals, none at all, and nothing', () => {
    expect(fractionOfPercent(33.333)).toBeNull();
    expect(fractionOfPercent(0)).toBeNull();
    expect(fractionOfPercent(NaN)).toBeNull();
  });

  it('reads an amount in the currency of the workshop', () => {
    const off = { ...offForm(null, 'EUR'), kind: 'amount' as const, amount: '5.00' };
    expect(offBody(off, 'EUR')).toEqual({ kind: 'amount', minor: 500 });
    expect(offBody({ ...off, amount: '500' }, 'JPY')).toEqual({ kind: 'amount', minor: 500 });
  });
});
