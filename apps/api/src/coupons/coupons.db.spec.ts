import { newId } from '../database/columns.js';
import { Transactions, type Tx } from '../database/transactions.js';
import { couponBody, makeCoupon } from '../testing/coupons.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';
import { CouponsReader } from './coupons-reader.js';
import { Coupons } from './coupons.js';
import { SupporterCheck } from './supporter-check.js';

describe('coupons', () => {
  let shop: TestApp;
  let maker: Browser;
  let curlew: KitOnSale;
  let knot: KitOnSale;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
    curlew = await putKitOnSale(shop, { name: 'Curlew', priceMinor: 2400 });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
  });
  afterAll(() => shop.stop());

  const quote = async (couponCode: string, licenceIds = [curlew.licenceId], browser = shop.browser()) => {
    const items = licenceIds.map((licenceId) => ({ licenceId }));
    return (await browser.post('/api/basket/quote').send({ items, couponCode }).expect(200)).body;
  };

  it('are made, read, changed and logged', async () => {
    const made = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'spring-1', cap: 150 }))
      .expect(201);
    expect(made.body).toMatchObject({ code: 'SPRING-1', cap: 150, held: 0, redeemed: 0, left: 150 });
    const changed = await maker
      .put(`/api/workshop/coupons/${made.body.id}`)
      .send(couponBody({ code: 'SPRING-1', cap: 10, kitIds: [curlew.kitId] }))
      .expect(200);
    expect(changed.body).toMatchObject({ cap: 10, kits: [{ id: curlew.kitId, name: 'Curlew' }] });
    const { body } = await maker.get('/api/workshop/coupons').query({ search: 'spring' }).expect(200);
    expect(body).toMatchObject({ total: 1, items: [{ id: made.body.id }] });
    const owner = await signInAs(shop, 'owner');
    const { body: log } = await owner.get('/api/workshop/log').query({ search: 'SPRING-1' }).expect(200);
    expect(log.items).toMatchObject([
      { what: 'changed a coupon', before: { cap: 150, kitIds: [] }, after: { cap: 10 } },
      { what: 'made a coupon', after: { cap: 150 } },
    ]);
  });

  it('have codes that are unique whatever the capitals', async () => {
    await makeCoupon(shop, { code: 'TWICE' });
    const again = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'twice' }))
      .expect(409);
    expect(again.body).toMatchObject({ code: 'already-exists', fields: { code: 'This code is taken.' } });
    expect((await quote('twice')).coupon.code).toBe('TWICE');
  });

  it('take a third off 24.00: 16.00', async () => {
    await makeCoupon(shop, { code: 'WINDFALL' });
    expect(await quote('windfall')).toMatchObject({
      subtotal: { minor: 2400, currency: 'EUR' },
      discount: { minor: 800 },
      total: { minor: 1600 },
      coupon: { code: 'WINDFALL', left: null },
      couponFault: null,
    });
  });

  it('spread an amount over the kits they are for, and leave others alone', async () => {
    await makeCoupon(shop, { code: 'FIVE', off: { kind: 'amount', minor: 500 } });
    const both = await quote('FIVE', [curlew.licenceId, knot.licenceId]);
    // 500 by largest remainder over 2400 and 900: 363.6 and 136.4.
    expect(both.lines.map((line: { discount: { minor: number } }) => line.discount.minor)).toEqual([
      364, 136,
    ]);
    await makeCoupon(shop, {
      code: 'KNOTS',
      off: { kind: 'amount', minor: 500 },
      kitIds: [knot.kitId],
    });
    const one = await quote('KNOTS', [curlew.licenceId, knot.licenceId]);
    expect(one.lines.map((line: { discount: { minor: number } }) => line.discount.minor)).toEqual([0, 500]);
    expect((await quote('KNOTS')).couponFault.code).toBe('coupon-does-not-apply');
  });

  it('hold between their start and their end', async () => {
    const now = shop.clock.now().getTime();
    const at = (hours: number) => new Date(now + hours * 3_600_000).toISOString();
    await makeCoupon(shop, { code: 'EARLY', startsAt: at(1), endsAt: at(2) });
    await makeCoupon(shop, { code: 'LATE', startsAt: at(-2), endsAt: at(0.5) });
    await makeCoupon(shop, { code: 'ASLEEP', isActive: false });
    expect((await quote('EARLY')).couponFault.code).toBe('coupon-not-started');
    expect((await quote('LATE')).couponFault).toBeNull();
    const past = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'PAST', endsAt: at(-1) }))
      .expect(422);
    expect(past.body.fields.endsAt).toMatch(/passed already/);
    expect((await quote('ASLEEP')).couponFault.code).toBe('coupon-unknown');
    expect((await quote('NOWHERE')).couponFault.code).toBe('coupon-unknown');
    const priced = await quote('NOWHERE');
    expect(priced).toMatchObject({ coupon: null, discount: { minor: 0 }, total: { minor: 2400 } });
    shop.clock.advance(3600);
    expect((await quote('LATE')).couponFault.code).toBe('coupon-has-ended');
    expect((await quote('EARLY')).couponFault).toBeNull();
    shop.clock.advance(3600);
    expect((await quote('EARLY')).couponFault.code).toBe('coupon-has-ended');
    shop.clock.advance(-7200);
  });

  it('are refused where a price would be too small to charge, but may make a kit free', async () => {
    const dear = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'TOOMUCH', off: { kind: 'fraction', numerator: 99, denominator: 100 } }))
      .expect(422);
    expect(dear.body.code).toBe('coupon-refused');
    expect(dear.body.fields.off).toMatch(/Curlew.*€0\.24.*€0\.50/);
    await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'GIFT', off: { kind: 'fraction', numerator: 1, denominator: 1 } }))
      .expect(201);
    expect((await quote('GIFT')).total.minor).toBe(0);
  });

  it('are refused for a kit that does not exist', async () => {
    const answer = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'NOKIT', kitIds: ['00000000-0000-4000-8000-000000000000'] }))
      .expect(422);
    expect(answer.body.fields).toHaveProperty('kitIds');
  });

  it('are announced with the price of each licence they are for', async () => {
    const { id } = await makeCoupon(shop, { code: 'LAUNCH', cap: 3, kitIds: [knot.kitId] });
    await makeCoupon(shop, { code: 'QUIET', isAnnounced: false });
    const { body } = await shop.browser().get('/api/offers').expect(200);
    const offers = body as { code: string }[];
    expect(offers.filter((offer) => offer.code === 'LAUNCH')).toEqual([
      {
        kitSlug: knot.slug,
        licenceId: knot.licenceId,
        code: 'LAUNCH',
        label: 'A third off',
        price: { minor: 600, currency: 'EUR' },
        cap: 3,
        left: 3,
        endsAt: null,
      },
    ]);
    expect(offers.map((offer) => offer.code)).not.toContain('QUIET');
    await maker
      .put(`/api/workshop/coupons/${id}`)
      .send(couponBody({ code: 'LAUNCH', isActive: false }))
      .expect(200);
    const later = await shop.browser().get('/api/offers').expect(200);
    expect(later.body.map((offer: { code: string }) => offer.code)).not.toContain('LAUNCH');
  });

  it('tell the workshop when few places are left', async () => {
    const reader = shop.app.get(CouponsReader, { strict: false });
    const { id } = await makeCoupon(shop, { code: 'SCARCE', cap: 10 });
    const scarce = async () => (await reader.nearlyUsedUp()).filter((coupon) => coupon.id === id);
    const set = (held: number, redeemed: number) =>
      shop.database.query('UPDATE coupons SET held = ?, redeemed = ? WHERE id = ?', {
        replacements: [held, redeemed, id],
      });
    await set(3, 5);
    expect(await scarce()).toEqual([]);
    await set(3, 6);
    expect(await scarce()).toEqual([{ id, code: 'SCARCE', left: 1 }]);
  });

  it('hold from their smallest basket on and say what is missing', async () => {
    await makeCoupon(shop, { code: 'BIGGER', minBasketMinor: 3000, kitIds: [curlew.kitId] });
    expect((await quote('BIGGER')).couponFault).toEqual({
      code: 'coupon-basket-too-small',
      detail: 'The coupon BIGGER holds from €30.00 on. This basket is €6.00 short of that.',
    });
    // The whole basket counts, also kits the coupon takes nothing off.
    expect(await quote('BIGGER', [curlew.licenceId, knot.licenceId])).toMatchObject({
      couponFault: null,
      discount: { minor: 800 },
    });
    const offers = (await shop.browser().get('/api/offers').expect(200)).body as { code: string }[];
    expect(offers.map((offer) => offer.code)).not.toContain('BIGGER');
  });

  it('are for supporters alone where they say so', async () => {
    await makeCoupon(shop, { code: 'PLEDGED', isForSupporters: true, isAnnounced: false });
    const person = await makePerson(shop, 'buyer');
    const browser = shop.browser();
    await browser.post('/api/session').send({ email: person.email, passphrase: TEST_PASSPHRASE }).expect(200);
    const faultFor = async (who: Browser) => (await quote('PLEDGED', [curlew.licenceId], who)).couponFault;
    expect(await faultFor(shop.browser())).toMatchObject({
      code: 'coupon-for-supporters',
      detail: expect.stringContaining('Sign in') as string,
    });
    expect((await faultFor(browser)).detail).toContain('no current pledge');
    const check = shop.app.get(SupporterCheck, { strict: false });
    check.register((personId) => Promise.resolve(personId === person.id));
    expect(await faultFor(browser)).toBeNull();
    expect((await faultFor(await signInAs(shop, 'buyer'))).code).toBe('coupon-for-supporters');
    check.register(() => Promise.resolve(false));
    const announced = await maker
      .post('/api/workshop/coupons')
      .send(couponBody({ code: 'LOUD', isForSupporters: true }))
      .expect(422);
    expect(announced.body.fields).toHaveProperty('isAnnounced');
  });

  it('know one buyer as guest and signed in, whatever the capitals of the address', async () => {
    const { id } = await makeCoupon(shop, { code: 'ONCE', perBuyer: 1 });
    const coupons = shop.app.get(Coupons, { strict: false });
    const tern = await makePerson(shop, 'buyer', 'tern@mail.example');
    const unproved = await makePerson(shop, 'buyer', 'stint@mail.example', false);
    const hold = async (email: string, personId: string | null): Promise<string> => {
      const orderId = newId();
      const hit = shop.app
        .get(Transactions, { strict: false })
        .run(
          (tx) => coupons.hold(tx, { couponId: id, orderId, email, personId, discountMinor: 800 }),
          'read-committed',
        );
      return hit.then(
        () => 'held',
        (fault: { code: string }) => fault.code,
      );
    };
    expect(await hold('Tern@Mail.example', null)).toBe('held');
    for (const [email, personId] of [
      ['tern@mail.example', null],
      // The account of the guest's address, buying with another one.
      ['elsewhere@mail.example', tern.id],
    ] as const)
      expect(await hold(email, personId)).toBe('coupon-buyer-limit');
    // An address somebody only claims is theirs takes nothing from the one who used it as a guest.
    expect(await hold('stint@mail.example', null)).toBe('held');
    expect(await hold('other@mail.example', unproved.id)).toBe('held');
    expect(await hold('again@mail.example', unproved.id)).toBe('coupon-buyer-limit');
  });

  it('show how they were used, by day', async () => {
    const { id } = await makeCoupon(shop, { code: 'DAILY' });
    const coupons = shop.app.get(Coupons, { strict: false });
    const transactions = shop.app.get(Transactions, { strict: false });
    const today = shop.clock.now().toISOString().slice(0, 10);
    for (const end of ['redeem', 'redeem', 'giveBack', null] as const) {
      const orderId = newId();
      await transactions.run(async (tx) => {
        const email = `${orderId}@mail.example`;
        await coupons.hold(tx, { couponId: id, orderId, email, personId: null, discountMinor: 300 });
        if (end) await coupons[end](tx, orderId);
      }, 'read-committed');
    }
    const { body } = await maker.get(`/api/workshop/coupons/${id}/uses`).expect(200);
    expect(body).toEqual([
      { day: today, redeemed: 2, held: 1, givenBack: 1, takenOff: { minor: 600, currency: 'EUR' } },
    ]);
    await maker.get(`/api/workshop/coupons/${newId()}/uses`).expect(404);
  });

  it('move each place once: redeemed or given back, whatever is asked for again', async () => {
    const { id } = await makeCoupon(shop, { code: 'STEPS', cap: 3 });
    const coupons = shop.app.get(Coupons, { strict: false });
    const inTx = (work: (tx: Tx) => Promise<void>) =>
      shop.app.get(Transactions, { strict: false }).run(work, 'read-committed');
    const [kept, returned] = [newId(), newId()];
    for (const orderId of [kept, returned])
      await inTx((tx) =>
        coupons.hold(tx, {
          couponId: id,
          orderId,
          email: 'wren@mail.example',
          personId: null,
          discountMinor: 800,
        }),
      );
    for (let times = 0; times < 2; times++) {
      await inTx((tx) => coupons.redeem(tx, kept));
      await inTx((tx) => coupons.giveBack(tx, kept));
      await inTx((tx) => coupons.giveBack(tx, returned));
      await inTx((tx) => coupons.redeem(tx, returned));
      await inTx((tx) => coupons.redeem(tx, newId()));
    }
    const { body } = await maker.get(`/api/workshop/coupons/${id}`).expect(200);
    expect(body).toMatchObject({ held: 0, redeemed: 1, left: 2, takenOff: { minor: 800 } });
  });
});
