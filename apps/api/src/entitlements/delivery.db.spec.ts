import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtemp, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { selectRows, touchRows } from '../database/rows.js';
import { releaseWithBundle, type StoredBundle } from '../testing/bundle.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { startPaymentShop, type PaymentShop } from '../testing/payment-shop.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';

const run = promisify(execFile);

const eventually = async <T>(ask: () => Promise<T>, isThere: (answer: T) => boolean): Promise<T> => {
  for (let tries = 0; ; tries++) {
    const answer = await ask();
    if (isThere(answer) || tries === 100) return answer;
    await new Promise((resolve) => setTimeout(resolve, 30));
  }
};

describe('delivery', () => {
  let shop: PaymentShop;
  let kit: KitOnSale;
  let bundle: StoredBundle;
  let buyer: { browser: Browser; email: string };

  const buy = async (email: string, browser = shop.browser()): Promise<string> => {
    const { orderId, paymentUrl } = await shop.checkout([kit.licenceId], { email, browser });
    await shop.pay(paymentUrl);
    for (let tries = 0; tries < 50; tries++) {
      await shop.drain();
      const [row] = await selectRows<{ state: string }>(
        shop.database,
        'SELECT state FROM orders WHERE id = :orderId',
        { orderId },
      );
      if (row?.state === 'paid') break;
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
    await shop.drain();
    return orderId;
  };
  const grantOf = async (browser: Browser): Promise<string> => {
    const { body } = await browser
      .post('/api/shelf/grants')
      .send({ kitSlug: kit.slug, revisionId: bundle.revisionId })
      .expect(201);
    return body.url as string;
  };
  /** The whole answer of a GET, as bytes. */
  const fetchBytes = (browser: Browser, url: string) =>
    browser
      .get(url)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      });

  beforeAll(async () => {
    shop = await startPaymentShop();
    kit = await putKitOnSale(shop);
    bundle = await releaseWithBundle(shop, kit, 5);
    const { email } = await makePerson(shop, 'buyer');
    const browser = shop.browser();
    await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
    buyer = { browser, email };
    await buy(email, browser);
  });
  afterAll(() => shop.stop());

  describe('to a person with an account', () => {
    it('puts the kit on the shelf, with the newest revision and none held yet', async () => {
      const { body } = await buyer.browser.get('/api/shelf').expect(200);
      expect(body).toMatchObject({
        total: 1,
        items: [{ slug: kit.slug, source: 'purchase', held: null, newest: { label: 'Mk 1.5' } }],
      });
      expect((await buyer.browser.get('/api/shelf/owned').expect(200)).body).toEqual([kit.slug]);
      const { body: one } = await buyer.browser.get(`/api/shelf/${kit.slug}`).expect(200);
      expect(one).toMatchObject({ rank: [], room: { temperatureC: 20 }, declaredCents: 12 });
    });

    it('hands the file out whole, named, with its hash as a strong ETag, and notes the revision held', async () => {
      const answer = await fetchBytes(buyer.browser, await grantOf(buyer.browser)).expect(200);
      expect(
        createHash('sha256')
          .update(answer.body as Buffer)
          .digest('hex'),
      ).toBe(bundle.sha256);
      expect(answer.headers['etag']).toBe(`"${bundle.sha256}"`);
      expect(answer.headers['accept-ranges']).toBe('bytes');
      expect(answer.headers['content-disposition']).toMatch(/^attachment; filename="?[\w.-]+\.zip"?/);
      expect(answer.headers['content-encoding']).toBeUndefined();
      const shelf = async () => (await buyer.browser.get(`/api/shelf/${kit.slug}`).expect(200)).body;
      const body = await eventually(shelf, (one) => one.held !== null);
      expect(body.held).toMatchObject({ label: 'Mk 1.5' });
      expect(body.downloads[0]).toMatchObject({ revision: 'Mk 1.5', isComplete: true });
    });

    it('answers ranges, If-Range, HEAD and If-None-Match as RFC 9110 has it', async () => {
      const url = await grantOf(buyer.browser);
      const part = await fetchBytes(buyer.browser, url).set('Range', 'bytes=1000-1999').expect(206);
      expect(part.headers['content-range']).toBe('bytes 1000-1999/200000');
      expect(Buffer.compare(part.body as Buffer, bundle.bytes.subarray(1000, 2000))).toBe(0);
      const tail = await fetchBytes(buyer.browser, url).set('Range', 'bytes=-500').expect(206);
      expect(Buffer.compare(tail.body as Buffer, bundle.bytes.subarray(-500))).toBe(0);
      await fetchBytes(buyer.browser, url)
        .set('Range', 'bytes=10-19')
        .set('If-Range', `"${bundle.sha256}"`)
        .expect(206);
      const changed = await fetchBytes(buyer.browser, url)
        .set('Range', 'bytes=10-19')
        .set('If-Range', '"another"')
        .expect(200);
      expect((changed.body as Buffer).length).toBe(200_000);
      const beyond = await buyer.browser.get(url).set('Range', 'bytes=300000-').expect(416);
      expect(beyond.headers['content-range']).toBe('bytes */200000');
      expect(beyond.body.code).toBe('range-not-satisfiable');
      const head = await buyer.browser.head(url).expect(200);
      expect(head.headers['content-length']).toBe('200000');
      await buyer.browser.get(url).set('If-None-Match', `"${bundle.sha256}"`).expect(304);
    });

    it('goes on with `curl -C -` after breaking off at 40 %, and the hash is right', async () => {
      const folder = await mkdtemp(join(tmpdir(), 'windchest-curl-'));
      const url = `${shop.url}${await grantOf(buyer.browser)}`;
      const login = await shop
        .browser()
        .post('/api/session')
        .send({ email: buyer.email, passphrase: TEST_PASSPHRASE })
        .expect(200);
      const cookie = String(login.headers['set-cookie']).split(';')[0] ?? '';
      const half = join(folder, 'bundle.zip');
      // A connection cut after 80,000 of 200,000 bytes leaves just these on the disk.
      const received = await new Promise<Buffer>((resolve, reject) => {
        const chunks: Buffer[] = [];
        let length = 0;
        request(url, { headers: { cookie } }, (response) => {
          response.on('data', (chunk: Buffer) => {
            chunks.push(chunk);
            length += chunk.length;
            if (length >= 80_000) response.destroy();
          });
          response.on('close', () => resolve(Buffer.concat(chunks)));
        })
          .on('error', reject)
          .end();
      });
      await writeFile(half, received.subarray(0, 80_000));
      await run('curl', [
        '--silent',
        '--show-error',
        '--fail',
        '--continue-at',
        '-',
        '--cookie',
        cookie,
        '--output',
        half,
        url,
      ]);
      expect((await stat(half)).size).toBe(200_000);
      expect(
        createHash('sha256')
          .update(await readFile(half))
          .digest('hex'),
      ).toBe(bundle.sha256);
      await rm(folder, { recursive: true });
    });

    it('counts what was sent, and a broken-off download as not complete', async () => {
      const url = await grantOf(buyer.browser);
      await fetchBytes(buyer.browser, url).set('Range', 'bytes=0-99').expect(206);
      const newest = async () =>
        (
          await selectRows<{ requests: number; bytes_sent: string; completed_at: Date | null }>(
            shop.database,
            'SELECT requests, bytes_sent, completed_at FROM downloads ORDER BY granted_at DESC, id DESC LIMIT 1',
          )
        )[0];
      expect(await newest()).toMatchObject({ requests: 1, completed_at: null });
      await fetchBytes(buyer.browser, url).set('Range', 'bytes=100-').expect(206);
      // The count is written when the last byte is out, a moment after the client has it.
      const after = await eventually(newest, (row) => row?.completed_at !== null);
      expect(after).toMatchObject({ requests: 2 });
      expect(Number(after?.bytes_sent)).toBe(200_000);
    });

    it('lets a person say which revision they printed', async () => {
      await buyer.browser
        .post(`/api/shelf/${kit.slug}/held`)
        .send({ revisionId: kit.revisionId })
        .expect(200);
      const { body } = await buyer.browser.get(`/api/shelf/${kit.slug}`).expect(200);
      expect(body.held.label).toBe('Mk 1.4');
      expect(body.newest.label).toBe('Mk 1.5');
      // What the tuner listens for is what was printed, not what came after.
      expect(body.declaredCents).toBe(10);
    });
  });

  describe('refuses what belongs to somebody else', () => {
    it('a shelf, a grant and a file address, to a signed-in stranger, a helper and a visitor', async () => {
      const url = await grantOf(buyer.browser);
      const stranger = await signInAs(shop, 'buyer');
      const helper = await signInAs(shop, 'helper');
      for (const other of [stranger, helper]) {
        await other.get(`/api/shelf/${kit.slug}`).expect(404);
        await other
          .post('/api/shelf/grants')
          .send({ kitSlug: kit.slug, revisionId: bundle.revisionId })
          .expect(404);
        await other.post(`/api/shelf/${kit.slug}/held`).send({ revisionId: bundle.revisionId }).expect(404);
        expect((await other.get(url).expect(404)).body.code).toBe('not-found');
        await other.head(url).expect(404);
      }
      await shop.browser().get(url).expect(404);
      await shop.browser().get(`/api/shelf/${kit.slug}`).expect(401);
    });

    it('a forged or altered address', async () => {
      const url = await grantOf(buyer.browser);
      const [text, signature] = (url.split('/').at(-1) ?? '').split('.') as [string, string];
      const facts = JSON.parse(Buffer.from(text, 'base64url').toString()) as Record<string, unknown>;
      const altered = Buffer.from(JSON.stringify({ ...facts, expires: 9_999_999_999 })).toString('base64url');
      await buyer.browser.get(`/api/files/${altered}.${signature}`).expect(404);
      await buyer.browser.get(`/api/files/${text}.${'A'.repeat(43)}`).expect(404);
    });

    it('an address that has had its time', async () => {
      const url = await grantOf(buyer.browser);
      shop.clock.advance(61 * 60);
      expect((await buyer.browser.get(url).expect(410)).body.code).toBe('link-has-expired');
      shop.clock.advance(-61 * 60);
    });

    it('a file of a right that has ended or rests, even by an address given out before', async () => {
      const email = `ended-${Math.floor(performance.now())}@mail.example`;
      const browser = await signInAs(shop, 'buyer', email);
      await buy(email, browser);
      const url = await grantOf(browser);
      await touchRows(shop.database, `UPDATE entitlements SET state = 'suspended' WHERE email = :email`, {
        email,
      });
      await browser.get(url).expect(403);
      await browser
        .post('/api/shelf/grants')
        .send({ kitSlug: kit.slug, revisionId: bundle.revisionId })
        .expect(403);
      expect((await browser.get('/api/shelf')).body.total).toBe(0);
    });
  });

  describe('by a mailed link', () => {
    const guest = 'guest.of.the.tide@mail.example';
    let token: string;
    beforeAll(async () => {
      await buy(guest);
      token = shop.mailer.tokenFor(guest, '/collect');
    });
    const wish = () => ({ kitSlug: kit.slug, revisionId: bundle.revisionId });

    it('opens a page, as often as mail scanners like, without using anything up', async () => {
      for (let times = 0; times < 5; times++) {
        const { body } = await shop.browser().get(`/api/collect/${token}`).expect(200);
        expect(body).toMatchObject({
          state: 'open',
          usesLeft: 10,
          kits: [{ slug: kit.slug, newest: { label: 'Mk 1.5' } }],
        });
      }
    });

    it('keeps only the hash of its secret', async () => {
      const rows = await selectRows<{ token_hash: string }>(shop.database, 'SELECT * FROM download_links');
      expect(rows.map((row) => row.token_hash)).toContain(createHash('sha256').update(token).digest('hex'));
      expect(
        JSON.stringify([
          rows,
          (await shop.database.query('SELECT * FROM mails'))[0],
          (await shop.database.query('SELECT * FROM jobs'))[0],
        ]),
      ).not.toContain(token);
    });

    it('gives a file address that works in the same browser and in no other', async () => {
      const browser = shop.browser();
      const { body } = await browser.post(`/api/collect/${token}/grants`).send(wish()).expect(201);
      const answer = await fetchBytes(browser, body.url as string).expect(200);
      expect((answer.body as Buffer).length).toBe(200_000);
      await shop
        .browser()
        .get(body.url as string)
        .expect(404);
      await (await signInAs(shop, 'buyer')).get(body.url as string).expect(404);
      await (await signInAs(shop, 'helper')).get(body.url as string).expect(404);
      expect((await shop.browser().get(`/api/collect/${token}`)).body.usesLeft).toBe(9);
    });

    it('is used as often as it may be, also by many at once, and no more', async () => {
      const answers = await Promise.all(
        Array.from({ length: 20 }, () => shop.browser().post(`/api/collect/${token}/grants`).send(wish())),
      );
      expect(answers.filter((one) => one.status === 201)).toHaveLength(9);
      expect(new Set(answers.filter((one) => one.status !== 201).map((one) => one.body.code))).toEqual(
        new Set(['link-is-used-up']),
      );
      expect((await shop.browser().get(`/api/collect/${token}`)).body.state).toBe('used-up');
    });

    it('is replaced on request by a mail to the order’s own address; the old one ends', async () => {
      await shop.browser().post(`/api/collect/${token}/replacement`).expect(202);
      await shop.drain();
      const fresh = shop.mailer.tokenFor(guest, '/collect');
      expect(fresh).not.toBe(token);
      expect((await shop.browser().get(`/api/collect/${token}`)).body).toMatchObject({
        state: 'replaced',
        kits: [],
      });
      await shop.browser().post(`/api/collect/${token}/grants`).send(wish()).expect(410);
      await shop.browser().post(`/api/collect/${fresh}/grants`).send(wish()).expect(201);
    });

    it('expires', async () => {
      const fresh = shop.mailer.tokenFor(guest, '/collect');
      shop.clock.advance(15 * 86_400);
      expect((await shop.browser().get(`/api/collect/${fresh}`)).body.state).toBe('expired');
      await shop.browser().post(`/api/collect/${fresh}/grants`).send(wish()).expect(410);
      shop.clock.advance(-15 * 86_400);
    });

    it('is found again by the address alone, which tells nothing to others', async () => {
      const count = shop.mailer.sent.length;
      await shop.browser().post('/api/collect/lost').send({ email: 'nobody@mail.example' }).expect(202);
      await shop.drain();
      expect(shop.mailer.sent).toHaveLength(count);
      await shop.browser().post('/api/collect/lost').send({ email: guest }).expect(202);
      await shop.drain();
      expect(shop.mailer.sent).toHaveLength(count + 1);
    });

    it('is unknown when guessed', async () => {
      await shop
        .browser()
        .get(`/api/collect/${'x'.repeat(43)}`)
        .expect(404);
    });

    it('joins an account once the address is verified', async () => {
      const { email } = await makePerson(shop, 'buyer', guest, false);
      const browser = shop.browser();
      await browser.post('/api/session').send({ email, passphrase: TEST_PASSPHRASE }).expect(200);
      expect((await browser.get('/api/shelf')).body.total).toBe(0);
      await browser.post('/api/account/verification').expect(202);
      await shop.drain();
      await browser
        .post('/api/accounts/verify')
        .send({ token: shop.mailer.tokenFor(guest, '/verify') })
        .expect(200);
      expect((await browser.get('/api/shelf')).body).toMatchObject({ total: 1, items: [{ slug: kit.slug }] });
      expect((await browser.get('/api/account/orders')).body.items).toHaveLength(1);
    });
  });

  it('shows the workshop who holds what, and resends a link on a helper’s word', async () => {
    const helper = await signInAs(shop, 'helper');
    const { body } = await helper
      .get('/api/workshop/holders')
      .query({ kitId: kit.kitId, search: buyer.email })
      .expect(200);
    expect(body.items).toEqual([
      expect.objectContaining({ email: buyer.email, source: 'purchase', state: 'active', held: 'Mk 1.4' }),
    ]);
    const [order] = await selectRows<{ id: string }>(
      shop.database,
      'SELECT id FROM orders WHERE email = :email',
      { email: buyer.email },
    );
    await helper.post(`/api/workshop/orders/${order?.id}/link`).expect(202);
    await shop.drain();
    expect(shop.mailer.lastTo(buyer.email).text).toContain('/collect/');
  });
});
