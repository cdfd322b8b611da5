import { chmodSync, mkdtempSync, readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PACKAGES_TO_RUN } from '../apt.mjs';
import { runCommand } from '../command.mjs';
import { StandFailure } from '../failures.mjs';
import { projectRoot } from '../paths.mjs';
import { prepareStand } from '../prepare.mjs';
import { elapsed, say } from '../report.mjs';
import { startStand } from '../stand.mjs';

await runCommand(async (supervisor) => {
  const patterns = process.argv.slice(2).filter((word) => word !== '--');
  const benches = findBenches().filter(
    (file) => patterns.length === 0 || patterns.some((part) => file.includes(part)),
  );
  if (benches.length === 0) throw new StandFailure('No bench has a path like that.');
  const folder = mkdtempSync(join(tmpdir(), 'windchest-bench-'));
  chmodSync(folder, 0o711);
  supervisor.removeAtEnd(folder);
  await prepareStand({ supervisor, packages: PACKAGES_TO_RUN, logs: join(folder, 'logs') });

  /** @type {import('../stand.mjs').Stand | undefined} */
  let stand;
  /** @type {string[]} */
  const failed = [];
  for (const [index, bench] of benches.entries()) {
    if (needsStand(bench)) {
      stand ??= await startStand({
        folder: join(folder, 'stand'),
        mode: 'throwaway',
        supervisor,
        isDurable: true,
      });
    }
    say(`\n${bench}`);
    const sinceMs = performance.now();
    const logFile = join(folder, `bench-${index}.log`);
    const code = await supervisor.run({
      name: bench,
      command: process.execPath,
      args: ['node_modules/tsx/dist/cli.mjs', bench],
      env: stand?.visitor,
      logFile,
    });
    say(readFileSync(logFile, 'utf8').trimEnd());
    say(`(${elapsed(sinceMs)}${code === 0 ? '' : `, failed with code ${code}`})`);
    if (code !== 0) failed.push(bench);
  }
  if (failed.length > 0) throw new StandFailure(`These did not finish well: ${failed.join(', ')}.`);
  return 0;
});

/** A bench says in its first line whether it wants a whole shop. @param {string} file */
function needsStand(file) {
  return /^\/\/ needs: stand\s*$/m.test(
    readFileSync(join(projectRoot, file), 'utf8').split('\n', 1)[0] ?? '',
  );
}

/** @returns {string[]} */
function findBenches() {
  return ['packages', 'apps', 'seed-data']
    .flatMap((folder) => list(folder))
    .filter((file) => /(\.bench|-report)\.ts$/.test(file))
    .sort();
}

/** @param {string} folder @returns {string[]} */
function list(folder) {
  return readdirSync(join(projectRoot, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    if (entry.isDirectory()) return ['node_modules', 'dist'].includes(entry.name) ? [] : list(path);
    return [path];
  });
}
