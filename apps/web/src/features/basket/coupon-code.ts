import { type StoredValue, storedValue } from '../../lib/stored-value.js';

/** As the contract has it; asked here so that a slip of the pen needs no answer from the server. */
export const isCode = (text: string): boolean => /^[A-Z0-9-]{3,40}$/.test(text);

export const tidyCode = (text: string): string => text.trim().toUpperCase();

/** The coupon the basket is priced with, kept as long as the tab; empty without one. */
export const couponCode: StoredValue<string> = storedValue({
  key: 'windchest.coupon',
  read: (text) => (text !== null && isCode(text) ? text : ''),
  write: (code) => code || null,
  storage: () => sessionStorage,
});

/** An announced code goes into the basket with the kit; one the buyer wrote down stays. */
export function takeCodeAlong(code: string): void {
  if (!couponCode.get()) couponCode.set(code);
}
