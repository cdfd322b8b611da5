import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';

describe('accounts', () => {
  let shop: TestApp;
  beforeAll(async () => (shop = await startTestApp()));
  afterAll(() => shop.stop());
  const wren = { email: 'wren@mail.example', name: 'Wren', passphrase: 'sandpipers at low water' };

  it('join, verify by the mailed link, sign out and in again', async () => {
    const browser = shop.browser();
    await browser
      .post('/api/accounts')
      .send({ ...wren, email: ' Wren@Mail.example ' })
      .expect(202);
    await shop.drain();
    expect(shop.mailer.lastTo(wren.email).subject).toMatch(/address/i);
    const token = shop.mailer.tokenFor(wren.email, '/verify');
    const verified = await browser.post('/api/accounts/verify').send({ token }).expect(200);
    expect(verified.body.person).toMatchObject({ email: wren.email, role: 'buyer', isVerified: true });
    expect((await browser.get('/api/session')).body.person.name).toBe('Wren');

    await browser.delete('/api/session').expect(204);
    expect((await browser.get('/api/session')).body.person).toBeNull();
    await browser.post('/api/session').send({ email: wren.email, passphrase: wren.passphrase }).expect(200);
    expect((await browser.get('/api/session')).body.person.email).toBe(wren.email);
  });

  it('refuse a verification link the second time', async () => {
    const token = shop.mailer.tokenFor(wren.email, '/verify');
    const again = await shop.browser().post('/api/accounts/verify').send({ token }).expect(410);
    expect(again.body.code).toBe('link-is-used-up');
  });

  it('never tell whether an address has an account', async () => {
    const unknown = await shop
      .browser()
      .post('/api/session')
      .send({ email: 'nobody@mail.example', passphrase: 'whatever it may be' })
      .expect(401);
    const wrong = await shop
      .browser()
      .post('/api/session')
      .send({ email: wren.email, passphrase: 'whatever it may be' })
      .expect(401);
    expect(unknown.body.detail).toBe(wrong.body.detail);
    const count = shop.mailer.sent.length;
    for (const path of ['sign-in-links', 'forgotten'])
      await shop.browser().post(`/api/accounts/${path}`).send({ email: 'nobody@mail.example' }).expect(202);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(count);
    await shop.browser().post('/api/accounts').send(wren).expect(202);
    await shop.drain();
    expect(shop.mailer.lastTo(wren.email).subject).toMatch(/already/i);
  });

  it('sign in by a one-time link, once', async () => {
    await shop.browser().post('/api/accounts/sign-in-links').send({ email: wren.email }).expect(202);
    await shop.drain();
    const token = shop.mailer.tokenFor(wren.email, '/sign-in/link');
    const browser = shop.browser();
    await browser.post('/api/session/from-link').send({ token }).expect(200);
    expect((await browser.get('/api/session')).body.person.email).toBe(wren.email);
    await shop.browser().post('/api/session/from-link').send({ token }).expect(410);
  });

  it('let a sign-in link expire', async () => {
    await shop.browser().post('/api/accounts/sign-in-links').send({ email: wren.email }).expect(202);
    await shop.drain();
    shop.clock.advance(21 * 60);
    const late = await shop
      .browser()
      .post('/api/session/from-link')
      .send({ token: shop.mailer.tokenFor(wren.email, '/sign-in/link') })
      .expect(410);
    expect(late.body.code).toBe('link-has-expired');
    shop.clock.advance(-21 * 60);
  });

  it('reset a passphrase by mail: the old one and all sessions end, and the owner is told', async () => {
    const old = shop.browser();
    await old.post('/api/session').send({ email: wren.email, passphrase: wren.passphrase }).expect(200);
    await shop.browser().post('/api/accounts/forgotten').send({ email: wren.email }).expect(202);
    await shop.drain();
    const token = shop.mailer.tokenFor(wren.email, '/reset');
    const short = await shop
      .browser()
      .post('/api/accounts/reset')
      .send({ token, passphrase: 'passwordpassword' })
      .expect(422);
    expect(short.body.code).toBe('passphrase-refused');
    await shop
      .browser()
      .post('/api/accounts/reset')
      .send({ token, passphrase: 'turnstones turn stones' })
      .expect(200);
    expect((await old.get('/api/session')).body.person).toBeNull();
    await shop
      .browser()
      .post('/api/session')
      .send({ email: wren.email, passphrase: wren.passphrase })
      .expect(401);
    await shop
      .browser()
      .post('/api/session')
      .send({ email: wren.email, passphrase: 'turnstones turn stones' })
      .expect(200);
    await shop.drain();
    expect(shop.mailer.lastTo(wren.email).subject).toMatch(/passphrase/i);
  });

  it('give the session a new id at sign-in', async () => {
    const { email } = await makePerson(shop, 'buyer');
    const browser = shop.browser();
    const first = await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    const second = await browser
      .post('/api/session')
      .send({ email, passphrase: TEST_PASSPHRASE })
      .expect(200);
    const cookie = (answer: { headers: Record<string, unknown> }) => String(answer.headers['set-cookie']);
    expect(cookie(first)).toMatch(/HttpOnly; SameSite=Lax/);
    expect(cookie(second)).not.toBe(cookie(first));
  });

  it('list own sessions without showing their secrets, and end the others', async () => {
    const { email } = await makePerson(shop, 'buyer');
    const [one, two] = [shop.browser(), shop.browser()];
    for (const browser of [one, two])
      await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    const { body } = await one.get('/api/account/sessions').expect(200);
    expect(body).toHaveLength(2);
    expect(body.filter((session: { isThis: boolean }) => session.isThis)).toHaveLength(1);
    await one.delete('/api/account/sessions').expect(204);
    expect((await two.get('/api/session')).body.person).toBeNull();
    expect((await one.get('/api/session')).body.person.email).toBe(email);
  });

  it('invite staff by mail; every change is in the log; the last owner stays owner', async () => {
    const owner = await signInAs(shop, 'owner');
    await owner
      .post('/api/workshop/invitations')
      .send({ email: 'knot@saltmarsh.example', name: 'Knot', role: 'helper' })
      .expect(202);
    await shop.drain();
    const invited = shop.browser();
    const joined = await invited
      .post('/api/accounts/reset')
      .send({
        token: shop.mailer.tokenFor('knot@saltmarsh.example', '/reset'),
        passphrase: 'knots fly in great flocks',
      })
      .expect(200);
    expect(joined.body.person.role).toBe('helper');
    expect(joined.body.permissions).toContain('workshop:enter');
    expect(joined.body.permissions).not.toContain('orders:read');

    const { body: people } = await owner.get('/api/workshop/people').query({ role: 'owner' }).expect(200);
    const last = await owner
      .patch(`/api/workshop/people/${people.items[0].id}`)
      .send({ role: 'maker' })
      .expect(409);
    expect(last.body.detail).toMatch(/needs an owner/);
    const { body: log } = await owner.get('/api/workshop/log').expect(200);
    expect(log.items[0]).toMatchObject({
      what: 'invited',
      subject: 'knot@saltmarsh.example',
      after: { role: 'helper' },
    });
  });
});

describe('rate limits', () => {
  let shop: TestApp;
  beforeAll(async () => (shop = await startTestApp({ RATE_LIMITS_OFF: '0' })));
  afterAll(() => shop.stop());

  it('stop guessing after ten tries at one address and say how long to wait', async () => {
    const attempt = () =>
      shop
        .browser()
        .post('/api/session')
        .send({ email: 'target@mail.example', passphrase: 'guess after guess' });
    for (let tries = 0; tries < 10; tries++) await attempt().expect(401);
    const stopped = await attempt().expect(429);
    expect(stopped.body.detail).toMatch(/Wait \d+ (seconds|minutes)/);
    expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(0);
  });
});
