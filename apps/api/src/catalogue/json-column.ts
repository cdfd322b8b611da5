/** Written queries give JSON columns as text or as values, depending on the driver; both are read here. */
export const fromJson = <T>(value: unknown): T | null =>
  typeof value === 'string' ? (JSON.parse(value) as T) : ((value ?? null) as T | null);
