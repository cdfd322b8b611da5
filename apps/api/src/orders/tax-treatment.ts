import { isInUnion, readVatNumber, type TaxTreatment } from '@windchest/contracts';
import { money, percent, taxFromGross } from '@windchest/money';

/**
 * How a sale of files is taxed. A business gets them where it is established (Directive 2006/112/EC, art. 44), and
 * owes the tax itself where that is another country of the Union (art. 196); the number by which its country knows
 * it tells it is one (Implementing Regulation (EU) 282/2011, art. 18). Without such a number a buyer in another
 * country of the Union is taken for a consumer, who is taxed at home (art. 58). Not tax advice.
 */
export const taxTreatmentOf = (
  sellerCountry: string,
  buyerCountry: string,
  business: { readonly vatNumber: string } | null,
): TaxTreatment => {
  if (!business) return 'consumer';
  if (buyerCountry === sellerCountry) return 'domestic-business';
  if (!isInUnion(buyerCountry)) return 'business-abroad';
  return 'number' in readVatNumber(business.vatNumber, buyerCountry) ? 'reverse-charge' : 'consumer';
};

/** Whether the tax lies within the price, or was taken off it. */
export const isTaxWithin = (treatment: TaxTreatment): boolean =>
  treatment === 'consumer' || treatment === 'domestic-business';

/**
 * What a price comes to for this buyer. The shop's prices contain the tax. A business that owes the tax itself, or
 * none, pays the price less the tax that a consumer of its country would pay within it, so that neither buys dearer
 * than the other. Rounded once for each price, so that a coupon and the sum work on what is charged.
 */
export const chargedPrice = (
  priceMinor: number,
  {
    treatment,
    ratePercent,
    currency,
  }: { treatment: TaxTreatment; ratePercent: string | null; currency: string },
): number =>
  isTaxWithin(treatment) || ratePercent === null
    ? priceMinor
    : taxFromGross(money(priceMinor, currency), percent(ratePercent)).net.minor;
