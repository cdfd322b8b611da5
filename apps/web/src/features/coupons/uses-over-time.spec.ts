import { stepFor, stepStart, usesOverTime } from './uses-over-time.js';

const day = (name: string, redeemed: number, held = 0, givenBack = 0) => ({
  day: name,
  redeemed,
  held,
  givenBack,
  takenOff: { minor: redeemed * 800, currency: 'EUR' },
});

describe('the uses of a coupon over time', () => {
  it('stand day by day, days without any between them', () => {
    const { step, bars } = usesOverTime([day('2026-11-12', 3, 1), day('2026-11-14', 1, 0, 2)], '2026-11-15');
    expect(step).toBe('day');
    expect(bars.map((bar) => [bar.from, bar.redeemed, bar.held, bar.givenBack, bar.takenOffMinor])).toEqual([
      ['2026-11-12', 3, 1, 0, 2400],
      ['2026-11-13', 0, 0, 0, 0],
      ['2026-11-14', 1, 0, 2, 800],
      ['2026-11-15', 0, 0, 0, 0],
    ]);
  });

  it('stand week by week and month by month once there are many', () => {
    expect(stepFor('2026-01-01', '2026-03-03')).toBe('day');
    expect(stepFor('2026-01-01', '2026-03-04')).toBe('week');
    expect(stepFor('2024-01-01', '2026-12-31')).toBe('month');
    // 12 November 2026 is a Thursday.
    expect(stepStart('2026-11-12', 'week')).toBe('2026-11-09');
    expect(stepStart('2026-11-09', 'week')).toBe('2026-11-09');
    expect(stepStart('2026-11-12', 'month')).toBe('2026-11-01');
  });

  it('lose nothing in weeks and months', () => {
    const days = Array.from({ length: 400 }, (_, at) =>
      day(new Date(Date.UTC(2025, 0, 1 + at * 2)).toISOString().slice(0, 10), 1),
    );
    const { step, bars } = usesOverTime(days, '2027-06-01');
    expect(step).toBe('month');
    expect(bars.reduce((sum, bar) => sum + bar.redeemed, 0)).toBe(400);
    expect(bars.at(-1)?.from).toBe('2027-06-01');
  });

  it('are none before the first', () => {
    expect(usesOverTime([], '2026-11-12').bars).toEqual([]);
  });
});
