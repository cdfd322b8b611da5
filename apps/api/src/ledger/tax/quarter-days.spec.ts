import { isQuarterOver, quarterDays, quarterOf } from './quarter-days.js';

describe('a quarter', () => {
  it('has its first and its last day, leap years included', () => {
    expect(quarterDays({ year: 2028, quarter: 1 })).toMatchObject({
      firstDay: '2028-01-01',
      lastDay: '2028-03-31',
    });
    expect(quarterDays({ year: 2026, quarter: 4 })).toEqual({
      from: new Date('2026-10-01T00:00:00Z'),
      until: new Date('2027-01-01T00:00:00Z'),
      firstDay: '2026-10-01',
      lastDay: '2026-12-31',
    });
  });

  it('is known from any moment in it', () => {
    expect(quarterOf(new Date('2026-03-31T23:59:59.999Z'))).toEqual({ year: 2026, quarter: 1 });
    expect(quarterOf(new Date('2026-04-01T00:00:00Z'))).toEqual({ year: 2026, quarter: 2 });
    expect(quarterOf(new Date('2026-12-31T12:00:00Z'))).toEqual({ year: 2026, quarter: 4 });
  });

  it('is over when nothing that began in it can still be written', () => {
    const quarter = { year: 2026, quarter: 4 };
    expect(isQuarterOver(quarter, new Date('2027-01-01T00:30:00Z'))).toBe(false);
    expect(isQuarterOver(quarter, new Date('2027-01-01T01:00:00Z'))).toBe(true);
  });
});
