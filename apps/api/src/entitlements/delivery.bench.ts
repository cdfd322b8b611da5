// needs: stand
import { spawn, spawnSync, type ChildProcess } from 'node:child_process';
import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { get } from 'node:http';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import mysql from 'mysql2/promise';

/**
 * How fast a bundle goes out, in one run: through the shop's signed address, by Express's own `sendFile`
 * of the same file, by nginx alone, and by nginx after the shop's check (`X-Accel-Redirect`).
 */
const BYTES = 200 * 1024 ** 2;
const ROUNDS = 20;
const PLAIN = `import express from 'express';
const [, file, port] = process.argv;
express().get('/file', (_, response) => response.sendFile(file)).listen(Number(port), '127.0.0.1', () => console.log('ready'));`;
const env = process.env as Record<string, string>;

const freePort = (): Promise<number> =>
  new Promise((done) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => done(port));
    });
  });

/** @returns GB/s of one GET whose bytes are thrown away */
const fetchOnce = (url: string, cookie: string): Promise<number> =>
  new Promise((done, fail) => {
    const startedAt = performance.now();
    get(url, { headers: { cookie } }, (response) => {
      let length = 0;
      response.on('data', (chunk: Buffer) => (length += chunk.length));
      response.on('end', () =>
        response.statusCode === 200 && length === BYTES
          ? done(BYTES / 1e6 / (performance.now() - startedAt))
          : fail(new Error(`${url}: ${response.statusCode}, ${length} bytes`)),
      );
    }).on('error', fail);
  });
const median = (values: number[]): number =>
  [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

const startApi = async (port: number, more: Record<string, string>): Promise<ChildProcess> => {
  const child = spawn(process.execPath, ['apps/api/dist/main.js'], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: {
      ...env,
      PORT: String(port),
      BASE_URL: `http://127.0.0.1:${port}`,
      DB_HOST: env['WINDCHEST_DB_HOST'],
      DB_PORT: env['WINDCHEST_DB_PORT'],
      DB_NAME: env['WINDCHEST_DB_NAME'],
      DB_USER: env['WINDCHEST_DB_USER'],
      DB_PASSWORD: env['WINDCHEST_DB_PASSWORD'],
      FILES_DIR: env['WINDCHEST_FILES_DIR'],
      SESSION_SECRET: 'bench'.repeat(8),
      LINK_SECRET: 'bench'.repeat(8),
      SMTP_URL: 'smtp://127.0.0.1:1',
      MAIL_FROM: 'Bench <bench@saltmarsh.example>',
      STRIPE_KEY: 'sk_test_bench',
      STRIPE_WEBHOOK_SECRET: 'whsec_bench',
      JOB_CONCURRENCY: '0',
      RATE_LIMITS_OFF: '1',
      LOG_LEVEL: 'warn',
      ...more,
    },
  });
  for (let tries = 0; tries < 200; tries++) {
    if ((await fetch(`http://127.0.0.1:${port}/api/health/ready`).catch(() => null))?.ok) return child;
    await new Promise((done) => setTimeout(done, 100));
  }
  throw new Error('The API did not get ready.');
};

/** A released revision of the free demo kit whose bundle is large enough to measure. */
const putBundle = async (sha256: string): Promise<{ revisionId: string; undo: () => Promise<void> }> => {
  const database = await mysql.createConnection({
    host: env['WINDCHEST_DB_HOST'],
    port: Number(env['WINDCHEST_DB_PORT']),
    database: env['WINDCHEST_DB_NAME'],
    user: env['WINDCHEST_DB_USER'],
    password: env['WINDCHEST_DB_PASSWORD'],
  });
  const revisionId = randomUUID();
  const [[kit]] = (await database.query(`SELECT id FROM kits WHERE slug = 'dunlin'`)) as unknown as [
    [{ id: string }],
  ];
  await database.query(
    `INSERT INTO revisions (id, kit_id, mark, issue, state, assembly_notes, change_notes, cautions, print_spec, hardware, build_volume, declared_cents, room, bundle_sha256, bundle_bytes, released_at, created_at, updated_at)
     VALUES (?, ?, 99, ${Math.floor(Date.now() / 1000)}, 'released', '', '', '', '{}', '[]', '{}', 30, '{}', ?, ?, NOW(), NOW(), NOW())`,
    [revisionId, kit.id, sha256, BYTES],
  );
  return { revisionId, undo: () => database.end() };
};

