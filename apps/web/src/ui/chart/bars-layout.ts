export interface DrawnPart {
  /** From the chart's upper edge, px. */
  y: number;
  height: number;
}

export interface DrawnBar {
  /** Left end of the bar's slot, px. */
  x: number;
  slotWidth: number;
  barX: number;
  width: number;
  /** From the foot upwards, one for each series. */
  parts: DrawnPart[];
}

/** What is there is never drawn as if it were not. */
const leastPx = 2;
const widestPx = 40;

const sumOf = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0);

/** Stacked bars of equal slots, the tallest as tall as there is room. Values are zero or more. */
export function layOutBars(
  stacks: readonly (readonly number[])[],
  room: { widthPx: number; heightPx: number },
): { bars: DrawnBar[]; tallest: number | undefined } {
  const sums = stacks.map(sumOf);
  const top = Math.max(0, ...sums);
  const slotWidth = room.widthPx / Math.max(1, stacks.length);
  const width = Math.max(1, Math.min(widestPx, slotWidth * 0.64));
  return {
    tallest: top > 0 ? sums.indexOf(top) : undefined,
    bars: stacks.map((parts, at) => {
      let y = room.heightPx;
      return {
        x: at * slotWidth,
        slotWidth,
        barX: at * slotWidth + (slotWidth - width) / 2,
        width,
        parts: parts.map((value) => {
          const height = value > 0 ? Math.max(leastPx, (value / top) * room.heightPx) : 0;
          y -= height;
          return { y, height };
        }),
      };
    }),
  };
}
