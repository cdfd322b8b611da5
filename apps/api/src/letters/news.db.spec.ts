import { createHmac } from 'node:crypto';
import type { Letter } from '@windchest/contracts';
import { RevisionReleasedSteps } from '../catalogue/release/revision-released-steps.js';
import { selectRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { letterOf } from '../testing/letters.js';
import { putOnShelf } from '../testing/released-revision.js';
import { putShapes } from '../testing/revision-with-shapes.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

const SECRET = 'bounce-secret-for-tests-0123456789abc';

describe('news, and mails about revisions', () => {
  let shop: TestApp;
  let kit: KitOnSale;
  let maker: Browser;
  beforeAll(async () => {
    shop = await startTestApp({ BOUNCE_ADDRESS: 'bounces@saltmarsh.example', BOUNCE_SECRET: SECRET });
    kit = await putKitOnSale(shop, { name: 'Curlew' });
    maker = await signInAs(shop, 'maker');
  });
  afterAll(() => shop.stop());
  beforeEach(() => (shop.mailer.sent.length = 0));

  const send = async (body: object): Promise<Letter> => {
    const { id } = (await maker.post('/api/workshop/letters').send(body).expect(201)).body as Letter;
    await maker.post(`/api/workshop/letters/${id}/sending`).send({ sendAt: null }).expect(200);
    await shop.drain();
    return (await maker.get(`/api/workshop/letters/${id}`).expect(200)).body as Letter;
  };
  const news = letterOf(null, {
    kind: 'news',
    subject: 'Turnstone is on the bench',
    body: 'Hello {name},\n\nten strings.\n',
  });

  it('come only to those who pressed the mailed link, until they press the other one', async () => {
    const visitor = shop.browser();
    for (const email of ['asks@mail.example', 'forgets@mail.example'])
      await visitor.post('/api/news').send({ email }).expect(202);
    await shop.drain();
    const token = shop.mailer.tokenFor('asks@mail.example', '/news/confirm');
    const confirmed = await visitor.post('/api/news/confirmation').send({ token }).expect(200);
    expect(confirmed.body).toEqual({ email: 'asks@mail.example' });
    shop.mailer.sent.length = 0;

    const letter = await send(news);
    expect(shop.mailer.sent.map(({ to }) => to)).toEqual(['asks@mail.example']);
    expect(letter.leftOut).toEqual([{ reason: 'not-confirmed', count: 1 }]);
    const mail = shop.mailer.lastTo('asks@mail.example');
    expect(mail.text).toContain('Hello,\n');
    expect(mail.headers?.['List-Unsubscribe-Post']).toBe('List-Unsubscribe=One-Click');
    const address = /^<http:\/\/127\.0\.0\.1(\/api\/unsubscribe\/[\w-]{43})>$/.exec(
      mail.headers?.['List-Unsubscribe'] ?? '',
    )?.[1] as string;

    // As RFC 8058 §3.2 has it: a POST of a form, from anywhere, without a cookie. A GET changes nothing.
    const opened = await shop.browser().get(address).expect(303);
    expect(opened.headers['location']).toBe(address.replace('/api', ''));
    expect((await visitor.get(`${address}/about`)).body).toMatchObject({ kind: 'news', isStopped: false });
    await shop
      .browser()
      .post(address)
      .unset('X-Windchest')
      .set('Origin', 'https://mail.elsewhere.example')
      .type('form')
      .send('List-Unsubscribe=One-Click')
      .expect(204);
    expect((await visitor.get(`${address}/about`)).body.isStopped).toBe(true);
    shop.mailer.sent.length = 0;
    const second = await send(news);
    expect(shop.mailer.sent).toEqual([]);
    expect(second.leftOut).toContainEqual({ reason: 'stopped', count: 1 });

    const archive = await visitor.get('/api/letters').expect(200);
    expect(archive.body.total).toBe(2);
    const page = await visitor.get(`/api/letters/${letter.slug}`).expect(200);
    expect(page.body).toMatchObject({
      subject: 'Turnstone is on the bench',
      body: 'Hello,\n\nten strings.\n',
    });
  });

  it('are asked for and stopped on the account', async () => {
    const person = await makePerson(shop, 'buyer', 'account@mail.example');
    const browser = shop.browser();
    await browser.post('/api/session').send({ email: person.email, passphrase: TEST_PASSPHRASE }).expect(200);
    expect((await browser.get('/api/account/news')).body).toEqual({ state: 'none' });
    expect((await browser.put('/api/account/news').send({ isWanted: true })).body).toEqual({
      state: 'confirmed',
    });
    expect((await browser.put('/api/account/news').send({ isWanted: false })).body).toEqual({
      state: 'stopped',
    });
  });

  it('tell of a revision whoever wanted that, once, each with their own list', async () => {
    const first = await putShapes(shop, kit.kitId, 5, [{ code: 'J-01', shape: 'a' }]);
    const watching = await makePerson(shop, 'buyer', 'watches@mail.example');
    const other = await makePerson(shop, 'buyer', 'other@mail.example');
    for (const person of [watching, other]) await putOnShelf(shop, person, kit.kitId, first);
    const browser = shop.browser();
    await browser
      .post('/api/session')
      .send({ email: watching.email, passphrase: TEST_PASSPHRASE })
      .expect(200);
    expect((await browser.get(`/api/shelf/${kit.slug}/watching`)).body).toEqual({ isOn: false });
    await browser.put(`/api/shelf/${kit.slug}/watching`).send({ isOn: true }).expect(200);
    const revisionId = await putShapes(shop, kit.kitId, 6, [
      { code: 'J-01', shape: 'b', mark: 'reprint needed', reason: 'Too tight' },
    ]);
    const released = { revisionId, label: 'Mk 1.6', kit: { id: kit.kitId, slug: kit.slug, name: kit.name } };
    for (let times = 0; times < 2; times++)
      await shop.app
        .get(Transactions, { strict: false })
        .run((tx) => shop.app.get(RevisionReleasedSteps, { strict: false }).run(tx, released));
    await shop.drain();
    expect(shop.mailer.sent.map(({ to }) => to)).toEqual(['watches@mail.example']);
    expect(shop.mailer.sent[0]?.text).toMatch(/J-01 Part J-01 × 1\n {2}Too tight/);
    const token = shop.mailer.tokenFor('watches@mail.example', '/unsubscribe');
    await shop.browser().post(`/api/unsubscribe/${token}`).expect(204);
    expect((await browser.get(`/api/shelf/${kit.slug}/watching`)).body).toEqual({ isOn: false });
  });

  /** The shape of a report by RFC 3464, appendix E, from memory. */
  const reportFor = (returnPath: string, status: string, action = 'failed'): string =>
    [
      'From: Mail Delivery System <postmaster@mail.example>',
      `To: <${returnPath}>`,
      'Subject: Undelivered',
      'MIME-Version: 1.0',
      'Content-Type: multipart/report; report-type=delivery-status; boundary="b"',
      '',
      '--b',
      'Content-Type: text/plain',
      '',
      'It could not be delivered.',
      '--b',
      'Content-Type: message/delivery-status',
      '',
      'Reporting-MTA: dns; mail.example',
      '',
      'Final-Recipient: rfc822; gone@mail.example',
      `Action: ${action}`,
      `Status: ${status}`,
      'Diagnostic-Code: smtp; 550 no such',
      ' mailbox here',
      '',
      '--b--',
      '',
    ].join('\r\n');

  it('that come back mark their recipient and spare a dead address, where the report is signed', async () => {
    const person = await makePerson(shop, 'buyer', 'gone@mail.example');
    const browser = shop.browser();
    await browser.post('/api/session').send({ email: person.email, passphrase: TEST_PASSPHRASE }).expect(200);
    await browser.put('/api/account/news').send({ isWanted: true }).expect(200);
    const { id } = await send({ ...news, subject: 'Third' });
    const { returnPath = '' } = shop.mailer.lastTo('gone@mail.example');
    expect(returnPath).toMatch(/^bounces\+[0-9a-f]{32}-[0-9a-f]{16}@saltmarsh\.example$/);
    const hand = (report: string, signature = createHmac('sha256', SECRET).update(report).digest('hex')) =>
      shop
        .browser()
        .post('/api/mails/bounces')
        .unset('X-Windchest')
        .set('Content-Type', 'message/rfc822')
        .set('X-Windchest-Signature', signature)
        .send(report);
    const stateOf = async () =>
      (
        await selectRows<{ state: string; reason: string | null }>(
          shop.database,
          'SELECT state, reason FROM letter_recipients WHERE letter_id = :id AND email = :email',
          { id, email: 'gone@mail.example' },
        )
      )[0];
    await hand(reportFor(returnPath, '5.1.1'), '00'.repeat(32)).expect(400);
    await hand(reportFor(returnPath, '4.4.1', 'delayed')).expect(204);
    await hand(reportFor(returnPath.replace(/-[0-9a-f]{16}@/, '-0123456789abcdef@'), '5.1.1')).expect(204);
    expect((await stateOf())?.state).toBe('sent');
    await hand(reportFor(returnPath, '5.1.1')).expect(204);
    await hand(reportFor(returnPath, '5.1.1')).expect(204);
    expect(await stateOf()).toEqual({ state: 'bounced', reason: '5.1.1 550 no such mailbox here' });
    shop.mailer.sent.length = 0;
    const next = await send({ ...news, subject: 'Fourth' });
    expect(shop.mailer.sent.map(({ to }) => to)).not.toContain('gone@mail.example');
    expect(next.leftOut).toContainEqual({ reason: 'address-dead', count: 1 });
  });
});
