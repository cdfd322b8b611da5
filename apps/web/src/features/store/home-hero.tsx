import { Box } from '@chakra-ui/react/box';
import type { KitCard } from '@windchest/contracts';
import { useMemo } from 'react';
import { paths } from '../../config/paths.js';
import { homeTexts } from '../../config/texts/home.js';
import { LinkButton } from '../../ui/button.js';
import { Rank } from '../../ui/drawing/rank.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { drawnVoices } from '../bench/drawn-voices.js';
import { useSounding } from '../bench/use-sounding.js';
import { voiceNoun } from '../bench/voice-noun.js';

const rankHeightPx = 272;
/** With its lettering; kept while the kit is on its way, so that the page does not jump. */
const reserved = `${rankHeightPx + 27}px`;

function HeroRank({ kit }: { kit: KitCard }) {
  const voices = useMemo(() => drawnVoices(kit.rank), [kit.rank]);
  const sounding = useSounding(kit.rank);
  return (
    <KitColour palette={kit.colour} width="full">
      <Rank voices={voices} maxHeightPx={rankHeightPx} hasLabels hasDimension {...sounding} />
    </KitColour>
  );
}

/** What the shop is, beside its newest kit, large enough to play on. */
export const HomeHero = ({ kit, isLoading }: { kit: KitCard | undefined; isLoading: boolean }) => (
  <Band tone="sheet" paddingTop={{ base: '7', md: '12' }} paddingBottom={{ base: '5', md: '4' }}>
    <Box
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 5fr) minmax(0, 7fr)' }}
      columnGap="14"
      rowGap="8"
    >
      <Box>
        <Heading level={1} look="display" maxWidth="7.5em">
          {homeTexts.motto}
        </Heading>
        <Text look="lead" marginTop="4" maxWidth="23em">
          {homeTexts.lead} {kit && homeTexts.press(voiceNoun(kit.rank).one)}
        </Text>
        <Box marginTop="6" minHeight="2.875rem" marginBottom={{ lg: '8' }}>
          {kit && (
            <LinkButton to={paths.kit.to({ slug: kit.slug })}>{homeTexts.seeNewest(kit.name)}</LinkButton>
          )}
        </Box>
      </Box>
      {(kit || isLoading) && (
        <Box minHeight={{ lg: reserved }} display="flex" alignItems="flex-end">
          {kit && <HeroRank key={kit.slug} kit={kit} />}
        </Box>
      )}
    </Box>
  </Band>
);
