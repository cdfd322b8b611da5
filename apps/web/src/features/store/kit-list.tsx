import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { lazy, Suspense, useMemo } from 'react';
import { homeTexts } from '../../config/texts/home.js';
import { extentOfAll } from '../../ui/drawing/rank-layout.js';
import { TextLink } from '../../ui/link.js';
import { Heading } from '../../ui/text.js';
import { drawnVoices } from '../bench/drawn-voices.js';
import { type Fits, kitListAddress, type KitSort } from './kit-list-query.js';
import { KitRow } from './kit-row.js';
import { type Offer, offerForCard } from './offers.js';
import { SortLinks } from './sort-links.js';

// Asked for by few, so fetched when it is.
const FitFilter = lazy(async () => ({ default: (await import('./fit-filter.js')).FitFilter }));
// Few shops have more kits than one page holds.
const Pager = lazy(async () => ({ default: (await import('../../ui/table/pager.js')).Pager }));

export interface KitListProps {
  answer: OutputOf<'GET /kits'>;
  offers: readonly Offer[];
  sort: KitSort;
  fits: Fits | undefined;
}

/** All kits of a page, drawn to one scale, so that one sees at once what is big. */
export function KitList({ answer, offers, sort, fits }: KitListProps) {
  const { items, total, page, size } = answer;
  const ranks = useMemo(() => items.map((kit) => drawnVoices(kit.rank)), [items]);
  const extent = useMemo(() => extentOfAll(ranks), [ranks]);
  return (
    <>
      <Box
        display="flex"
        flexWrap="wrap"
        alignItems="baseline"
        justifyContent="space-between"
        columnGap="6"
        rowGap="1"
        paddingBottom="2"
        borderBottomWidth="1px"
        borderColor="hairline"
      >
        <Heading level={2} look="body" fontWeight="normal" color="ink.soft">
          {homeTexts.heading(total)}
        </Heading>
        {fits ? (
          <Suspense>
            <FitFilter fits={fits} sort={sort} />
          </Suspense>
        ) : (
          <TextLink to={kitListAddress({ sort, page: 1, fits: 'mine' })}>{homeTexts.fits}</TextLink>
        )}
        {total > 1 && <SortLinks sort={sort} fits={fits} />}
      </Box>
      <Box as="ul" listStyle="none">
        {items.map((kit, at) => (
          <KitRow
            key={kit.slug}
            kit={kit}
            voices={ranks[at] ?? []}
            extent={extent}
            offer={offerForCard(kit, offers)}
          />
        ))}
      </Box>
      {total > size && (
        <Suspense>
          <Pager
            page={page}
            size={size}
            total={total}
            addressOf={(change) => kitListAddress({ sort, fits, ...change })}
          />
        </Suspense>
      )}
    </>
  );
}
