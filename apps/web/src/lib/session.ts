import type { Permission, Person, Session } from '@windchest/contracts';
import { useCallback } from 'react';
import type { ApiFault } from './api-fault.js';
import { speakLocale } from './format.js';
import { useEndpoint } from './use-endpoint.js';

export interface SessionState {
  session: Session | undefined;
  person: Person | null;
  isLoading: boolean;
  /** Why nobody knows who is signed in. */
  fault: ApiFault | undefined;
  /** Asks again. */
  refresh: () => Promise<unknown>;
  isSignedIn: boolean;
  /** Whether the signed-in person may do a kind of work; the server asks again. */
  may: (permission: Permission) => boolean;
  /** Put in the place of the cached one after signing in or out. */
  replace: (session: Session | undefined) => Promise<unknown>;
}

/** Who is signed in, and what they may do. */
export function useSession(): SessionState {
  const { data, fault, isLoading, mutate } = useEndpoint('GET /session', {}, { dedupingInterval: 10_000 });
  const replace = useCallback(
    (session: Session | undefined) => mutate(session, { revalidate: session === undefined }),
    [mutate],
  );
  if (data) speakLocale(data.workshop.locale);
  return {
    session: data,
    person: data?.person ?? null,
    isLoading,
    fault,
    refresh: () => mutate(),
    isSignedIn: Boolean(data?.person),
    may: (permission) => data?.permissions.includes(permission) ?? false,
    replace,
  };
}
