import type { DemoPerson, DemoPlan, DemoPledge } from '../demo-types.js';
import { pay } from './pay.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

/** Makes a plan as the maker would. @returns its id */
export const makePlan = async (
  maker: ShopBrowser,
  { kitSlugs, ...plan }: DemoPlan,
  kitIds: ReadonlyMap<string, string>,
): Promise<string> => {
  const { id } = await maker.post<{ id: string }>('/workshop/plans', {
    ...plan,
    hasAllKits: kitSlugs === null,
    kitIds: (kitSlugs ?? []).map((slug) => kitIds.get(slug) ?? ''),
    isOffered: true,
  });
  return id;
};

/** Pledges as a person would: plan, payment page, and back to the account. */
export const beginPledge = async (
  supporter: ShopBrowser,
  person: DemoPerson,
  planId: string,
  { isEnding }: DemoPledge,
  stripeUrl: string,
): Promise<void> => {
  const { pledgeId, paymentUrl } = await supporter.post<{ pledgeId: string; paymentUrl: string }>(
    '/pledges',
    {
      planId,
      country: person.countryCode,
      hasConsented: true,
      attempt: crypto.randomUUID(),
    },
  );
  await pay(stripeUrl, paymentUrl, person);
  await waitFor(
    'The first payment of a pledge',
    () => supporter.get<{ state: string }>(`/pledges/${pledgeId}`),
    (pledge) => pledge.state === 'current',
  );
  if (isEnding) await supporter.post(`/pledges/${pledgeId}/end`);
};
