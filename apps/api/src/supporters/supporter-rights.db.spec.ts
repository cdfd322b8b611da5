import type { WorkshopPlan } from '@windchest/contracts';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { hearAll, makePlan, planBody, pledgeAs } from '../testing/pledges.js';
import { signInAs } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';

describe('who may see and do what with supporters', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let plan: WorkshopPlan;
  let wren: Browser;
  let pledgeId: string;
  beforeAll(async () => {
    shop = await startPaymentShop();
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    plan = await makePlan(shop, { name: 'Tide table', kitIds: [knot.kitId] });
    wren = await signInAs(shop, 'buyer', 'wren@mail.example');
    await shop.database.query(`UPDATE people SET name = '=1+1' WHERE email = 'wren@mail.example'`);
    pledgeId = await pledgeAs(shop, wren, plan.id);
    await hearAll(shop);
  });
  afterAll(() => shop.stop());

  const ways = (browser: Browser) => {
    const path = `/api/pledges/${pledgeId}`;
    return [
      browser.get(path),
      browser.get(`${path}/payments`),
      browser.post(`${path}/refresh`),
      browser.post(`${path}/give-up`),
      browser.put(`${path}/plan`).send({ planId: plan.id }),
      browser.delete(`${path}/plan`),
      browser.post(`${path}/pause`).send({ months: 1 }),
      browser.post(`${path}/resume`),
      browser.post(`${path}/end`),
      browser.post(`${path}/keep`),
      browser.post(`${path}/card`).send({ attempt: pledgeId }),
    ];
  };

  it('a pledge is not there for anybody but its supporter, not even for the owner', async () => {
    for (const role of ['buyer', 'helper', 'owner'] as const) {
      const browser = await signInAs(shop, role);
      for (const way of ways(browser)) expect((await way.expect(404)).body.code).toBe('not-found');
      expect((await browser.get('/api/account/pledges').expect(200)).body.total).toBe(0);
    }
    expect((await wren.get(`/api/pledges/${pledgeId}`).expect(200)).body.state).toBe('current');
  });

  it('the workshop’s lists are for those who see money; plans are made by makers', async () => {
    const helper = await signInAs(shop, 'helper');
    for (const path of [
      'plans',
      'supporters',
      'supporters.csv',
      'supporter-figures',
      `supporters/${pledgeId}`,
    ])
      await helper.get(`/api/workshop/${path}`).expect(403);
    const bookkeeper = await signInAs(shop, 'bookkeeper');
    await bookkeeper
      .post('/api/workshop/plans')
      .send(planBody({ kitIds: [knot.kitId] }))
      .expect(403);

    const { body: list } = await bookkeeper
      .get('/api/workshop/supporters')
      .query({ state: 'current', planId: plan.id, search: 'wren' })
      .expect(200);
    expect(list).toMatchObject({ total: 1, items: [{ id: pledgeId, paid: { minor: 900 }, country: 'DE' }] });
    expect((await bookkeeper.get('/api/workshop/supporters?state=grace').expect(200)).body.total).toBe(0);
    const { body: one } = await bookkeeper.get(`/api/workshop/supporters/${pledgeId}`).expect(200);
    expect((one.history as { what: string }[]).map(({ what }) => what)).toEqual([
      'opening',
      'payment page opened',
      'paid',
      'current',
    ]);
    expect(one.consentText).toMatch(/at once/);
    const { body: figures } = await bookkeeper.get('/api/workshop/supporter-figures').expect(200);
    expect(figures).toMatchObject({ current: 1, grace: 0, paused: 0, monthly: { minor: 900 } });
    expect(figures.months).toHaveLength(12);
    expect(figures.months.at(-1)).toMatchObject({ payments: 1, gross: { minor: 900 } });
  });

  it('the CSV is safe to open in a program of tables', async () => {
    const bookkeeper = await signInAs(shop, 'bookkeeper');
    const { text } = await bookkeeper.get('/api/workshop/supporters.csv').expect(200);
    const [head, row] = text.split('\r\n');
    expect(head).toMatch(/^name,email,plan,state,currency,amount_each_month/);
    expect(row).toContain(`'=1+1,wren@mail.example,Tide table,current,EUR,9.00,9.00,DE,`);
  });

  it('a plan is refused below what can be charged, without kits, or under a name that is taken', async () => {
    const maker = await signInAs(shop, 'maker');
    const make = (changes: object) => maker.post('/api/workshop/plans').send({ ...planBody(), ...changes });
    const cheap = await make({ kitIds: [knot.kitId], amountMinor: 49 }).expect(422);
    expect(cheap.body).toMatchObject({
      code: 'plan-refused',
      fields: { amountMinor: expect.stringContaining('€0.50') as string },
    });
    await make({ kitIds: [] }).expect(422);
    expect((await make({ kitIds: [knot.kitId], name: 'tide TABLE' }).expect(409)).body.code).toBe(
      'already-exists',
    );
    const owner = await signInAs(shop, 'owner');
    const { body: log } = await owner.get('/api/workshop/log').query({ search: 'pledge plan' }).expect(200);
    expect(log.items[0]).toMatchObject({ what: 'made a pledge plan', subject: 'Tide table' });
  });

  it('everybody sees the plans on offer, the smallest first, with their kits as the shop draws them', async () => {
    await makePlan(shop, { name: 'Ebb', hasAllKits: true, amountMinor: 300 });
    await makePlan(shop, { name: 'Hidden', hasAllKits: true, amountMinor: 100, isOffered: false });
    const { body } = await shop.browser().get('/api/plans').expect(200);
    expect((body.items as { name: string }[]).map(({ name }) => name)).toEqual(['Ebb', 'Tide table']);
    expect(body.items[1].kits).toMatchObject([{ slug: knot.slug, rank: [] }]);
  });
});
