import { formatMoney } from '@windchest/money';
import type { Config } from '../config/config.js';
import { smallestChargeOf } from '../payments/smallest-charge.js';
import { Refusal } from '../http/refusal.js';

/** A total between nothing and what the payment service charges at least. */
export const tooLittleToCharge = (
  totalMinor: number,
  {
    WORKSHOP_CURRENCY: currency,
    WORKSHOP_LOCALE: locale,
  }: Pick<Config, 'WORKSHOP_CURRENCY' | 'WORKSHOP_LOCALE'>,
): Refusal => {
  const show = (minor: number): string => formatMoney({ minor, currency }, locale);
  return new Refusal(
    'coupon-refused',
    `The basket would cost ${show(totalMinor)}, and the payment service charges nothing below ${show(smallestChargeOf(currency))}. Add a kit, or leave the coupon out.`,
  );
};
