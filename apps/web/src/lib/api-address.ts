import type { EndpointKey } from '@windchest/contracts';

type Values = Readonly<Record<string, unknown>>;

/** `?page=2&search=…`; what is undefined, null or empty is left out. */
export function queryText(query: Values | undefined): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value === undefined || value === null || value === '') continue;
    search.set(name, String(value));
  }
  const text = search.toString();
  return text && `?${text}`;
}

/** Puts values in the place of `:names`. Throws where one is missing: a wrong address must not be asked for. */
export const fillPath = (pattern: string, params: Values = {}): string =>
  pattern.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined || value === '') throw new Error(`${pattern} needs a value for ${name}.`);
    return encodeURIComponent(String(value));
  });

/** Where an endpoint is asked, for links and uploads that do not go through `call`. */
export function apiAddress(key: EndpointKey, input: { params?: Values; query?: Values } = {}): string {
  const path = key.slice(key.indexOf(' ') + 1);
  return `/api${fillPath(path, input.params)}${queryText(input.query)}`;
}
