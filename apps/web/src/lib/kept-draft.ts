import { type StoredValue, storedValue } from './stored-value.js';

const kept = new Map<string, StoredValue<string | null>>();

/** Words that were typed but not saved yet, kept in the browser: a broken connection must not cost an hour's work. */
export function keptDraft(name: string): StoredValue<string | null> {
  const key = `windchest.draft.${name}`;
  const known = kept.get(key);
  if (known) return known;
  const made = storedValue<string | null>({ key, read: (text) => text, write: (text) => text });
  kept.set(key, made);
  return made;
}
