import type { KitCard, OutputOf } from '@windchest/contracts';

export type Offer = OutputOf<'GET /offers'>[number];

/** How many places are left is asked again while somebody looks on. */
export const liveOffers = { refreshInterval: 20_000 };

const holds = (offer: Offer) => offer.left === null || offer.left > 0;

/** The announced coupon that makes a kit's shown price lowest; none where its places are all taken. */
export function offerForCard(
  card: Pick<KitCard, 'slug' | 'price'>,
  offers: readonly Offer[],
): Offer | undefined {
  const lower = offers.filter(
    (offer) => offer.kitSlug === card.slug && holds(offer) && offer.price.minor < card.price.minor,
  );
  return lower.sort((a, b) => a.price.minor - b.price.minor)[0];
}

/** The announced coupon that makes one licence cheapest. */
export function offerForLicence(licenceId: string, offers: readonly Offer[]): Offer | undefined {
  const own = offers.filter((offer) => offer.licenceId === licenceId && holds(offer));
  return own.sort((a, b) => a.price.minor - b.price.minor)[0];
}
