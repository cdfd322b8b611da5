import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ReactNode, useId } from 'react';
import { drawingTexts } from '../../config/texts/shared.js';
import { VisuallyHidden } from '../visually-hidden.js';
import { LayerLines } from './layer-lines.js';
import { partsScale } from './parts-scale.js';
import { useWidth } from './use-width.js';

export interface DrawnPart {
  code: string;
  name?: string;
  /** An SVG path in mm, the box it lies in, and its size. */
  path: string;
  /** What is seen inside the outline, as another path; stroked finely. */
  edges?: string;
  viewBox: string;
  widthMm: number;
  heightMm: number;
  /** Filled with layer lines in the kit's colour; else outline only. */
  isToReprint?: boolean;
}

const Outline = chakra('path', {
  base: {
    strokeWidth: '1',
    vectorEffect: 'non-scaling-stroke',
    strokeLinejoin: 'round',
    fillRule: 'evenodd',
  },
});

const Edges = chakra('path', {
  base: { fill: 'none', strokeWidth: '0.5', vectorEffect: 'non-scaling-stroke', strokeLinejoin: 'round' },
});
/** Across less, inner lines would run into a grey patch. */
const leastForEdgesPx = 20;

/** The inner lines of a part, where it is drawn large enough to tell them apart. */
const InnerEdges = ({
  part,
  pxPerMm,
  stroke,
}: {
  part: Omit<DrawnPart, 'code'>;
  pxPerMm: number;
  stroke: string;
}) =>
  part.edges && Math.min(part.widthMm, part.heightMm) * pxPerMm >= leastForEdgesPx ? (
    <Edges d={part.edges} stroke={stroke} />
  ) : null;

/** Room a lettered code takes under the smallest part, px. */
const leastSlotPx = 26;

const PartDrawing = ({
  part,
  pxPerMm,
  patternId,
}: {
  part: DrawnPart;
  pxPerMm: number;
  patternId: string;
}) => (
  <chakra.svg
    viewBox={part.viewBox}
    // With their unit: a bare 32 would be the token of that name.
    width={`${Math.max(2, part.widthMm * pxPerMm)}px`}
    height={`${Math.max(2, part.heightMm * pxPerMm)}px`}
    overflow="visible"
    display="block"
    marginInline="auto"
    aria-hidden
  >
    {part.isToReprint ? (
      <Outline d={part.path} fill={`url(#${patternId})`} stroke="kit.deep" />
    ) : (
      <Outline d={part.path} fill="none" stroke="ink.soft" />
    )}
    <InnerEdges part={part} pxPerMm={pxPerMm} stroke={part.isToReprint ? 'kit.deep' : 'edge'} />
  </chakra.svg>
);

export interface PartsSheetProps {
  parts: readonly DrawnPart[];
  /** What the list is: "Parts of Curlew". */
  label: string;
  maxHeightPx?: number;
  /** Where a part leads, if anywhere. */
  linkOf?: (part: DrawnPart, drawn: ReactNode) => ReactNode;
}

/** Every part of a kit as an outline, to one scale, with its code. */
export function PartsSheet({ parts, label, maxHeightPx = 104, linkOf }: PartsSheetProps) {
  const patternId = useId();
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const pxPerMm = parts.length ? partsScale(parts, { widthPx, heightPx: maxHeightPx }) : 0;
  return (
    <Box ref={ref} width="full" minHeight="1px">
      {widthPx > 0 && parts.length > 0 && (
        <>
          <chakra.svg width="0" height="0" position="absolute" aria-hidden>
            <defs>
              <LayerLines id={patternId} scale={pxPerMm} />
            </defs>
          </chakra.svg>
          <Box
            as="ul"
            aria-label={label}
            listStyle="none"
            display="flex"
            flexWrap="wrap"
            alignItems="flex-end"
            columnGap="3"
            rowGap="4"
          >
            {parts.map((part) => {
              const drawn = (
                <>
                  <PartDrawing part={part} pxPerMm={pxPerMm} patternId={patternId} />
                  <Box
                    as="span"
                    display="block"
                    textStyle="lettering"
                    textAlign="center"
                    marginTop="1.5"
                    fontWeight={part.isToReprint ? 'bold' : 'normal'}
                    color={part.isToReprint ? 'kit.deep' : 'ink.soft'}
                  >
                    {part.code}
                    {part.name && <VisuallyHidden> {part.name}</VisuallyHidden>}
                    {part.isToReprint && <VisuallyHidden>, {drawingTexts.toReprint}</VisuallyHidden>}
                  </Box>
                </>
              );
              return (
                <Box as="li" key={part.code} minWidth={`${leastSlotPx}px`} maxWidth="full" title={part.name}>
                  {linkOf ? linkOf(part, drawn) : drawn}
                </Box>
              );
            })}
          </Box>
        </>
      )}
    </Box>
  );
}

/** One part small, in a row of a table: no scale, just its shape. */
export const PartThumb = ({ part, sizePx = 40 }: { part: Omit<DrawnPart, 'code'>; sizePx?: number }) => {
  const pxPerMm = partsScale([part], { widthPx: sizePx, heightPx: sizePx * 0.8 });
  return (
    <chakra.svg
      viewBox={part.viewBox}
      width={`${part.widthMm * pxPerMm}px`}
      height={`${part.heightMm * pxPerMm}px`}
      overflow="visible"
      display="block"
      aria-hidden
    >
      <Outline
        d={part.path}
        fill={part.isToReprint ? 'kit.wash' : 'none'}
        stroke={part.isToReprint ? 'kit.deep' : 'ink'}
      />
      <InnerEdges part={part} pxPerMm={pxPerMm} stroke={part.isToReprint ? 'kit.deep' : 'ink.soft'} />
    </chakra.svg>
  );
};
