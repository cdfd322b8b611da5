import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
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
