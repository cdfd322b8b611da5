import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { lazy, Suspense, useMemo } from 'react';
import { homeTexts } from '../../config/texts/home.js';
import { extentOfAll } from '../../ui/drawing/rank-layout.js';
import { InlineSelect } from '../../ui/inline-select.js';
import { Heading } from '../../ui/text.js';
import { drawnVoices } from '../bench/drawn-voices.js';
import { kitListAddress, kitSorts, type KitSort } from './kit-list-query.js';
import { KitRow } from './kit-row.js';
import { type Offer, offerForCard } from './offers.js';

// Few shops have more kits than one page holds.
const Pager = lazy(async () => ({ default: (await import('../../ui/table/pager.js')).Pager }));

const sortOptions = kitSorts.map((value) => ({ value, label: homeTexts.sorts[value] }));

export interface KitListProps {
  answer: OutputOf<'GET /kits'>;
  offers: readonly Offer[];
  sort: KitSort;
  onSort: (sort: KitSort) => void;
}

/** All kits of a page, drawn to one scale, so that one sees at once what is big. */
export function KitList({ answer, offers, sort, onSort }: KitListProps) {
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
        {total > 1 && (
          <InlineSelect
            label={homeTexts.sortBy}
            value={sort}
            options={sortOptions}
            onChange={(event) => onSort(event.target.value as KitSort)}
          />
        )}
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
            addressOf={(change) => kitListAddress({ sort, ...change })}
          />
        </Suspense>
      )}
    </>
  );
}
