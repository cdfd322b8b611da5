import { type StoredValue, storedValue, useStoredValue } from './stored-value.js';

export interface BasketItem {
  kitSlug: string;
  licenceId: string;
}

const isItem = (one: unknown): one is BasketItem =>
  typeof one === 'object' &&
  one !== null &&
  typeof (one as BasketItem).kitSlug === 'string' &&
  typeof (one as BasketItem).licenceId === 'string';

/** Reads what is kept; a damaged basket is an empty one, a damaged item is left out. */
export function readBasket(text: string | null): readonly BasketItem[] {
  try {
    const kept: unknown = JSON.parse(text ?? '[]');
    return Array.isArray(kept) ? kept.filter(isItem) : [];
  } catch {
    return [];
  }
}

const writeBasket = (items: readonly BasketItem[]) => (items.length ? JSON.stringify(items) : null);

/** The API takes no more lines in one order. */
export const basketLimit = 30;

/** A licence is bought once, so it stands in the basket once. */
export const withItem = (items: readonly BasketItem[], item: BasketItem): readonly BasketItem[] =>
  items.some((one) => one.licenceId === item.licenceId) || items.length >= basketLimit
    ? items
    : [...items, item];

export const withoutLicences = (
  items: readonly BasketItem[],
  licenceIds: readonly string[],
): readonly BasketItem[] => items.filter((one) => !licenceIds.includes(one.licenceId));

export const basket: StoredValue<readonly BasketItem[]> = storedValue({
  key: 'windchest.basket',
  read: readBasket,
  write: writeBasket,
});

export interface Basket {
  items: readonly BasketItem[];
  holds: (licenceId: string) => boolean;
  add: (item: BasketItem) => void;
  remove: (...licenceIds: string[]) => void;
  clear: () => void;
}

export function useBasket(): Basket {
  const items = useStoredValue(basket);
  return {
    items,
    holds: (licenceId) => items.some((one) => one.licenceId === licenceId),
    add: (item) => basket.set(withItem(basket.get(), item)),
    remove: (...licenceIds) => basket.set(withoutLicences(basket.get(), licenceIds)),
    clear: () => basket.set([]),
  };
}
