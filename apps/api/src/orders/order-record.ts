import type { BusinessBuyer, GiftWish, orderFlag, TaxTreatment } from '@windchest/contracts';
import type { z } from 'zod';

/** An order as other rooms see it. */
export type OrderState = 'open' | 'paid' | 'cancelled' | 'expired' | 'refunded';

/**
 * What staff should look at. `location-unclear`: no two pieces of evidence agree on the buyer's country.
 * `amount-differs`: what was paid is not what the order asks, so nothing was handed over.
 * `paid-after-end`: money arrived for an order that had ended. `disputed`, `dispute-lost`: the payment service
 * says so. `refunded-outside`: money went back that nobody asked for here, so somebody decides on the rights.
 * `refund-failed`: money that was to go back did not.
 */
export type OrderFlag = z.output<typeof orderFlag>;

/** Tax within the total, at one rate. `ratePercent` is decimal text such as `25.5`. */
export interface TaxLine {
  readonly ratePercent: string;
  readonly netMinor: number;
  readonly taxMinor: number;
}

export interface OrderRecord {
  readonly id: string;
  readonly number: string;
  readonly state: OrderState;
  readonly personId: string | null;
  readonly email: string;
  readonly currency: string;
  readonly subtotalMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
  readonly refundedMinor: number;
  readonly couponCode: string | null;
  readonly declaredCountry: string;
  readonly paymentCountry: string | null;
  readonly cardCountry: string | null;
  readonly settledCountry: string | null;
  readonly taxTreatment: TaxTreatment;
  readonly business: BusinessBuyer | null;
  /** Whose the files are, where they are not the buyer's. */
  readonly gift: GiftWish | null;
  readonly flags: readonly OrderFlag[];
  readonly receiptNumber: string | null;
  readonly createdAt: Date;
  readonly paidAt: Date | null;
}

export interface OrderLineRecord {
  readonly id: string;
  readonly orderId: string;
  readonly kitId: string;
  readonly licenceId: string;
  readonly revisionId: string;
  readonly kitName: string;
  readonly licenceName: string;
  readonly revisionLabel: string;
  readonly priceMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
  readonly refundedMinor: number;
}
