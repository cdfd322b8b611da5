import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';
import { projectRoot } from './paths.mjs';
import { step } from './report.mjs';

/**
 * `npm ci` when node_modules is missing or is not what package-lock.json asks for.
 * @param {{ supervisor: import('./processes.mjs').Supervisor, logFile: string }} context
 */
export async function ensureDependencies({ supervisor, logFile }) {
  if (areDependenciesCurrent(projectRoot)) return;
  await step('Installing npm packages (one to three minutes)', async () => {
    const code = await supervisor.run({
      name: 'npm ci',
      command: 'npm',
      args: ['ci', '--include=dev', '--no-progress'],
      env: { PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD: '1' },
      logFile,
    });
    if (code !== 0) throw new StandFailure('npm could not install the packages.', { logFile });
  });
  writeStamp(projectRoot);
}

/**
 * @param {string} root
 * @returns {boolean}
 */
export function areDependenciesCurrent(root) {
  if (readText(stampFile(root)) === lockHash(root)) return true;
  if (!matchesInstalledLock(root)) return false;
  // Installed by hand, and right: remember that instead of installing all of it again.
  writeStamp(root);
  return true;
}

/** @param {string} root */
const stampFile = (root) => join(root, 'node_modules/.windchest-lock');

/** @param {string} root */
function writeStamp(root) {
  writeFileSync(stampFile(root), lockHash(root));
}

/** @param {string} root */
function lockHash(root) {
  return createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex');
}

/**
 * npm leaves a list of what it installed. Packages for other systems are missing from it rightly.
 * @param {string} root
 */
function matchesInstalledLock(root) {
  const installed = readText(join(root, 'node_modules/.package-lock.json'));
  if (installed === undefined) return false;
  const wanted = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(installed).packages;
  return Object.entries(wanted).every(([path, entry]) => {
    if (!path.includes('node_modules/')) return true;
    if (present[path] === undefined) return entry.optional === true || entry.devOptional === true;
    return entry.link === true || present[path].version === entry.version;
  });
}

/** @param {string} file */
function readText(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}
