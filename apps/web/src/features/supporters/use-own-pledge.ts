import type { OutputOf, Pledge } from '@windchest/contracts';
import { useEffect, useState } from 'react';
import { ApiFault } from '../../lib/api-fault.js';
import { call } from '../../lib/api-client.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { isLive } from './pledge-words.js';

const readEveryMs = 2_000;
/** The payment service itself is asked more rarely: its own event is usually quicker. */
const askEveryMs = 8_000;
const patienceMs = 5 * 60_000;

export interface OwnPledge {
  answer: OutputOf<'GET /account/pledges'> | undefined;
  /** The one that is under way, else the last one. */
  pledge: Pledge | undefined;
  fault: ApiFault | undefined;
  /** The last question to the payment service was not answered. */
  isUnheard: boolean;
  reload: () => void;
}

/** One's own pledge. Coming from a page of the payment service, it is followed until the service has spoken. */
export function useOwnPledge(isSignedIn: boolean, page: number): OwnPledge {
  const [isTired, setIsTired] = useState(false);
  const [isUnheard, setIsUnheard] = useState(false);
  const { data, fault, mutate } = useEndpoint(
    'GET /account/pledges',
    isSignedIn ? { query: { page } } : null,
    {
      keepPreviousData: true,
      refreshInterval: (answer) => (answer?.items[0]?.state === 'opening' && !isTired ? readEveryMs : 0),
    },
  );
  const first = data?.items[0];
  const liveId = page === 1 && first && isLive(first) ? first.id : undefined;
  const isOpening = first?.state === 'opening';

  useEffect(() => {
    if (!liveId) return undefined;
    let isOver = false;
    const ask = async () => {
      try {
        await call('POST /pledges/:pledgeId/refresh', { params: { pledgeId: liveId } });
        if (isOver) return;
        setIsUnheard(false);
        await mutate();
      } catch (thrown) {
        if (!(thrown instanceof ApiFault)) throw thrown;
        if (!isOver) setIsUnheard(true);
      }
    };
    void ask();
    if (!isOpening) return () => void (isOver = true);
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
  }, [liveId, isOpening, mutate]);

  return {
    answer: data,
    pledge: first,
    fault,
    isUnheard: isUnheard && isOpening,
    reload: () => void mutate(),
  };
}
