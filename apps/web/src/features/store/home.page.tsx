import { lazy, Suspense } from 'react';
import { useSearchParams } from 'react-router-dom';
import { homeTexts } from '../../config/texts/home.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { HomeHero } from './home-hero.js';
import { fitsOf, kitListQuery, newestKits } from './kit-list-query.js';
import { KitList } from './kit-list.js';
import { liveOffers } from './offers.js';
import { KitRowsSkeleton } from './kit-rows-skeleton.js';

// Seldom seen, so not part of a first visit.
const NoKits = lazy(async () => ({ default: (await import('./no-kits.js')).NoKits }));

/** The shop's front: the newest kit to play on, then all kits to one scale. */
export function HomePage() {
  const [address] = useSearchParams();
  const query = kitListQuery(address);
  const fits = fitsOf(address);
  // With the usual sorting both are one question.
  const newest = useEndpoint('GET /kits', { query: newestKits });
  const list = useEndpoint('GET /kits', { query }, { keepPreviousData: true });
  const offers = useEndpoint('GET /offers', {}, liveOffers);

  return (
    <>
      <PageTitle />
      <HomeHero kit={newest.data?.items[0]} isLoading={newest.isLoading} />
      <Band paddingTop={{ base: '6', md: '7' }}>
        {list.data ? (
          list.data.items.length > 0 ? (
            <KitList answer={list.data} offers={offers.data ?? []} sort={query.sort} fits={fits} />
          ) : (
            <Suspense>
              <NoKits page={query.page} fits={fits} onAgain={() => void list.mutate()} />
            </Suspense>
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
