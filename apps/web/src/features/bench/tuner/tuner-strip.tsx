import { chakra } from '@chakra-ui/react/styled-system';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { signed } from '../../../lib/format.js';
import { useWidth } from '../../../ui/drawing/use-width.js';

const Rule = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1', fill: 'none' } });
const Note = chakra('path', { base: { stroke: 'ink', strokeWidth: '1', strokeDasharray: '2 3' } });
const Unsure = chakra('rect', { base: { fill: 'kit.wash', stroke: 'kit.lit', strokeWidth: '1' } });
const Spread = chakra('rect', { base: { fill: 'kit.lit' } });
const Needle = chakra('path', { base: { fill: 'kit.deep', '&[data-past]': { opacity: 0.55 } } });
const Lettering = chakra('text', {
  base: { fill: 'ink.soft', fontSize: '2xs', fontWeight: 'medium', textAnchor: 'middle' },
});

const heightPx = 92;
const padPx = 16;
const baseY = 56;
/** Ends of the scale; the least that holds what is shown is taken, so that a needle does not jitter at the edge. */
const reaches = [50, 100, 200, 600];
const mostForDoubt = 190;
const labelledSteps: Record<number, number> = { 50: 10, 100: 25, 200: 50, 600: 200 };

export interface TunerStripProps {
  heard: { cents: number; spreadCents: number; isPast: boolean } | undefined;
  foreseen: { cents: number; uncertaintyCents: number } | undefined;
  declaredCents: number;
}

/** A scale of cents from the note: where the voice sounds, where calculation has it, what the kit declares. */
export function TunerStrip({ heard, foreseen, declaredCents }: TunerStripProps) {
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const doubtCents = foreseen ? Math.abs(foreseen.cents) + foreseen.uncertaintyCents : 0;
  // Once something is heard the scale is for that; a wide band of calculation then runs off its ends.
  const widest = Math.max(declaredCents, heard ? Math.abs(heard.cents) : Math.min(doubtCents, mostForDoubt));
  const reach = reaches.find((one) => widest <= one * 0.96) ?? reaches.at(-1)!;
  const middle = Math.floor(widthPx / 2);
  const pxPerCent = Math.max(0, middle - padPx) / reach;
  const x = (cents: number) => middle + Math.max(-reach, Math.min(reach, cents)) * pxPerCent;
  const step = labelledSteps[reach]!;
  const labels = Array.from(
    { length: 2 * Math.floor(reach / step) + 1 },
    (_, at) => (at - Math.floor(reach / step)) * step,
  );
  const crowded = widthPx / labels.length < 34;
  const bar = (cents: number) => `M${Math.round(x(cents)) + 0.5} ${baseY - 22}v22`;
  return (
    <chakra.div ref={ref} width="full" height={`${heightPx}px`} aria-hidden>
      {widthPx > 0 && (
        <chakra.svg width={widthPx} height={heightPx} display="block" overflow="visible">
          {foreseen && (
            <Unsure
              x={x(foreseen.cents - foreseen.uncertaintyCents)}
              width={
                x(foreseen.cents + foreseen.uncertaintyCents) - x(foreseen.cents - foreseen.uncertaintyCents)
              }
              y={baseY - 16}
              height={16}
            />
          )}
          {heard && (
            <Spread
              x={x(heard.cents - heard.spreadCents)}
              width={Math.max(1, x(heard.cents + heard.spreadCents) - x(heard.cents - heard.spreadCents))}
              y={baseY - 10}
              height={10}
            />
          )}
          <Rule d={`M${padPx} ${baseY + 0.5}H${widthPx - padPx}`} />
          <Rule d={bar(-declaredCents) + bar(declaredCents)} />
          <Note d={`M${middle + 0.5} ${baseY - 34}v${42}`} />
          {labels.map((cents, at) => (
            <g key={cents}>
              <Rule d={`M${Math.round(x(cents)) + 0.5} ${baseY}v${6}`} />
              {(!crowded || at % 2 === Math.floor(labels.length / 2) % 2) && (
                <Lettering x={x(cents)} y={baseY + 19}>
                  {cents === 0 ? '0' : signed(cents)}
                </Lettering>
              )}
            </g>
          ))}
          <Lettering x={padPx} y={baseY + 34} style={{ textAnchor: 'start' }}>
            {texts.strip.flat}
          </Lettering>
          <Lettering x={widthPx - padPx} y={baseY + 34} style={{ textAnchor: 'end' }}>
            {texts.strip.sharp}
          </Lettering>
          {heard && (
            <Needle data-past={heard.isPast ? '' : undefined} d={`M${x(heard.cents)} ${baseY}l-7 -40h14z`} />
          )}
        </chakra.svg>
      )}
    </chakra.div>
  );
}
