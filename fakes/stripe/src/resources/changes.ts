/** What was otherwise before: the `previous_attributes` of an event. Null where nothing changed. */
export function previousOf<T extends object>(before: T, after: T): Partial<T> | null {
  const keys = Object.keys({ ...before, ...after }) as (keyof T)[];
  const changed = keys.filter((key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]));
  if (changed.length === 0) return null;
  return Object.fromEntries(changed.map((key) => [key, before[key] ?? null])) as Partial<T>;
}
