import { existsSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { standPlaces } from './stand-environment.mjs';

/**
 * @param {string} folder
 * @returns {string[]} the names of what was there and is gone now
 */
export function removeStandData(folder) {
  const { database, files, mails, paymentState, seedMark } = standPlaces(folder);
  /** @type {[string, string][]} */
  const kinds = [
    ['database', database],
    ['files', files],
    ['mails', mails],
    ['payments', paymentState],
    ['seed mark', seedMark],
  ];
  return kinds.flatMap(([name, path]) => {
    if (!existsSync(path)) return [];
    rmSync(path, { recursive: true });
    return name === 'seed mark' ? [] : [name];
  });
}

/** @typedef {'none' | 'begun' | 'done'} SeedState */

/** @param {string} folder @returns {SeedState} */
export function seedState(folder) {
  try {
    return JSON.parse(readFileSync(standPlaces(folder).seedMark, 'utf8')).state === 'done' ? 'done' : 'begun';
  } catch {
    return 'none';
  }
}

/** @param {string} folder @param {SeedState} state */
export function markSeed(folder, state) {
  writeFileSync(standPlaces(folder).seedMark, JSON.stringify({ state }));
}

/**
 * Keeps the logs of the run before last out of the way, and those of the last one at hand.
 * @param {string} logs
 */
export function turnLogs(logs) {
  if (!existsSync(logs)) return;
  for (const name of readdirSync(logs).filter(
    (file) => file.endsWith('.log') && !file.endsWith('.last.log'),
  )) {
    renameSync(join(logs, name), join(logs, name.replace(/\.log$/, '.last.log')));
  }
}
