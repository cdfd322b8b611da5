import type { RankVoice } from '@windchest/contracts';
import { anyVoice, voiceNouns } from '../../config/texts/voices.js';

/** What the voices of a rank are called: pipes, bars; voices where there is more than one kind of them. */
export function voiceNoun(rank: readonly RankVoice[]): { one: string; many: string } {
  const first = rank[0];
  if (!first) return anyVoice;
  const noun = voiceNouns[first.voice.kind];
  return rank.every(({ voice }) => voiceNouns[voice.kind].many === noun.many) ? noun : anyVoice;
}
