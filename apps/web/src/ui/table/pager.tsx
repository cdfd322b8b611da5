import { Box } from '@chakra-ui/react/box';
import { tableTexts } from '../../config/texts/furniture.js';
import { LinkButton } from '../button.js';
import { pageCount } from './table-state.js';

export interface PagerProps {
  page: number;
  size: number;
  total: number;
  addressOf: (change: { page: number }) => string;
}

/** Which rows these are, and the way to the next. Nothing where one page holds all. */
export function Pager({ page, size, total, addressOf }: PagerProps) {
  const pages = pageCount(total, size);
  if (pages === 1) return null;
  const from = (page - 1) * size + 1;
  return (
    <Box
      as="nav"
      aria-label={tableTexts.pageOf(page, pages)}
      display="flex"
      flexWrap="wrap"
      alignItems="center"
      justifyContent="space-between"
      gap="3"
      marginTop="4"
    >
      <Box as="span" fontSize="sm" color="ink.soft">
        {tableTexts.rows(from, Math.min(total, page * size), total)}
      </Box>
      <Box display="flex" gap="2">
        {page > 1 && (
          <LinkButton look="outline" size="sm" rel="prev" to={addressOf({ page: page - 1 })}>
            {tableTexts.previous}
          </LinkButton>
        )}
        {page < pages && (
          <LinkButton look="outline" size="sm" rel="next" to={addressOf({ page: page + 1 })}>
            {tableTexts.next}
          </LinkButton>
        )}
      </Box>
    </Box>
  );
}
