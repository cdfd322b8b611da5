import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { startPaymentShop, type CheckoutAnswer, type PaymentShop } from '../testing/payment-shop.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';

describe('an order of somebody else', () => {
  let shop: PaymentShop;
  let knot: KitOnSale;
  let wren: Browser;
  let wrens: CheckoutAnswer;
  let guests: CheckoutAnswer;
  beforeAll(async () => {
    shop = await startPaymentShop({}, { webhooks: false });
    knot = await putKitOnSale(shop, { name: 'Knot', priceMinor: 900 });
    wren = await signInAs(shop, 'buyer', 'wren@mail.example');
    wrens = await shop.checkout([knot.licenceId], { browser: wren, email: 'wren@mail.example' });
    guests = await shop.checkout([knot.licenceId], { email: 'guest@mail.example' });
  });
  afterAll(() => shop.stop());

  const ways = (browser: Browser, orderId: string, key?: string) => {
    const query = key ? { key } : {};
    return [
      browser.get(`/api/orders/${orderId}`).query(query),
      browser.post(`/api/orders/${orderId}/refresh`).query(query),
      browser.post(`/api/orders/${orderId}/cancel`).query(query),
    ];
  };
  const expectHidden = async (browser: Browser, orderId: string, key?: string) => {
    for (const way of ways(browser, orderId, key)) expect((await way).body.code).toBe('not-found');
  };

  it('is not there for a visitor', async () => {
    await expectHidden(shop.browser(), wrens.orderId);
    await expectHidden(shop.browser(), guests.orderId);
  });

  it('is not there for another person who is signed in', async () => {
    await expectHidden(await signInAs(shop, 'buyer'), wrens.orderId);
    await expectHidden(await signInAs(shop, 'buyer'), guests.orderId);
  });

  it('is not there for a helper, who sees no money', async () => {
    const helper = await signInAs(shop, 'helper');
    await expectHidden(helper, wrens.orderId);
    expect((await helper.get(`/api/workshop/orders/${wrens.orderId}`).expect(403)).body.code).toBe(
      'forbidden',
    );
    await helper.get('/api/workshop/orders').expect(403);
    await helper.get('/api/workshop/orders.csv').expect(403);
  });

  it('is not there even for the owner, outside the workshop', async () => {
    await expectHidden(await signInAs(shop, 'owner'), wrens.orderId);
  });

  it('is not there with the key of another order or a made-up key', async () => {
    await expectHidden(shop.browser(), wrens.orderId, guests.orderKey);
    await expectHidden(shop.browser(), wrens.orderId, 'A'.repeat(43));
    const answer = await shop.browser().get(`/api/orders/${wrens.orderId}`).query({ key: 'short' });
    expect(answer.status).toBe(422);
  });

  it('looks like an order that never was', async () => {
    const never = '00000000-0000-4000-8000-000000000000';
    const [hidden, missing] = await Promise.all(
      [wrens.orderId, never].map((id) => shop.browser().get(`/api/orders/${id}`)),
    );
    expect({ ...hidden?.body, requestId: '' }).toEqual({ ...missing?.body, requestId: '' });
  });

  it('opens for its person and with its key', async () => {
    const mine = await wren.get(`/api/orders/${wrens.orderId}`).expect(200);
    expect(mine.body).toMatchObject({ id: wrens.orderId, isMine: true });
    const byKey = await shop
      .browser()
      .get(`/api/orders/${guests.orderId}`)
      .query({ key: guests.orderKey })
      .expect(200);
    expect(byKey.body).toMatchObject({ id: guests.orderId, isMine: false });
  });

  it('never stands in one’s own list', async () => {
    const { body } = await wren.get('/api/account/orders').expect(200);
    expect(body.items.map((order: { id: string }) => order.id)).toEqual([wrens.orderId]);
  });

  it('becomes one’s own when its address is verified, and not before', async () => {
    const email = 'sanderling@mail.example';
    const placed = await shop.checkout([knot.licenceId], { email });
    const { id } = await makePerson(shop, 'buyer', email, false);
    const browser = shop.browser();
    await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    expect((await browser.get('/api/account/orders').expect(200)).body.total).toBe(0);
    await browser.get(`/api/orders/${placed.orderId}`).expect(404);
    await browser.post('/api/account/verification').expect(202);
    await shop.drain();
    const token = shop.mailer.tokenFor(email, '/verify');
    await browser.post('/api/accounts/verify').send({ token }).expect(200);
    const { body } = await browser.get('/api/account/orders').expect(200);
    expect(body.items).toMatchObject([{ id: placed.orderId, isMine: true }]);
    expect(id).toHaveLength(36);
  });
});
