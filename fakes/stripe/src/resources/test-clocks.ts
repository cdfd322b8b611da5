import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { badParameter, refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import { pageOf, pageParameters } from '../api/pages.js';
import type { StandIn } from '../stand-in.js';
import { emit } from './events.js';
import { forgetCustomer } from './customers.js';

const daysKept = 30;
/** How long a clock takes to arrive: long enough to be seen on its way. */
const travelMs = 30;

function createFromCall({ standIn, fields, cause }: ApiCall): Stripe.TestHelpers.TestClock {
  fields.allowOnly('frozen_time', 'name', 'expand');
  const now = standIn.clock.nowSeconds();
  const clock: Stripe.TestHelpers.TestClock = {
    id: standIn.newId('clock'),
    object: 'test_helpers.test_clock',
    created: now,
    deletes_after: now + daysKept * 86_400,
    frozen_time: fields.requiredInteger('frozen_time'),
    livemode: false,
    name: fields.string('name'),
    status: 'ready',
    status_details: {},
  };
  standIn.state.testClocks.add(clock);
  emit(standIn, 'test_helpers.test_clock.created', clock, cause);
  return clock;
}

/** Answers at once; the clock arrives a moment later. */
function advanceFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.TestHelpers.TestClock {
  fields.allowOnly('frozen_time', 'expand');
  const clock = existing(standIn.state.testClocks, 'test_clock', id);
  const target = fields.requiredInteger('frozen_time');
  if (clock.status !== 'ready') throw refused(`The test clock is ${clock.status} and cannot be advanced.`);
  if (target <= clock.frozen_time)
    throw badParameter('frozen_time', 'A test clock can only be advanced to a later time.');
  clock.status = 'advancing';
  clock.status_details = { advancing: { target_frozen_time: target } };
  emit(standIn, 'test_helpers.test_clock.advancing', clock, cause);
  standIn.sendOff(clock.id, travelMs);
  return clock;
}

function deleteFromCall({ standIn, id, fields, cause }: ApiCall): Stripe.TestHelpers.DeletedTestClock {
  fields.allowOnly();
  const clock = existing(standIn.state.testClocks, 'test_clock', id);
  for (const customer of standIn.state.customers.oldestFirst()) {
    if (customer.test_clock === id) forgetCustomer(standIn, customer, cause);
  }
  standIn.state.testClocks.remove(id);
  emit(standIn, 'test_helpers.test_clock.deleted', clock, cause);
  return { id, object: 'test_helpers.test_clock', deleted: true };
}

/** The clock has arrived, and all that fell due on the way has happened. */
export function arrive(standIn: StandIn, clock: Stripe.TestHelpers.TestClock, target: number): void {
  clock.frozen_time = target;
  clock.status = 'ready';
  clock.status_details = {};
  emit(standIn, 'test_helpers.test_clock.ready', clock, null);
}

export const testClockRoutes: ApiRoute[] = [
  { method: 'post', path: '/v1/test_helpers/test_clocks', run: createFromCall },
  {
    method: 'get',
    path: '/v1/test_helpers/test_clocks',
    run: (call) => {
      call.fields.allowOnly(...pageParameters);
      return pageOf(call, call.standIn.state.testClocks.newestFirst());
    },
  },
  {
    method: 'get',
    path: '/v1/test_helpers/test_clocks/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.testClocks, 'test_clock', id);
    },
  },
  { method: 'post', path: '/v1/test_helpers/test_clocks/:id/advance', run: advanceFromCall },
  { method: 'delete', path: '/v1/test_helpers/test_clocks/:id', run: deleteFromCall },
];
