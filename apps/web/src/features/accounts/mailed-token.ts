import type { Session } from '@windchest/contracts';
import { useCallback, useEffect, useRef, useState } from 'react';
import type { ApiFault } from '../../lib/api-fault.js';
import { useHashSecret } from '../../lib/hash-secret.js';
import { useAction } from '../../lib/use-action.js';
import { useEnter } from './enter.js';

export interface MailedToken {
  hasToken: boolean;
  /** The session it opened. */
  session: Session | undefined;
  fault: ApiFault | undefined;
  again: () => void;
}

/**
 * Hands in the token of a mailed link, by itself and once. Mail scanners that open links do not get here: the
 * token stands behind `#`, and it takes a script to send it.
 */
export function useMailedToken(endpoint: 'POST /accounts/verify' | 'POST /session/from-link'): MailedToken {
  const token = useHashSecret('token');
  const { run, fault } = useAction(endpoint);
  const enter = useEnter();
  const [session, setSession] = useState<Session>();
  const sent = useRef<string>(undefined);

  const handIn = useCallback(async () => {
    if (!token) return;
    sent.current = token;
    const outcome = await run({ body: { token } });
    if (!outcome.isDone) return;
    await enter(outcome.data);
    setSession(outcome.data);
  }, [token, run, enter]);

  useEffect(() => {
    // A token works once; React runs effects twice while developing.
    if (sent.current !== token) void handIn();
  }, [token, handIn]);

  return { hasToken: token !== undefined, session, fault, again: () => void handIn() };
}
