import { chakra } from '@chakra-ui/react/styled-system';

const Fill = chakra('rect', { base: { fill: 'kit' } });
const Line = chakra('rect', { base: { fill: 'kit.line' } });

/** Distance between layer lines, px: wide enough to be seen, as a print's are from a hand's breadth away. */
const pitch = 4;

export interface LayerLinesProps {
  id: string;
  /** Of the drawing it fills, so that the lines keep their distance where the drawing is scaled. */
  scale?: number;
}

/** The pattern printed things are filled with, in the kit's colour: `fill="url(#id)"`. Stands inside `defs`. */
export const LayerLines = ({ id, scale = 1 }: LayerLinesProps) => (
  <pattern
    id={id}
    width={pitch}
    height={pitch}
    patternUnits="userSpaceOnUse"
    patternTransform={scale === 1 ? undefined : `scale(${1 / scale})`}
  >
    <Fill width={pitch} height={pitch} />
    <Line width={pitch} height="1" y={pitch - 1} />
  </pattern>
);
