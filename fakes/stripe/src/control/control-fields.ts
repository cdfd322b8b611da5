import { Fields } from '../api/fields.js';

/** JSON -> the same reader that the API's forms go through: one way to check, one way to complain. */
export function fieldsOf(body: unknown): Fields {
  const isObject = typeof body === 'object' && body !== null && !Array.isArray(body);
  return new Fields(isObject ? (asText(body) as Record<string, unknown>) : {});
}

function asText(value: unknown): unknown {
  if (value === null) return undefined;
  if (Array.isArray(value)) return value.map(asText);
  if (typeof value === 'object') {
    return Object.fromEntries(Object.entries(value).map(([key, entry]) => [key, asText(entry)]));
  }
  return String(value);
}
