import { useEffect, useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';

/** The secret in an address's fragment, `#token=…`; undefined where there is none or it is not whole. */
export const secretIn = (hash: string, name: string): string | undefined => {
  const value = new URLSearchParams(hash.replace(/^#/, '')).get(name);
  return value !== null && /^[A-Za-z0-9_-]{43}$/.test(value) ? value : undefined;
};

/**
 * A secret of a mailed link. It stands behind `#`, so no server on the way sees it; here it is taken out of the
 * address bar too, so that nobody reads it there, copies it along or finds it in the history.
 */
export function useHashSecret(name: string): string | undefined {
  const { hash, pathname, search } = useLocation();
  const navigate = useNavigate();
  const found = secretIn(hash, name);
  const [kept, setKept] = useState(found);
  if (found && found !== kept) setKept(found);
  useEffect(() => {
    if (found) void navigate(pathname + search, { replace: true, preventScrollReset: true });
  }, [found, navigate, pathname, search]);
  return found ?? kept;
}
