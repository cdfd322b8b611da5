import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { openState, type State } from './state.js';

const format = 'windchest-fake-stripe-1';

/**
 * Reads the state file, or opens an empty state where there is none.
 * @throws Error that names the file when it is not a snapshot of this stand-in
 */
export function loadState(file: string | null, seed: number): State {
  if (!file || !existsSync(file)) return openState(seed);
  try {
    const saved = JSON.parse(readFileSync(file, 'utf8')) as { format?: string } & Partial<
      Record<keyof State, unknown>
    >;
    if (saved.format !== format)
      throw new Error(`its format is ${saved.format ?? 'not given'}, not ${format}`);
    return openState(seed, saved);
  } catch (cause) {
    const reason = cause instanceof Error ? cause.message : String(cause);
    throw new Error(`The state file ${file} cannot be used (${reason}). Delete it to start afresh.`, {
      cause,
    });
  }
}

/** Writes beside the file, then renames: a reader, or a crash, never meets half a file. */
export function saveState(file: string, state: State): void {
  mkdirSync(dirname(file), { recursive: true });
  const draft = `${file}.${process.pid}.new`;
  // The snapshot holds the buyers' e-mail addresses: for the owner's eyes alone.
  writeFileSync(draft, JSON.stringify({ format, ...state }), { mode: 0o600 });
  renameSync(draft, file);
}
