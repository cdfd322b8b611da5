import { useEffect, useState } from 'react';

/**
 * A part of the program fetched after the page stands; undefined until it is here, or where it cannot be had.
 * `load` is made once, outside the component.
 */
export function useLoaded<T>(load: () => Promise<T>): T | undefined {
  const [loaded, setLoaded] = useState<{ value: T }>();
  useEffect(() => {
    let isGone = false;
    load().then(
      (value) => !isGone && setLoaded({ value }),
      () => undefined,
    );
    return () => {
      isGone = true;
    };
  }, [load]);
  return loaded?.value;
}
