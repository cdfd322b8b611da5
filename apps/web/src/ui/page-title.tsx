import { createContext, useContext, useEffect } from 'react';

/** The workshop's name, or "Workshop" behind its door; layouts set it. */
export const TitleSuffix = createContext('');

/**
 * Names the page in the window's title. Set by hand: React's own `<title>` would be a second one beside the
 * one the server puts into the page for shared links.
 */
export function PageTitle({ title }: { title?: string }) {
  const suffix = useContext(TitleSuffix);
  useEffect(() => {
    const text = [title, suffix].filter(Boolean).join(' · ');
    if (text) document.title = text;
  }, [title, suffix]);
  return null;
}
