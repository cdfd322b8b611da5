/**
 * An instant for a reader, in UTC since the reader's zone is unknown: `1 December 2026 at 14:40 UTC`.
 * Throws TypeError where the text is no ISO 8601 instant.
 */
export function showInstant(instant: string, locale: string): string {
  const at = read(instant);
  const day = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: 'UTC' }).format(at);
  const hour = new Intl.DateTimeFormat(locale, { timeStyle: 'short', timeZone: 'UTC' }).format(at);
  return `${day} at ${hour}\u00a0UTC`;
}

/** The day of an instant, in UTC: `1 December 2026`, held together on one line. Throws as `showInstant` does. */
export function showDay(instant: string, locale: string): string {
  const day = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: 'UTC' }).format(read(instant));
  return day.replaceAll(' ', '\u00a0');
}

function read(instant: string): Date {
  const at = new Date(instant);
  if (Number.isNaN(at.getTime())) {
    throw new TypeError(`"${instant}" is not an instant. Give it as ISO 8601, such as 2026-12-01T14:40:00Z.`);
  }
  return at;
}
