/** Px per mm, one for all parts: the tallest fits the height, the widest the width. */
export function partsScale(
  parts: readonly { widthMm: number; heightMm: number }[],
  room: { widthPx: number; heightPx: number },
): number {
  const widest = Math.max(...parts.map((part) => part.widthMm));
  const tallest = Math.max(...parts.map((part) => part.heightMm));
  return widest > 0 && tallest > 0 ? Math.min(room.widthPx / widest, room.heightPx / tallest) : 0;
}
