/** One value of a log entry: what it was, what it is. `undefined` where there was, or is, none. */
export interface LogChange {
  path: string;
  before: unknown;
  after: unknown;
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const isNothing = (value: unknown): boolean => value === null || value === undefined;

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);

/** The values that differ between two records, down to single fields; lists count as one value. */
export function changesOf(before: unknown, after: unknown, path = ''): LogChange[] {
  if (isSame(before ?? null, after ?? null)) return [];
  const isDeeper =
    (isRecord(before) || isRecord(after)) &&
    (isRecord(before) || isNothing(before)) &&
    (isRecord(after) || isNothing(after));
  if (!isDeeper) return [{ path, before: before ?? undefined, after: after ?? undefined }];
  const [old, now] = [(before ?? {}) as Record<string, unknown>, (after ?? {}) as Record<string, unknown>];
  return [...new Set([...Object.keys(old), ...Object.keys(now)])].flatMap((name) =>
    changesOf(old[name], now[name], path ? `${path}.${name}` : name),
  );
}

/** `declaredCents` → `declared cents`, for a reader who does not program. */
export const pathWords = (path: string): string =>
  path
    .replace(/([a-z0-9])([A-Z])/g, '$1 $2')
    .replaceAll('.', ', ')
    .toLowerCase();
