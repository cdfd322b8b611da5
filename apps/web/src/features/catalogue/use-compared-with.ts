import { useSearchParams } from 'react-router-dom';

export interface ComparedWith {
  /** The earlier revision asked for; the last released where there is none. */
  withId: string | undefined;
  isOnlyChanged: boolean;
  /** Keeps the rest of the address. */
  change: (to: { with?: string; only?: 'changed' | '' }) => void;
}

/** With what a revision is compared, and what of it is shown: both stand in the address. */
export function useComparedWith(): ComparedWith {
  const [params, setParams] = useSearchParams();
  return {
    withId: params.get('with') ?? undefined,
    isOnlyChanged: params.get('only') === 'changed',
    change: (to) =>
      setParams(
        (now) => {
          const next = new URLSearchParams(now);
          for (const [name, value] of Object.entries(to))
            if (value) next.set(name, value);
            else next.delete(name);
          return next;
        },
        { replace: true },
      ),
  };
}
