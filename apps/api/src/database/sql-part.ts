/**
 * A piece of a query that one room hands to another: the tables named in it stay known to its own room
 * alone. Values go in by name; whoever joins parts gives each its own prefix.
 */
export interface SqlPart {
  readonly sql: string;
  readonly values: Readonly<Record<string, unknown>>;
}

/** Several parts' values in one object; two parts with one name would read each other's. */
export const valuesOf = (...parts: readonly SqlPart[]): Record<string, unknown> => {
  const all: Record<string, unknown> = {};
  for (const { values } of parts)
    for (const [name, value] of Object.entries(values)) {
      if (name in all) throw new Error(`Two parts of a query both name a value ${name}.`);
      all[name] = value;
    }
  return all;
};
