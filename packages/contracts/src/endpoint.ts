import type { z } from 'zod';
import type { Permission } from './permissions.js';

/** Who may call: everybody, anybody signed in, or those whose role carries a permission. */
export type Access = 'public' | 'signed-in' | Permission;

/**
 * One route of the API. The server validates `params`, `query` and `body` with these schemas, strips
 * its answer to `response`, guards the route by `access` and describes itself with `summary`.
 * `response: null` is an answer without a body, `'stream'` one that is not JSON.
 */
export interface EndpointDefinition {
  readonly access: Access;
  readonly summary: string;
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  readonly response: z.ZodType | null | 'stream';
  /** Answered with this status instead of 200 (204 without a body). */
  readonly status?: number;
  /** Unsafe methods are refused without the shop's own header; a signed call from outside needs none. */
  readonly isCalledFromOutside?: boolean;
}

export const endpoint = <const D extends EndpointDefinition>(definition: D): D => definition;

type Part<D, K extends string, Side extends 'in' | 'out'> = D extends {
  readonly [P in K]: infer S extends z.ZodType;
}
  ? { readonly [P in K]: Side extends 'in' ? z.input<S> : z.output<S> }
  : unknown;

/** What a caller sends: `{params, query, body}`, each only where the endpoint has it. */
export type CallInput<D> = Part<D, 'params', 'in'> & Part<D, 'query', 'in'> & Part<D, 'body', 'in'>;
/** What a handler receives after validation. */
export type HandlerInput<D> = Part<D, 'params', 'out'> & Part<D, 'query', 'out'> & Part<D, 'body', 'out'>;
/** What a caller gets. */
export type CallOutput<D> = D extends { readonly response: infer R }
  ? R extends z.ZodType
    ? z.output<R>
    : R extends null
      ? void
      : unknown
  : never;
/** What a handler returns, before it is stripped to the schema. */
export type HandlerOutput<D> = D extends { readonly response: infer R }
  ? R extends z.ZodType
    ? z.input<R>
    : void
  : never;
