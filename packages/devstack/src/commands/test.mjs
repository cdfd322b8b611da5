import { chmodSync, cpSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensurePackages, PACKAGES_TO_TEST } from '../apt.mjs';
import { runCommand } from '../command.mjs';
import { ensureDependencies } from '../dependencies.mjs';
import { Interrupted } from '../failures.mjs';
import { homeFolder } from '../paths.mjs';
import { elapsed, say } from '../report.mjs';
import { addUp, emptyTally, failedOnce, tallyLine } from '../tally.mjs';
import * as suites from '../test-suites.mjs';
import { readTestWish } from '../test-wish.mjs';

await runCommand(async (supervisor) => {
  const startedMs = performance.now();
  const wish = readTestWish(process.argv.slice(2));
  const folder = mkdtempSync(join(tmpdir(), 'windchest-test-'));
  chmodSync(folder, 0o711);
  supervisor.removeAtEnd(folder);
  const run = { supervisor, folder, patterns: wish.patterns };

  let tally = emptyTally();
  /** @param {() => Promise<import('../tally.mjs').Tally>} part */
  const count = async (part) => {
    const result = await part();
    tally = addUp(tally, result);
    return result.failures.length === 0;
  };
  try {
    const isPrepared = await count(() => suites.asTally(() => prepare(run)));
    if (isPrepared) await runSuites(run, wish.suites, count);
  } catch (error) {
    const failure =
      error instanceof Interrupted
        ? failedOnce('The run was interrupted', error.message)
        : failedOnce('The run broke off', error instanceof Error ? error.stack : String(error));
    tally = addUp(tally, failure);
  }

  for (const { title, detail } of tally.failures) say(`\n✗ ${title}\n${detail.replace(/^/gm, '    ')}`);
  if (tally.failures.length > 0) keepLogs(folder);
  await supervisor.stopAll();
  say(`\nIn ${elapsed(startedMs)}${tally.skipped > 0 ? `, ${tally.skipped} skipped` : ''}:`);
  say(tallyLine(tally));
  const mustHaveTests = wish.suites.size > 1 || !wish.suites.has('lint');
  return tally.failures.length > 0 || (mustHaveTests && tally.passed === 0) ? 1 : 0;
});

/** @param {suites.TestRun} run */
async function prepare({ supervisor, folder }) {
  await ensurePackages(PACKAGES_TO_TEST, { supervisor, logFile: join(folder, 'logs/apt.log') });
  await ensureDependencies({ supervisor, logFile: join(folder, 'logs/npm.log') });
}

/**
 * @param {suites.TestRun} run
 * @param {Set<string>} wanted
 * @param {(part: () => Promise<import('../tally.mjs').Tally>) => Promise<boolean>} count
 */
async function runSuites(run, wanted, count) {
  const hasServer = await count(() => suites.buildServer(run));
  if (wanted.has('lint')) {
    await count(() => suites.checkSpecTypes(run));
    await count(() => suites.lint(run));
  }
  if (wanted.has('unit')) await count(() => suites.testUnits(run));
  if (wanted.has('db')) await count(() => suites.asTally(() => suites.testWithDatabase(run)));
  if (wanted.has('e2e')) {
    const hasWeb = await count(() => suites.buildWeb(run));
    if (hasServer && hasWeb) await count(() => suites.asTally(() => suites.testInBrowser(run)));
    else await count(async () => failedOnce('Browser tests', 'Not run, because the build failed.'));
  }
}

/** @param {string} folder */
function keepLogs(folder) {
  const kept = join(homeFolder, 'logs/test');
  rmSync(kept, { recursive: true, force: true });
  for (const logs of ['logs', 'stand/logs']) {
    if (existsSync(join(folder, logs))) cpSync(join(folder, logs), kept, { recursive: true });
  }
  say(`\nAll logs of this run are in ${kept}.`);
}
