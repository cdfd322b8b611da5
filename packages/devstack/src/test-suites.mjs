import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureServerBuild, ensureWebBuild } from './build.mjs';
import { lastLines, StandFailure } from './failures.mjs';
import { startMariadb } from './mariadb.mjs';
import { compiler, projectRoot } from './paths.mjs';
import { randomPort } from './ports.mjs';
import { step } from './report.mjs';
import { makeSecrets } from './secrets.mjs';
import { startStand } from './stand.mjs';
import { emptyTally, failedOnce, jestTally, playwrightTally, tallyLine } from './tally.mjs';

/** @typedef {import('./tally.mjs').Tally} Tally */
/**
 * @typedef {object} TestRun
 * @property {import('./processes.mjs').Supervisor} supervisor
 * @property {string} folder a temporary one, removed at the end
 * @property {string[]} patterns parts of file paths
 */

const STEP_LIMIT_MS = 30 * 60_000;

/** @param {Tally} tally */
const outcome = (tally) => `${tallyLine(tally)}${tally.skipped > 0 ? `, ${tally.skipped} skipped` : ''}`;

/** @param {TestRun} run @param {string} name */
const logOf = ({ folder }, name) => join(folder, 'logs', `${name}.log`);

/** @param {TestRun} run @returns {Promise<Tally>} */
export const buildServer = (run) =>
  asTally(() => ensureServerBuild({ supervisor: run.supervisor, logFile: logOf(run, 'build-server') }));

/** @param {TestRun} run @returns {Promise<Tally>} */
export const buildWeb = (run) =>
  asTally(() => ensureWebBuild({ supervisor: run.supervisor, logFile: logOf(run, 'build-web') }));

/** @param {TestRun} run @returns {Promise<Tally>} */
export async function checkSpecTypes(run) {
  if (!existsSync(join(projectRoot, 'tsconfig.test.json'))) return emptyTally();
  return check(run, 'Checking the types of tests', 'types-of-tests', [
    process.execPath,
    compiler,
    '-p',
    'tsconfig.test.json',
  ]);
}

/** @param {TestRun} run @returns {Promise<Tally>} */
export const lint = (run) => check(run, 'Checking style and imports', 'lint', ['npm', 'run', 'lint']);

/** @param {TestRun} run @returns {Promise<Tally>} */
export const testUnits = (run) => jest(run, 'Unit tests', 'unit', {});

/** @param {TestRun} run @returns {Promise<Tally>} */
export async function testWithDatabase(run) {
  const { supervisor, folder } = run;
  const port = await randomPort();
  const database = await step('Starting a database for tests', () =>
    startMariadb({
      supervisor,
      folder: join(folder, 'test-database'),
      port,
      secrets: makeSecrets(),
      logFile: logOf(run, 'test-mariadb'),
      isDurable: false,
      mayMakeDatabases: true,
    }),
  );
  return jest(run, 'Tests with the database', 'database', {
    WINDCHEST_TEST_DB_HOST: database.host,
    WINDCHEST_TEST_DB_PORT: String(database.port),
    WINDCHEST_TEST_DB_USER: database.user,
    WINDCHEST_TEST_DB_PASSWORD: database.password,
  });
}

/** @param {TestRun} run @returns {Promise<Tally>} */
export async function testInBrowser(run) {
  const { supervisor, folder, patterns } = run;
  const config = 'e2e/playwright.config.ts';
  if (!existsSync(join(projectRoot, config))) return failedOnce('Browser tests', `${config} is missing.`);
  const stand = await startStand({ folder: join(folder, 'stand'), mode: 'throwaway', supervisor });
  const report = join(folder, 'playwright.json');
  const logFile = logOf(run, 'playwright');
  return step(
    'Browser tests',
    async () => {
      const code = await supervisor.run({
        name: 'Playwright',
        command: process.execPath,
        args: [
          'node_modules/@playwright/test/cli.js',
          'test',
          `--config=${config}`,
          '--reporter=list,json',
          ...(patterns.length > 0 ? ['--pass-with-no-tests', ...patterns] : []),
        ],
        env: {
          ...stand.visitor,
          ...quiet,
          PLAYWRIGHT_JSON_OUTPUT_NAME: report,
          PLAYWRIGHT_JSON_OUTPUT_FILE: report,
        },
        logFile,
        timeLimitMs: STEP_LIMIT_MS,
        // On an interrupt Playwright closes its browsers; on other signals it leaves them.
        stopSignal: 'SIGINT',
      });
      return withEnding('Browser tests', code, logFile, () => playwrightTally(readJson(report)));
    },
    outcome,
  );
}

const quiet = { FORCE_COLOR: '0', NO_COLOR: undefined };

/**
 * @param {TestRun} run
 * @param {string} label
 * @param {string} project
 * @param {Record<string, string>} env
 */
async function jest(run, label, project, env) {
  const report = join(run.folder, `jest-${project}.json`);
  const logFile = logOf(run, `jest-${project}`);
  return step(
    label,
    async () => {
      const code = await run.supervisor.run({
        name: label,
        command: process.execPath,
        args: [
          '--experimental-vm-modules',
          '--no-warnings',
          'node_modules/jest/bin/jest.js',
          '--ci',
          // A connection that a test forgot to close must not hold up the whole run.
          '--forceExit',
          // By itself jest leaves one core free, which is half of a machine that has two.
          '--maxWorkers=100%',
          '--json',
          `--outputFile=${report}`,
          `--selectProjects=${project}`,
          ...(run.patterns.length > 0 ? ['--passWithNoTests', '--testPathPatterns', ...run.patterns] : []),
        ],
        env: { ...env, ...quiet, NODE_ENV: 'test' },
        logFile,
        timeLimitMs: STEP_LIMIT_MS,
      });
      return withEnding(label, code, logFile, () => jestTally(readJson(report), projectRoot));
    },
    outcome,
  );
}

/**
 * A runner may end badly though no test failed: it found none, crashed, or hung after the last one.
 * @param {string} label
 * @param {number} code
 * @param {string} logFile
 * @param {() => Tally} readTally
 */
function withEnding(label, code, logFile, readTally) {
  const log = lastLines(logFile, 60).join('\n');
  /** @type {Tally} */
  let tally;
  try {
    tally = readTally();
  } catch {
    return failedOnce(`${label}: ended with code ${code} and left no report`, log);
  }
  if (code === 0 || tally.failures.length > 0) return tally;
  return { ...tally, failures: [{ title: `${label}: ended with code ${code}`, detail: log }] };
}

/**
 * @param {TestRun} run
 * @param {string} label
 * @param {string} name
 * @param {string[]} commandLine
 */
async function check(run, label, name, [command = '', ...args]) {
  const logFile = logOf(run, name);
  return step(
    label,
    async () => {
      const code = await run.supervisor.run({
        name: label,
        command,
        args,
        env: quiet,
        logFile,
        timeLimitMs: STEP_LIMIT_MS,
      });
      return code === 0 ? emptyTally() : failedOnce(label, lastLines(logFile, 200).join('\n'));
    },
    (tally) => (tally.failures.length === 0 ? '' : 'failed'),
  );
}

/**
 * A failure of the work itself counts as one failed.
 * @param {() => Promise<Tally | void>} work
 * @returns {Promise<Tally>}
 */
export async function asTally(work) {
  try {
    return (await work()) ?? emptyTally();
  } catch (error) {
    if (!(error instanceof StandFailure)) throw error;
    return failedOnce(error.message, lastLines(error.logFile, 100).join('\n'));
  }
}

/** @param {string} file */
const readJson = (file) => JSON.parse(readFileSync(file, 'utf8'));
