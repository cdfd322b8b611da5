import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { KitCard } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { homeTexts } from '../../config/texts/home.js';
import { counted, number, price } from '../../lib/format.js';
import { Rank } from '../../ui/drawing/rank.js';
import type { DrawnVoice, ExtentMm } from '../../ui/drawing/rank-layout.js';
import { Price } from '../../ui/price.js';
import { RouterLink } from '../../ui/router-link.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { voiceNoun } from '../bench/voice-noun.js';
import { KitFacts } from './kit-facts.js';
import type { Offer } from './offers.js';
import { orFree } from './or-free.js';

/** The whole row leads to the kit; the name is what is read out. */
const RowLink = chakra(RouterLink, {
  base: {
    _before: { content: '""', position: 'absolute', inset: '0' },
    _focusVisible: {
      outline: 'none',
      _before: { outline: '2px solid', outlineColor: 'ink', outlineOffset: '-2px' },
    },
    'li:hover &': {
      textDecoration: 'underline',
      textDecorationThickness: '2px',
      textUnderlineOffset: '0.15em',
    },
  },
});

const rankHeightPx = 100;

const offerWords = ({ label, left }: Offer) =>
  left === null ? label : `${label}, ${homeTexts.left(number(left))}`;

export interface KitRowProps {
  kit: KitCard;
  voices: readonly DrawnVoice[];
  /** Of the largest rank of the list. */
  extent: ExtentMm;
  offer: Offer | undefined;
}

export function KitRow({ kit, voices, extent, offer }: KitRowProps) {
  const noun = voiceNoun(kit.rank);
  return (
    <KitColour
      as="li"
      palette={kit.colour}
      position="relative"
      display="grid"
      gridTemplateColumns={{
        base: 'minmax(0, 1fr)',
        md: '14rem minmax(0, 1fr) auto',
        lg: '19rem minmax(0, 1fr) auto',
      }}
      columnGap={{ md: '7', lg: '12' }}
      rowGap="4"
      alignItems="end"
      paddingBlock="6"
      borderBottomWidth="1px"
      borderColor="hairline"
    >
      <Box maxWidth={{ base: '19rem', md: 'none' }}>
        <Rank
          voices={voices}
          extent={extent}
          maxHeightPx={rankHeightPx}
          description={homeTexts.drawn(kit.name, counted(voices.length, noun.one, noun.many))}
        />
      </Box>
      <Box minWidth="0">
        <Heading level={3} look="section">
          <RowLink to={paths.kit.to({ slug: kit.slug })}>{kit.name}</RowLink>
        </Heading>
        <Text isSoft marginTop="0.5" marginBottom="3" maxWidth="27rem">
          {kit.tagline}
        </Text>
        <KitFacts kit={kit} />
      </Box>
      <Box
        maxWidth={{ md: '11rem', lg: '18rem' }}
        justifySelf={{ base: 'start', md: 'end' }}
        css={{ '& > div': { textAlign: { base: 'start', md: 'end' } } }}
      >
        <Price
          align="end"
          price={orFree(offer?.price ?? kit.price)}
          original={offer && price(kit.price)}
          note={offer && offerWords(offer)}
        />
      </Box>
    </KitColour>
  );
}
