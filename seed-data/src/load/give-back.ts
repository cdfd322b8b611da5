import type { DemoPurchase } from '../demo-types.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

interface OrderAnswer {
  lines: { id: string; kitSlug: string }[];
  refunds: { state: string }[];
}

/** Gives part of what was paid back, as the bookkeeper does on the order's page, and waits for its credit note. */
export const giveBack = async (
  bookkeeper: ShopBrowser,
  orderId: string,
  { kitSlug, minor, reason }: NonNullable<DemoPurchase['givenBack']>,
): Promise<void> => {
  const at = `/workshop/orders/${orderId}`;
  const { lines } = await bookkeeper.get<OrderAnswer>(at);
  const line = lines.find((one) => one.kitSlug === kitSlug);
  if (!line) throw new Error(`The order has no line of ${kitSlug}.`);
  await bookkeeper.post(`${at}/refunds`, {
    lines: [{ orderLineId: line.id, amountMinor: minor, keepsEntitlement: true }],
    reason,
    attempt: crypto.randomUUID(),
  });
  await waitFor(
    'The refund',
    () => bookkeeper.get<OrderAnswer>(at),
    (order) => order.refunds.every((refund) => refund.state === 'succeeded'),
  );
};
