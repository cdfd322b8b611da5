import type { KitCard } from '@windchest/contracts';
import { priceTexts } from '../../config/texts/shared.js';
import { price } from '../../lib/format.js';

/** A price as the shop writes it: nothing to pay is free. */
export const orFree = (amount: KitCard['price']): string =>
  amount.minor === 0 ? priceTexts.free : price(amount);
