import type { Quote } from '@windchest/contracts';
import { useEffect, useMemo, useState } from 'react';
import type { ApiFault } from '../../lib/api-fault.js';
import { type BasketItem, useBasket } from '../../lib/basket.js';
import { useStoredValue } from '../../lib/stored-value.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { couponCode } from './coupon-code.js';

const settleMs = 250;

/** A value that has not changed for a moment. */
function useSettled<T>(value: T): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), settleMs);
    return () => clearTimeout(timer);
  }, [value]);
  return settled;
}

export interface QuotedBasket {
  items: readonly BasketItem[];
  /** The last price heard; of the basket as it is only when `isCurrent`. */
  quote: Quote | undefined;
  fault: ApiFault | undefined;
  isCurrent: boolean;
  /** The code asked with, whether it holds or not. */
  code: string;
  /** Asks again. */
  requote: () => void;
}

/** As much of the buyer as the price depends on. */
export interface TaxedBuyer {
  /** Empty until it is chosen. */
  country: string;
  /** Null for who does not buy for a business. */
  vatNumber: string | null;
}

/** The basket with its prices. While a new price is on its way the last one stays in sight. */
export function useQuote({ country, vatNumber }: TaxedBuyer): QuotedBasket {
  const { items } = useBasket();
  const code = useStoredValue(couponCode);
  const now = useMemo(
    () => ({
      items: items.map(({ licenceId }) => ({ licenceId })),
      couponCode: code || undefined,
      country: country || undefined,
      business: vatNumber === null ? undefined : { vatNumber },
    }),
    [items, code, country, vatNumber],
  );
  const settled = useSettled(now);
  const body = items.length > 0 ? settled : null;
  const { data, fault, isRefreshing, mutate } = useEndpoint(
    'POST /basket/quote',
    body && body.items.length > 0 ? { body } : null,
    { keepPreviousData: true },
  );
  return {
    items,
    quote: items.length > 0 ? data : undefined,
    fault,
    isCurrent: settled === now && !isRefreshing && data !== undefined && !fault,
    code,
    requote: () => void mutate(),
  };
}
