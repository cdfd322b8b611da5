const two = (value: number) => String(value).padStart(2, '0');

/** An ISO 8601 moment in UTC as `datetime-local` wants it, in the reader's own zone. */
export function toLocalField(moment: string | null): string {
  if (!moment) return '';
  const at = new Date(moment);
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}T${two(at.getHours())}:${two(at.getMinutes())}`;
}

/** What stands in a `datetime-local` field, as a moment in UTC; null where it is empty. */
export function fromLocalField(text: string): string | null {
  // Other texts a browser would guess a year for.
  if (!/^\d{4,}-\d\d-\d\dT\d\d:\d\d/.test(text)) return null;
  const at = new Date(text);
  return Number.isNaN(at.getTime()) ? null : at.toISOString();
}

/** `Europe/Dublin` */
export const zoneName = (): string => new Intl.DateTimeFormat().resolvedOptions().timeZone;
