import type { BuyerOrder } from '@windchest/contracts';
import { useCallback, useEffect, useState } from 'react';
import { ApiFault } from '../../lib/api-fault.js';
import { call } from '../../lib/api-client.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { useOrderKey } from './order-key.js';

const readEveryMs = 2_000;
/** The payment service itself is asked more rarely: its own event is usually quicker. */
const askEveryMs = 8_000;
const patienceMs = 5 * 60_000;

export interface FollowedOrder {
  order: BuyerOrder | undefined;
  fault: ApiFault | undefined;
  /** For the endpoints of this order. */
  input: { params: { orderId: string }; query: { key?: string } };
  /** Some minutes have gone by without a word; the page has stopped asking. */
  isTired: boolean;
  /** The last question to the payment service was not answered. */
  isUnheard: boolean;
  /** Asks now, and goes on asking for some minutes. */
  askAgain: () => void;
  replace: (order: BuyerOrder) => void;
  /** Reads the order again, where it could not be read. */
  reload: () => void;
}

/** An order, followed until it is paid or over. */
export function useOrder(orderId: string): FollowedOrder {
  const key = useOrderKey(orderId);
  const input = { params: { orderId }, query: { key } };
  const [isTired, setIsTired] = useState(false);
  const [isUnheard, setIsUnheard] = useState(false);
  const [round, setRound] = useState(0);
  const { data, fault, mutate } = useEndpoint('GET /orders/:orderId', input, {
    refreshInterval: (order) => (order?.state === 'open' && !isTired ? readEveryMs : 0),
  });
  const isOpen = data?.state === 'open';
  const replace = useCallback((order: BuyerOrder) => void mutate(order, { revalidate: false }), [mutate]);

  useEffect(() => {
    if (!isOpen) return undefined;
    let isOver = false;
    const ask = async () => {
      try {
        const order = await call('POST /orders/:orderId/refresh', { params: { orderId }, query: { key } });
        if (isOver) return;
        setIsUnheard(false);
        replace(order);
      } catch (thrown) {
        if (!(thrown instanceof ApiFault)) throw thrown;
        if (!isOver) setIsUnheard(true);
      }
    };
    if (round > 0) void ask();
    const asking = setInterval(() => void ask(), askEveryMs);
    const tiring = setTimeout(() => {
      clearInterval(asking);
      setIsTired(true);
    }, patienceMs);
    return () => {
      isOver = true;
      clearInterval(asking);
      clearTimeout(tiring);
    };
  }, [isOpen, orderId, key, replace, round]);

  const askAgain = () => {
    setIsTired(false);
    setRound((last) => last + 1);
  };
  return { order: data, fault, input, isTired, isUnheard, askAgain, replace, reload: () => void mutate() };
}
