import { readdirSync, readFileSync } from 'node:fs';

/**
 * Every process of a run inherits this variable. It finds those that left their process group too, as
 * browsers do.
 */
export const RUN_MARK = 'WINDCHEST_RUN';

/**
 * @param {string} runId
 * @returns {number[]} living processes that carry the mark of the run
 */
export function findMarked(runId) {
  const mark = `${RUN_MARK}=${runId}`;
  return processNumbers()
    .filter((pid) => Number(pid) !== process.pid && environmentOf(pid).includes(mark))
    .map(Number);
}

/** @param {string} runId */
export function killMarked(runId) {
  for (const pid of findMarked(runId)) sendSignal(pid, 'SIGKILL');
}

/**
 * @param {number} pid a negative number means the process group
 * @param {NodeJS.Signals | 0} signal
 * @returns {boolean} false when nobody was there to receive it
 */
export function sendSignal(pid, signal) {
  try {
    process.kill(pid, signal);
    return true;
  } catch {
    return false;
  }
}

/**
 * Asks a process group to end, and makes it end when it has not done so in time.
 * @param {number} pid the group's first process
 * @param {{ signal?: NodeJS.Signals, graceMs?: number }} [options]
 */
export async function endGroup(pid, { signal = 'SIGTERM', graceMs = 10_000 } = {}) {
  sendSignal(-pid, signal);
  const untilMs = performance.now() + graceMs;
  while (isGroupAlive(pid) && performance.now() < untilMs) {
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  sendSignal(-pid, 'SIGKILL');
}

/**
 * Signals still reach processes that have ended and whose parent has not asked for their code; where the
 * parent died first, in a container without an init, that may stay so for ever.
 * @param {number} group
 */
function isGroupAlive(group) {
  if (!sendSignal(-group, 0)) return false;
  return processNumbers().some((pid) => {
    const status = processStatus(Number(pid));
    return status !== undefined && status.group === group && !status.hasEnded;
  });
}

/**
 * @param {number} pid
 * @returns {{ hasEnded: boolean, group: number, startTick: string } | undefined}
 */
export function processStatus(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // proc(5): the name in brackets may hold spaces; state is field 3, group 5, start time 22.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return { hasEnded: fields[0] === 'Z', group: Number(fields[2]), startTick: fields[19] ?? '' };
  } catch {
    return undefined;
  }
}

const processNumbers = () => readdirSync('/proc').filter((name) => /^\d+$/.test(name));

/** @param {string} pid */
function environmentOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/environ`, 'latin1').split('\0');
  } catch {
    // It ended meanwhile, or belongs to somebody else.
    return [];
  }
}
