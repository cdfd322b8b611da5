import { lastLines, StandFailure } from './failures.mjs';

/** @param {string} text */
export function say(text = '') {
  process.stdout.write(`${text}\n`);
}

/** @param {number} sinceMs */
export function elapsed(sinceMs) {
  return `${((performance.now() - sinceMs) / 1000).toFixed(1)} s`;
}

/**
 * Names a step, does it, and ends the line with its seconds. The work writes to logs, never to the screen
 * meanwhile, so that one line stays one line.
 * @template T
 * @param {string} label
 * @param {() => Promise<T>} work
 * @param {(result: T) => string} [outcome] what to add behind the seconds
 * @returns {Promise<T>}
 */
export async function step(label, work, outcome = () => '') {
  const sinceMs = performance.now();
  process.stdout.write(`  ${label} … `);
  try {
    const result = await work();
    const more = outcome(result);
    say(`${elapsed(sinceMs)}${more === '' ? '' : `, ${more}`}`);
    return result;
  } catch (error) {
    say(`${elapsed(sinceMs)}, stopped`);
    throw error;
  }
}

/** @param {unknown} error */
export function sayFailure(error) {
  if (!(error instanceof StandFailure)) {
    say(`\n${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
    return;
  }
  say(`\n${error.message}`);
  const lines = lastLines(error.logFile);
  if (lines.length > 0) {
    say(`\nThe last lines of ${error.logFile}:`);
    for (const line of lines) say(`  ${line}`);
  }
}

/**
 * @param {string[][]} rows
 * @returns {string[]} the rows as lines with aligned columns
 */
export function columns(rows) {
  const widths = (rows[0] ?? []).map((_, index) => Math.max(...rows.map((row) => (row[index] ?? '').length)));
  return rows.map((row) =>
    row
      .map((cell, index) => cell.padEnd(widths[index] ?? 0))
      .join('  ')
      .trimEnd(),
  );
}
