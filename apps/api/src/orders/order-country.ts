import type { TaxTreatment } from '@windchest/contracts';
import { locate, type Location } from '../payments/location-evidence.js';

export interface PlacedOrder {
  readonly declaredCountry: string;
  readonly paymentCountry: string | null;
  readonly cardCountry: string | null;
  readonly settledCountry: string | null;
  readonly taxTreatment: TaxTreatment;
}

/**
 * Where an order is taxed. What the workshop has settled by hand stands. A business is where it says it is
 * established; evidence that agrees on another country, or on none, is for somebody to look at.
 */
export const placeOf = (order: PlacedOrder): Location => {
  if (order.settledCountry) return { country: order.settledCountry, isClear: true };
  const place = locate(order.declaredCountry, order.paymentCountry, order.cardCountry);
  if (order.taxTreatment === 'consumer') return place;
  return {
    country: order.declaredCountry,
    isClear: place.isClear && place.country === order.declaredCountry,
  };
};
