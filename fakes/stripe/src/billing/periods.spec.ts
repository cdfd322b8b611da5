import { boundary, boundaryAfter } from './periods.js';

const at = (text: string) => Date.parse(text) / 1000;
const monthly = { interval: 'month', interval_count: 1 };

// Days as in the calendar; that a short month ends on its last day and the next has the anchor's day again is
// what the service's page on the billing cycle says, from memory.
describe('the boundaries of a period', () => {
  it.each([
    ['2026-01-31T10:00:00Z', 1, '2026-02-28T10:00:00Z'],
    ['2026-01-31T10:00:00Z', 2, '2026-03-31T10:00:00Z'],
    ['2028-01-30T00:00:00Z', 1, '2028-02-29T00:00:00Z'],
    ['2026-11-15T23:59:59Z', 3, '2027-02-15T23:59:59Z'],
  ])('lie, from %s and %d months on, at %s', (anchor, count, expected) => {
    expect(boundary(at(anchor), monthly, count)).toBe(at(expected));
  });

  it('follow one another by weeks, days and years too', () => {
    const anchor = at('2028-02-29T12:00:00Z');
    expect(boundary(anchor, { interval: 'week', interval_count: 2 }, 1)).toBe(anchor + 14 * 86_400);
    expect(boundary(anchor, { interval: 'day', interval_count: 1 }, 3)).toBe(anchor + 3 * 86_400);
    expect(boundary(anchor, { interval: 'year', interval_count: 1 }, 1)).toBe(at('2029-02-28T12:00:00Z'));
  });

  it('go on from any moment, the boundary itself belonging to the next period', () => {
    const anchor = at('2026-01-31T10:00:00Z');
    expect(boundaryAfter(anchor, monthly, anchor)).toBe(at('2026-02-28T10:00:00Z'));
    expect(boundaryAfter(anchor, monthly, at('2026-02-28T10:00:00Z'))).toBe(at('2026-03-31T10:00:00Z'));
    expect(boundaryAfter(anchor, monthly, at('2026-01-30T10:00:00Z'))).toBe(anchor);
  });
});
