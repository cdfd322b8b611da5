import { isInUnion, readVatNumber, type BusinessBuyer, type GiftWish } from '@windchest/contracts';
import { Refusal } from '../http/refusal.js';

/**
 * The business as the order keeps it: the number in its tidy form. Whether the number was ever given to anybody is
 * not asked: only its form is looked at.
 * @throws Refusal `validation-failed` where a country of the Union knows no number of this form
 */
export const businessOf = (wish: BusinessBuyer | undefined, country: string): BusinessBuyer | null => {
  if (!wish) return null;
  if (wish.vatNumber === '' || !isInUnion(country)) return wish;
  const read = readVatNumber(wish.vatNumber, country);
  if ('number' in read) return { ...wish, vatNumber: read.number };
  throw new Refusal('validation-failed', read.fault, { fields: { 'business.vatNumber': read.fault } });
};

/** @throws Refusal `gift-refused` for a gift to oneself or one that costs nothing */
export const checkGift = (gift: GiftWish | undefined, buyerEmail: string, totalMinor: number): void => {
  if (!gift) return;
  if (gift.email === buyerEmail) {
    const sentence =
      'This is your own address. Write the address of whom the gift is for, or buy it for yourself.';
    throw new Refusal('gift-refused', sentence, { fields: { 'gift.email': sentence } });
  }
  // Or anybody could have the shop write to any address, at no cost.
  if (totalMinor === 0)
    throw new Refusal(
      'gift-refused',
      'What costs nothing cannot be sent as a gift: tell them where it is, and they can take it themselves.',
    );
};
