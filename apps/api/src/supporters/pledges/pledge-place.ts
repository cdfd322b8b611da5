import { locate, type Location } from '../../payments/location-evidence.js';

export interface PlacedPledge {
  readonly declaredCountry: string;
  readonly paymentCountry: string | null;
  readonly cardCountry: string | null;
  readonly settledCountry: string | null;
}

/** Where a pledge is taxed. What the workshop has settled by hand stands, for the months to come too. */
export const placeOf = (pledge: PlacedPledge): Location =>
  pledge.settledCountry
    ? { country: pledge.settledCountry, isClear: true }
    : locate(pledge.declaredCountry, pledge.paymentCountry, pledge.cardCountry);
