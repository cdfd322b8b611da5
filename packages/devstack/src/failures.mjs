import { readFileSync } from 'node:fs';
import { stripVTControlCharacters } from 'node:util';

/** A failure told in one sentence, with the log that explains it. Shown without a stack. */
export class StandFailure extends Error {
  /**
   * @param {string} sentence what failed and what to do
   * @param {{ logFile?: string }} [evidence]
   */
  constructor(sentence, { logFile } = {}) {
    super(sentence);
    this.logFile = logFile;
  }
}

/** Thrown into whatever was waiting when the command was told to stop. */
export class Interrupted extends Error {
  constructor() {
    super('Stopped before it was done.');
  }
}

/**
 * @param {string | undefined} file
 * @param {number} [count]
 * @returns {string[]} the last lines of a log, none if it cannot be read
 */
export function lastLines(file, count = 30) {
  if (file === undefined) return [];
  try {
    const lines = stripVTControlCharacters(readFileSync(file, 'utf8')).trimEnd().split('\n');
    return lines.slice(-count).filter((line) => line !== '');
  } catch {
    return [];
  }
}
