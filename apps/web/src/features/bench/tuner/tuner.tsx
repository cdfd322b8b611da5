import { Box } from '@chakra-ui/react/box';
import type { RankVoice, ShelfKit } from '@windchest/contracts';
import { useMemo } from 'react';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { number } from '../../../lib/format.js';
import { TextLink } from '../../../ui/link.js';
import { Band, SplitSheet } from '../../../ui/sheet.js';
import { Heading, Text } from '../../../ui/text.js';
import { TitleBlock } from '../../../ui/title-block.js';
import { noteName } from '../drawn-voices.js';
import { voiceNoun } from '../voice-noun.js';
import { ListenButton } from './listen-button.js';
import { RecordingField } from './recording-field.js';
import { RoomChoice } from './room-choice.js';
import { ForeseenNote, HeardTable, TunerCautions } from './tuner-notes.js';
import { StripKey } from './strip-key.js';
import { TunerStrip } from './tuner-strip.js';
import { useTuner } from './use-tuner.js';
import { VerdictLines } from './verdict-lines.js';
import { VoiceChooser } from './voice-chooser.js';

const standardA4Hz = 440;
const soundsByAir = new Set(['stopped-pipe', 'open-pipe', 'vessel']);

export interface TunerProps {
  kit: Pick<ShelfKit, 'name' | 'room' | 'declaredCents'>;
  rank: readonly [RankVoice, ...RankVoice[]];
  /** Whose voices these are: the one held, or the newest. */
  revision: string;
  /** The kit's place on the shelf. */
  back: string;
}

/** Listens to a printed voice and says what to do about its pitch. */
export function Tuner({ kit, rank, revision, back }: TunerProps) {
  const tuner = useTuner(rank, kit.room);
  const { judging, targetHz, foreseen, listening, tuned, soFar, microphone, recording } = tuner;
  const { voice, room, tunedAtC } = judging;
  const heardCodes = useMemo(() => new Set(soFar.keys()), [soFar]);
  const source = microphone.state.is === 'on' ? 'microphone' : recording.is === 'here' ? 'recording' : 'none';
  const noun = voiceNoun(rank).one;
  const target = texts.hertz(number(targetHz, 1));
  const shown = tuned && 'cents' in tuned.verdict ? tuned.verdict.cents : undefined;

  return (
    <>
      <SplitSheet
        asideLabel={texts.aside}
        main={
          // Drawings keep their width until their place takes its own: it must not take theirs.
          <Box display="grid" gap="6" gridTemplateColumns="minmax(0, 1fr)">
            <Box>
              <Heading level={1} overflowWrap="anywhere">
                {texts.title(kit.name)}
              </Heading>
              <Text look="lead" marginTop="2">
                {texts.lead(noun)}
              </Text>
              <Text look="small" isSoft marginTop="2">
                {texts.revision(revision)} <TextLink to={back}>{texts.toKit(kit.name)}</TextLink>
              </Text>
            </Box>
            <VoiceChooser
              rank={rank}
              noun={noun}
              chosen={voice.code}
              heard={heardCodes}
              onChoose={tuner.chooseVoice}
            />
            <ListenButton microphone={microphone} />
            <Box>
              <TunerStrip
                heard={
                  tuned && shown !== undefined
                    ? {
                        cents: shown,
                        spreadCents: tuned.reading.spreadCents,
                        isPast: source === 'microphone' && listening.now !== 'pitch',
                      }
                    : undefined
                }
                foreseen={foreseen}
                declaredCents={kit.declaredCents}
              />
              <StripKey hasForeseen={foreseen !== undefined} />
              <VerdictLines
                tuned={tuned}
                listening={listening}
                source={source}
                kind={voice.voice.kind}
                declaredCents={kit.declaredCents}
                onChoose={tuner.chooseVoice}
              />
            </Box>
            <ForeseenNote foreseen={foreseen} />
          </Box>
        }
        aside={
          <Box display="grid" gap="7">
            <RecordingField recording={recording} onChoose={tuner.chooseRecording} />
            {soundsByAir.has(voice.voice.kind) && (
              <RoomChoice
                temperatureC={room.temperatureC}
                voicedForC={kit.room.temperatureC}
                isForRoom={tunedAtC === undefined}
                words={target}
                onTemperature={tuner.chooseTemperature}
                onForRoom={tuner.tuneForRoom}
              />
            )}
          </Box>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: texts.blockVoice, value: voice.code },
              { name: texts.blockNote, value: noteName(voice.voice.note) },
              { name: texts.blockTarget, value: target },
              {
                name: texts.blockHeard,
                value: tuned ? texts.hertz(number(tuned.reading.hz, 1)) : texts.blockNothing,
              },
              { name: texts.blockDeclared, value: texts.within(texts.cents(number(kit.declaredCents))) },
              { name: texts.blockA4, value: texts.hertz(number(room.a4Hz ?? standardA4Hz, 1)) },
            ]}
          />
        }
      />
      <Band>
        <Box display="grid" gap="12">
          <HeardTable rank={rank} soFar={soFar} declaredCents={kit.declaredCents} />
          <TunerCautions />
        </Box>
      </Band>
    </>
  );
}
