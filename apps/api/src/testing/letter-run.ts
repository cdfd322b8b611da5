import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import mysql from 'mysql2/promise';
import { startSmtpSink, type SmtpSink } from './smtp-sink.js';
import { createTestDatabase } from './test-database.js';

export const pause = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => resolve(port));
    });
  });

export interface LetterRun {
  readonly sink: SmtpSink;
  readonly letterId: string;
  /** Starts a process of the API that works on the same database; answers when it is ready. */
  start(): Promise<ChildProcess>;
  kill(api: ChildProcess): Promise<void>;
  /** Memory in use; 0 of a process that is gone. */
  rssMib(api: ChildProcess): number;
  /** Puts the letter on its way, as the begin job finds it. */
  send(perMinute: number): Promise<void>;
  counts(): Promise<Record<string, number>>;
  stateOfLetter(): Promise<string>;
  /** How often each reader got the letter. */
  mailsByReader(): Map<string, number>;
  stop(): Promise<void>;
}

/** A letter to many readers of one kit, on a database of its own, with a mail server that keeps what arrives. */
export const prepareLetterRun = async (main: string, readers: number): Promise<LetterRun> => {
  const database = await createTestDatabase();
  const sink = await startSmtpSink();
  const folder = await mkdtemp(join(tmpdir(), 'windchest-letters-'));
  const { DB_HOST = '', DB_PORT = '', DB_USER = '', DB_PASSWORD = '', DB_NAME = '' } = database.environment;
  const pool = mysql.createPool({
    host: DB_HOST,
    port: Number(DB_PORT),
    user: DB_USER,
    password: DB_PASSWORD,
    database: DB_NAME,
  });
  const rows = async <T>(sql: string, values: unknown[] = []): Promise<T[]> =>
    (await pool.query(sql, values))[0] as T[];
  const running = new Set<ChildProcess>();
  const letterId = randomUUID();

  const start = async (): Promise<ChildProcess> => {
    const port = await freePort();
    const url = `http://127.0.0.1:${port}`;
    const api = spawn(process.execPath, [main], {
      stdio: ['ignore', 'ignore', 'inherit'],
      env: {
        PATH: process.env['PATH'],
        ...database.environment,
        NODE_ENV: 'production',
        PORT: String(port),
        BASE_URL: 'http://127.0.0.1:4600',
        SESSION_SECRET: 's'.repeat(40),
        LINK_SECRET: 'l'.repeat(40),
        FILES_DIR: folder,
        SMTP_URL: `smtp://127.0.0.1:${sink.port}`,
        MAIL_FROM: 'Saltmarsh Sound Works <bench@saltmarsh.example>',
        STRIPE_KEY: 'sk_test_windchest',
        STRIPE_WEBHOOK_SECRET: 'whsec_windchest',
        JOB_POLL_MS: '50',
        JOB_LEASE_SECONDS: '2',
        RATE_LIMITS_OFF: '1',
        LOG_LEVEL: 'silent',
      },
    });
    running.add(api);
    for (let tries = 0; tries < 600; tries++) {
      if ((await fetch(`${url}/api/health/ready`).catch(() => null))?.ok) return api;
      await pause(50);
    }
    throw new Error('The API did not get ready within 30 seconds.');
  };
  const kill = async (api: ChildProcess): Promise<void> => {
    const gone = new Promise((resolve) => api.once('exit', resolve));
    api.kill('SIGKILL');
    await gone;
    running.delete(api);
  };

  return {
    sink,
    letterId,
    start,
    kill,
    rssMib: (api) => {
      const status = `/proc/${api.pid}/status`;
      if (!existsSync(status)) return 0;
      return Math.round(Number(/VmRSS:\s+(\d+)/.exec(readFileSync(status, 'utf8'))?.[1]) / 1024);
    },
    send: async (perMinute) => {
      await putReaders(rows, letterId, readers, perMinute);
      const payload = JSON.stringify({ letterId, run: 1 });
      await pool.query(
        `INSERT INTO jobs (name, payload, run_at, created_at) VALUES ('letters.begin', ?, UTC_TIMESTAMP(6), UTC_TIMESTAMP(6))`,
        [payload],
      );
    },
    counts: async () =>
      Object.fromEntries(
        (
          await rows<{ state: string; n: number }>(
            'SELECT state, COUNT(*) AS n FROM letter_recipients GROUP BY state',
          )
        ).map(({ state, n }) => [state, Number(n)]),
      ),
    stateOfLetter: async () =>
      (await rows<{ state: string }>('SELECT state FROM letters WHERE id = ?', [letterId]))[0]?.state ?? '',
    mailsByReader: () => {
      const counts = new Map<string, number>();
      for (const mail of sink.mails) {
        const to = /^To: (\S+)/im.exec(mail)?.[1] ?? '';
        counts.set(to, (counts.get(to) ?? 0) + 1);
      }
      return counts;
    },
    stop: async () => {
      await Promise.all([...running].map(kill));
      await new Promise((resolve) => sink.server.close(resolve));
      await pool.end();
      await database.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
};

type Rows = <T>(sql: string, values?: unknown[]) => Promise<T[]>;

const putReaders = async (
  rows: Rows,
  letterId: string,
  readers: number,
  perMinute: number,
): Promise<void> => {
  const now = new Date();
  const [kitId, held, newest] = [randomUUID(), randomUUID(), randomUUID()];
  await rows(
    `INSERT INTO kits (id, slug, name, tagline, description, colour, is_listed, newest_revision_id, created_at, updated_at) VALUES (?, 'curlew', 'Curlew', '', '', 'orange', TRUE, ?, ?, ?)`,
    [kitId, newest, now, now],
  );
  for (const [id, issue] of [
    [held, 0],
    [newest, 1],
  ] as const) {
    await rows(
      `INSERT INTO revisions (id, kit_id, mark, issue, assembly_notes, change_notes, cautions, print_spec, hardware, build_volume, declared_cents, room, created_at, updated_at)
       VALUES (?, ?, 1, ?, '', '', '', '{}', '[]', '{}', 10, '{"temperatureC":20}', ?, ?)`,
      [id, kitId, issue, now, now],
    );
    for (let part = 1; part <= issue * 3 + 1; part++)
      await rows(
        `INSERT INTO parts (id, revision_id, code, name, quantity, reprint_reason, created_at, updated_at) VALUES (?, ?, ?, 'Locking tongue', 2, '', ?, ?)`,
        [randomUUID(), id, `J-0${part}`, now, now],
      );
    await rows(
      `UPDATE revisions SET state = 'released', released_at = ?, bundle_sha256 = REPEAT('a', 64), bundle_bytes = 9 WHERE id = ?`,
      [now, id],
    );
  }
  for (let from = 0; from < readers; from += 1000) {
    const some = Array.from({ length: Math.min(1000, readers - from) }, (_, at) => [
      randomUUID(),
      `reader-${from + at}@mail.example`,
      kitId,
      'staff',
      held,
      now,
      now,
    ]);
    await rows(
      'INSERT INTO entitlements (id, email, kit_id, source, held_revision_id, created_at, updated_at) VALUES ?',
      [some],
    );
  }
  const audience = {
    ownsKit: true,
    heldFromId: null,
    heldToId: null,
    withNothingHeld: true,
    sources: [],
    nozzlesMm: [],
    materials: [],
    reportedParts: [],
    countries: [],
    askedForNews: false,
  };
  await rows(
    `INSERT INTO letters (id, kind, subject, body, kit_id, audience, per_minute, state, run, send_at, written_by, created_at, updated_at)
     VALUES (?, 'service', '{kit}: what {newest} mends', 'Hello {name},\n\nyou hold {held}. **Print these again**:\n\n{reprint_list}\n\n{download_link}\n', ?, ?, ?, 'scheduled', 1, ?, ?, ?, ?)`,
    [letterId, kitId, JSON.stringify(audience), perMinute, now, randomUUID(), now, now],
  );
};
