import type { OutputOf } from '@windchest/contracts';
import { useEffect, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { ApiFault } from '../../lib/api-fault.js';
import { call } from '../../lib/api-client.js';
import { attemptFor, dropAttempt, type WhatIsOrdered } from './checkout-attempt.js';

type Opened = OutputOf<'POST /checkout'>;

const send = (ordered: WhatIsOrdered): Promise<Opened> =>
  call('POST /checkout', {
    body: {
      items: ordered.licenceIds.map((licenceId) => ({ licenceId })),
      couponCode: ordered.couponCode,
      email: ordered.email,
      country: ordered.country,
      business: ordered.business,
      gift: ordered.gift,
      hasConsented: true,
      attempt: attemptFor(ordered),
    },
  });

/** Whether the order an attempt leads to was given up or ran out: its page can be paid no more. */
async function isOver({ orderId, orderKey }: Opened): Promise<boolean> {
  const { state } = await call('GET /orders/:orderId', { params: { orderId }, query: { key: orderKey } });
  return state === 'cancelled' || state === 'expired';
}

/** Opens the order; where the last attempt's order is over by now, a new one. */
async function open(ordered: WhatIsOrdered): Promise<Opened> {
  const opened = await send(ordered);
  if (opened.paymentUrl !== null || !(await isOver(opened))) return opened;
  dropAttempt();
  return send(ordered);
}

/** After these the order of the attempt cannot be gone on with. */
const ends = new Set<ApiFault['code']>(['order-is-final', 'payment-refused', 'conflict']);

export interface Checkout {
  /** Leads on to the payment page or the order; the fault where it could not. */
  run: (ordered: WhatIsOrdered) => Promise<ApiFault | undefined>;
  isOpening: boolean;
}

export function useCheckout(): Checkout {
  const navigate = useNavigate();
  const [isOpening, setIsOpening] = useState(false);
  // Coming back from the payment page may bring this very page back as it was left.
  useEffect(() => {
    const wake = (event: PageTransitionEvent) => event.persisted && setIsOpening(false);
    window.addEventListener('pageshow', wake);
    return () => window.removeEventListener('pageshow', wake);
  }, []);

  const run = async (ordered: WhatIsOrdered) => {
    setIsOpening(true);
    try {
      const { orderId, orderKey, paymentUrl } = await open(ordered);
      if (paymentUrl === null) {
        dropAttempt();
        await navigate(`${paths.order.to({ orderId })}#key=${orderKey}`);
        setIsOpening(false);
      } else {
        // Stays busy until the browser has gone there.
        window.location.assign(paymentUrl);
      }
      return undefined;
    } catch (thrown) {
      setIsOpening(false);
      if (!(thrown instanceof ApiFault)) throw thrown;
      if (ends.has(thrown.code)) dropAttempt();
      return thrown;
    }
  };
  return { run, isOpening };
}
