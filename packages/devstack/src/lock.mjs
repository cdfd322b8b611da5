import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';
import { processStatus } from './marked-processes.mjs';
import { say } from './report.mjs';

/** @typedef {{ pid: number, bornAt: string | undefined }} Holder */

/** A killed command's watchdog stops the database within its grace, and the rest sooner. */
const TIDYING_LIMIT_MS = 60_000;

/** @param {string} folder */
const lockFile = (folder) => join(folder, 'running.json');

/**
 * Two stands in one folder would write to one database. After a killed command, waits until its watchdog has
 * stopped what it left.
 * @param {string} folder
 * @param {number | undefined} watchdogPid
 * @returns {Promise<() => void>} gives the folder free again
 */
export async function takeLock(folder, watchdogPid) {
  mkdirSync(folder, { recursive: true });
  const own = `${lockFile(folder)}.${process.pid}`;
  const holders = { command: holder(process.pid), watchdog: holder(watchdogPid ?? 0) };
  writeFileSync(own, JSON.stringify(holders));
  try {
    if (!tryLink(own, folder)) {
      refuseWhenRunning(folder, 'start a second one');
      await waitForWatchdog(folder);
      refuseWhenRunning(folder, 'start a second one');
      rmSync(lockFile(folder), { force: true });
      if (!tryLink(own, folder)) refuseWhenRunning(folder, 'start a second one');
    }
  } finally {
    rmSync(own, { force: true });
  }
  return () => rmSync(lockFile(folder), { force: true });
}

/**
 * @param {string} folder
 * @param {string} wish what cannot be done meanwhile
 */
export function refuseWhenRunning(folder, wish) {
  const pid = runningPid(folder);
  if (pid === undefined) return;
  throw new StandFailure(
    `Windchest is running from this folder already (process ${pid}). Stop it with Ctrl-C in its terminal, or by "kill ${pid}", to ${wish}.`,
  );
}

/**
 * @param {string} folder
 * @returns {number | undefined} the command that holds the folder
 */
export const runningPid = (folder) => livingPid(readHolders(folder).command);

/** @param {string} folder */
export async function waitForWatchdog(folder) {
  const { watchdog } = readHolders(folder);
  if (livingPid(watchdog) === undefined) return;
  say('  Waiting until everything from the last, broken-off start has stopped …');
  const untilMs = performance.now() + TIDYING_LIMIT_MS;
  while (livingPid(watchdog) !== undefined) {
    if (performance.now() > untilMs) {
      throw new StandFailure(
        `Process ${watchdog?.pid} of an earlier start does not end. Stop it and try again.`,
      );
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

/** @param {string} folder @returns {{ command?: Holder, watchdog?: Holder }} */
function readHolders(folder) {
  try {
    return JSON.parse(readFileSync(lockFile(folder), 'utf8'));
  } catch {
    return {};
  }
}

/** @param {string} own @param {string} folder */
function tryLink(own, folder) {
  try {
    // A link appears whole: nobody ever reads a half-written lock.
    linkSync(own, lockFile(folder));
    return true;
  } catch {
    return false;
  }
}

/** @param {number} pid @returns {Holder} */
const holder = (pid) => ({ pid, bornAt: bornAt(pid) });

/** @param {Holder | undefined} kept */
function livingPid(kept) {
  // A number is used again, after a restart of the machine at the latest; its birth is not.
  return kept?.bornAt !== undefined && bornAt(kept.pid) === kept.bornAt ? kept.pid : undefined;
}

/**
 * @param {number} pid
 * @returns {string | undefined} boot and clock tick at which the process began
 */
function bornAt(pid) {
  const status = processStatus(pid);
  if (status === undefined || status.hasEnded) return undefined;
  return `${readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim()}:${status.startTick}`;
}