const signInAndGrant = async (
  port: number,
  revisionId: string,
): Promise<{ cookie: string; path: string }> => {
  const { demoSignIns } = (await import(resolve('seed-data/dist/sign-ins.js'))) as {
    demoSignIns: { email: string; passphrase: string }[];
  };
  const { email, passphrase } = demoSignIns.find((one) => one.email.startsWith('jonas')) ?? {
    email: '',
    passphrase: '',
  };
  const headers = { 'content-type': 'application/json', 'x-windchest': '1' };
  const base = `http://127.0.0.1:${port}/api`;
  const signedIn = await fetch(`${base}/session`, {
    method: 'POST',
    headers,
    body: JSON.stringify({ email, passphrase }),
  });
  const cookie = signedIn.headers.getSetCookie()[0]?.split(';')[0] ?? '';
  const granted = await fetch(`${base}/shelf/grants`, {
    method: 'POST',
    headers: { ...headers, cookie },
    body: JSON.stringify({ kitSlug: 'dunlin', revisionId }),
  });
  if (!granted.ok) throw new Error(`No grant: ${await granted.text()}`);
  return { cookie, path: ((await granted.json()) as { url: string }).url };
};

const main = async (): Promise<void> => {
  const bytes = randomBytes(BYTES);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const file = join(env['WINDCHEST_FILES_DIR'] ?? '', 'bundles', sha256.slice(0, 2), sha256);
  await mkdir(join(file, '..'), { recursive: true });
  await writeFile(file, bytes);
  const { revisionId, undo } = await putBundle(sha256);
  const [apiPort, accelPort, nginxPort, plainPort] = [
    await freePort(),
    await freePort(),
    await freePort(),
    await freePort(),
  ];
  const stops: (() => void)[] = [];
  const api = await startApi(apiPort, {});
  stops.push(() => api.kill());
  // In a process of its own, as the shop is.
  const plain = spawn(process.execPath, ['--input-type=module', '-e', PLAIN, file, String(plainPort)], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  await new Promise((done) => plain.stdout.once('data', done));
  stops.push(() => plain.kill());

  const ours = await signInAndGrant(apiPort, revisionId);
  const ways: Record<string, { url: string; cookie: string }> = {
    'Express sendFile of the same file': { url: `http://127.0.0.1:${plainPort}/file`, cookie: '' },
    'the shop, checked and counted': { url: `http://127.0.0.1:${apiPort}${ours.path}`, cookie: ours.cookie },
  };

  const folder = await mkdtemp(join(tmpdir(), 'windchest-bench-'));
  if (spawnSync('nginx', ['-v']).status === 0) {
    const accel = await startApi(accelPort, { ACCEL_PREFIX: '/protected-files/' });
    stops.push(() => accel.kill());
    const files = resolve(env['WINDCHEST_FILES_DIR'] ?? '');
    await writeFile(
      join(folder, 'nginx.conf'),
      `daemon off; error_log ${folder}/error.log; pid ${folder}/pid; ${process.getuid?.() === 0 ? 'user root;' : ''}
       events {} http { access_log off; sendfile on; client_body_temp_path ${folder}; proxy_temp_path ${folder}; fastcgi_temp_path ${folder}; uwsgi_temp_path ${folder}; scgi_temp_path ${folder};
       server { listen 127.0.0.1:${nginxPort}; location / { proxy_pass http://127.0.0.1:${accelPort}; }
       location /protected-files/ { internal; alias ${files}/; } location /alone/ { alias ${files}/; } } }`,
    );
    const nginx = spawn('nginx', ['-c', join(folder, 'nginx.conf')], {
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    stops.push(() => nginx.kill('SIGQUIT'));
    await new Promise((done) => setTimeout(done, 500));
    const granted = await signInAndGrant(accelPort, revisionId);
    ways['nginx alone'] = {
      url: `http://127.0.0.1:${nginxPort}/alone/bundles/${sha256.slice(0, 2)}/${sha256}`,
      cookie: '',
    };
    ways['nginx after the shop’s check'] = {
      url: `http://127.0.0.1:${nginxPort}${granted.path}`,
      cookie: granted.cookie,
    };
  } else console.log('nginx is not installed: its two rows are left out.');

  const speeds = new Map<string, number[]>(Object.keys(ways).map((name) => [name, []]));
  for (let round = 0; round < ROUNDS; round++)
    for (const [name, { url, cookie }] of Object.entries(ways))
      speeds.get(name)?.push(await fetchOnce(url, cookie));

  const of = (name: string): number => median(speeds.get(name) ?? []);
  console.log(`A bundle of ${BYTES / 1024 ** 2} MiB, ${ROUNDS} rounds in turn, median:`);
  for (const name of speeds.keys()) console.log(`  ${of(name).toFixed(2)} GB/s  ${name}`);
  console.log(
    `  the shop against sendFile: ${(of('the shop, checked and counted') / of('Express sendFile of the same file')).toFixed(2)}`,
  );
  if (speeds.has('nginx alone'))
    console.log(
      `  nginx after the check against nginx alone: ${(of('nginx after the shop’s check') / of('nginx alone')).toFixed(2)}`,
    );
  for (const stop of stops) stop();
  await undo();
  await rm(folder, { recursive: true, force: true });
};

await main();
