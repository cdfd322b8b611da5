import { StandFailure } from './failures.mjs';

/** The parts of `npm test`, in the order in which they run. */
export const SUITES = Object.freeze(['lint', 'unit', 'db', 'e2e']);

/**
 * `npm test -- unit db -- orders`: some parts only, and only files whose path matches.
 * @param {string[]} words
 * @returns {{ suites: Set<string>, patterns: string[] }}
 */
export function readTestWish(words) {
  const suites = words.filter((word) => SUITES.includes(word));
  const patterns = words.filter((word) => word !== '--' && !SUITES.includes(word));
  const option = patterns.find((word) => word.startsWith('-'));
  if (option !== undefined) {
    throw new StandFailure(
      `"${option}" is not known. Use "npm test", or "npm test -- ${SUITES.join('|')}" and a part of a file's path.`,
    );
  }
  const chosen =
    suites.length > 0 ? suites : patterns.length > 0 ? SUITES.filter((name) => name !== 'lint') : SUITES;
  return { suites: new Set(chosen), patterns };
}
