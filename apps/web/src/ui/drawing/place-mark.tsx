import { chakra } from '@chakra-ui/react/styled-system';

const Stroke = chakra('path', { base: { fill: 'none', stroke: 'kit.deep', strokeWidth: '1.5' } });
/** Lies under the sign, so that it stands clear of the lines it marks a place on. */
const Halo = chakra('path', { base: { fill: 'none', stroke: 'sheet', strokeWidth: '4.5' } });
const Lettering = chakra('text', {
  base: {
    fill: 'ink',
    stroke: 'sheet',
    strokeWidth: '3px',
    strokeLinejoin: 'round',
    paintOrder: 'stroke',
    fontSize: 'xs',
    fontWeight: 'semibold',
    textAnchor: 'middle',
  },
});

const radius = 5;
const arm = 9;
const shoulder = 10;
const tick = 4;

const ring = (x: number, y: number) =>
  `M${x - radius} ${y}a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0` +
  `M${x - arm} ${y}h${2 * arm}M${x} ${y - arm}v${2 * arm}`;

/** A ring with cross-hairs: a place on a part, the same in all its views. */
export function PlaceMark({ x, y, label }: { x: number; y: number; label?: string | undefined }) {
  // About as wide as the figures; a line between two ticks carries them, as any size on a drawing.
  const lengthPx = label ? 8 + 6.5 * label.length : 0;
  const start = x + arm + shoulder;
  const line = `M${x + arm} ${y}h${shoulder}M${start} ${y - tick}v${2 * tick}M${start} ${y}h${lengthPx}M${start + lengthPx} ${y - tick}v${2 * tick}`;
  const sign = ring(x, y) + (label ? line : '');
  return (
    <g aria-hidden>
      <Halo d={sign} />
      <Stroke d={sign} />
      {label && (
        <Lettering x={start + lengthPx / 2} y={y - 5}>
          {label}
        </Lettering>
      )}
    </g>
  );
}

/** The same sign beside the words it stands for. */
export const PlaceSign = () => (
  <chakra.svg
    viewBox="0 0 20 20"
    width="1.125rem"
    height="1.125rem"
    flex="none"
    display="inline-block"
    verticalAlign="-0.2em"
    aria-hidden
  >
    <Stroke d={ring(10, 10)} />
  </chakra.svg>
);
