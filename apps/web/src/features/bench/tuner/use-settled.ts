import { useEffect, useState } from 'react';

/** The words once they have stood for a while, for what is read out: a pitch moves with every frame. */
export function useSettled(words: string, afterMs = 900): string {
  const [settled, setSettled] = useState('');
  useEffect(() => {
    const timer = setTimeout(() => setSettled(words), afterMs);
    return () => clearTimeout(timer);
  }, [words, afterMs]);
  return settled;
}
