import { randomUUID } from 'node:crypto';
import type { ShelfItem, WorkshopPlan } from '@windchest/contracts';
import { selectRows } from '../../database/rows.js';
import { releaseWithBundle } from '../../testing/bundle.js';
import { putKitOnSale, type KitOnSale } from '../../testing/kit-on-sale.js';
import { sessionIdOf, startPaymentShop, type PaymentShop } from '../../testing/payment-shop.js';
import {
  cardWill,
  daysGoBy,
  hearAll,
  makePlan,
  pledgeAs,
  pledgeBody,
  readPledge,
} from '../../testing/pledges.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../../testing/sign-in.js';
import type { Browser } from '../../testing/test-app.js';
import { Supporters } from '../supporters.js';

describe('a pledge', () => {
  let shop: PaymentShop;
  let curlew: KitOnSale;
  let knot: KitOnSale;
  let plan: WorkshopPlan;
  beforeAll(async () => {
    shop = await startPaymentShop();
    curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    plan = await makePlan(shop, { kitIds: [curlew.kitId, knot.kitId] });
  });
  afterAll(() => shop.stop());

  const supporter = async (email = `wren-${randomUUID().slice(0, 8)}@mail.example`) => {
    const { id } = await makePerson(shop, 'buyer', email);
    const browser = shop.browser();
    await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    return { browser, email, personId: id };
  };
  const shelfOf = async (browser: Browser): Promise<ShelfItem[]> =>
    ((await browser.get('/api/shelf').expect(200)).body as { items: ShelfItem[] }).items;
  const mailsTo = (email: string) =>
    shop.mailer.sent.filter((mail) => mail.to === email).map((mail) => mail.subject);
  const grant = (browser: Browser, kit: KitOnSale, revisionId: string) =>
    browser.post('/api/shelf/grants').send({ kitSlug: kit.slug, revisionId });
  const isCurrent = (personId: string) => shop.app.get(Supporters, { strict: false }).isCurrent(personId);

  it('begins with its first payment: kits on the shelf, receipt, one mail', async () => {
    const { browser, email, personId } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'opening', deeds: ['give-up'] });
    expect(await shelfOf(browser)).toEqual([]);
    expect(await isCurrent(personId)).toBe(false);

    await hearAll(shop);
    const pledge = await readPledge(browser, pledgeId);
    expect(pledge).toMatchObject({
      state: 'current',
      amount: { minor: 900, currency: 'EUR' },
      cardLast4: '4242',
      endsAt: null,
      deeds: ['change-plan', 'pause', 'end', 'card'],
    });
    expect(pledge.nextPaymentAt).toBe(pledge.paidUntil);
    expect(await isCurrent(personId)).toBe(true);
    const shelf = await shelfOf(browser);
    expect(shelf.map((item) => item.slug).sort()).toEqual([curlew.slug, knot.slug].sort());
    expect(shelf[0]).toMatchObject({
      licenceName: 'Personal prints',
      sources: [{ source: 'pledge', until: pledge.paidUntil, releasedBefore: null }],
    });
    const { body } = await browser.get(`/api/pledges/${pledgeId}/payments`).expect(200);
    expect(body).toMatchObject({
      total: 1,
      items: [
        {
          amount: { minor: 900 },
          receiptNumber: expect.stringMatching(/^\d{4}-\d{6}$/) as string,
          // 19 % in Germany: 9.00 / 1.19 = 7.563…
          tax: [{ ratePercent: '19', net: { minor: 756 }, tax: { minor: 144 } }],
        },
      ],
    });
    expect(mailsTo(email)).toEqual([`Your pledge has begun: ${plan.name}`]);
  });

  it('is not opened without a proved address, without consent, twice, or for a plan no longer offered', async () => {
    const { browser } = await supporter();
    const unproved = await makePerson(shop, 'buyer', 'unproved@mail.example', false);
    const other = shop.browser();
    await other.post('/api/session').send({ email: unproved.email, passphrase: TEST_PASSPHRASE }).expect(200);
    const refused = await other.post('/api/pledges').send(pledgeBody(plan.id)).expect(403);
    expect(refused.body.code).toBe('address-not-verified');
    await browser
      .post('/api/pledges')
      .send(pledgeBody(plan.id, { hasConsented: false }))
      .expect(422);

    const attempt = randomUUID();
    const twice = await Promise.all(
      [1, 2, 3].map(() => browser.post('/api/pledges').send(pledgeBody(plan.id, { attempt })).expect(201)),
    );
    expect(new Set(twice.map((answer) => answer.body.paymentUrl as string)).size).toBe(1);
    // Another plan while the first page is open: that page is closed and makes way.
    const dear = await makePlan(shop, { hasAllKits: true, amountMinor: 1500 });
    const second = await browser.post('/api/pledges').send(pledgeBody(dear.id)).expect(201);
    expect(second.body.pledgeId).not.toBe(twice[0]?.body.pledgeId);
    await shop.control(`/sessions/${sessionIdOf(second.body.paymentUrl as string)}/pay`, { country: 'DE' });
    await hearAll(shop);
    const third = await browser.post('/api/pledges').send(pledgeBody(plan.id)).expect(409);
    expect(third.body.code).toBe('pledge-exists');
    const maker = await signInAs(shop, 'maker');
    const old = await makePlan(shop, { kitIds: [knot.kitId] });
    await maker
      .put(`/api/workshop/plans/${old.id}`)
      .send({ ...old, amountMinor: 900, kitIds: [knot.kitId], isOffered: false })
      .expect(200);
    const gone = (await supporter()).browser.post('/api/pledges').send(pledgeBody(old.id));
    expect((await gone.expect(422)).body.code).toBe('plan-refused');
  });

  it('brings each month’s receipt, a new revision at once, and what differs from the one held', async () => {
    const { browser, email } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    await hearAll(shop);
    await browser.post(`/api/shelf/${knot.slug}/held`).send({ revisionId: knot.revisionId }).expect(200);
    await daysGoBy(shop, 32);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'current' });
    const receipts = mailsTo(email).filter((subject) => subject.startsWith('Receipt'));
    expect(receipts).toHaveLength(1);
    const { revisionId } = await releaseWithBundle(shop, knot, 5);
    const { body } = await browser.get(`/api/shelf/${knot.slug}`).expect(200);
    expect(body).toMatchObject({ held: { id: knot.revisionId }, newest: { id: revisionId } });
    await grant(browser, knot, revisionId).expect(201);
  });

  it('lapses after its grace days, and leaves what was released in its time and what was bought', async () => {
    const { browser, email, personId } = await supporter();
    const before = await releaseWithBundle(shop, curlew, 5);
    await daysGoBy(shop, 1);
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    const bought = await shop.checkout([knot.licenceId], { browser, email });
    await shop.pay(bought.paymentUrl);
    await hearAll(shop);
    await cardWill(shop, pledgeId, 'decline');
    await daysGoBy(shop, 10);
    const during = await releaseWithBundle(shop, curlew, 6);

    await daysGoBy(shop, 22);
    const failing = await readPledge(browser, pledgeId);
    expect(failing).toMatchObject({ state: 'grace', deeds: ['end', 'card'] });
    expect(failing.settleUrl).toMatch(/^http/);
    expect(await isCurrent(personId)).toBe(true);
    await grant(browser, curlew, before.revisionId).expect(201);
    const failed = `The payment for ${plan.name} did not go through`;
    expect(mailsTo(email).filter((subject) => subject === failed)).toHaveLength(1);

    await daysGoBy(shop, 4, 3);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'lapsed', deeds: [] });
    expect(await isCurrent(personId)).toBe(false);
    const afterwards = await releaseWithBundle(shop, curlew, 7);
    for (const [revision, status] of [
      [before, 403],
      [during, 201],
      [afterwards, 403],
    ] as const)
      expect((await grant(browser, curlew, revision.revisionId)).status).toBe(status);
    const item = (await shelfOf(browser)).find(({ slug }) => slug === curlew.slug);
    expect(item).toMatchObject({ newest: { id: during.revisionId }, newerNotIncluded: 'Mk 1.7' });
    // Bought and pledged: the purchase stands by itself.
    const knots = (await shelfOf(browser)).find(({ slug }) => slug === knot.slug);
    expect(knots?.sources.map(({ source }) => source)).toEqual(['purchase']);
    await grant(browser, knot, knot.revisionId).expect(201);
    const told = mailsTo(email).filter((subject) => /lapse|go through/.test(subject));
    expect(told).toEqual([
      failed,
      expect.stringMatching(/^Your pledge lapses on/),
      `Your pledge has lapsed: ${plan.name}`,
    ]);

    await daysGoBy(shop, 40);
    expect(mailsTo(email).filter((subject) => /lapse|go through|Receipt/.test(subject))).toHaveLength(3);
    const again = await pledgeAs(shop, browser, plan.id);
    await hearAll(shop);
    expect(await readPledge(browser, again)).toMatchObject({ state: 'current' });
    await grant(browser, curlew, afterwards.revisionId).expect(201);
  });

  it('is saved in its grace days by another card, given on the service’s own page', async () => {
    const { browser } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id, { later: 'decline' });
    await hearAll(shop);
    await daysGoBy(shop, 33);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'grace' });
    const open = async () =>
      (await browser.post(`/api/pledges/${pledgeId}/card`).send({ attempt: randomUUID() }).expect(201)).body
        .url as string;
    const first = await open();
    const second = await open();
    const late = await shop
      .control(`/sessions/${sessionIdOf(first)}/pay`, { card: '5555555555554444' })
      .catch(() => 'closed');
    expect(late).toBe('closed');
    await shop.control(`/sessions/${sessionIdOf(second)}/pay`, { card: '5555555555554444', country: 'DE' });
    await hearAll(shop);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'current', cardLast4: '4444' });
    await daysGoBy(shop, 31);
    expect((await browser.get(`/api/pledges/${pledgeId}/payments`)).body.total).toBe(3);
  });

  it('ends with the month that is paid, and can be kept until then', async () => {
    const { browser, email } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    await hearAll(shop);
    const paidUntil = (await readPledge(browser, pledgeId)).paidUntil;
    const ending = (await browser.post(`/api/pledges/${pledgeId}/end`).expect(200)).body;
    expect(ending).toMatchObject({
      state: 'current',
      endsAt: paidUntil,
      nextPaymentAt: null,
      deeds: ['keep', 'card'],
    });
    await browser.post(`/api/pledges/${pledgeId}/pause`).send({ months: 1 }).expect(409);
    const kept = (await browser.post(`/api/pledges/${pledgeId}/keep`).expect(200)).body;
    expect(kept).toMatchObject({ state: 'current', endsAt: null, nextPaymentAt: paidUntil });
    await daysGoBy(shop, 32);
    expect((await browser.get(`/api/pledges/${pledgeId}/payments`)).body.total).toBe(2);
    await browser.post(`/api/pledges/${pledgeId}/end`).expect(200);
    await daysGoBy(shop, 31);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'ended', deeds: [] });
    expect((await browser.get(`/api/pledges/${pledgeId}/payments`)).body.total).toBe(2);
    expect(mailsTo(email).filter((subject) => /end/.test(subject))).toEqual([
      expect.stringMatching(/^Your pledge ends on/),
      expect.stringMatching(/^Your pledge ends on/),
      `Your pledge has ended: ${plan.name}`,
    ]);
  });

  it('rests for as many payments as are skipped, and goes on by itself', async () => {
    const { browser, email, personId } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    await hearAll(shop);
    const paused = (await browser.post(`/api/pledges/${pledgeId}/pause`).send({ months: 1 }).expect(200))
      .body;
    expect(paused.nextPaymentAt).toBe(paused.pausedUntil);
    await daysGoBy(shop, 32.5);
    expect(await readPledge(browser, pledgeId)).toMatchObject({
      state: 'paused',
      deeds: ['resume', 'end', 'card'],
    });
    expect(await isCurrent(personId)).toBe(false);
    expect((await grant(browser, knot, knot.revisionId)).body.detail).toMatch(/rests/);
    await daysGoBy(shop, 25, 2, 1, 1, 2);
    expect(await readPledge(browser, pledgeId)).toMatchObject({ state: 'current', pausedUntil: null });
    expect((await browser.get(`/api/pledges/${pledgeId}/payments`)).body.total).toBe(2);
    await grant(browser, knot, knot.revisionId).expect(201);
    expect(mailsTo(email).slice(1, 3)).toEqual([
      expect.stringMatching(/^Your pledge rests until/),
      expect.stringMatching(/^Your pledge goes on, on/),
    ]);
  });

  it('changes its plan with the next payment, and the shelf with it', async () => {
    const { browser } = await supporter();
    const small = await makePlan(shop, { kitIds: [knot.kitId], amountMinor: 400, keepsAfter: 'nothing' });
    const pledgeId = await pledgeAs(shop, browser, small.id);
    await hearAll(shop);
    const chosen = (await browser.put(`/api/pledges/${pledgeId}/plan`).send({ planId: plan.id }).expect(200))
      .body;
    expect(chosen).toMatchObject({
      plan: { id: small.id },
      nextPlan: { id: plan.id, amount: { minor: 900 }, from: chosen.paidUntil },
    });
    expect((await shelfOf(browser)).map(({ slug }) => slug)).toEqual([knot.slug]);
    await daysGoBy(shop, 32);
    const now = await readPledge(browser, pledgeId);
    expect(now).toMatchObject({ plan: { id: plan.id }, amount: { minor: 900 }, nextPlan: null });
    expect((await shelfOf(browser)).map(({ slug }) => slug).sort()).toEqual([curlew.slug, knot.slug].sort());
    const [first, second] = (await browser.get(`/api/pledges/${pledgeId}/payments`)).body.items as {
      amount: { minor: number };
      planName: string;
    }[];
    expect([first, second]).toMatchObject([
      { amount: { minor: 900 }, planName: plan.name },
      { amount: { minor: 400 }, planName: small.name },
    ]);
    await browser.put(`/api/pledges/${pledgeId}/plan`).send({ planId: small.id }).expect(200);
    const stayed = (await browser.delete(`/api/pledges/${pledgeId}/plan`).expect(200)).body;
    expect(stayed).toMatchObject({ plan: { id: plan.id }, nextPlan: null });
    const [row] = await selectRows<{ flags: unknown }>(
      shop.database,
      'SELECT JSON_LENGTH(flags) AS flags FROM pledges WHERE id = :pledgeId',
      { pledgeId },
    );
    expect(Number(row?.flags)).toBe(0);
  });

  it('follows the kits of its plan, whose new amount is for new pledges only', async () => {
    const { browser } = await supporter();
    const maker = await signInAs(shop, 'maker');
    const growing = await makePlan(shop, { kitIds: [knot.kitId], keepsAfter: 'nothing' });
    const all = await makePlan(shop, { hasAllKits: true });
    const pledgeId = await pledgeAs(shop, browser, growing.id);
    const everything = await supporter();
    await pledgeAs(shop, everything.browser, all.id);
    await hearAll(shop);
    await maker
      .put(`/api/workshop/plans/${growing.id}`)
      .send({ ...growing, kitIds: [curlew.kitId], amountMinor: 1200 })
      .expect(200);
    await shop.drain();
    expect((await shelfOf(browser)).map(({ slug }) => slug)).toEqual([curlew.slug]);
    expect((await readPledge(browser, pledgeId)).amount.minor).toBe(900);
    await daysGoBy(shop, 32);
    expect((await browser.get(`/api/pledges/${pledgeId}/payments`)).body.items[0].amount.minor).toBe(900);
    const { body } = await maker.get(`/api/workshop/plans/${growing.id}`).expect(200);
    expect(body).toMatchObject({ areShelvesUpToDate: true, supporters: 1, monthly: { minor: 900 } });

    const teal = await putKitOnSale(shop, { name: 'Teal', priceMinor: 1900 });
    expect((await shelfOf(everything.browser)).map(({ slug }) => slug)).not.toContain(teal.slug);
    await maker.patch(`/api/workshop/kits/${teal.kitId}`).send({ isListed: true }).expect(200);
    await shop.drain();
    expect((await shelfOf(everything.browser)).map(({ slug }) => slug)).toContain(teal.slug);
  });

  it('rests while a payment is in dispute, and staff see why', async () => {
    const { browser } = await supporter();
    const pledgeId = await pledgeAs(shop, browser, plan.id);
    await hearAll(shop);
    const [payment] = await selectRows<{ intent: string }>(
      shop.database,
      'SELECT payment_intent_id AS intent FROM pledge_payments WHERE pledge_id = :pledgeId',
      { pledgeId },
    );
    const dispute = await shop.control<{ id: string }>('/disputes', {
      payment_intent: payment?.intent,
      reason: 'fraudulent',
    });
    await hearAll(shop);
    expect((await grant(browser, knot, knot.revisionId)).body.detail).toMatch(/rests/);
    const bookkeeper = await signInAs(shop, 'bookkeeper');
    const seen = (await bookkeeper.get(`/api/workshop/supporters/${pledgeId}`).expect(200)).body;
    expect(seen.flags).toEqual(['disputed']);
    expect((seen.history as { what: string }[]).map(({ what }) => what)).toContain('payment disputed');
    await shop.control(`/disputes/${dispute.id}/close`, { status: 'won' });
    await hearAll(shop);
    await grant(browser, knot, knot.revisionId).expect(201);
  });
});
