import { delimiter, join } from 'node:path';
import { accessSync, constants } from 'node:fs';
import { fileURLToPath } from 'node:url';

/** The folder of the whole project, whatever folder the command was called from. */
export const projectRoot = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');

/** Everything a stand keeps between two runs lives here; git ignores it. */
export const homeFolder = join(projectRoot, '.windchest');

/** Compilers are called by their files: `npx` would ask a registry when one is missing. */
export const compiler = join(projectRoot, 'node_modules/typescript/bin/tsc');

/**
 * Finds a program the way a shell does. The sbin folders are added because an ordinary user's PATH on
 * Debian leaves them out, and servers are installed there.
 * @param {string} name
 * @returns {string | undefined}
 */
export function findProgram(name) {
  const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/local/sbin', '/sbin'];
  return folders
    .filter((folder) => folder !== '')
    .map((folder) => join(folder, name))
    .find(isExecutable);
}

/** @param {string} file */
function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
