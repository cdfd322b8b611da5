import type { OutputOf } from '@windchest/contracts';

export type SalesDay = NonNullable<OutputOf<'GET /workshop/overview'>['sales']>[number];

export interface SalesBar {
  day: SalesDay;
  /** Left end of the day's slot, px. */
  x: number;
  slotWidth: number;
  width: number;
  height: number;
}

/** A day with sales is never drawn as one without. */
const leastPx = 2;

/** Bars of equal slots, the best day as tall as there is room. */
export function barsOf(
  sales: readonly SalesDay[],
  room: { widthPx: number; heightPx: number },
): { bars: SalesBar[]; most: SalesDay | undefined } {
  const top = Math.max(0, ...sales.map((day) => day.gross.minor));
  const slotWidth = room.widthPx / Math.max(1, sales.length);
  return {
    most: top > 0 ? sales.find((day) => day.gross.minor === top) : undefined,
    bars: sales.map((day, at) => ({
      day,
      x: at * slotWidth,
      slotWidth,
      width: Math.max(1, Math.min(18, slotWidth * 0.64)),
      height: day.gross.minor > 0 ? Math.max(leastPx, (day.gross.minor / top) * room.heightPx) : 0,
    })),
  };
}
