import { isStillWorthOpening, payUntil } from './pay-until.js';

const now = new Date('2026-12-01T12:00:00Z');
const after = (seconds: number): Date => new Date(now.getTime() + seconds * 1000);

describe('the end of a payment page', () => {
  it('leaves the payment service its thirty minutes, counted from a moment later', () => {
    expect(payUntil(now, 30)).toEqual(after(32 * 60));
    expect(isStillWorthOpening(payUntil(now, 30), after(60), 30)).toBe(true);
    expect(isStillWorthOpening(payUntil(now, 30), after(180), 30)).toBe(false);
    expect(isStillWorthOpening(null, now, 30)).toBe(false);
  });

  it('keeps short pages short', () => {
    expect(payUntil(now, 1)).toEqual(after(66));
  });
});
