import { spawn } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { closeSync, mkdirSync, openSync, rmSync, writeSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Interrupted, StandFailure } from './failures.mjs';
import { endGroup, killMarked, RUN_MARK } from './marked-processes.mjs';
import { projectRoot } from './paths.mjs';

/**
 * @typedef {object} ProcessOrder
 * @property {string} name how messages call it
 * @property {string} command
 * @property {string[]} [args]
 * @property {string} [cwd]
 * @property {Record<string, string | undefined>} [env] added to the environment
 * @property {string} logFile output is appended here
 * @property {NodeJS.Signals} [stopSignal]
 * @property {number} [stopGraceMs]
 *
 * @typedef {{ code: number | null, signal: string | null }} Ending
 * @typedef {{ name: string, pid: number | undefined, logFile: string, exited: Promise<Ending>, hasExited: () => boolean, order: ProcessOrder }} Child
 * @typedef {ReturnType<typeof createSupervisor>} Supervisor
 */

/**
 * Starts processes and makes sure none outlives the command. Each gets a process group of its own, so that
 * Ctrl-C in the terminal reaches only the command, which then stops them in the right order.
 */
export function createSupervisor() {
  const runId = randomUUID();
  const watchdog = startWatchdog(runId);
  /** @type {Child[]} */
  const running = [];
  /** @type {string[]} */
  const folders = [];
  /** @type {Promise<void> | undefined} */
  let stopped;
  /** @type {(child: Child) => void} */
  let reportEnd = () => {};
  /** Resolves with the first server that ends though nobody stopped it. */
  const unexpectedEnd = new Promise((/** @type {(child: Child) => void} */ resolve) => {
    reportEnd = resolve;
  });

  /** @type {(nobody: undefined) => void} */
  let reportStop = () => {};
  /** Resolves when the stopping begins. */
  const stopBegins = new Promise((/** @type {(nobody: undefined) => void} */ resolve) => {
    reportStop = resolve;
  });

  const checkRunning = () => {
    if (stopped !== undefined) throw new Interrupted();
  };

  /** @param {ProcessOrder} order @returns {Child} */
  const launch = (order) => {
    checkRunning();
    mkdirSync(dirname(order.logFile), { recursive: true });
    const log = openSync(order.logFile, 'a');
    const child = spawn(order.command, order.args ?? [], {
      cwd: order.cwd ?? projectRoot,
      env: { ...process.env, ...order.env, [RUN_MARK]: runId },
      detached: true,
      stdio: ['ignore', log, log],
    });
    let hasExited = false;
    /** @type {Promise<Ending>} */
    const exited = new Promise((resolve) => {
      child.once('error', (error) => {
        writeSync(log, `${error.message}\n`);
        resolve({ code: 127, signal: null });
      });
      child.once('exit', (code, signal) => resolve({ code, signal }));
    });
    /** @type {Child} */
    const entry = {
      name: order.name,
      pid: child.pid,
      logFile: order.logFile,
      exited,
      hasExited: () => hasExited,
      order,
    };
    running.push(entry);
    watchdog.tell(`started ${child.pid ?? 0}`);
    void exited.then(() => {
      hasExited = true;
      closeSync(log);
      running.splice(running.indexOf(entry), 1);
      watchdog.tell(`ended ${child.pid ?? 0}`);
    });
    return entry;
  };

  /** @param {Child} child */
  const stop = async (child) => {
    if (child.pid === undefined) return;
    await endGroup(child.pid, { signal: child.order.stopSignal, graceMs: child.order.stopGraceMs });
    await child.exited;
  };

  const stopEverything = async () => {
    // Newest first: the shop, then the stand-ins, then the database.
    for (const child of running.toReversed()) await stop(child);
    killMarked(runId);
    for (const folder of folders) rmSync(folder, { recursive: true, force: true });
    await watchdog.end();
  };

  return {
    watchdogPid: watchdog.pid,
    unexpectedEnd,
    stopBegins,
    isStopping: () => stopped !== undefined,
    checkRunning,
    stop,

    /** A server: runs until stopped. @param {ProcessOrder} order */
    start(order) {
      const child = launch(order);
      void child.exited.then(() => {
        if (stopped === undefined) reportEnd(child);
      });
      return child;
    },

    /**
     * A step that ends by itself.
     * @param {ProcessOrder & { timeLimitMs?: number }} order
     * @returns {Promise<number>} its exit code; a step over its time limit is ended and gives 124
     */
    async run(order) {
      const child = launch(order);
      let isLate = false;
      const limit = setTimeout(
        () => {
          isLate = true;
          void stop(child);
        },
        order.timeLimitMs ?? 2 ** 31 - 1,
      );
      const { code } = await child.exited;
      clearTimeout(limit);
      checkRunning();
      return isLate ? 124 : (code ?? 1);
    },

    /**
     * Repeats a question until its answer is yes, while the process asked lives.
     * @param {Child} child
     * @param {() => Promise<boolean> | boolean} isReady
     * @param {number} limitMs
     */
    async waitUntilReady(child, isReady, limitMs) {
      const untilMs = performance.now() + limitMs;
      for (;;) {
        checkRunning();
        if (child.hasExited()) {
          throw new StandFailure(`${child.name} ended before it was ready.`, { logFile: child.logFile });
        }
        if (await isReady()) return;
        if (performance.now() > untilMs) {
          const seconds = Math.round(limitMs / 1000);
          throw new StandFailure(`${child.name} was not ready after ${seconds} seconds.`, {
            logFile: child.logFile,
          });
        }
        await new Promise((resolve) => setTimeout(resolve, 50));
      }
    },

    /** The folder goes when everything has stopped, however the command ends. @param {string} folder */
    removeAtEnd(folder) {
      folders.push(folder);
      watchdog.tell(`folder ${folder}`);
    },

    stopAll() {
      reportStop(undefined);
      stopped ??= stopEverything();
      return stopped;
    },
  };
}

/** @param {string} runId */
function startWatchdog(runId) {
  const { [RUN_MARK]: _outerRun, ...env } = process.env;
  const child = spawn(process.execPath, [fileURLToPath(new URL('watchdog.mjs', import.meta.url)), runId], {
    detached: true,
    env,
    cwd: '/',
    stdio: ['pipe', 'ignore', 'ignore'],
  });
  child.stdin.on('error', () => {});
  const exited = new Promise((resolve) => child.once('exit', resolve));
  return {
    pid: child.pid,
    /** @param {string} line */
    tell: (line) => child.stdin.write(`${line}\n`),
    async end() {
      child.stdin.end();
      await exited;
    },
  };
}
