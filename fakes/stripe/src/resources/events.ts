import type Stripe from 'stripe';
import type { ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { Cause, StandIn } from '../stand-in.js';

/** The version of the API that the objects here have; it is the one of the SDK they are checked against. */
export const apiVersion = '2026-10-28.endive' satisfies Stripe.LatestApiVersion;

/**
 * Writes down that something happened, and starts its webhook. The event holds a copy: what becomes of
 * the object afterwards does not change it.
 */
export function emit<T extends Stripe.Event['type']>(
  standIn: StandIn,
  type: T,
  object: Extract<Stripe.Event, { type: T }>['data']['object'],
  cause: Cause,
  previousAttributes?: Extract<Stripe.Event, { type: T }>['data']['previous_attributes'],
): Stripe.Event {
  const event = {
    id: standIn.newId('evt'),
    object: 'event',
    api_version: apiVersion,
    created: standIn.clock.nowSeconds(),
    data: structuredClone({
      object,
      ...(previousAttributes ? { previous_attributes: previousAttributes } : {}),
    }),
    livemode: false,
    pending_webhooks: 0,
    request: { id: cause?.requestId ?? null, idempotency_key: cause?.idempotencyKey ?? null },
    type,
    // The union of all events has one member a type; that `object` belongs to `type` is checked by the
    // parameters above, which the compiler cannot carry over to a member of the union.
  } as unknown as Stripe.Event;
  standIn.state.events.add(event);
  standIn.onEvent(event);
  return event;
}

export const eventRoutes: ApiRoute[] = [
  {
    method: 'get',
    path: '/v1/events/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.events, 'event', id);
    },
  },
  {
    method: 'get',
    path: '/v1/events',
    run: (call) => {
      call.fields.allowOnly(...pageParameters, 'type', 'types', 'created', 'delivery_success');
      const type = call.fields.string('type');
      const types = call.fields.strings('types');
      const isDelivered = call.fields.boolean('delivery_success');
      const wanted = type ? [type] : types;
      const isInTime = createdFilter(call.fields);
      const events = call.standIn.state.events
        .newestFirst()
        .filter((event) => wanted.length === 0 || wanted.some((name) => matches(event.type, name)))
        .filter((event) => isDelivered === null || (event.pending_webhooks === 0) === isDelivered)
        .filter(isInTime);
      return pageOf(call, events);
    },
  },
];

/** `charge.*` stands for all that begin with `charge.`. */
function matches(type: string, wanted: string): boolean {
  return wanted.endsWith('*') ? type.startsWith(wanted.slice(0, -1)) : type === wanted;
}
