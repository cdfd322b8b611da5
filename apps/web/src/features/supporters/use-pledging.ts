import type { Pledge } from '@windchest/contracts';
import { useEffect, useRef, useState } from 'react';
import { useAction } from '../../lib/use-action.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { newAttempt } from '../basket/checkout-attempt.js';

export interface Pledging {
  /** Leads on to the payment page; the fault where it could not. */
  run: (plan: { planId: string; country: string }) => Promise<ApiFault | undefined>;
  isOpening: boolean;
}

/** Opens a pledge. What is sent again after a broken connection opens the same page. */
export function usePledging(): Pledging {
  const { run } = useAction('POST /pledges', ['GET /account/pledges']);
  const attempt = useRef({ of: '', id: '' });
  const [isOpening, setIsOpening] = useState(false);
  // Coming back from the payment page may bring this very page back as it was left.
  useEffect(() => {
    const wake = (event: PageTransitionEvent) => {
      if (!event.persisted) return;
      attempt.current = { of: '', id: '' };
      setIsOpening(false);
    };
    window.addEventListener('pageshow', wake);
    return () => window.removeEventListener('pageshow', wake);
  }, []);

  return {
    isOpening,
    run: async ({ planId, country }) => {
      const of = `${planId} ${country}`;
      if (attempt.current.of !== of) attempt.current = { of, id: newAttempt() };
      setIsOpening(true);
      const outcome = await run({
        body: { planId, country, hasConsented: true, attempt: attempt.current.id },
      });
      // Stays busy until the browser has gone there.
      if (outcome.isDone) window.location.assign(outcome.data.paymentUrl);
      else {
        setIsOpening(false);
        if (outcome.fault.code !== 'unreachable' && outcome.fault.code !== 'payment-unreachable')
          attempt.current = { of: '', id: '' };
        return outcome.fault;
      }
      return undefined;
    },
  };
}

/** The pledge that stands in the way of another. */
export const standingPledge = (pledges: readonly Pledge[] | undefined): Pledge | undefined =>
  pledges?.find(({ state }) => state !== 'lapsed' && state !== 'ended');
