import { jest } from '@jest/globals';
import { randomUUID } from 'node:crypto';
import type { WorkshopPlan } from '@windchest/contracts';
import { PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Subscriptions } from '../../adapters/payments/subscriptions.js';
import { selectRows } from '../../database/rows.js';
import { putKitOnSale } from '../../testing/kit-on-sale.js';
import { sessionIdOf, startPaymentShop, type PaymentShop } from '../../testing/payment-shop.js';
import { cardWill, hearAll, makePlan, pledgeAs, pledgeBody, readPledge } from '../../testing/pledges.js';
import { signInAs } from '../../testing/sign-in.js';
import type { Browser } from '../../testing/test-app.js';

const DAY = 86_400;

describe('a storm of events about pledges', () => {
  let shop: PaymentShop;
  let plan: WorkshopPlan;
  const PLEDGES = 6;
  beforeAll(async () => {
    shop = await startPaymentShop();
    const knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    const teal = await putKitOnSale(shop, { name: 'Teal', priceMinor: 900 });
    plan = await makePlan(shop, { kitIds: [knot.kitId, teal.kitId], keepsAfter: 'nothing' });
  });
  afterAll(() => shop.stop());

  const rows = <Row extends object>(sql: string) => selectRows<Row>(shop.database, sql);
  const goBy = async (days: number) => {
    shop.clock.advance(days * DAY);
    await shop.control('/clock', { advanceSeconds: days * DAY });
  };
  const severalWorkers = () => Promise.all([shop.drain(), shop.drain(), shop.drain()]);

  it('five times each, shuffled, a third lost: each month is paid once, with one receipt and one mail', async () => {
    const third = PLEDGES / 3;
    const supporters: { browser: Browser; pledgeId: string; email: string }[] = [];
    await shop.control('/webhooks', { duplicates: 4, shuffle: true, seed: 11 });
    for (let n = 0; n < PLEDGES; n++) {
      const email = `supporter-${n}@mail.example`;
      const browser = await signInAs(shop, 'buyer', email);
      if (n === 2 * third) await shop.control('/webhooks', { lose: 1 });
      supporters.push({ browser, email, pledgeId: await pledgeAs(shop, browser, plan.id) });
    }
    // Browsers come back while events arrive and several workers run, all at the same time.
    await Promise.all([
      shop.control('/webhooks/flush'),
      ...supporters
        .filter((_, n) => n % 2 === 0)
        .map(({ browser, pledgeId }) => browser.post(`/api/pledges/${pledgeId}/refresh`).expect(200)),
      severalWorkers(),
    ]);
    shop.clock.advance(61);
    await severalWorkers();

    // The second month: one card in three fails, and nobody hears of anything for a third of them.
    for (const { pledgeId } of supporters.slice(0, third)) await cardWill(shop, pledgeId, 'decline');
    await shop.control('/webhooks', { duplicates: 4, shuffle: true, lose: 0.33, seed: 5 });
    await goBy(32);
    await Promise.all([shop.control('/webhooks/flush'), severalWorkers()]);
    await goBy(1);
    await Promise.all([shop.control('/webhooks/flush'), severalWorkers()]);

    const pledges = await rows<{ id: string; state: string; email: string }>(
      'SELECT p.id, p.state, n.email FROM pledges p JOIN people n ON n.id = p.person_id ORDER BY n.email',
    );
    expect(pledges.map(({ state }) => state)).toEqual([
      ...Array<string>(third).fill('grace'),
      ...Array<string>(2 * third).fill('current'),
    ]);
    const paid = await rows<{ n: number | string; invoices: number | string; receipts: number | string }>(
      `SELECT COUNT(*) AS n, COUNT(DISTINCT invoice_id) AS invoices, COUNT(DISTINCT receipt_number) AS receipts
       FROM pledge_payments`,
    );
    const months = PLEDGES + 2 * third;
    expect(Object.values(paid[0]!).map(Number)).toEqual([months, months, months]);
    // Gap-free in each year, for the second month may be of the next one.
    const gaps = await rows<{ gaps: number | string }>(
      'SELECT MAX(number) - COUNT(*) AS gaps FROM receipts GROUP BY year',
    );
    for (const year of gaps) expect(Number(year.gaps)).toBe(0);
    const entitled = await rows<{ state: string }>(`SELECT state FROM entitlements WHERE source = 'pledge'`);
    expect(entitled.map(({ state }) => state)).toEqual(Array<string>(2 * PLEDGES).fill('active'));
    for (const [n, { email }] of supporters.entries()) {
      const subjects = shop.mailer.sent.filter((mail) => mail.to === email).map((mail) => mail.subject);
      const second = n < third ? /did not go through/ : /^Receipt/;
      expect(subjects).toEqual([expect.stringMatching(/has begun/), expect.stringMatching(second)]);
    }

    // The grace days go by without a word from the service: the job finds out by itself.
    await shop.control('/webhooks', { lose: 1 });
    for (let day = 0; day < 6; day++) {
      await goBy(1);
      await severalWorkers();
    }
    const lapsed = await rows<{ n: number }>(`SELECT COUNT(*) AS n FROM pledges WHERE state = 'lapsed'`);
    expect(Number(lapsed[0]?.n)).toBe(third);
    const ended = await rows<{ n: number }>(`SELECT COUNT(*) AS n FROM entitlements WHERE state = 'ended'`);
    expect(Number(ended[0]?.n)).toBe(2 * third);
    const about = shop.mailer.sent.filter((mail) => /lapse/.test(mail.subject));
    expect(about).toHaveLength(2 * third);
    expect(await rows(`SELECT name, last_error FROM jobs WHERE state = 'dead'`)).toEqual([]);
    await shop.control('/webhooks', { reset: true });
  }, 300_000);
});

