import { checkoutBody, isInUnion, readVatNumber } from '@windchest/contracts';
import { z } from 'zod';
import { basketTexts } from '../../config/texts/basket.js';

/** The checkout as it stands in the form. */
export interface CheckoutFields {
  email: string;
  country: string;
  isBusiness: boolean;
  business: { name: string; address: string; vatNumber: string };
  isGift: boolean;
  gift: { email: string; giver: string; greeting: string };
  hasConsented: boolean;
}

/** Fields that the server may find fault with. */
export const checkoutFieldNames = [
  'email',
  'country',
  'business.name',
  'business.address',
  'business.vatNumber',
  'gift.email',
  'gift.giver',
  'gift.greeting',
  'hasConsented',
] as const;

export const emptyCheckout = (email: string, giver: string): CheckoutFields => ({
  email,
  country: '',
  isBusiness: false,
  business: { name: '', address: '', vatNumber: '' },
  isGift: false,
  gift: { email: '', giver, greeting: '' },
  hasConsented: false,
});

export const checkoutSchema = checkoutBody
  .pick({ email: true, hasConsented: true, business: true, gift: true })
  .extend({ country: z.string().regex(/^[A-Z]{2}$/, basketTexts.countryMissing) })
  .superRefine(({ country, business }, context) => {
    if (!business?.vatNumber || !isInUnion(country)) return;
    const read = readVatNumber(business.vatNumber, country);
    if ('fault' in read)
      context.addIssue({ code: 'custom', path: ['business', 'vatNumber'], message: read.fault });
  });

/** What is not ticked is not sent, whatever was typed before. */
export const toCheckout = ({ isBusiness, business, isGift, gift, ...fields }: CheckoutFields): unknown => ({
  ...fields,
  business: isBusiness ? business : undefined,
  gift: isGift ? gift : undefined,
});
