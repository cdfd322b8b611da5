import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ShelfItem } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { shelfTexts, sourceTexts } from '../../config/texts/shelf.js';
import { LinkButton } from '../../ui/button.js';
import { FilamentSwatch } from '../../ui/drawing/filament-swatch.js';
import { Facts } from '../../ui/facts.js';
import { RouterLink } from '../../ui/router-link.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { sourceWords } from './source-words.js';

const NameLink = chakra(RouterLink, {
  base: { borderRadius: 'sm', _hover: { textDecoration: 'underline', textUnderlineOffset: '0.12em' } },
});

/** The one next step: fetch it, see what to reprint, or just open it. */
function NextStep({ item }: { item: ShelfItem }) {
  const { held, newest } = item;
  const isUpToDate = held?.id === newest.id || newest.isWithdrawn;
  const words = !held
    ? shelfTexts.get(newest.label)
    : isUpToDate
      ? shelfTexts.open
      : held.isWithdrawn
        ? shelfTexts.get(newest.label)
        : shelfTexts.seeReprint;
  return (
    <LinkButton
      to={paths.shelfKit.to({ slug: item.slug })}
      look={isUpToDate ? 'outline' : 'ink'}
      width={{ base: 'full', sm: 'auto' }}
    >
      {words}
      <VisuallyHidden> {shelfTexts.of(item.name)}</VisuallyHidden>
    </LinkButton>
  );
}

export const ShelfRow = ({ item }: { item: ShelfItem }) => {
  const { held, newest } = item;
  return (
    <KitColour
      as="li"
      palette={item.colour}
      display="grid"
      gridTemplateColumns={{ base: 'auto minmax(0, 1fr)', md: 'auto minmax(0, 1fr) auto' }}
      columnGap={{ base: '4', md: '6' }}
      rowGap="5"
      paddingBlock="6"
      borderBottomWidth="1px"
      borderColor="hairline"
      alignItems={{ md: 'center' }}
    >
      <FilamentSwatch alignSelf="stretch" width={{ base: '0.75rem', md: '1.125rem' }} />
      <Box minWidth="0">
        <Heading level={2} look="section" overflowWrap="anywhere">
          <NameLink to={paths.shelfKit.to({ slug: item.slug })}>{item.name}</NameLink>
        </Heading>
        {item.tagline && <Text isSoft>{item.tagline}</Text>}
        <Box marginTop="3">
          <Facts
            facts={[
              {
                name: shelfTexts.hold,
                value: held ? (
                  <>
                    {held.label}
                    {held.isWithdrawn && <>, {shelfTexts.withdrawn}</>}
                  </>
                ) : (
                  shelfTexts.nothingYet
                ),
              },
              { name: shelfTexts.newest, value: newest.label },
              {
                name: item.licenceName || sourceTexts[item.source],
                value: sourceWords(item).map((words) => <Box key={words}>{words}</Box>),
              },
            ]}
          />
        </Box>
      </Box>
      <Box gridColumn={{ base: '1 / -1', md: 'auto' }}>
        <NextStep item={item} />
      </Box>
    </KitColour>
  );
};
