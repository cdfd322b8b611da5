import { useEffect } from 'react';
import { storedValue, useStoredValue } from './stored-value.js';

export const schemeChoices = ['light', 'dark', 'system'] as const;
export type SchemeChoice = (typeof schemeChoices)[number];

/** `public/colour-scheme.js` reads the same key before the first paint. */
export const colourScheme = storedValue<SchemeChoice>({
  key: 'windchest.colour-scheme',
  read: (text) => (text === 'light' || text === 'dark' ? text : 'system'),
  write: (choice) => (choice === 'system' ? null : choice),
});

export const isDark = (choice: SchemeChoice, systemIsDark: boolean): boolean =>
  choice === 'dark' || (choice === 'system' && systemIsDark);

/** Keeps the page in the chosen scheme, and in the system's own while none is chosen. */
export function useColourScheme(): [SchemeChoice, (choice: SchemeChoice) => void] {
  const choice = useStoredValue(colourScheme);
  useEffect(() => {
    const system = matchMedia('(prefers-color-scheme: dark)');
    const apply = () => document.documentElement.classList.toggle('dark', isDark(choice, system.matches));
    apply();
    system.addEventListener('change', apply);
    return () => system.removeEventListener('change', apply);
  }, [choice]);
  return [choice, colourScheme.set];
}
