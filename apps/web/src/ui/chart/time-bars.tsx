import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useId, useState } from 'react';
import { useWidth } from '../drawing/use-width.js';
import { Text } from '../text.js';
import { layOutBars } from './bars-layout.js';

const Bar = chakra('rect', {
  base: {
    stroke: 'ink',
    strokeWidth: '1',
    '&[data-fill=solid]': { fill: 'ink' },
    '&[data-fill=open]': { fill: 'none', stroke: 'ink.soft' },
    '&[data-shown]': { strokeWidth: '2' },
    '&[data-fill=solid][data-shown]': { fill: 'ink.soft', stroke: 'ink.soft' },
  },
});
const Rule = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1' } });
const Hairline = chakra('path', { base: { stroke: 'hairline', strokeWidth: '1' } });
const Hatch = chakra('path', { base: { stroke: 'ink', strokeWidth: '1' } });
const Lettering = chakra('text', { base: { fill: 'ink.soft', fontSize: 'xs' } });

const headPx = 18;
const footPx = 22;

export interface Series {
  name: string;
  /** Told apart by how they are filled, as materials are on a drawing. */
  fill: 'solid' | 'hatched' | 'open';
}
export interface TimeBar {
  key: string;
  /** One value for each series, from the foot upwards. */
  parts: readonly number[];
  /** What is said of it when it is pointed at. */
  words: string;
}
export interface TimeBarsProps {
  /** What the drawing is, for those who do not see it; `summary` is added. */
  label: string;
  summary: string;
  bars: readonly TimeBar[];
  series?: readonly Series[];
  /** The worth of the tallest bar, as it stands at the upper line. */
  topText: (bar: TimeBar) => string;
  /** What stands under the first and the last bar. */
  ends: readonly [string, string] | undefined;
  heightPx?: number;
}

const alone: readonly Series[] = [{ name: '', fill: 'solid' }];

/** What the reader needs to read the fillings. */
const Legend = ({ series, hatchId }: { series: readonly Series[]; hatchId: string }) => (
  <Box
    as="ul"
    listStyle="none"
    display="flex"
    flexWrap="wrap"
    columnGap="5"
    rowGap="1"
    marginBottom="3"
    fontSize="sm"
    color="ink.soft"
  >
    {series.map(({ name, fill }) => (
      <Box as="li" key={name} display="flex" alignItems="center" gap="2">
        <svg width="14" height="14" aria-hidden>
          <Bar
            data-fill={fill}
            x={1}
            y={1}
            width={12}
            height={12}
            fill={fill === 'hatched' ? `url(#${hatchId})` : undefined}
          />
        </svg>
        {name}
      </Box>
    ))}
  </Box>
);

/** Bars along time. Give the same facts in a table beside it. */
export function TimeBars({
  label,
  summary,
  bars,
  series = alone,
  topText,
  ends,
  heightPx = 168,
}: TimeBarsProps) {
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const [shown, setShown] = useState<TimeBar>();
  const hatchId = useId();
  const layout = layOutBars(
    bars.map((bar) => bar.parts),
    { widthPx, heightPx },
  );
  const tallest = layout.tallest === undefined ? undefined : bars[layout.tallest];
  return (
    <>
      <Text isSoft marginBottom="4" minHeight="3em">
        {shown?.words ?? summary}
      </Text>
      {series.length > 1 && <Legend series={series} hatchId={hatchId} />}
      <Box ref={ref}>
        {widthPx > 0 && (
          <chakra.svg
            role="img"
            aria-label={`${label}. ${summary}`}
            width={`${widthPx}px`}
            height={`${headPx + heightPx + footPx}px`}
            display="block"
            maxWidth="full"
            onPointerLeave={() => setShown(undefined)}
          >
            <defs>
              <pattern
                id={hatchId}
                width="5"
                height="5"
                patternUnits="userSpaceOnUse"
                patternTransform="rotate(45)"
              >
                <Hatch d="M0 0V5" />
              </pattern>
            </defs>
            {tallest && (
              <>
                <Hairline d={`M0 ${headPx + 0.5}H${widthPx}`} />
                <Lettering x={0} y={headPx - 5}>
                  {topText(tallest)}
                </Lettering>
              </>
            )}
            {bars.map((bar, at) => {
              const drawn = layout.bars[at];
              return (
                drawn && (
                  <g key={bar.key} onPointerEnter={() => setShown(bar)}>
                    <rect
                      x={drawn.x}
                      y={headPx}
                      width={drawn.slotWidth}
                      height={heightPx}
                      fill="transparent"
                    />
                    {drawn.parts.map(({ y, height }, part) => {
                      const fill = series[part]?.fill ?? 'solid';
                      return height > 0 ? (
                        <Bar
                          key={series[part]?.name ?? part}
                          data-fill={fill}
                          data-shown={shown === bar || undefined}
                          fill={fill === 'hatched' ? `url(#${hatchId})` : undefined}
                          x={drawn.barX}
                          y={headPx + y}
                          width={drawn.width}
                          height={height}
                        />
                      ) : null;
                    })}
                  </g>
                )
              );
            })}
            <Rule d={`M0 ${headPx + heightPx + 0.5}H${widthPx}`} />
            {ends && (
              <>
                <Lettering x={0} y={headPx + heightPx + 17}>
                  {ends[0]}
                </Lettering>
                {bars.length > 1 && (
                  <Lettering x={widthPx} y={headPx + heightPx + 17} textAnchor="end">
                    {ends[1]}
                  </Lettering>
                )}
              </>
            )}
          </chakra.svg>
        )}
      </Box>
    </>
  );
}
