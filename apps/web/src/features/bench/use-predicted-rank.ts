import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { useMemo, useState } from 'react';
import type { PredictedVoice } from './predicted-rank.js';
import { roomRange } from './room-range.js';
import { useLoaded } from './use-loaded.js';

const load = () => import('./predicted-rank.js');

export interface RankInRoom {
  /** As chosen; at first the one the kit was voiced for. */
  room: Room;
  choose: (temperatureC: number) => void;
  /** Undefined until the computation is fetched. */
  predicted: readonly PredictedVoice[] | undefined;
  /** As far as any voice may be from its note in any room to choose from, its uncertainty included. */
  widestCents: number;
}

/** How a rank sounds in a room whose temperature can be moved. */
export function usePredictedRank(rank: readonly RankVoice[], voicedFor: Room): RankInRoom {
  const [temperatureC, choose] = useState(Math.round(voicedFor.temperatureC));
  const loaded = useLoaded(load);
  const room = useMemo(() => ({ ...voicedFor, temperatureC }), [voicedFor, temperatureC]);
  const predicted = useMemo(() => loaded?.predictedRank(rank, room), [loaded, rank, room]);
  const widestCents = useMemo(() => {
    if (!loaded) return 0;
    const ends = [roomRange.leastC, roomRange.mostC].flatMap((endC) =>
      loaded.predictedRank(rank, { ...voicedFor, temperatureC: endC }),
    );
    return Math.max(0, ...ends.map((one) => Math.abs(one.cents) + one.uncertaintyCents));
  }, [loaded, rank, voicedFor]);
  return { room, choose, predicted, widestCents };
}
