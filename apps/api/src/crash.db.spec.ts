import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startFakeStripe, type FakeStripe } from '@windchest/fake-stripe';
import mysql from 'mysql2/promise';
import { startSmtpSink } from './testing/smtp-sink.js';
import { createTestDatabase, type TestDatabase } from './testing/test-database.js';

const ORDERS = 60;
const KILLS = 10;
const CAP = 20;
/** Of an order, in cents, that goes back. */
const REFUND = 100;
const main = join(process.cwd(), 'apps/api/dist/main.js');

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => resolve(port));
    });
  });
const pause = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

/**
 * The API as a process of its own, killed with SIGKILL at ten moments while sixty people order, pay, give up
 * and get money back; started again each time. Nobody but the database, the payment service and the mail server
 * remembers anything.
 */
describe('killing the API at any moment', () => {
  let database: TestDatabase;
  let pool: mysql.Pool;
  let stripe: FakeStripe;
  let sink: Awaited<ReturnType<typeof startSmtpSink>>;
  let folder: string;
  let environment: NodeJS.ProcessEnv;
  let url: string;
  let api: ChildProcess | undefined;
  const ids = { kit: randomUUID(), licence: randomUUID(), revision: randomUUID(), coupon: randomUUID() };

  const rows = async <T>(sql: string): Promise<T[]> => (await pool.query(sql))[0] as T[];
  const start = async (): Promise<void> => {
    api = spawn(process.execPath, [main], { env: environment, stdio: ['ignore', 'ignore', 'inherit'] });
    for (let tries = 0; tries < 300; tries++) {
      if ((await fetch(`${url}/api/health/ready`).catch(() => null))?.ok) return;
      await pause(50);
    }
    throw new Error('The API did not get ready within 15 seconds.');
  };
  const kill = async (): Promise<void> => {
    const gone = new Promise((resolve) => api?.once('exit', resolve));
    api?.kill('SIGKILL');
    await gone;
  };
  /** As a browser does: the same request again until an answer comes. */
  const persistently = async (
    path: string,
    body: object,
  ): Promise<{ status: number; json: Record<string, unknown> }> => {
    for (;;) {
      try {
        const response = await fetch(`${url}/api${path}`, {
          method: 'POST',
          headers: { 'content-type': 'application/json', 'x-windchest': '1' },
          body: JSON.stringify(body),
        });
        const json = (await response.json().catch(() => ({}))) as Record<string, unknown>;
        if (response.status < 500) return { status: response.status, json };
      } catch {
        // Killed under way; nothing is known of what was done.
      }
      await pause(60);
    }
  };

  beforeAll(async () => {
    if (!existsSync(main))
      throw new Error('apps/api/dist/main.js is missing: build the server first (`npm run build:server`).');
    database = await createTestDatabase();
    folder = await mkdtemp(join(tmpdir(), 'windchest-crash-'));
    stripe = await startFakeStripe({ seed: 7, webhookTimeScale: 0.05 });
    sink = await startSmtpSink();
    const port = await freePort();
    url = `http://127.0.0.1:${port}`;
    environment = {
      PATH: process.env['PATH'],
      ...database.environment,
      NODE_ENV: 'production',
      PORT: String(port),
      BASE_URL: url,
      SESSION_SECRET: 's'.repeat(40),
      LINK_SECRET: 'l'.repeat(40),
      FILES_DIR: folder,
      SMTP_URL: `smtp://127.0.0.1:${sink.port}`,
      MAIL_FROM: 'Saltmarsh Sound Works <bench@saltmarsh.example>',
      STRIPE_KEY: stripe.apiKey,
      STRIPE_WEBHOOK_SECRET: stripe.webhookSecret,
      STRIPE_HOST: '127.0.0.1',
      STRIPE_PORT: String(stripe.port),
      STRIPE_PROTOCOL: 'http',
      JOB_POLL_MS: '50',
      JOB_LEASE_SECONDS: '2',
      RATE_LIMITS_OFF: '1',
      LOG_LEVEL: 'silent',
    };
    const { DB_HOST: host, DB_PORT, DB_USER: user, DB_PASSWORD: password, DB_NAME } = database.environment;
    pool = mysql.createPool({
      host: host!,
      port: Number(DB_PORT),
      user: user!,
      password: password!,
      database: DB_NAME!,
      supportBigNumbers: true,
    });
    await start();
    stripe.setWebhookUrl(`${url}/api/payments/webhook`);
    const now = new Date();
    await pool.query(
      `INSERT INTO kits (id, slug, name, tagline, description, colour, is_listed, newest_revision_id, created_at, updated_at) VALUES (?, 'curlew', 'Curlew', '', '', 'orange', TRUE, ?, ?, ?)`,
      [ids.kit, ids.revision, now, now],
    );
    await pool.query(
      `INSERT INTO licences (id, kit_id, kind, name, terms, price_minor, created_at, updated_at) VALUES (?, ?, 'personal', 'For my own prints', 'x', 2400, ?, ?)`,
      [ids.licence, ids.kit, now, now],
    );
    await pool.query(
      `INSERT INTO revisions (id, kit_id, mark, issue, state, assembly_notes, change_notes, cautions, print_spec, hardware, build_volume, declared_cents, room, bundle_sha256, bundle_bytes, released_at, created_at, updated_at)
       VALUES (?, ?, 1, 0, 'released', '', '', '', '{}', '[]', '{"xMm":220,"yMm":220,"zMm":250}', 10, '{"temperatureC":20}', REPEAT('a', 64), 1000, ?, ?, ?)`,
      [ids.revision, ids.kit, now, now, now],
    );
    await pool.query(
      `INSERT INTO coupons (id, code, label, off, cap, created_at, updated_at) VALUES (?, 'WINDFALL', 'A third off', '{"kind":"fraction","numerator":1,"denominator":3}', ?, ?, ?)`,
      [ids.coupon, CAP, now, now],
    );
  });

  afterAll(async () => {
    await kill();
    await stripe.stop();
    await new Promise((resolve) => sink.server.close(resolve));
    await pool.end();
    await database.drop();
    await rm(folder, { recursive: true, force: true });
  });

  it('loses nothing and does nothing twice', async () => {
    let isOver = false;
    const paid: string[] = [];
    const givenUp: string[] = [];
    const refunded: string[] = [];

    const order = async (number: number): Promise<void> => {
      await pause(Math.random() * 9000);
      const body = {
        items: [{ licenceId: ids.licence }],
        email: `person-${number}@mail.example`,
        country: 'DE',
        hasConsented: true,
        attempt: randomUUID(),
      };
      let opened = await persistently('/checkout', { ...body, couponCode: 'WINDFALL' });
      if (opened.status !== 201) opened = await persistently('/checkout', { ...body, attempt: randomUUID() });
      expect(opened.status).toBe(201);
      const { orderId, orderKey, paymentUrl } = opened.json as {
        orderId: string;
        orderKey: string;
        paymentUrl: string;
      };
      await pause(Math.random() * 1500);
      if (number % 6 === 5) {
        await persistently(`/orders/${orderId}/cancel?key=${orderKey}`, {});
        givenUp.push(orderId);
        return;
      }
      const answer = await fetch(`${stripe.url}/control/sessions/${paymentUrl.split('/').at(-1)}/pay`, {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify({ country: 'DE', cardCountry: 'DE' }),
      });
      expect(answer.status).toBe(200);
      paid.push(orderId);
      if (number % 5 === 0) await askForRefund(orderId);
    };
    /** What the workshop writes in one transaction when somebody asks; the rest is the jobs' affair. */
    const askForRefund = async (orderId: string): Promise<void> => {
      const line = `SELECT l.id FROM order_lines l JOIN orders o ON o.id = l.order_id WHERE o.id = '${orderId}' AND o.state = 'paid'`;
      let lines = await rows<{ id: string }>(line);
      for (; lines.length === 0; lines = await rows(line)) await pause(100);
      const id = randomUUID();
      const now = new Date();
      const connection = await pool.getConnection();
      await connection.beginTransaction();
      await connection.query(
        `INSERT INTO refunds (id, order_id, attempt, origin, state, amount_minor, currency, created_at, updated_at) VALUES (?, ?, ?, 'workshop', 'asked', ?, 'EUR', ?, ?)`,
        [id, orderId, randomUUID(), REFUND, now, now],
      );
      await connection.query('INSERT INTO refund_lines VALUES (?, ?, ?, FALSE)', [id, lines[0]?.id, REFUND]);
      await connection.query(
        `INSERT INTO jobs (name, payload, run_at, created_at) VALUES ('orders.carry-out-refund', ?, ?, ?)`,
        [JSON.stringify({ refundId: id }), now, now],
      );
      await connection.commit();
      connection.release();
      refunded.push(orderId);
    };
    const killer = async (): Promise<void> => {
      for (let times = 0; times < KILLS; times++) {
        await pause(200 + Math.random() * 900);
        await kill();
        await start();
      }
      isOver = true;
    };
    await Promise.all([killer(), ...Array.from({ length: ORDERS }, (_, number) => order(number))]);
    expect(isOver).toBe(true);

    // Whatever was under way is taken up again by itself: leases run out, the payment service is asked.
    for (let tries = 0; tries < 600; tries++) {
      const [left] = await rows<{ n: number }>(
        `SELECT (SELECT COUNT(*) FROM jobs WHERE state IN ('queued', 'running') AND name <> 'orders.reconcile') + (SELECT COUNT(*) FROM refunds WHERE state = 'asked') + (SELECT COUNT(*) FROM mails WHERE state <> 'sent') + ${paid.length} - (SELECT COUNT(*) FROM orders WHERE state = 'paid') AS n`,
      );
      if (Number(left?.n) === 0) break;
      await pause(200);
    }

    expect(await rows(`SELECT name, last_error FROM jobs WHERE state = 'dead'`)).toEqual([]);
    const paidOrders = await rows<{ id: string; email: string }>(
      `SELECT id, email FROM orders WHERE state = 'paid'`,
    );
    expect(paidOrders.map((one) => one.id).sort()).toEqual([...paid].sort());
    expect(
      (await rows<{ id: string }>(`SELECT id FROM orders WHERE state = 'cancelled'`))
        .map((one) => one.id)
        .sort(),
    ).toEqual([...givenUp].sort());

    const entitled = await rows<{ order_id: string }>('SELECT order_id FROM entitlements');
    expect(entitled.map((one) => one.order_id).sort()).toEqual([...paid].sort());

    const receipts = await rows<{ order_id: string; number: number }>(
      'SELECT order_id, number FROM receipts ORDER BY number',
    );
    expect(receipts.map((one) => Number(one.number))).toEqual(
      Array.from({ length: paid.length }, (_, index) => index + 1),
    );
    expect(new Set(receipts.map((one) => one.order_id)).size).toBe(paid.length);

    const emailOf = new Map(paidOrders.map((one) => [one.id, one.email]));
    const mailedAbout = (subject: RegExp) =>
      sink.mails
        .filter((mail) => subject.test(mail))
        .map((mail) => /^To: (.+)$/im.exec(mail)?.[1]?.trim() ?? '')
        .sort();
    expect(mailedAbout(/^Subject: Your files/im)).toEqual(paidOrders.map((one) => one.email).sort());
    expect(mailedAbout(/^Subject: .*Refund/im)).toEqual(refunded.map((id) => emailOf.get(id)).sort());
    expect(sink.mails).toHaveLength(paid.length + refunded.length);

    const answer = await fetch(`${stripe.url}/v1/refunds?limit=100`, {
      headers: { authorization: `Bearer ${stripe.apiKey}` },
    });
    const { data } = (await answer.json()) as { data: { amount: number; metadata: { order: string } }[] };
    expect(data.map((one) => one.metadata.order).sort()).toEqual([...refunded].sort());
    const notes = await rows<{ order_id: string; number: number; total_minor: number }>(
      'SELECT order_id, number, total_minor FROM credit_notes ORDER BY number',
    );
    expect(notes.map((one) => Number(one.number))).toEqual(refunded.map((_, index) => index + 1));
    expect(notes.map((one) => one.order_id).sort()).toEqual([...refunded].sort());
    expect(
      (await rows<{ id: string }>(`SELECT order_id AS id FROM entitlements WHERE state = 'ended'`))
        .map((one) => one.id)
        .sort(),
    ).toEqual([...refunded].sort());
    const [sums] = await rows<{ n: string }>('SELECT SUM(refunded_minor) AS n FROM orders');
    expect(Number(sums?.n)).toBe(refunded.length * REFUND);

    const [coupon] = await rows<{ held: number; redeemed: number }>('SELECT held, redeemed FROM coupons');
    const [places] = await rows<{ held: string; redeemed: string }>(
      `SELECT SUM(state = 'held') AS held, SUM(state = 'redeemed') AS redeemed FROM coupon_places`,
    );
    const [discounted] = await rows<{ n: number }>(
      `SELECT COUNT(*) AS n FROM orders WHERE state = 'paid' AND discount_minor > 0`,
    );
    expect([Number(coupon?.held), Number(coupon?.redeemed)]).toEqual([
      Number(places?.held),
      Number(places?.redeemed),
    ]);
    expect(Number(coupon?.held)).toBe(0);
    expect(Number(coupon?.redeemed)).toBe(Number(discounted?.n));
    expect(Number(coupon?.redeemed)).toBeLessThanOrEqual(CAP);
  }, 240_000);
});
