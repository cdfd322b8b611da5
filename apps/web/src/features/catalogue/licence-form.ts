import type { Licence } from '@windchest/contracts';
import { amountText, readAmount } from '../../lib/amount-text.js';

export interface LicenceForm {
  kind: Licence['kind'];
  name: string;
  terms: string;
  /** As it is typed: `24.00`. */
  price: string;
  yearlyLimit: number;
  isOffered: boolean;
}

export const licenceForm = (licence: (Licence & { isOffered: boolean }) | null): LicenceForm => ({
  kind: licence?.kind ?? 'personal',
  name: licence?.name ?? '',
  terms: licence?.terms ?? '',
  price: licence ? amountText(licence.price) : '',
  yearlyLimit: licence?.yearlyLimit ?? NaN,
  isOffered: licence?.isOffered ?? true,
});

/** What is sent; an unreadable price is refused by its own field's check and counts as none here. */
export const licenceBodyOf =
  (currency: string) =>
  ({ price, yearlyLimit, ...form }: LicenceForm): unknown => {
    const amount = readAmount(price, currency);
    return {
      ...form,
      priceMinor: 'minor' in amount ? amount.minor : NaN,
      yearlyLimit: Number.isNaN(yearlyLimit) ? null : yearlyLimit,
    };
  };
