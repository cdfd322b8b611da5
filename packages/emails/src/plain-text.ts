// Control characters would break a header or a line; the bidirectional ones can show a name backwards.
const unseen = /[\p{Cc}\u2028\u2029\u202a-\u202e\u2066-\u2069]+/gu;

const plainLine = (text: string): string => text.replace(unseen, ' ').trim();

/** The same value with every string in it on one line, without control or direction characters. */
export function plainStrings<T>(value: T): T {
  if (typeof value === 'string') return plainLine(value) as T;
  if (Array.isArray(value)) return value.map((item: unknown) => plainStrings(item)) as T;
  if (typeof value === 'object' && value !== null) {
    return Object.fromEntries(
      Object.entries(value).map(([key, item]: [string, unknown]) => [key, plainStrings(item)]),
    ) as T;
  }
  return value;
}

const longestGreetedName = 60;
const looksLikeAddress = /[/@]|www\.|\S\.\p{L}{2,}/iu;

/**
 * The name to greet with, or none. Anybody can have a mail sent to a stranger by joining with that
 * stranger's address; a name that is an advertisement or an address is therefore not repeated.
 */
export function greetedName(name: string | undefined): string | undefined {
  if (name === undefined || name === '' || name.length > longestGreetedName) return undefined;
  return looksLikeAddress.test(name) ? undefined : name;
}
