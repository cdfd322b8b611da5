import type { BuyerOrder } from '@windchest/contracts';
import { isJustPaid, withoutBought } from './bought-basket.js';

const line = (kitSlug: string) => ({ kitSlug }) as BuyerOrder['lines'][number];

describe('what stays in the basket after paying', () => {
  const items = [
    { kitSlug: 'curlew', licenceId: 'a' },
    { kitSlug: 'teal', licenceId: 'b' },
  ];

  it('is what was not bought', () => {
    expect(withoutBought(items, { lines: [line('curlew')] })).toEqual([items[1]]);
    expect(withoutBought(items, { lines: [line('dunlin')] })).toEqual(items);
  });

  it('is looked at for an order paid within the hour only', () => {
    const paidAt = '2026-11-12T14:00:00.000Z';
    const minutesLater = (minutes: number) => Date.parse(paidAt) + minutes * 60_000;
    expect(isJustPaid({ state: 'paid', paidAt }, minutesLater(5))).toBe(true);
    expect(isJustPaid({ state: 'paid', paidAt }, minutesLater(61))).toBe(false);
    expect(isJustPaid({ state: 'open', paidAt: null }, minutesLater(5))).toBe(false);
    expect(isJustPaid({ state: 'refunded', paidAt }, minutesLater(5))).toBe(false);
  });
});
