import { useEffect, useState } from 'react';
import { useHashSecret } from '../../lib/hash-secret.js';

const nameOf = (orderId: string) => `windchest.order-key.${orderId}`;

function keptKey(orderId: string): string | undefined {
  try {
    return sessionStorage.getItem(nameOf(orderId)) ?? undefined;
  } catch {
    return undefined;
  }
}

/**
 * The key that opens an order without an account. It comes behind the `#` of a link and is kept as long as the
 * tab, so that loading the page again does not lose it.
 */
export function useOrderKey(orderId: string): string | undefined {
  const fromLink = useHashSecret('key');
  const [kept] = useState(() => keptKey(orderId));
  useEffect(() => {
    if (!fromLink) return;
    try {
      sessionStorage.setItem(nameOf(orderId), fromLink);
    } catch {
      // Without storage the key lives as long as the page.
    }
  }, [fromLink, orderId]);
  return fromLink ?? kept;
}
