import { homeTexts } from '../../config/texts/home.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { HomeHero } from './home-hero.js';
import { kitListQuery, kitsPerPage, newestKits } from './kit-list-query.js';
import { KitList } from './kit-list.js';
import { KitRowsSkeleton } from './kit-rows-skeleton.js';
import { NoKits } from './no-kits.js';

/** The shop's front: the newest kit to play on, then all kits to one scale. */
export function HomePage() {
  const table = useTableState({ sort: newestKits.sort, size: kitsPerPage });
  const query = kitListQuery(table.state);
  // With the usual sorting both are one question.
  const newest = useEndpoint('GET /kits', { query: newestKits });
  const list = useEndpoint('GET /kits', { query }, { keepPreviousData: true });
  const offers = useEndpoint('GET /offers');

  return (
    <>
      <PageTitle />
      <HomeHero kit={newest.data?.items[0]} isLoading={newest.isLoading} />
      <Band paddingTop={{ base: '6', md: '7' }}>
        {list.data ? (
          list.data.items.length > 0 ? (
            <KitList
              answer={list.data}
              offers={offers.data ?? []}
              sort={query.sort}
              onSort={(sort) => table.change({ sort })}
              addressOf={table.addressOf}
            />
          ) : (
            <NoKits page={query.page} onAgain={() => void list.mutate()} />
          )
        ) : list.fault ? (
          <Fault
            level={2}
            what={homeTexts.failed}
            fault={list.fault}
            onAgain={() => {
              void list.mutate();
              void newest.mutate();
            }}
          />
        ) : (
          <KitRowsSkeleton />
        )}
      </Band>
    </>
  );
}
