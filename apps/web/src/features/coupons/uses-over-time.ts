import type { CouponDay } from '@windchest/contracts';

export interface UsesBar {
  /** First day, ISO. */
  from: string;
  redeemed: number;
  held: number;
  givenBack: number;
  takenOffMinor: number;
}
export type Step = 'day' | 'week' | 'month';

const dayMs = 86_400_000;
const daysAsDays = 62;
const daysAsWeeks = 2 * 366;

/** As many bars as can be told apart: days for two months, weeks for two years, then months. */
export const stepFor = (firstDay: string, lastDay: string): Step => {
  const days = (Date.parse(lastDay) - Date.parse(firstDay)) / dayMs + 1;
  if (days <= daysAsDays) return 'day';
  return days <= daysAsWeeks ? 'week' : 'month';
};

/** The first day of the step a day lies in; weeks begin on Monday (ISO 8601). */
export const stepStart = (day: string, step: Step): string => {
  if (step === 'month') return `${day.slice(0, 7)}-01`;
  if (step === 'day') return day;
  const date = new Date(`${day}T00:00:00Z`);
  const sinceMonday = (date.getUTCDay() + 6) % 7;
  return new Date(date.getTime() - sinceMonday * dayMs).toISOString().slice(0, 10);
};

const nextStart = (start: string, step: Step): string => {
  const date = new Date(`${start}T00:00:00Z`);
  if (step === 'month') date.setUTCMonth(date.getUTCMonth() + 1);
  else date.setUTCDate(date.getUTCDate() + (step === 'week' ? 7 : 1));
  return date.toISOString().slice(0, 10);
};

/** From the first use to today, steps without any included. */
export function usesOverTime(days: readonly CouponDay[], today: string): { step: Step; bars: UsesBar[] } {
  const first = days[0]?.day;
  if (!first) return { step: 'day', bars: [] };
  const last = (days.at(-1)?.day ?? today) > today ? (days.at(-1)?.day ?? today) : today;
  const step = stepFor(first, last);
  const bars = new Map<string, UsesBar>();
  for (let from = stepStart(first, step); from <= last; from = nextStart(from, step))
    bars.set(from, { from, redeemed: 0, held: 0, givenBack: 0, takenOffMinor: 0 });
  for (const day of days) {
    const bar = bars.get(stepStart(day.day, step));
    if (!bar) continue;
    bar.redeemed += day.redeemed;
    bar.held += day.held;
    bar.givenBack += day.givenBack;
    bar.takenOffMinor += day.takenOff.minor;
  }
  return { step, bars: [...bars.values()] };
}
