/**
 * Runs beside a command and outlives it by a moment: when the command dies without having stopped what it
 * started (killed, or its terminal gone), the pipe on stdin closes and the watchdog ends the rest.
 * Told by lines: `started <pid>`, `ended <pid>`, `folder <path>`.
 */
import { rmSync } from 'node:fs';
import { createInterface } from 'node:readline';
import { endGroup, findMarked, killMarked } from './marked-processes.mjs';

const runId = process.argv[2] ?? '';
/** @type {number[]} */
const running = [];
/** @type {string[]} */
const folders = [];

for await (const line of createInterface({ input: process.stdin })) {
  const [word, ...rest] = line.split(' ');
  const value = rest.join(' ');
  if (word === 'started') running.unshift(Number(value));
  if (word === 'ended') running.splice(running.indexOf(Number(value)), 1);
  if (word === 'folder') folders.push(value);
}

if (runId !== '' && (running.length > 0 || findMarked(runId).length > 0)) {
  // Newest first: the shop before the database it writes to.
  for (const pid of running) await endGroup(pid);
  killMarked(runId);
}
for (const folder of folders) rmSync(folder, { recursive: true, force: true });
