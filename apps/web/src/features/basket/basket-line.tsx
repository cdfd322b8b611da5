import { Box } from '@chakra-ui/react/box';
import type { Quote } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { basketTexts } from '../../config/texts/basket.js';
import { priceTexts } from '../../config/texts/shared.js';
import { price } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { FilamentSwatch } from '../../ui/drawing/filament-swatch.js';
import { TextLink } from '../../ui/link.js';
import { Price } from '../../ui/price.js';
import { StatusMark } from '../../ui/status-mark.js';
import { KitColour } from '../../ui/theme/kit-colour.js';

type Line = Quote['lines'][number];

const orFree = (amount: Line['total']) => (amount.minor === 0 ? priceTexts.free : price(amount));

export interface BasketLineProps {
  line: Line;
  isOwned: boolean;
  onRemove: () => void;
}

/** One licence of one kit, with what it costs now. */
export const BasketLine = ({ line, isOwned, onRemove }: BasketLineProps) => (
  <KitColour
    as="li"
    palette={line.colour}
    display="flex"
    gap="4"
    paddingBlock="4"
    borderBottomWidth="1px"
    borderColor="hairline"
  >
    <FilamentSwatch />
    <Box flex="1" minWidth="0" display="flex" flexWrap="wrap" columnGap="6" rowGap="1">
      <Box flex="1 1 9rem" minWidth="0">
        <Box fontSize="lg" fontWeight="semibold" lineHeight="snug">
          <TextLink to={paths.kit.to({ slug: line.kitSlug })}>{line.kitName}</TextLink> {line.revision}
        </Box>
        <Box color="ink.soft">{line.licenceName}</Box>
        {isOwned && <StatusMark state="note">{basketTexts.alreadyYours}</StatusMark>}
      </Box>
      <Box flex="none" display="flex" flexDirection="column" alignItems="flex-end" marginLeft="auto">
        <Price
          size="md"
          align="end"
          price={orFree(line.total)}
          original={line.discount.minor > 0 ? price(line.price) : undefined}
        />
        <Button
          look="plain"
          size="sm"
          aria-label={basketTexts.removeSpoken(line.kitName, line.licenceName)}
          onClick={onRemove}
        >
          {basketTexts.remove}
        </Button>
      </Box>
    </Box>
  </KitColour>
);

/** All the browser knows of a kit that is sold no more is how it stood in the address. */
const nameFromSlug = (slug: string) => slug.charAt(0).toUpperCase() + slug.slice(1).replaceAll('-', ' ');

/** A licence that was sold when it was chosen, and is no more. */
export const GoneLine = ({ kitSlug, onRemove }: { kitSlug: string; onRemove: () => void }) => (
  <Box
    as="li"
    display="flex"
    justifyContent="space-between"
    gap="4"
    paddingBlock="4"
    borderBottomWidth="1px"
    borderColor="hairline"
  >
    <Box>
      <Box fontSize="lg" fontWeight="semibold" lineHeight="snug">
        {nameFromSlug(kitSlug)}
      </Box>
      <StatusMark state="warn">{basketTexts.gone}</StatusMark>{' '}
      <Box as="span" fontSize="sm" color="ink.soft">
        {basketTexts.goneDetail}
      </Box>
    </Box>
    <Button
      look="plain"
      size="sm"
      aria-label={basketTexts.removeSpoken(nameFromSlug(kitSlug), basketTexts.gone)}
      onClick={onRemove}
    >
      {basketTexts.remove}
    </Button>
  </Box>
);
