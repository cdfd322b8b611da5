import { chakra } from '@chakra-ui/react/styled-system';
import { roomTexts } from '../../config/texts/room.js';
import { signed } from '../../lib/format.js';
import type { RankLayout } from '../../ui/drawing/rank-layout.js';
import type { PredictedVoice } from './predicted-rank.js';

const Note = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1', strokeDasharray: '2 3' } });
const Edge = chakra('path', { base: { stroke: 'hairline', strokeWidth: '1' } });
const Unsure = chakra('rect', { base: { fill: 'kit.wash', stroke: 'kit.lit', strokeWidth: '1' } });
const Mark = chakra('rect', { base: { fill: 'kit.deep' } });
const Lettering = chakra('text', {
  base: { fill: 'ink.soft', fontSize: '2xs', fontWeight: 'medium', textAnchor: 'end' },
});
/** Moves with the room’s temperature; the page stills it where less motion is asked for. */
const Mover = chakra('g', { base: { transition: 'transform', transitionDuration: 'fast' } });

const heightPx = 88;
const padPx = 8;
/** The strip’s ends are at a round number, so that they can be read. */
const roundCents = (cents: number) => Math.max(10, Math.ceil(cents / 10) * 10);

export interface CentsStripProps {
  layout: RankLayout;
  /** Room at the left that the rank leaves for its dimension line. */
  gutterPx: number;
  predicted: readonly PredictedVoice[];
  /** As far as a mark may come from the line of the notes. */
  widestCents: number;
}

/** Under each voice, where it sounds against its note: a mark, and how far it may be off. The table says it in numbers. */
export function CentsStrip({ layout, gutterPx, predicted, widestCents }: CentsStripProps) {
  const endCents = roundCents(widestCents);
  const middle = heightPx / 2;
  const pxPerCent = (middle - padPx) / endCents;
  const right = gutterPx + layout.widthPx + 4;
  const byCode = new Map(predicted.map((one) => [one.code, one]));
  return (
    <chakra.svg
      width={right + 4}
      height={heightPx}
      display="block"
      marginTop="3"
      marginLeft="-4px"
      viewBox={`-4 0 ${right + 4} ${heightPx}`}
      aria-hidden
    >
      <Edge
        d={`M${gutterPx - 4} ${padPx + 0.5}H${right}M${gutterPx - 4} ${heightPx - padPx + 0.5}H${right}`}
      />
      <Note d={`M${gutterPx - 4} ${middle + 0.5}H${right}`} />
      <Lettering x={gutterPx - 8} y={padPx + 4}>
        {signed(endCents)}
      </Lettering>
      <Lettering x={gutterPx - 8} y={middle + 4}>
        {roomTexts.strip}
      </Lettering>
      <Lettering x={gutterPx - 8} y={heightPx - padPx + 4}>
        {signed(-endCents)}
      </Lettering>
      {layout.voices.map(({ voice, x, width }) => {
        const one = byCode.get(voice.key);
        if (!one) return null;
        const markWidth = Math.max(6, Math.min(width, 16));
        const left = gutterPx + x + (width - markWidth) / 2;
        const unsurePx = one.uncertaintyCents * pxPerCent;
        return (
          <Mover
            key={voice.key}
            style={{ transform: `translate(${left}px, ${middle - one.cents * pxPerCent}px)` }}
          >
            <Unsure x={1} width={markWidth - 2} y={-unsurePx} height={2 * unsurePx} />
            <Mark width={markWidth} y={-1} height={2.5} />
          </Mover>
        );
      })}
    </chakra.svg>
  );
}
