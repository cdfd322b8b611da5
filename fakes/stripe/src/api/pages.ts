import type Stripe from 'stripe';
import type { ApiCall } from './api-route.js';
import { badParameter } from './errors.js';
import type { Fields } from './fields.js';

export const pageParameters = ['limit', 'starting_after', 'ending_before', 'expand'] as const;

/**
 * One page of `entries`, which come newest first. `starting_after` goes on to older ones,
 * `ending_before` back to newer ones, as the SDK's auto-paging expects.
 */
export function pageOf<T extends { id: string }>(call: ApiCall, entries: readonly T[]): Stripe.ApiList<T> {
  const { fields } = call;
  const limit = fields.integer('limit') ?? 10;
  if (limit < 1 || limit > 100) throw badParameter('limit', 'This value must be between 1 and 100.');
  const after = fields.string('starting_after');
  const before = fields.string('ending_before');
  if (after && before) {
    throw badParameter('ending_before', 'Give starting_after or ending_before, not both.');
  }
  const list = (data: T[], hasMore: boolean) =>
    ({ object: 'list', url: call.path, has_more: hasMore, data }) satisfies Stripe.ApiList<T>;
  if (before) {
    const end = positionOf(entries, before, 'ending_before');
    return list(entries.slice(Math.max(0, end - limit), end), end > limit);
  }
  const start = after ? positionOf(entries, after, 'starting_after') + 1 : 0;
  return list(entries.slice(start, start + limit), entries.length > start + limit);
}

function positionOf(entries: readonly { id: string }[], id: string, param: string): number {
  const position = entries.findIndex((entry) => entry.id === id);
  if (position < 0) throw badParameter(param, `No such object in this list: '${id}'`, 'resource_missing');
  return position;
}

/** The test of `created`: a second, or a range of `gt`, `gte`, `lt`, `lte`. */
export function createdFilter(fields: Fields): (entry: { created: number }) => boolean {
  if (!fields.has('created')) return () => true;
  if (!fields.isNested('created')) {
    const second = fields.requiredInteger('created');
    return (entry) => entry.created === second;
  }
  const range = fields.object('created');
  range?.allowOnly('gt', 'gte', 'lt', 'lte');
  const gt = range?.integer('gt') ?? -Infinity;
  const gte = range?.integer('gte') ?? -Infinity;
  const lt = range?.integer('lt') ?? Infinity;
  const lte = range?.integer('lte') ?? Infinity;
  return ({ created }) => created > gt && created >= gte && created < lt && created <= lte;
}
