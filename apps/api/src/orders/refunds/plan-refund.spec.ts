import { isStillLeft, planRefund, spreadRefund, type RefundableOrderLine } from './plan-refund.js';

const line = (
  id: string,
  totalMinor: number,
  more: Partial<RefundableOrderLine> = {},
): RefundableOrderLine => ({
  id,
  kitName: id,
  licenceName: 'Personal prints',
  totalMinor,
  refundedMinor: 0,
  askedMinor: 0,
  ...more,
});
const how = { currency: 'EUR', locale: 'en-IE' };
const refusalOf = (work: () => unknown): string => {
  try {
    work();
  } catch (fault) {
    return (fault as { detail: string }).detail;
  }
  return '';
};

describe('planning a refund', () => {
  const lines = [
    line('Knot', 600, { refundedMinor: 100 }),
    line('Plover', 1333, { askedMinor: 333 }),
    line('Gauge', 0),
  ];

  it('of the whole order takes what is left of each line, and ends the right of a free one, too', () => {
    expect(planRefund({ whole: { keepsEntitlement: false } }, lines, how)).toEqual([
      { orderLineId: 'Knot', amountMinor: 500, keepsEntitlement: false },
      { orderLineId: 'Plover', amountMinor: 1000, keepsEntitlement: false },
      { orderLineId: 'Gauge', amountMinor: 0, keepsEntitlement: false },
    ]);
  });

  it('by line takes what is asked for, up to what is left', () => {
    const ask = (orderLineId: string, amountMinor: number) =>
      planRefund({ lines: [{ orderLineId, amountMinor, keepsEntitlement: true }] }, lines, how);
    expect(ask('Plover', 1000)).toHaveLength(1);
    expect(refusalOf(() => ask('Plover', 1001))).toBe(
      'For Plover no more than €10.00 can go back. Ask for that or less.',
    );
    expect(refusalOf(() => ask('Knot', 0))).toMatch(/^Write how much goes back for Knot/);
    expect(refusalOf(() => ask('Godwit', 5))).toMatch(/not of this order/);
  });

  it('is refused where nothing is left', () => {
    const gone = [line('Knot', 600, { refundedMinor: 600 })];
    expect(refusalOf(() => planRefund({ whole: { keepsEntitlement: false } }, gone, how))).toBe(
      'Nothing is left to give back for this order.',
    );
    const asked = { lines: [{ orderLineId: 'Knot', amountMinor: 1, keepsEntitlement: false }] };
    expect(refusalOf(() => planRefund(asked, gone, how))).toBe('Nothing is left to give back for Knot.');
  });

  it('leaves nothing, and not less, where the service gave back what was asked for here as well', () => {
    const both = [line('Knot', 600, { refundedMinor: 400, askedMinor: 400 })];
    expect(refusalOf(() => planRefund({ whole: { keepsEntitlement: false } }, both, how))).toMatch(
      /^Nothing is left/,
    );
  });
});

describe('a refund that was begun at the payment service', () => {
  const lines = [line('Knot', 900), line('Plover', 1999)];

  it('is spread over what is left of the lines, and keeps the rights while it is a part', () => {
    // Exact shares 310.45 and 689.55 of 1000: the unit left over goes to the larger remainder.
    expect(spreadRefund(1000, lines, 'EUR')).toEqual([
      { orderLineId: 'Knot', amountMinor: 310, keepsEntitlement: true },
      { orderLineId: 'Plover', amountMinor: 690, keepsEntitlement: true },
    ]);
  });

  it('ends the rights when it takes all that is left', () => {
    const left = [line('Knot', 900, { refundedMinor: 310 }), line('Plover', 1999, { refundedMinor: 690 })];
    expect(spreadRefund(1899, left, 'EUR')).toEqual([
      { orderLineId: 'Knot', amountMinor: 590, keepsEntitlement: false },
      { orderLineId: 'Plover', amountMinor: 1309, keepsEntitlement: false },
    ]);
  });

  it('may have taken what another refund planned for', () => {
    const planned = [{ orderLineId: 'Knot', amountMinor: 600, keepsEntitlement: false }];
    expect(isStillLeft(planned, lines)).toBe(true);
    expect(isStillLeft(planned, [line('Knot', 900, { refundedMinor: 310 })])).toBe(false);
  });
});
