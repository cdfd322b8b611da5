import { maySeeOrder } from './may-see-order.js';

const order = { personId: 'wren', keyHash: 'a'.repeat(64) };

describe('an order', () => {
  it('is seen by its person and by whoever holds its key', () => {
    expect(maySeeOrder(order, { id: 'wren' }, null)).toBe(true);
    expect(maySeeOrder(order, null, 'a'.repeat(64))).toBe(true);
    expect(maySeeOrder(order, { id: 'knot' }, 'a'.repeat(64))).toBe(true);
  });

  it('is hidden from everybody else', () => {
    expect(maySeeOrder(order, null, null)).toBe(false);
    expect(maySeeOrder(order, { id: 'knot' }, null)).toBe(false);
    expect(maySeeOrder(order, null, 'b'.repeat(64))).toBe(false);
  });

  it('without a person is seen by its key alone', () => {
    expect(maySeeOrder({ ...order, personId: null }, { id: 'wren' }, null)).toBe(false);
  });
});
