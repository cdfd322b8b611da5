import type { EndpointKey, OutputOf } from '@windchest/contracts';
import useSWR, { type KeyedMutator, type SWRConfiguration } from 'swr';
import type { ApiFault } from './api-fault.js';
import { call, type CallArguments, type CallInput, keyOf } from './api-client.js';

export interface Answered<T> {
  data: T | undefined;
  fault: ApiFault | undefined;
  /** The first answer is on its way. */
  isLoading: boolean;
  /** A fresher answer is on its way. */
  isRefreshing: boolean;
  mutate: KeyedMutator<T>;
}

export type Asking<T> = SWRConfiguration<T, ApiFault>;

/** Reads one endpoint; `null` in place of the input asks nothing yet. */
export function useEndpoint<K extends EndpointKey>(
  key: K,
  input: CallInput<K> | null = {} as CallInput<K>,
  options: Asking<OutputOf<K>> = {},
): Answered<OutputOf<K>> {
  const args = [input ?? undefined] as CallArguments<K>;
  const { data, error, isLoading, isValidating, mutate } = useSWR<OutputOf<K>, ApiFault>(
    input === null ? null : keyOf(key, ...args),
    () => call(key, ...args),
    options,
  );
  return { data, fault: error, isLoading, isRefreshing: isValidating, mutate };
}
