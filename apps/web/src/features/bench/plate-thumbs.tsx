import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { Bed, Plate } from '@windchest/plates';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { counted } from '../../lib/format.js';
import { pathOf } from './plate-paths.js';

const Thumb = chakra('button', {
  base: {
    display: 'block',
    padding: '1',
    cursor: 'pointer',
    borderWidth: '1px',
    borderColor: 'transparent',
    borderRadius: 'sm',
    _hover: { borderColor: 'edge' },
    '&[aria-current]': { borderColor: 'ink' },
  },
});
const BedOutline = chakra('rect', {
  base: { fill: 'sheet', stroke: 'ink.soft', strokeWidth: '1', vectorEffect: 'non-scaling-stroke' },
});
const Outline = chakra('path', {
  base: { fill: 'kit', stroke: 'kit.deep', strokeWidth: '0.5', vectorEffect: 'non-scaling-stroke' },
});

const widestPx = 60;

export interface PlateThumbsProps {
  plates: readonly Plate[];
  bed: Bed;
  shown: number;
  onShow: (at: number) => void;
}

/** All plates small, to go to one of them. */
export const PlateThumbs = ({ plates, bed, shown, onShow }: PlateThumbsProps) => (
  <Box
    as="ul"
    aria-label={texts.allPlates}
    listStyle="none"
    display="flex"
    flexWrap="wrap"
    alignItems="flex-end"
    marginInline="-1"
  >
    {plates.map((plate, at) => (
      <li key={at}>
        <Thumb
          type="button"
          aria-label={texts.thumb(at + 1, counted(plate.placements.length, texts.onePiece, texts.manyPieces))}
          aria-current={at === shown || undefined}
          onClick={() => onShow(at)}
        >
          <chakra.svg
            viewBox={`0 0 ${bed.xMm} ${bed.yMm}`}
            width={`${widestPx * Math.min(1, bed.xMm / bed.yMm)}px`}
            height={`${widestPx * Math.min(1, bed.yMm / bed.xMm)}px`}
            display="block"
            overflow="visible"
            aria-hidden
          >
            <BedOutline width={bed.xMm} height={bed.yMm} />
            {plate.placements.map((placement, index) => (
              <Outline key={index} d={pathOf(placement, bed)} />
            ))}
          </chakra.svg>
        </Thumb>
      </li>
    ))}
  </Box>
);
