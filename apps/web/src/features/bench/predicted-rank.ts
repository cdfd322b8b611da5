import type { RankVoice } from '@windchest/contracts';
import { predict, type Room, VoicingError } from '@windchest/voicing';

export interface PredictedVoice {
  code: string;
  /** From the voice's note; positive is sharp. */
  cents: number;
  uncertaintyCents: number;
}

/** How every voice of a rank sounds in a room; voices whose sizes lie outside the formulas are left out. */
export const predictedRank = (rank: readonly RankVoice[], room: Room): PredictedVoice[] =>
  rank.flatMap(({ code, voice }) => {
    try {
      const { cents, uncertaintyCents } = predict(voice, room);
      return [{ code, cents, uncertaintyCents }];
    } catch (thrown) {
      if (!(thrown instanceof VoicingError)) throw thrown;
      return [];
    }
  });
