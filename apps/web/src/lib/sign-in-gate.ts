import { useEffect } from 'react';
import { useSWRConfig } from 'swr';
import type { ApiFault } from './api-fault.js';
import { useSession } from './session.js';
import { isAnswerOf } from './use-action.js';

export type SignInState = 'unknown' | 'signed-in' | 'signed-out';

/** For pages of one's own: whether somebody is signed in. Where nobody can say, the page's own question finds out. */
export function useSignInState(): SignInState {
  const { session, isLoading } = useSession();
  if (session) return session.person ? 'signed-in' : 'signed-out';
  return isLoading ? 'unknown' : 'signed-in';
}

const isSession = isAnswerOf(['GET /session']);

/** The session ended behind the page's back: find out, so that the page can ask to sign in. */
export function useEndedSession(fault: ApiFault | undefined): void {
  const { mutate } = useSWRConfig();
  const hasEnded = fault?.code === 'not-signed-in';
  useEffect(() => {
    if (hasEnded) void mutate(isSession);
  }, [hasEnded, mutate]);
}
