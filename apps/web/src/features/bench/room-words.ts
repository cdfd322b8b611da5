import type { RankVoice } from '@windchest/contracts';
import { roomTexts } from '../../config/texts/room.js';
import { number } from '../../lib/format.js';
import type { PredictedVoice } from './predicted-rank.js';
import { voiceNoun } from './voice-noun.js';

/** `4 cents`, `15–18 cents`, of numbers that are not negative. */
function centsRange(low: number, high: number): string {
  const [from, to] = [Math.round(low), Math.round(high)];
  const range = from === to ? number(to) : roomTexts.between(number(from), number(to));
  return roomTexts.cents(range, from === to && to === 1);
}

/** Kinds that sound by the air in them; solid voices do not follow its warmth. */
const moves = ({ voice }: RankVoice) =>
  voice.kind === 'stopped-pipe' || voice.kind === 'open-pipe' || voice.kind === 'vessel';

function spreadWords(predicted: readonly PredictedVoice[]): string {
  const cents = predicted.map((one) => one.cents);
  const [least, most] = [Math.min(...cents), Math.max(...cents)];
  if (Math.round(least) > 0) return roomTexts.sharp(centsRange(least, most));
  if (Math.round(most) < 0) return roomTexts.flat(centsRange(-most, -least));
  const widest = Math.max(1, Math.ceil(Math.max(-least, most)));
  const within = centsRange(widest, widest);
  return predicted.length === 1 ? roomTexts.withinOne(within) : roomTexts.within(within);
}

export interface RoomWords {
  /** `all pipes 15–18 cents flat`. */
  spread: string;
  /** `Before tuning, a print may be off by ± 9 cents.` */
  unsure: string;
  /** Only of voices that do not follow the air. */
  stays: string | undefined;
}

/** What a room does to a rank, in words; undefined where nothing of it can be predicted. */
export function roomWords(
  rank: readonly RankVoice[],
  predicted: readonly PredictedVoice[],
): RoomWords | undefined {
  if (predicted.length === 0) return undefined;
  const noun = voiceNoun(rank);
  const unsure = predicted.map((one) => one.uncertaintyCents);
  const spread = spreadWords(predicted);
  return {
    spread: predicted.length === 1 ? roomTexts.one(noun.one, spread) : roomTexts.all(noun.many, spread),
    unsure: roomTexts.unsure(centsRange(Math.min(...unsure), Math.max(...unsure))),
    stays: rank.some(moves) ? undefined : roomTexts.stays(noun.many),
  };
}
