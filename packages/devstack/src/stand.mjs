import { chmodSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';
import { startMariadb } from './mariadb.mjs';
import { compiler, projectRoot } from './paths.mjs';
import { keptPorts, randomPorts, readShopPort } from './ports.mjs';
import { step } from './report.mjs';
import { keptSecrets } from './secrets.mjs';
import { markSeed, removeStandData, seedState } from './stand-data.mjs';
import * as environment from './stand-environment.mjs';

/** @typedef {import('./processes.mjs').Supervisor} Supervisor */
/** @typedef {import('./stand-environment.mjs').StandFacts} StandFacts */
/** @typedef {Awaited<ReturnType<typeof startStand>>} Stand */

/**
 * Starts everything the shop consists of, in the order in which they need each other: database, payment
 * stand-in and mail catcher, API (which migrates), in `dev` also compiler and Vite; then seeds an empty stand.
 * Built files must be there. The supervisor stops it all.
 * @param {{ folder: string, mode: import('./stand-environment.mjs').StandMode, supervisor: Supervisor, isDurable?: boolean }} options
 *   a stand that is not durable is quicker, and loses its last second when the machine stops
 */
export async function startStand({ folder, mode, supervisor, isDurable = mode !== 'throwaway' }) {
  const places = environment.standPlaces(folder);
  mkdirSync(folder, { recursive: true });
  // The database's own user must be able to pass through to its folder.
  chmodSync(folder, 0o711);
  // A seed that broke off left half a workshop that nobody has worked in: begin again.
  if (seedState(folder) === 'begun') removeStandData(folder);

  const ports =
    mode === 'throwaway'
      ? await randomPorts()
      : await keptPorts(folder, { shopPort: readShopPort(process.env.WINDCHEST_PORT) });
  const secrets = keptSecrets(folder);
  const database = await step('Starting the database', () =>
    startMariadb({
      supervisor,
      folder: places.database,
      port: ports.database,
      logFile: join(places.logs, 'mariadb.log'),
      secrets,
      isDurable,
      // Benches make databases of their own beside the shop's.
      mayMakeDatabases: mode === 'throwaway',
    }),
  );
  /** @type {StandFacts} */
  const facts = { mode, folder, ports, secrets, database };
  const servers = { supervisor, facts, places };
  await step('Starting payment stand-in and mail catcher', async () => {
    await Promise.all([
      startStandIn(servers, 'payment stand-in', 'fakes/stripe', environment.stripeEnvironment(facts)),
      startStandIn(servers, 'mail catcher', 'fakes/mail', environment.mailEnvironment(facts)),
    ]);
  });
  await step('Starting the shop', async () => {
    await startApi(servers);
    if (mode === 'dev') await startWatchers(servers);
  });
  const visitor = environment.visitorEnvironment(facts);
  if (seedState(folder) === 'none') await step('Filling the demo workshop', () => seed(servers, visitor));
  return { addresses: environment.standAddresses(facts), visitor, logs: places.logs };
}

/** @typedef {{ supervisor: Supervisor, facts: StandFacts, places: ReturnType<typeof environment.standPlaces> }} Servers */

/**
 * @param {Servers} servers
 * @param {string} name
 * @param {string} workspace
 * @param {Record<string, string>} env
 */
async function startStandIn({ supervisor, places }, name, workspace, env) {
  const logFile = join(places.logs, `${name.replace(' ', '-')}.log`);
  const child = supervisor.start({
    name: `The ${name}`,
    command: process.execPath,
    args: [join(workspace, 'dist/main.js')],
    env,
    logFile,
  });
  // It says on a line of its own that it is ready.
  await supervisor.waitUntilReady(
    child,
    () => /^\{.*"ready":\s*true/m.test(readFileSync(logFile, 'utf8')),
    20_000,
  );
}

/** @param {Servers} servers */
async function startApi({ supervisor, facts, places }) {
  const entry = join('apps/api/dist/main.js');
  const api = supervisor.start({
    name: 'The API',
    command: process.execPath,
    args:
      facts.mode === 'dev' ? ['--watch', '--watch-preserve-output', entry] : ['--enable-source-maps', entry],
    env: environment.apiEnvironment(facts),
    logFile: join(places.logs, 'api.log'),
    stopGraceMs: 15_000,
  });
  const ready = `${environment.standAddresses(facts).api}/api/health/ready`;
  await supervisor.waitUntilReady(api, () => answersOk(ready), 90_000);
}

/** @param {Servers} servers */
async function startWatchers({ supervisor, facts, places }) {
  supervisor.start({
    name: 'The compiler',
    command: process.execPath,
    args: [compiler, '-b', '--watch', '--preserveWatchOutput'],
    logFile: join(places.logs, 'compiler.log'),
  });
  const { shop, api } = environment.standAddresses(facts);
  const vite = supervisor.start({
    name: 'Vite',
    command: process.execPath,
    args: [
      join(projectRoot, 'node_modules/vite/bin/vite.js'),
      '--host=127.0.0.1',
      `--port=${facts.ports.shop}`,
      '--strictPort',
      '--clearScreen=false',
    ],
    cwd: join(projectRoot, 'apps/web'),
    env: { WINDCHEST_API_URL: api },
    logFile: join(places.logs, 'vite.log'),
  });
  await supervisor.waitUntilReady(vite, () => answersOk(shop), 60_000);
}

/** @param {Servers} servers @param {Record<string, string>} visitor */
async function seed({ supervisor, facts, places }, visitor) {
  const logFile = join(places.logs, 'seed.log');
  markSeed(facts.folder, 'begun');
  const code = await supervisor.run({
    name: 'The seed',
    command: process.execPath,
    args: ['--enable-source-maps', 'seed-data/dist/main.js'],
    env: visitor,
    logFile,
    timeLimitMs: 600_000,
  });
  if (code !== 0) {
    throw new StandFailure(
      `The demo workshop could not be filled; the next start tries again from an empty one. See also ${join(places.logs, 'api.log')}.`,
      { logFile },
    );
  }
  markSeed(facts.folder, 'done');
}

/** @param {string} url */
async function answersOk(url) {
  try {
    const response = await fetch(url, {
      headers: { accept: 'text/html, application/json' },
      signal: AbortSignal.timeout(5_000),
    });
    await response.body?.cancel();
    return response.ok;
  } catch {
    return false;
  }
}
