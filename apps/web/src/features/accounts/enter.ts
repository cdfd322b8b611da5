import type { Session } from '@windchest/contracts';
import { useCallback } from 'react';
import { useSWRConfig } from 'swr';
import { comeBackTo, paths } from '../../config/paths.js';
import { isAnswerOf } from '../../lib/use-action.js';

const isSession = isAnswerOf(['GET /session']);

/** Another person is at the page now: whatever was read for the one before is forgotten. */
export function useEnter(): (session: Session | undefined) => Promise<void> {
  const { mutate } = useSWRConfig();
  return useCallback(
    async (session) => {
      await mutate((key) => !isSession(key), undefined, { revalidate: true });
      await mutate(isSession, session, { revalidate: session === undefined });
    },
    [mutate],
  );
}

/** Browsers drop tabs and line breaks from an address, so `/<tab>/elsewhere` would lead to another site. */
const staysHere = (address: string): boolean =>
  !/[\s\\]/.test(address) && new URL(address, location.origin).origin === location.origin;

/** Where one goes after signing in: back to where one was, else staff to the workshop and buyers to their shelf. */
export function landing(session: Session, from: string | null = null): string {
  if (from !== null && from.startsWith('/') && staysHere(from)) return comeBackTo(from);
  return session.permissions.includes('workshop:enter') ? paths.workshop.overview.to() : paths.shelf.to();
}
