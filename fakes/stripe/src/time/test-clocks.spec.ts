import { errorOf, Shop } from '../testing/shop.js';

const day = 86_400;
const start = Date.UTC(2030, 0, 31, 9) / 1000;

describe('test clocks', () => {
  let shop: Shop;
  beforeEach(async () => {
    shop = await Shop.open();
  });
  afterEach(() => shop.close());

  const arriveAt = async (id: string, time: number) => {
    const leaving = await shop.stripe.testHelpers.testClocks.advance(id, { frozen_time: time });
    expect(leaving).toMatchObject({
      status: 'advancing',
      status_details: { advancing: { target_frozen_time: time } },
    });
    for (;;) {
      const clock = await shop.stripe.testHelpers.testClocks.retrieve(id);
      if (clock.status === 'ready') return clock;
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
  };

  it('move the subscriptions of their customers, and nobody else', async () => {
    const clock = await shop.stripe.testHelpers.testClocks.create({ frozen_time: start, name: 'Winter' });
    const bound = await shop.runningPledge({}, { test_clock: clock.id });
    const free = await shop.runningPledge();
    const before = await shop.stripe.subscriptions.retrieve(bound.subscriptionId);
    expect(before).toMatchObject({ created: start, test_clock: clock.id, billing_cycle_anchor: start });
    await shop.arrived();
    const arrived = await arriveAt(clock.id, start + 62 * day);
    expect(arrived).toMatchObject({ frozen_time: start + 62 * day, status_details: {} });
    const after = await shop.stripe.subscriptions.retrieve(bound.subscriptionId);
    // From the 31st of January by way of the 28th of February to the 31st of March.
    expect(after.items.data[0]).toMatchObject({
      current_period_start: Date.UTC(2030, 2, 31, 9) / 1000,
      current_period_end: Date.UTC(2030, 3, 30, 9) / 1000,
    });
    const invoices = (await shop.stripe.invoices.list({ customer: bound.customerId })).data;
    expect(invoices.map(({ created, status }) => [created, status])).toEqual([
      [Date.UTC(2030, 2, 31, 9) / 1000, 'paid'],
      [Date.UTC(2030, 1, 28, 9) / 1000, 'paid'],
      [start, 'paid'],
    ]);
    expect((await shop.stripe.invoices.list({ customer: free.customerId })).data).toHaveLength(1);
    await shop.control('/webhooks/flush');
    expect(shop.types()[0]).toBe('test_helpers.test_clock.advancing');
    expect(shop.types().at(-1)).toBe('test_helpers.test_clock.ready');
    const paid = shop.received.filter(({ event }) => event.type === 'invoice.paid');
    expect(paid.map(({ event }) => event.created)).toEqual([
      Date.UTC(2030, 1, 28, 10) / 1000,
      Date.UTC(2030, 2, 31, 10) / 1000,
    ]);
  });

  it('go forward alone, one journey at a time', async () => {
    const { id } = await shop.stripe.testHelpers.testClocks.create({ frozen_time: start });
    const back = await errorOf(shop.stripe.testHelpers.testClocks.advance(id, { frozen_time: start - 1 }));
    expect(back.param).toBe('frozen_time');
    await shop.stripe.testHelpers.testClocks.advance(id, { frozen_time: start + 1 });
    const second = await errorOf(shop.stripe.testHelpers.testClocks.advance(id, { frozen_time: start + 2 }));
    expect(second.message).toContain('is advancing and cannot be advanced');
  });

  it('hide their customers from the common lists, and take them along when they are deleted', async () => {
    const clock = await shop.stripe.testHelpers.testClocks.create({ frozen_time: start });
    const { customerId, subscriptionId } = await shop.runningPledge({}, { test_clock: clock.id });
    expect((await shop.stripe.customers.list({ email: 'ada@example.test' })).data).toEqual([]);
    expect((await shop.stripe.customers.list({ test_clock: clock.id })).data).toHaveLength(1);
    expect((await shop.stripe.subscriptions.list()).data).toEqual([]);
    expect((await shop.stripe.subscriptions.list({ customer: customerId })).data).toHaveLength(1);
    expect(await shop.stripe.testHelpers.testClocks.del(clock.id)).toMatchObject({ deleted: true });
    expect(await shop.stripe.customers.retrieve(customerId)).toEqual(
      expect.objectContaining({ id: customerId, deleted: true }),
    );
    expect((await shop.stripe.subscriptions.retrieve(subscriptionId)).status).toBe('canceled');
  });
});
