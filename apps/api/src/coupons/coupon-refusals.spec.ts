import { whyRefused, type Surroundings, type WantedCoupon } from './coupon-refusals.js';

const now = new Date('2026-11-12T08:00:00Z');
const licence = (kitName: string, priceMinor: number) => ({
  kitId: kitName,
  kitName,
  licenceName: 'Personal prints',
  priceMinor,
});
const around = (changes: Partial<Surroundings> = {}): Surroundings => ({
  now,
  currency: 'EUR',
  locale: 'en-IE',
  licences: [licence('Curlew', 2400), licence('Knot', 900), licence('Gauge', 0)],
  endsAtBefore: null,
  ...changes,
});
const wanted = (changes: Partial<WantedCoupon>): WantedCoupon => ({
  off: { kind: 'fraction', numerator: 1, denominator: 3 },
  endsAt: null,
  minBasketMinor: null,
  ...changes,
});
const amount = (minor: number) => ({ kind: 'amount', minor }) as const;
const percent = (numerator: number) => ({ kind: 'fraction', numerator, denominator: 100 }) as const;
const refusal = (changes: Partial<WantedCoupon>, surroundings = around()) =>
  whyRefused(wanted(changes), surroundings);

describe('what a coupon may not do', () => {
  it('is nothing where every basket can be charged or is free', () => {
    expect(refusal({})).toBeNull();
    expect(refusal({ off: percent(100) })).toBeNull();
    // 9.00 − 8.50 is the smallest charge itself.
    expect(refusal({ off: amount(850) })).toBeNull();
  });

  it('is to leave less than can be charged of any licence it is for', () => {
    expect(refusal({ off: amount(851) })).toEqual({
      field: 'off',
      sentence:
        'Knot (Personal prints) would cost €0.49. The payment service charges nothing below €0.50: take off less, or the whole price.',
    });
    // 95 % off 9.00 leaves 0.45; of 24.00 it would leave 1.20.
    expect(refusal({ off: percent(95) })?.sentence).toMatch(/Knot .* €0\.45/);
    expect(refusal({ off: percent(95) }, around({ licences: [licence('Curlew', 2400)] }))).toBeNull();
  });

  it('is to take an amount off that the cheapest licence does not cost', () => {
    for (const minor of [900, 1200])
      expect(refusal({ off: amount(minor) })).toMatchObject({
        field: 'off',
        sentence: expect.stringContaining('Knot (Personal prints) costs €9.00') as string,
      });
    expect(refusal({ off: amount(900) })?.sentence).toContain('a basket of €9.50 or more');
  });

  it('does not look at the cheapest licence where a smallest basket is asked for', () => {
    expect(refusal({ off: amount(1200), minBasketMinor: 3000 })).toBeNull();
    expect(refusal({ off: percent(95), minBasketMinor: 3000 })).toBeNull();
    expect(refusal({ off: amount(3000), minBasketMinor: 3000 })).toMatchObject({
      field: 'minBasketMinor',
      sentence: 'The smallest basket must be €30.50 or more, for €30.00 are taken off.',
    });
    expect(refusal({ off: amount(2960), minBasketMinor: 3000 })?.sentence).toContain('would cost €0.40');
    expect(refusal({ off: percent(100), minBasketMinor: 3000 })).toBeNull();
  });

  it('is to end before now, but an end that has come may stay', () => {
    const endsAt = '2026-11-12T08:00:00.000Z';
    expect(refusal({ endsAt })?.field).toBe('endsAt');
    expect(refusal({ endsAt }, around({ endsAtBefore: endsAt }))).toBeNull();
    expect(refusal({ endsAt: '2026-11-12T08:00:01.000Z' })).toBeNull();
  });

  it('is to be for free kits alone', () => {
    expect(refusal({}, around({ licences: [licence('Gauge', 0)] }))?.sentence).toContain('free');
    expect(refusal({}, around({ licences: [] }))).toBeNull();
  });

  it('follows the smallest charge of the currency', () => {
    const forint = around({ currency: 'HUF', locale: 'hu-HU', licences: [licence('Knot', 100_000)] });
    expect(refusal({ off: amount(82_500) }, forint)).toBeNull();
    expect(refusal({ off: amount(82_501) }, forint)?.field).toBe('off');
  });
});
