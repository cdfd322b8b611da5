import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useId, useMemo } from 'react';
import { drawingTexts } from '../../config/texts/shared.js';
import { millimetres, number } from '../../lib/format.js';
import { DimensionLine } from './dimension-line.js';
import { LayerLines } from './layer-lines.js';
import { type DrawnVoice, type ExtentMm, layOutRank } from './rank-layout.js';
import { type Pressing, usePressing } from './use-pressing.js';
import { useWidth } from './use-width.js';
import { VoiceShape } from './voice-shape.js';

const Voice = chakra('g', {
  base: {
    outline: 'none',
    '&[role=button]': { cursor: 'pointer' },
    // Browsers draw an outline around all of the group, its label too; the ring is drawn around the voice.
    '&:focus-visible .focus': { opacity: 1 },
    '&[data-pressed] .body': { opacity: 0.7 },
  },
});
const FocusRing = chakra('rect', { base: { fill: 'none', stroke: 'ink', strokeWidth: '2', opacity: 0 } });
const Baseline = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1' } });
const Label = chakra('text', {
  base: { fill: 'ink', fontSize: '2xs', fontWeight: 'semibold', textAnchor: 'middle', userSelect: 'none' },
});

export interface RankProps extends Pressing {
  voices: readonly DrawnVoice[];
  /** Most it may be tall, px; the width is that of its place. */
  maxHeightPx?: number;
  /** Of the largest of several ranks (`extentOfAll`), so that all are drawn to one scale. */
  extent?: ExtentMm;
  hasLabels?: boolean;
  /** The longest voice's length, at the left. */
  hasDimension?: boolean;
  /** Instead of "18 voices drawn to scale, the longest 158.5 mm". */
  description?: string;
}

const dimensionPx = 34;
const labelPx = 20;
/** Lettering under each voice needs this much room, else every second or third one is lettered. */
const leastLabelPx = 17;

/** A kit's voices, side by side, to scale: its emblem. Draws nothing until its width is known. */
export function Rank({
  voices,
  maxHeightPx = 272,
  extent,
  hasLabels,
  hasDimension,
  description,
  onPress,
  onRelease,
}: RankProps) {
  const patternId = useId();
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const keys = useMemo(() => voices.map((voice) => voice.key), [voices]);
  const { pressed, handlersOf } = usePressing(keys, { onPress, onRelease });
  const left = hasDimension ? dimensionPx : 0;
  const layout = useMemo(
    () => layOutRank(voices, { widthPx: Math.max(0, widthPx - left - 4), heightPx: maxHeightPx, extent }),
    [voices, widthPx, left, maxHeightPx, extent],
  );
  const longestMm = Math.max(0, ...voices.map((voice) => voice.lengthMm));
  const words = description ?? drawingTexts.rank(voices.length, millimetres(longestMm));
  const top = hasDimension ? 7 : 1;
  const foot = top + layout.heightPx;
  const slotPx = layout.widthPx / Math.max(1, voices.length);
  const everyNth = Math.max(1, Math.ceil(leastLabelPx / Math.max(1, slotPx)));

  return (
    <Box ref={ref} width="full" minHeight="1px">
      {widthPx > 0 && voices.length > 0 && (
        <chakra.svg
          role={onPress ? 'group' : 'img'}
          aria-label={onPress ? `${words}. ${drawingTexts.pressHint}` : words}
          width={left + layout.widthPx + 4}
          height={foot + (hasLabels ? labelPx : 2)}
          display="block"
          maxWidth="full"
          touchAction={onPress ? 'pan-y' : undefined}
          overflow="visible"
        >
          <defs>
            <LayerLines id={patternId} />
          </defs>
          {hasDimension && (
            <DimensionLine
              x={18}
              y={top}
              lengthPx={layout.heightPx}
              direction="down"
              label={number(longestMm, 1)}
            />
          )}
          <g transform={`translate(${left} ${top})`}>
            {layout.voices.map((placed, at) => (
              <Voice
                key={placed.voice.key}
                {...(onPress && {
                  role: 'button',
                  'aria-label': `${placed.voice.label}, ${millimetres(placed.voice.lengthMm)}`,
                  'data-voice': placed.voice.key,
                  'data-pressed': pressed === placed.voice.key ? '' : undefined,
                  ...handlersOf(placed.voice.key),
                })}
              >
                {onPress && (
                  <rect
                    x={placed.slotX}
                    width={placed.slotWidth}
                    y={0}
                    height={layout.heightPx + (hasLabels ? labelPx : 0)}
                    fill="transparent"
                  />
                )}
                <g className="body">
                  <VoiceShape placed={placed} fill={`url(#${patternId})`} />
                </g>
                {onPress && (
                  <FocusRing
                    className="focus"
                    x={placed.x - 3}
                    y={placed.y - 3}
                    width={placed.width + 6}
                    height={placed.height + 6}
                  />
                )}
                {hasLabels && at % everyNth === 0 && (
                  <Label x={placed.x + placed.width / 2} y={layout.heightPx + 15} aria-hidden>
                    {placed.voice.label}
                  </Label>
                )}
              </Voice>
            ))}
          </g>
          <Baseline
            d={`M${Math.max(0, left - 4)} ${Math.round(foot) + 0.5}H${left + layout.widthPx + 4}`}
            aria-hidden
          />
        </chakra.svg>
      )}
    </Box>
  );
}
