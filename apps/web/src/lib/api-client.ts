import type { EndpointKey, InputOf, OutputOf } from '@windchest/contracts';
import { apiAddress } from './api-address.js';
import { faultOf, unreachable } from './api-fault.js';

/** Browsers of another site cannot send this header unasked; the API refuses unsafe methods without it. */
export const ownHeader = { 'X-Windchest': '1' } as const;

type WithLooseQuery<I> = I extends { query: infer Q }
  ? object extends Q
    ? Omit<I, 'query'> & { query?: Q }
    : I
  : I;
/** `{params, query, body}`, each only where the endpoint has it; a query of optional values may be left out. */
export type CallInput<K extends EndpointKey> =
  unknown extends InputOf<K> ? object : WithLooseQuery<InputOf<K>>;
export type CallArguments<K extends EndpointKey> =
  object extends CallInput<K> ? [input?: CallInput<K>] : [input: CallInput<K>];

interface AnyInput {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
}

/** Asks one endpoint of the API. Throws ApiFault, and nothing else, when it says no or cannot be reached. */
export async function call<K extends EndpointKey>(
  key: K,
  ...[input]: CallArguments<K>
): Promise<OutputOf<K>> {
  const { params, query, body } = (input ?? {}) as AnyInput;
  const method = key.slice(0, key.indexOf(' '));
  const response = await fetch(apiAddress(key, { params, query }), {
    method,
    credentials: 'same-origin',
    headers: {
      Accept: 'application/json, application/problem+json',
      ...(method !== 'GET' && ownHeader),
      ...(body !== undefined && { 'Content-Type': 'application/json' }),
    },
    ...(body !== undefined && { body: JSON.stringify(body) }),
  }).catch(() => {
    throw unreachable();
  });
  if (!response.ok) throw await faultOf(response);
  const text = await response.text().catch(() => {
    throw unreachable();
  });
  return (text ? JSON.parse(text) : undefined) as OutputOf<K>;
}

/** The cache key of a question; the same builder serves reading and revalidating. */
export const keyOf = <K extends EndpointKey>(key: K, ...[input]: CallArguments<K>) =>
  [key, input ?? null] as const;
