import { Box } from '@chakra-ui/react/box';
import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { type RefObject, useMemo, useState } from 'react';
import { roomTexts } from '../../config/texts/room.js';
import { drawingTexts } from '../../config/texts/shared.js';
import { Details } from '../../ui/details.js';
import { Rank } from '../../ui/drawing/rank.js';
import type { DrawnVoice, RankLayout } from '../../ui/drawing/rank-layout.js';
import { Text } from '../../ui/text.js';
import { CentsStrip } from './cents-strip.js';
import { rankGutterPx } from './rank-scale.js';
import { RoomSlider } from './room-slider.js';
import { roomWords } from './room-words.js';
import { usePredictedRank } from './use-predicted-rank.js';
import { useSounding } from './use-sounding.js';
import { VoicesTable } from './voices-table.js';

export interface RankBoardProps {
  rank: readonly RankVoice[];
  /** The same voices, as they are drawn; with the layout and the element it was measured by. */
  voices: readonly DrawnVoice[];
  layout: RankLayout;
  measured: RefObject<HTMLDivElement | null>;
  maxHeightPx: number;
  /** The room the kit was voiced for. */
  room: Room;
}

/** A kit’s rank to play on, with the room it sounds in. */
export function RankBoard({ rank, voices, layout, measured, maxHeightPx, room }: RankBoardProps) {
  const [temperatureC, setTemperatureC] = useState(Math.round(room.temperatureC));
  const chosen = useMemo(() => ({ ...room, temperatureC }), [room, temperatureC]);
  const { predicted, widestCents } = usePredictedRank(rank, chosen);
  const sounding = useSounding(rank, chosen);
  const words = predicted && roomWords(rank, predicted);
  const spread = words?.spread ?? (predicted ? roomTexts.beyond : roomTexts.working);

  return (
    <Box ref={measured}>
      <Rank voices={voices} maxHeightPx={maxHeightPx} hasLabels hasDimension {...sounding} />
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
        <RoomSlider temperatureC={temperatureC} onChange={setTemperatureC} words={spread} />
        <Text look="small" isSoft minHeight="2lh">
          {words
            ? [roomTexts.calculated(sentence(words.spread)), words.unsure, words.stays].join(' ')
            : spread}
        </Text>
        <Text look="small" isSoft>
          {drawingTexts.pressHint}
        </Text>
      </Box>
      <Box paddingLeft={{ md: `${rankGutterPx}px` }} marginTop="4">
        <Details summary={roomTexts.table}>
          <VoicesTable rank={rank} predicted={predicted} temperatureC={temperatureC} />
        </Details>
      </Box>
    </Box>
  );
}

const sentence = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);
