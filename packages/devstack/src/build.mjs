import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';
import { compiler, homeFolder, projectRoot } from './paths.mjs';
import { step } from './report.mjs';

/** @typedef {{ supervisor: import('./processes.mjs').Supervisor, logFile: string }} BuildContext */
/** @typedef {{ hash: string, files: string[] }} Fingerprint */

const SKIPPED_FOLDERS = new Set(['node_modules', 'dist', 'coverage', 'test-results']);
const ROOT_FILES = ['package-lock.json', 'tsconfig.json', 'tsconfig.base.json'];

const SERVER = {
  name: 'server',
  label: 'Building the server',
  sources: ['packages', 'apps/api', 'fakes', 'seed-data'],
  result: 'apps/api/dist/main.js',
  command: [process.execPath, compiler, '-b'],
};
const WEB = {
  name: 'web',
  label: 'Building the web pages',
  sources: ['packages', 'apps/web'],
  result: 'apps/web/dist/index.html',
  command: ['npm', 'run', 'build', '-w', '@windchest/web'],
};

/** @param {BuildContext} context */
export const ensureServerBuild = (context) => ensureBuilt(SERVER, context);

/** @param {BuildContext} context */
export const ensureWebBuild = (context) => ensureBuilt(WEB, context);

/** @returns {boolean} whether there are pages to serve, of whatever age */
export const hasWebBuild = () => existsSync(join(projectRoot, WEB.result));

/**
 * Builds when a source has changed since the last build that went well.
 * @param {typeof SERVER} target
 * @param {BuildContext} context
 */
async function ensureBuilt(target, { supervisor, logFile }) {
  const before = readStamps()[target.name];
  const now = fingerprint(projectRoot, target.sources);
  const hasResult = existsSync(join(projectRoot, target.result));
  if (hasResult && before?.hash === now.hash) return;
  removeOutdated(projectRoot, before?.files ?? [], now.files);
  await step(target.label, async () => {
    const [command = '', ...args] = target.command;
    const code = await supervisor.run({ name: target.label, command, args, logFile });
    if (code !== 0) throw new StandFailure(`${target.label} failed.`, { logFile });
  });
  writeStamp(target.name, now);
}

/**
 * @param {string} root
 * @param {string[]} sources folders below the root
 * @returns {Fingerprint} path, size and time of every source; specs change nothing that runs
 */
export function fingerprint(root, sources) {
  const files = [
    ...ROOT_FILES.filter((file) => existsSync(join(root, file))),
    ...sources.flatMap((folder) => list(root, folder)),
  ]
    .filter((file) => !/\.(spec|bench|contract)\.tsx?$/.test(file))
    .sort();
  const hash = createHash('sha256');
  for (const file of files) {
    const { size, mtimeMs } = statSync(join(root, file));
    hash.update(`${file}\0${size}\0${mtimeMs}\n`);
  }
  return { hash: hash.digest('hex'), files };
}

/**
 * The compiler never removes what it once wrote; a migration or a route whose source has gone would still
 * be found among the built files. Workspaces that lost a source are built anew.
 * @param {string} root
 * @param {string[]} before
 * @param {string[]} now
 */
export function removeOutdated(root, before, now) {
  const present = new Set(now);
  const gone = before.filter((file) => !present.has(file) && file.includes('/src/'));
  for (const workspace of new Set(gone.map((file) => file.slice(0, file.indexOf('/src/'))))) {
    rmSync(join(root, workspace, 'dist'), { recursive: true, force: true });
  }
}

/** @param {string} root @param {string} folder @returns {string[]} */
function list(root, folder) {
  if (!existsSync(join(root, folder))) return [];
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    if (entry.isDirectory()) {
      return SKIPPED_FOLDERS.has(entry.name) || entry.name.startsWith('.') ? [] : list(root, path);
    }
    return entry.isFile() ? [path] : [];
  });
}

const stampsFile = join(homeFolder, 'builds.json');

/** @returns {Record<string, Fingerprint>} */
function readStamps() {
  try {
    return JSON.parse(readFileSync(stampsFile, 'utf8'));
  } catch {
    return {};
  }
}

/** @param {string} name @param {Fingerprint} stamp */
function writeStamp(name, stamp) {
  mkdirSync(homeFolder, { recursive: true });
  writeFileSync(stampsFile, JSON.stringify({ ...readStamps(), [name]: stamp }));
}
