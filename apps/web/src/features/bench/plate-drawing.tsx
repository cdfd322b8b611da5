import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { Bed, Plate } from '@windchest/plates';
import { useId } from 'react';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { number } from '../../lib/format.js';
import { DimensionLine } from '../../ui/drawing/dimension-line.js';
import { LayerLines } from '../../ui/drawing/layer-lines.js';
import { useWidth } from '../../ui/drawing/use-width.js';
import { labelPlace, pathOf } from './plate-paths.js';

const BedOutline = chakra('rect', { base: { fill: 'sheet', stroke: 'ink', strokeWidth: '1.5' } });
const FreeEdge = chakra('rect', {
  base: { fill: 'none', stroke: 'edge', strokeWidth: '1', strokeDasharray: '2 4' },
});
const Outline = chakra('path', {
  base: {
    stroke: 'kit.deep',
    strokeWidth: '1',
    strokeLinejoin: 'round',
    vectorEffect: 'non-scaling-stroke',
  },
});
/** Written over layer lines, so it stands on a rim of the sheet's colour. */
const Code = chakra('text', {
  base: {
    fill: 'ink',
    stroke: 'sheet',
    strokeWidth: '3.5',
    strokeLinejoin: 'round',
    paintOrder: 'stroke',
    fontSize: '2xs',
    fontWeight: 'semibold',
    textAnchor: 'middle',
  },
});

const left = 30;
const foot = 30;
const tallestPx = 560;
/** Of the lettering: a sign's width at that size, and its height. */
const lettering = { perSignPx: 5.9, heightPx: 11 };

export interface PlateDrawingProps {
  plate: Plate;
  bed: Bed;
  marginMm: number;
  gapMm: number;
  /** What it shows, for those who do not see it. */
  description: string;
}

/** One plate from above, to scale, its front edge at the foot. */
export function PlateDrawing({ plate, bed, marginMm, gapMm, description }: PlateDrawingProps) {
  const patternId = useId();
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const pxPerMm = Math.min(Math.max(0, widthPx - left - 2) / bed.xMm, tallestPx / bed.yMm);
  const [bedX, bedY] = [bed.xMm * pxPerMm, bed.yMm * pxPerMm];
  return (
    <Box ref={ref} width="full" minHeight="1px">
      {widthPx > 0 && (
        <chakra.svg
          role="img"
          aria-label={description}
          width={left + bedX + 2}
          height={bedY + foot + 2}
          display="block"
          overflow="visible"
        >
          <defs>
            <LayerLines id={patternId} scale={pxPerMm} />
          </defs>
          <DimensionLine x={left - 12} y={1} lengthPx={bedY} direction="down" label={number(bed.yMm, 1)} />
          <DimensionLine
            x={left}
            y={bedY + 22}
            lengthPx={bedX}
            direction="right"
            label={number(bed.xMm, 1)}
          />
          <g transform={`translate(${left} 1)`}>
            <BedOutline width={bedX} height={bedY} />
            {marginMm > 0 && (
              <FreeEdge
                x={marginMm * pxPerMm}
                y={marginMm * pxPerMm}
                width={Math.max(0, bedX - 2 * marginMm * pxPerMm)}
                height={Math.max(0, bedY - 2 * marginMm * pxPerMm)}
              />
            )}
            <g transform={`scale(${pxPerMm})`}>
              {plate.placements.map((placement, at) => (
                <Outline key={at} d={pathOf(placement, bed)} fill={`url(#${patternId})`}>
                  <title>
                    {[
                      placement.code,
                      placement.laidAxis && texts.placed.laid,
                      placement.turnedDegrees !== 0 && texts.placed.turned(number(placement.turnedDegrees)),
                    ]
                      .filter(Boolean)
                      .join(', ')}
                  </title>
                </Outline>
              ))}
            </g>
            {plate.placements.map((placement, at) => {
              const place = labelPlace(placement, bed, {
                widthMm: (placement.code.length * lettering.perSignPx) / pxPerMm,
                heightMm: lettering.heightPx / pxPerMm,
                slackMm: gapMm * 0.4,
              });
              if (!place) return null;
              const turn = place.isUpright ? ' rotate(-90)' : '';
              return (
                <g key={at} transform={`translate(${place.xMm * pxPerMm} ${place.yMm * pxPerMm})${turn}`}>
                  <Code y="4">{placement.code}</Code>
                </g>
              );
            })}
          </g>
        </chakra.svg>
      )}
    </Box>
  );
}
