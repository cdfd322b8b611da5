import type { RankVoice } from '@windchest/contracts';
import type { Room } from '@windchest/voicing';
import { useMemo } from 'react';
import type { PredictedVoice } from './predicted-rank.js';
import { roomRange } from './room-range.js';
import { useLoaded } from './use-loaded.js';

const load = () => import('./predicted-rank.js');

export interface RankInRoom {
  /** Undefined until the computation is fetched. */
  predicted: readonly PredictedVoice[] | undefined;
  /** As far as any voice may be from its note in any room of the slider, its uncertainty included. */
  widestCents: number;
}

/** How a rank sounds in a room, as the temperature is moved. */
export function usePredictedRank(rank: readonly RankVoice[], room: Room): RankInRoom {
  const loaded = useLoaded(load);
  const predicted = useMemo(() => loaded?.predictedRank(rank, room), [loaded, rank, room]);
  const widestCents = useMemo(() => {
    if (!loaded) return 0;
    const ends = [roomRange.leastC, roomRange.mostC].flatMap((temperatureC) =>
      loaded.predictedRank(rank, { ...room, temperatureC }),
    );
    return Math.max(0, ...ends.map((one) => Math.abs(one.cents) + one.uncertaintyCents));
  }, [loaded, rank, room]);
  return { predicted, widestCents };
}
