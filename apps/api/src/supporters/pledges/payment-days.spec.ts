import { paymentAfter } from './payment-days.js';

const at = (text: string) => new Date(`${text}T09:30:00.000Z`);

// Checked against the calendar by hand; common practice of monthly billing, no source.
describe('the day of a later payment', () => {
  it('is the same day of the month, at the same time', () => {
    expect(paymentAfter(at('2026-03-12'), 2, at('2026-01-12'))).toEqual(at('2026-05-12'));
    expect(paymentAfter(at('2026-11-12'), 3, at('2026-01-12'))).toEqual(at('2027-02-12'));
  });

  it('is the last day of a shorter month, and the first day’s again after it', () => {
    expect(paymentAfter(at('2026-01-31'), 1, at('2026-01-31'))).toEqual(at('2026-02-28'));
    expect(paymentAfter(at('2026-02-28'), 1, at('2026-01-31'))).toEqual(at('2026-03-31'));
    expect(paymentAfter(at('2028-01-31'), 1, at('2028-01-31'))).toEqual(at('2028-02-29'));
  });
});
