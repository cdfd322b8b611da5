import { closeSync, fstatSync, openSync, readSync } from 'node:fs';
import { say } from './report.mjs';

/**
 * Shows on the screen what a server writes to its log from now on.
 * @param {string} file
 * @param {string} name put before each line
 */
export function followLog(file, name) {
  const log = openSync(file, 'r');
  let position = fstatSync(log).size;
  let rest = '';
  const timer = setInterval(() => {
    const size = fstatSync(log).size;
    if (size <= position) return;
    const bytes = Buffer.alloc(size - position);
    position += readSync(log, bytes, 0, bytes.length, position);
    const lines = `${rest}${bytes.toString('utf8')}`.split('\n');
    rest = lines.pop() ?? '';
    for (const line of lines) say(`[${name}] ${line}`);
  }, 200);
  return () => {
    clearInterval(timer);
    closeSync(log);
  };
}
