import type { KitCard } from '@windchest/contracts';
import { homeTexts } from '../../config/texts/home.js';
import { counted, grams, millimetres, number } from '../../lib/format.js';
import { Facts } from '../../ui/facts.js';
import { voiceNoun } from '../bench/voice-noun.js';

/** What a kit comes to, in figures; plates and filament only where they have been worked out. */
export function KitFacts({ kit }: { kit: KitCard }) {
  const { rank, compass, longestPartMm, partCount, printEstimate } = kit;
  const noun = voiceNoun(rank);
  return (
    <Facts
      facts={[
        ...(rank.length > 0 ? [{ value: compass, name: counted(rank.length, noun.one, noun.many) }] : []),
        ...(longestPartMm > 0 ? [{ value: millimetres(longestPartMm, 0), name: homeTexts.longest }] : []),
        { value: number(partCount), name: homeTexts.parts(partCount) },
        ...(printEstimate
          ? [
              { value: number(printEstimate.plates), name: homeTexts.plates(printEstimate.plates) },
              { value: grams(printEstimate.massG), name: homeTexts.filament },
            ]
          : []),
      ]}
    />
  );
}
