import type { WorkshopOrder } from '@windchest/contracts';
import { emptyRefund, leftOf, planRefund, wholeRefund } from './refund-form.js';

const eur = (minor: number) => ({ minor, currency: 'EUR' });
const line = (id: string, totalMinor: number, refundedMinor = 0) => ({
  id,
  kitName: id,
  total: eur(totalMinor),
  refunded: eur(refundedMinor),
  right: 'active',
});
const order = (lines: ReturnType<typeof line>[], refunds: object[] = []) =>
  ({ lines, refunds, total: eur(0) }) as unknown as WorkshopOrder;
const form = (...lines: [amount: string, keepsEntitlement: boolean][]) => ({
  lines: lines.map(([amount, keepsEntitlement]) => ({ amount, keepsEntitlement })),
  reason: '',
});

describe('what is left of a line', () => {
  it('is what was paid, without what went back and what was asked for', () => {
    const asked = { state: 'asked', lines: [{ orderLineId: 'Knot', amount: eur(200) }] };
    const failed = { state: 'failed', lines: [{ orderLineId: 'Knot', amount: eur(900) }] };
    const knot = line('Knot', 900, 300);
    expect(leftOf(order([knot], [asked, failed]), knot as never)).toBe(400);
  });
});

describe('the form of a refund', () => {
  const two = order([line('Knot', 900), line('Plover', 1999, 999)]);

  it('begins whole for one kit, and empty for several', () => {
    expect(emptyRefund(order([line('Knot', 900)])).lines).toEqual([
      { amount: '9.00', keepsEntitlement: false },
    ]);
    expect(emptyRefund(two).lines.map((one) => one.amount)).toEqual(['', '']);
    expect(wholeRefund(two).map((one) => one.amount)).toEqual(['9.00', '10.00']);
  });

  it('sends the lines with an amount, and says which rights end and stay', () => {
    expect(planRefund(form(['4.50', true], ['10', false]), two)).toEqual({
      totalMinor: 1450,
      ending: ['Plover'],
      staying: ['Knot'],
      lines: [
        { orderLineId: 'Knot', amountMinor: 450, keepsEntitlement: true },
        { orderLineId: 'Plover', amountMinor: 1000, keepsEntitlement: false },
      ],
    });
    expect(planRefund(form(['', false], ['1.00', true]), two).lines).toHaveLength(1);
  });

  it('takes a free kit along only when all of the order goes back', () => {
    const withFree = order([line('Knot', 900), line('Gauge', 0)]);
    expect(planRefund(form(['9.00', false], ['', false]), withFree).ending).toEqual(['Knot', 'Gauge']);
    expect(planRefund(form(['8.99', false], ['', false]), withFree).ending).toEqual(['Knot']);
  });

  it('plans nothing from what cannot be read', () => {
    expect(planRefund(form(['ten', false], ['-5', false]), two)).toMatchObject({ totalMinor: 0, lines: [] });
  });
});
