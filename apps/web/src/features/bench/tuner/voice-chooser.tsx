import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { RankVoice } from '@windchest/contracts';
import { memo, useId, useMemo } from 'react';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { Button } from '../../../ui/button.js';
import { SelectField } from '../../../ui/field/select-field.js';
import { LayerLines } from '../../../ui/drawing/layer-lines.js';
import { layOutRank } from '../../../ui/drawing/rank-layout.js';
import { useWidth } from '../../../ui/drawing/use-width.js';
import { VoiceShape } from '../../../ui/drawing/voice-shape.js';
import { drawnVoices, noteName } from '../drawn-voices.js';

const heightPx = 190;
const labelPx = 20;
const Slot = chakra('g', { base: { cursor: 'pointer', '&:hover .body': { opacity: 1 } } });
const Body = chakra('g', { base: { opacity: 0.32, '&[data-chosen]': { opacity: 1 } } });
const Baseline = chakra('path', { base: { stroke: 'ink.soft', strokeWidth: '1' } });
const Mark = chakra('path', { base: { fill: 'ink' } });
const Label = chakra('text', {
  base: { fill: 'ink', fontSize: 'xs', fontWeight: 'bold', textAnchor: 'middle' },
});
/** Heard in tune or told what to do: a dot under the voice. */
const Done = chakra('circle', { base: { fill: 'kit.deep' } });

interface DrawnChoiceProps {
  rank: readonly RankVoice[];
  chosen: string;
  heard: ReadonlySet<string>;
  onChoose: (code: string) => void;
}

/** The rank with the chosen voice in full colour. A picture of the select beside it, for the pointer. */
const DrawnChoice = memo(function DrawnChoice({ rank, chosen, heard, onChoose }: DrawnChoiceProps) {
  const patternId = useId();
  const [ref, widthPx] = useWidth<HTMLDivElement>();
  const voices = useMemo(() => drawnVoices(rank), [rank]);
  const layout = useMemo(
    () => layOutRank(voices, { widthPx: Math.max(0, widthPx - 4), heightPx }),
    [voices, widthPx],
  );
  const foot = layout.heightPx + 1;
  return (
    <Box ref={ref} width="full" minHeight="1px">
      {widthPx > 0 && (
        <chakra.svg
          width={layout.widthPx + 4}
          height={foot + labelPx + 4}
          display="block"
          overflow="visible"
          aria-hidden
        >
          <defs>
            <LayerLines id={patternId} />
          </defs>
          {layout.voices.map((placed) => {
            const { key } = placed.voice;
            const middle = placed.x + placed.width / 2;
            return (
              <Slot key={key} onClick={() => onChoose(key)}>
                <rect
                  x={placed.slotX}
                  width={placed.slotWidth}
                  y={0}
                  height={foot + labelPx}
                  fill="transparent"
                />
                <Body className="body" data-chosen={key === chosen ? '' : undefined}>
                  <VoiceShape placed={placed} fill={`url(#${patternId})`} />
                </Body>
                {key === chosen ? (
                  <>
                    <Mark d={`M${middle - 4} ${foot + 6}h8l-4 -5z`} />
                    <Label x={middle} y={foot + 18}>
                      {placed.voice.label}
                    </Label>
                  </>
                ) : (
                  heard.has(key) && <Done cx={middle} cy={foot + 7} r={2.5} />
                )}
              </Slot>
            );
          })}
          <Baseline d={`M0 ${Math.round(foot) + 0.5}H${layout.widthPx + 4}`} />
        </chakra.svg>
      )}
    </Box>
  );
});

export interface VoiceChooserProps extends DrawnChoiceProps {
  noun: string;
}

/** Which voice is listened to: by its drawing, by name, or one after the other along the rank. */
export function VoiceChooser({ noun, ...choice }: VoiceChooserProps) {
  const { rank, chosen, onChoose } = choice;
  const at = rank.findIndex((one) => one.code === chosen);
  const step = (by: 1 | -1, words: string, spoken: string) => {
    const next = rank[at + by];
    return (
      <Button
        look="outline"
        size="sm"
        minHeight="2.875rem"
        aria-label={spoken}
        disabled={!next}
        onClick={() => next && onChoose(next.code)}
      >
        {words}
      </Button>
    );
  };
  return (
    <Box
      display="grid"
      gap={{ base: '4', md: '8' }}
      alignItems="end"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'minmax(0, 3fr) minmax(15rem, 2fr)' }}
    >
      <Box title={texts.rank(noun)} minWidth="0">
        <DrawnChoice {...choice} />
      </Box>
      <Box display="grid" gap="2" gridTemplateColumns="minmax(0, 1fr) auto auto" alignItems="end">
        <SelectField
          label={texts.voice}
          value={chosen}
          options={rank.map(({ code, voice }) => ({
            value: code,
            label: texts.voiceOption(noteName(voice.note), code),
          }))}
          onChange={(event) => onChoose(event.target.value)}
        />
        {step(-1, texts.lower, texts.lowerSpoken)}
        {step(1, texts.higher, texts.higherSpoken)}
      </Box>
    </Box>
  );
}
