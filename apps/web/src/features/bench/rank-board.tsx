import { Box } from '@chakra-ui/react/box';
import type { RankVoice } from '@windchest/contracts';
import type { RefObject } from 'react';
import { roomTexts } from '../../config/texts/room.js';
import { drawingTexts } from '../../config/texts/shared.js';
import { Rank } from '../../ui/drawing/rank.js';
import type { DrawnVoice, RankLayout } from '../../ui/drawing/rank-layout.js';
import { Text } from '../../ui/text.js';
import { CentsStrip } from './cents-strip.js';
import { hasTrueSizes } from './drawn-voices.js';
import { rankGutterPx } from './rank-scale.js';
import { RoomSlider } from './room-slider.js';
import { roomWords } from './room-words.js';
import type { RankInRoom } from './use-predicted-rank.js';
import { useSounding } from './use-sounding.js';

export interface RankBoardProps {
  rank: readonly RankVoice[];
  /** The same voices, as they are drawn; with the layout and the element it was measured by. */
  voices: readonly DrawnVoice[];
  layout: RankLayout;
  measured: RefObject<HTMLDivElement | null>;
  maxHeightPx: number;
  inRoom: RankInRoom;
}

const sentence = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

/** A kit’s rank to play on, with the room it sounds in. */
export function RankBoard({ rank, voices, layout, measured, maxHeightPx, inRoom }: RankBoardProps) {
  const { room, choose, predicted, widestCents } = inRoom;
  const sounding = useSounding(rank, room);
  const words = predicted && roomWords(rank, predicted);
  const spread = words?.spread ?? (predicted ? roomTexts.beyond : roomTexts.working);
  const isTrue = hasTrueSizes(rank);

  return (
    <Box ref={measured}>
      <Box paddingLeft={isTrue ? undefined : `${rankGutterPx}px`}>
        <Rank voices={voices} maxHeightPx={maxHeightPx} hasLabels hasDimension={isTrue} {...sounding} />
      </Box>
      {/* Room is kept for the strip while its computation is fetched, so that nothing below moves. */}
      <Box minHeight="6.25rem">
        {predicted && predicted.length > 0 && (
          <CentsStrip
            layout={layout}
            gutterPx={rankGutterPx}
            predicted={predicted}
            widestCents={widestCents}
          />
        )}
      </Box>
      <Box marginTop="4" paddingLeft={{ md: `${rankGutterPx}px` }} display="grid" gap="1" maxWidth="measure">
        <RoomSlider temperatureC={room.temperatureC} onChange={choose} words={spread} />
        <Text look="small" isSoft minHeight={{ base: '2lh', md: '1lh' }}>
          {words
            ? [roomTexts.calculated(sentence(words.spread)), words.unsure, words.stays].join(' ')
            : spread}
        </Text>
        <Text look="small" isSoft>
          {drawingTexts.pressHint}
        </Text>
      </Box>
    </Box>
  );
}
