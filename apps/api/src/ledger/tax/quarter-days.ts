/** A quarter of a calendar year, in UTC as all days of the ledger. */
export interface Quarter {
  readonly year: number;
  readonly quarter: number;
}

export interface QuarterDays {
  readonly from: Date;
  /** The first moment after it. */
  readonly until: Date;
  readonly firstDay: string;
  readonly lastDay: string;
}

const dayMs = 86_400_000;
const isoDay = (date: Date): string => date.toISOString().slice(0, 10);

export const quarterDays = ({ year, quarter }: Quarter): QuarterDays => {
  const from = new Date(Date.UTC(year, (quarter - 1) * 3, 1));
  const until = new Date(Date.UTC(year, quarter * 3, 1));
  return { from, until, firstDay: isoDay(from), lastDay: isoDay(new Date(until.getTime() - dayMs)) };
};

export const quarterOf = (moment: Date): Quarter => ({
  year: moment.getUTCFullYear(),
  quarter: Math.floor(moment.getUTCMonth() / 3) + 1,
});

export const quarterName = ({ year, quarter }: Quarter): string => `${year} Q${quarter}`;

/** So late that no transaction which began in the quarter can still be under way. */
const AFTER_END_MS = 3_600_000;

export const isQuarterOver = (quarter: Quarter, now: Date): boolean =>
  now.getTime() >= quarterDays(quarter).until.getTime() + AFTER_END_MS;
