import { lastMonth } from './last-month.js';

describe('the month before', () => {
  it('is whole, whatever the day, over the turn of the year and in leap years', () => {
    expect(lastMonth(new Date('2026-11-12T10:00:00Z'))).toEqual({ from: '2026-10-01', to: '2026-10-31' });
    expect(lastMonth(new Date('2027-01-01T00:00:00Z'))).toEqual({ from: '2026-12-01', to: '2026-12-31' });
    expect(lastMonth(new Date('2028-03-31T23:59:59Z'))).toEqual({ from: '2028-02-01', to: '2028-02-29' });
  });
});
