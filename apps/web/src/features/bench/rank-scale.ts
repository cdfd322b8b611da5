import { type RefObject, useMemo } from 'react';
import { type DrawnVoice, layOutRank, type RankLayout } from '../../ui/drawing/rank-layout.js';
import { useWidth } from '../../ui/drawing/use-width.js';

/** What `Rank` leaves free of its width: the dimension line at the left, a hair at the right. */
export const rankGutterPx = 34;
const rankMarginPx = 4;

/** How `Rank` draws these voices at the width of the element, for what is ruled by the same measure. */
export function useRankScale(
  voices: readonly DrawnVoice[],
  maxHeightPx: number,
): [RefObject<HTMLDivElement | null>, RankLayout] {
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const layout = useMemo(
    () =>
      layOutRank(voices, {
        widthPx: Math.max(0, widthPx - rankGutterPx - rankMarginPx),
        heightPx: maxHeightPx,
      }),
    [voices, widthPx, maxHeightPx],
  );
  return [ref, layout];
}
