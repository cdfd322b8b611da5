import type { StandIn } from '../stand-in.js';

/** Works at the moment at which a test clock stands; without one, at the moment it is. */
export function inTimeOf<T>(standIn: StandIn, clockId: string | null, work: () => T): T {
  const clock = clockId === null ? undefined : standIn.state.testClocks.find(clockId);
  return clock ? standIn.clock.at(clock.frozen_time * 1000, work) : work();
}

/** The same by the clock that a customer is bound to. */
export function inTimeOfCustomer<T>(standIn: StandIn, customerId: string | null, work: () => T): T {
  const customer = customerId === null ? undefined : standIn.state.customers.find(customerId);
  return inTimeOf(standIn, (customer?.test_clock as string | null | undefined) ?? null, work);
}
