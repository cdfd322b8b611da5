/** How often something recurs: the two fields of a price's `recurring`. */
export type Rhythm = { interval: string; interval_count: number };

const secondsIn: Record<string, number> = { day: 86_400, week: 7 * 86_400 };

/**
 * The boundary that lies `count` intervals after `anchor`, in unix seconds. A month without the anchor's day
 * ends on its last day, and the next one has the day again.
 */
export function boundary(anchor: number, { interval, interval_count }: Rhythm, count: number): number {
  const steps = count * interval_count;
  const fixed = secondsIn[interval];
  if (fixed) return anchor + steps * fixed;
  const start = new Date(anchor * 1000);
  const months = interval === 'year' ? 12 * steps : steps;
  const year = start.getUTCFullYear();
  const month = start.getUTCMonth() + months;
  const lastDay = new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
  const end = Date.UTC(
    year,
    month,
    Math.min(start.getUTCDate(), lastDay),
    start.getUTCHours(),
    start.getUTCMinutes(),
    start.getUTCSeconds(),
  );
  return Math.floor(end / 1000);
}

/** The first boundary after `time`. */
export function boundaryAfter(anchor: number, rhythm: Rhythm, time: number): number {
  let count = time < anchor ? 0 : 1;
  while (boundary(anchor, rhythm, count) <= time) count += 1;
  return boundary(anchor, rhythm, count);
}
