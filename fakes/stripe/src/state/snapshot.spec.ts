import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startFakeStripe } from '../index.js';
import { clientOf, Shop } from '../testing/shop.js';

describe('the state file', () => {
  let folder: string;
  let stateFile: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'fake-stripe-'));
    stateFile = join(folder, 'state.json');
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('keeps sessions, keys, clock and waiting webhooks over a restart', async () => {
    const before = await Shop.open({ stateFile });
    await before.control('/webhooks', { paused: true });
    const { session } = await before.paidSession();
    const open = await before.openSession();
    const customer = await before.stripe.customers.create({ name: 'Ada' }, { idempotencyKey: 'k1' });
    await before.control('/clock', { advanceSeconds: 120 });
    await before.close();
    expect(readdirSync(folder)).toEqual(['state.json']);

    const after = await Shop.open({ stateFile });
    expect(await after.stripe.checkout.sessions.retrieve(session.id)).toMatchObject({
      payment_status: 'paid',
    });
    const again = await after.stripe.customers.create({ name: 'Ada' }, { idempotencyKey: 'k1' });
    expect(again.id).toBe(customer.id);
    const { clock } = await after.peek<{ clock: { offsetSeconds: number } }>('/state');
    expect(clock.offsetSeconds).toBe(120);
    await after.control(`/sessions/${open.id}/pay`);
    await after.control('/webhooks/flush');
    expect(after.types().filter((type) => type === 'checkout.session.completed')).toHaveLength(2);
    await after.close();
  });

  it('keeps subscriptions, which go on after a restart, and a test clock that was on its way', async () => {
    const before = await Shop.open({ stateFile });
    const clock = await before.stripe.testHelpers.testClocks.create({ frozen_time: 1_900_000_000 });
    const bound = await before.runningPledge({}, { test_clock: clock.id });
    const free = await before.runningPledge({ later: 'decline' });
    await before.stripe.testHelpers.testClocks.advance(clock.id, {
      frozen_time: 1_900_000_000 + 32 * 86_400,
    });
    await before.close();

    const after = await Shop.open({ stateFile });
    const arrived = await after.stripe.testHelpers.testClocks.retrieve(clock.id);
    expect(arrived.status).toBe('ready');
    const invoices = await after.stripe.invoices.list({ subscription: bound.subscriptionId });
    expect(invoices.data.map(({ status }) => status)).toEqual(['paid', 'paid']);
    await after.control('/clock', { advanceSeconds: 32 * 86_400 });
    const { status } = await after.stripe.subscriptions.retrieve(free.subscriptionId);
    expect(status).toBe('past_due');
    await after.close();
  });

  it('of an earlier day, without subscriptions, is taken as it is', async () => {
    const before = await Shop.open({ stateFile });
    const open = await before.openSession();
    await before.close();
    const saved = JSON.parse(readFileSync(stateFile, 'utf8')) as Record<string, unknown[]>;
    for (const key of ['subscriptions', 'invoices', 'savedCards', 'billing', 'testClocks']) delete saved[key];
    const [detail] = saved.sessionDetails as Record<string, unknown>[];
    for (const key of ['subscriptionData', 'subscriptionId', 'endsAt']) delete detail?.[key];
    writeFileSync(stateFile, JSON.stringify(saved));

    const after = await Shop.open({ stateFile });
    await after.control(`/sessions/${open.id}/pay`);
    expect((await after.stripe.checkout.sessions.retrieve(open.id)).payment_status).toBe('paid');
    expect((await after.runningPledge()).subscriptionId).toMatch(/^sub_/);
    await after.close();
  });

  it('never gives an id twice after a restart with the same seed', async () => {
    const first = await startFakeStripe({ stateFile, seed: 3 });
    const one = await clientOf(first).customers.create({});
    await first.stop();
    const second = await startFakeStripe({ stateFile, seed: 3 });
    const two = await clientOf(second).customers.create({});
    await second.stop();
    expect(two.id).not.toBe(one.id);
  });

  it('is refused, by name and with a mend, where it is something else', async () => {
    writeFileSync(stateFile, '{"format":"other"}');
    await expect(startFakeStripe({ stateFile })).rejects.toThrow(
      `The state file ${stateFile} cannot be used`,
    );
  });
});
