import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { homeTexts } from '../../config/texts/home.js';
import { RouterLink } from '../../ui/router-link.js';
import { type Fits, kitListAddress, type KitSort, kitSorts } from './kit-list-query.js';

const SortLink = chakra(RouterLink, {
  base: { _hover: { color: 'ink' }, '&[aria-current]': { color: 'ink', textDecoration: 'underline' } },
});

/** The order of the list: each has its address. */
export const SortLinks = ({ sort, fits }: { sort: KitSort; fits: Fits | undefined }) => (
  <Box as="nav" aria-label={homeTexts.sortBy} display="flex" gap="3" color="ink.soft">
    <span aria-hidden>{homeTexts.sortBy}</span>
    {kitSorts.map((one) => (
      <SortLink
        key={one}
        replace
        to={kitListAddress({ sort: one, page: 1, fits })}
        aria-current={one === sort || undefined}
      >
        {homeTexts.sorts[one]}
      </SortLink>
    ))}
  </Box>
);
