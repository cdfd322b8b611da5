import type { EndpointKey, OutputOf } from '@windchest/contracts';
import { useCallback, useState } from 'react';
import { useSWRConfig } from 'swr';
import { ApiFault } from './api-fault.js';
import { call, type CallArguments } from './api-client.js';

export type Outcome<T> = { isDone: true; data: T } | { isDone: false; fault: ApiFault };

export interface Action<K extends EndpointKey> {
  /** Never throws an ApiFault: the outcome says how it went. */
  run: (...args: CallArguments<K>) => Promise<Outcome<OutputOf<K>>>;
  fault: ApiFault | undefined;
  isRunning: boolean;
  /** Forgets the last fault. */
  reset: () => void;
}

/** Whether a cached answer came from one of these endpoints, with whatever input. */
export const isAnswerOf =
  (endpoints: readonly EndpointKey[]) =>
  (cacheKey: unknown): boolean =>
    Array.isArray(cacheKey) && endpoints.includes(cacheKey[0] as EndpointKey);

/** Calls an endpoint that changes something, and has the answers it makes stale read again. */
export function useAction<K extends EndpointKey>(key: K, stale: readonly EndpointKey[] = []): Action<K> {
  const { mutate } = useSWRConfig();
  const [state, setState] = useState<{ fault?: ApiFault; isRunning: boolean }>({ isRunning: false });
  const staleNames = stale.join();

  const run = useCallback(
    async (...args: CallArguments<K>): Promise<Outcome<OutputOf<K>>> => {
      setState({ isRunning: true });
      try {
        const data = await call(key, ...args);
        if (staleNames) await mutate(isAnswerOf(staleNames.split(',') as EndpointKey[]));
        setState({ isRunning: false });
        return { isDone: true, data };
      } catch (thrown) {
        if (!(thrown instanceof ApiFault)) throw thrown;
        setState({ fault: thrown, isRunning: false });
        return { isDone: false, fault: thrown };
      }
    },
    [key, staleNames, mutate],
  );
  const reset = useCallback(() => setState({ isRunning: false }), []);
  return { run, reset, fault: state.fault, isRunning: state.isRunning };
}