describe('an answer of the payment service that is lost on the way', () => {
  let shop: PaymentShop;
  let plan: WorkshopPlan;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    const knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    plan = await makePlan(shop, { kitIds: [knot.kitId] });
  });
  afterEach(() => jest.restoreAllMocks());
  afterAll(() => shop.stop());

  type Method = 'openPledgePage' | 'cancelAtPeriodEnd' | 'pause';
  /** The service does what it is asked, as often as it is asked, but its answers are lost. */
  const loseAnswers = (method: Method): void => {
    const service = shop.app.get(Subscriptions, { strict: false });
    const real = service[method].bind(service) as (argument: never) => Promise<never>;
    jest.spyOn(service, method).mockImplementation((async (argument: never) => {
      await real(argument);
      throw new PaymentsUnreachable('the answer was lost');
    }) as never);
  };
  const pledged = async () => {
    const browser = await signInAs(shop, 'buyer');
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    await browser.post(`/api/pledges/${pledgeId}/refresh`).expect(200);
    return { browser, pledgeId };
  };

  it('leaves one page to pay on, found again by the same attempt', async () => {
    const browser = await signInAs(shop, 'buyer');
    const body = pledgeBody(plan.id, { attempt: randomUUID() });
    loseAnswers('openPledgePage');
    expect((await browser.post('/api/pledges').send(body).expect(502)).body.code).toBe('payment-unreachable');
    jest.restoreAllMocks();
    const opened = await browser.post('/api/pledges').send(body).expect(201);
    await shop.control(`/sessions/${sessionIdOf(opened.body.paymentUrl as string)}/pay`, { country: 'DE' });
    const begun = (await browser.post(`/api/pledges/${opened.body.pledgeId}/refresh`).expect(200)).body;
    expect(begun.state).toBe('current');
    expect(
      Number((await selectRows<{ n: number }>(shop.database, 'SELECT COUNT(*) AS n FROM pledges'))[0]?.n),
    ).toBe(1);
  });

  it('keeps a wish until the service agrees with it', async () => {
    const { browser, pledgeId } = await pledged();
    loseAnswers('cancelAtPeriodEnd');
    const asked = (await browser.post(`/api/pledges/${pledgeId}/end`).expect(200)).body;
    expect(asked).toMatchObject({ state: 'current', endsAt: asked.paidUntil, deeds: ['keep', 'card'] });
    jest.restoreAllMocks();
    shop.clock.advance(11);
    await hearAll(shop);
    const [row] = await selectRows<{ ends: Date | null }>(
      shop.database,
      'SELECT ends_at AS ends FROM pledges WHERE id = :pledgeId',
      { pledgeId },
    );
    expect(row?.ends?.toISOString()).toBe((await readPledge(browser, pledgeId)).paidUntil);
  });

  it('passes on a wish that was written down just before everything stopped', async () => {
    const { browser, pledgeId } = await pledged();
    // As after a kill: the wish and its job are there, and nobody has told the service.
    const service = shop.app.get(Subscriptions, { strict: false });
    jest.spyOn(service, 'pause').mockRejectedValue(new PaymentsUnreachable('stopped'));
    await browser.post(`/api/pledges/${pledgeId}/pause`).send({ months: 2 }).expect(200);
    jest.restoreAllMocks();
    shop.clock.advance(11);
    await shop.drain();
    const [row] = await selectRows<{ subscription: string }>(
      shop.database,
      'SELECT subscription_id AS subscription FROM pledges WHERE id = :pledgeId',
      { pledgeId },
    );
    expect(await service.findSubscription(row?.subscription ?? '')).toMatchObject({ isPaused: true });
  });
});
