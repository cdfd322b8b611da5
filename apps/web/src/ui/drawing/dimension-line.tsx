import { chakra } from '@chakra-ui/react/styled-system';

const Rule = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1', fill: 'none' } });
const Lettering = chakra('text', {
  base: { fill: 'ink.soft', fontSize: '2xs', fontWeight: 'medium', textAnchor: 'middle' },
});

/** Half the length of the strokes that end a dimension line. */
const tick = 6;

export interface DimensionLineProps {
  /** Where it starts and how long it runs, in the drawing's px. */
  x: number;
  y: number;
  lengthPx: number;
  direction: 'down' | 'right';
  /** The size, without unit where the drawing is in mm. */
  label: string;
}

/** A size as it is lettered on a drawing: a line between two ticks. Stands inside an `svg`. */
export function DimensionLine({ x, y, lengthPx, direction, label }: DimensionLineProps) {
  // Half-pixel places, else a one-pixel rule is smeared over two.
  const [atX, atY] = [Math.round(x) + 0.5, Math.round(y) + 0.5];
  const length = Math.round(lengthPx);
  if (direction === 'right') {
    return (
      <g aria-hidden>
        <Rule
          d={`M${atX} ${atY - tick}v${2 * tick}M${atX} ${atY}h${length}M${atX + length} ${atY - tick}v${2 * tick}`}
        />
        <Lettering x={atX + length / 2} y={atY - tick}>
          {label}
        </Lettering>
      </g>
    );
  }
  return (
    <g aria-hidden>
      <Rule
        d={`M${atX - tick} ${atY}h${2 * tick}M${atX} ${atY}v${length}M${atX - tick} ${atY + length}h${2 * tick}`}
      />
      <g transform={`translate(${atX - tick - 3} ${atY + length / 2}) rotate(-90)`}>
        <Lettering>{label}</Lettering>
      </g>
    </g>
  );
}
