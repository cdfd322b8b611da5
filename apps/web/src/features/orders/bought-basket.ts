import type { BuyerOrder } from '@windchest/contracts';
import { useEffect } from 'react';
import { basket, type BasketItem } from '../../lib/basket.js';

const recentlyMs = 60 * 60_000;
const markOf = (orderId: string) => `windchest.order-taken.${orderId}`;

/** An order's lines name kits, not licences: of a kit just bought nothing stays in the basket. */
export const withoutBought = (
  items: readonly BasketItem[],
  order: Pick<BuyerOrder, 'lines'>,
): readonly BasketItem[] =>
  items.filter((item) => !order.lines.some((line) => line.kitSlug === item.kitSlug));

/** Whether this is the purchase the basket was filled for, and not an old order looked at again. */
export const isJustPaid = (order: Pick<BuyerOrder, 'state' | 'paidAt'>, nowMs: number): boolean =>
  order.state === 'paid' && order.paidAt !== null && nowMs - Date.parse(order.paidAt) < recentlyMs;

/** Once for each order: who then puts another licence of the kit into the basket keeps it. */
function takeMark(orderId: string): boolean {
  try {
    if (sessionStorage.getItem(markOf(orderId))) return false;
    sessionStorage.setItem(markOf(orderId), '1');
  } catch {
    // Without storage the basket is looked through at each visit.
  }
  return true;
}

/** Takes out of the basket what has been paid. */
export function useEmptiedBasket(order: BuyerOrder | undefined): void {
  useEffect(() => {
    if (!order || !isJustPaid(order, Date.now()) || !takeMark(order.id)) return;
    const items = basket.get();
    const left = withoutBought(items, order);
    if (left.length < items.length) basket.set(left);
  }, [order]);
}
