import { creditOf } from './credit-tax.js';
import type { ReceiptLine } from './receipt-parties.js';

const line = (orderLineId: string, totalMinor: number, ratePercent: string): ReceiptLine => ({
  orderLineId,
  kit: orderLineId,
  licence: 'Personal prints',
  revision: 'Mk 1.0',
  priceMinor: totalMinor,
  discountMinor: 0,
  totalMinor,
  ratePercent,
});

describe('what a credit note takes back', () => {
  // 22.00 with 19 % and 10.70 with 7 % in it: 18.49 and 3.51, 10.00 and 0.70 (Python decimal, ROUND_HALF_UP).
  const receipt = {
    currency: 'EUR',
    tax: [
      { country: 'DE', ratePercent: '19', netMinor: 1849, taxMinor: 351 },
      { country: 'DE', ratePercent: '7', netMinor: 1000, taxMinor: 70 },
    ],
    lines: [line('a', 1100, '19'), line('b', 1100, '19'), line('book', 1070, '7')],
  };

  it('is parted by rate, with the net of a rate spread over its lines', () => {
    const all = receipt.lines.map(({ orderLineId, totalMinor }) => ({
      orderLineId,
      amountMinor: totalMinor,
    }));
    const { tax, lines } = creditOf(receipt, [], all);
    expect(tax).toEqual(receipt.tax);
    expect(lines.map((one) => [one.orderLineId, one.totalMinor, one.netMinor])).toEqual([
      ['a', 1100, 925],
      ['b', 1100, 924],
      ['book', 1070, 1000],
    ]);
  });

  it('leaves out rates and lines of which nothing goes back', () => {
    const { tax, lines } = creditOf(
      receipt,
      [],
      [
        { orderLineId: 'a', amountMinor: 0 },
        { orderLineId: 'book', amountMinor: 535 },
      ],
    );
    expect(tax).toEqual([{ country: 'DE', ratePercent: '7', netMinor: 500, taxMinor: 35 }]);
    expect(lines).toMatchObject([{ orderLineId: 'book', totalMinor: 535, netMinor: 500 }]);
  });

  it('takes the rest with the last part, also after other lines of the rate went back', () => {
    const before = [{ orderLineId: 'a', amountMinor: 1100 }];
    const first = creditOf(receipt, [], before).tax[0];
    const second = creditOf(receipt, before, [{ orderLineId: 'b', amountMinor: 1100 }]).tax[0];
    expect((first?.netMinor ?? 0) + (second?.netMinor ?? 0)).toBe(1849);
    expect((first?.taxMinor ?? 0) + (second?.taxMinor ?? 0)).toBe(351);
  });
});
