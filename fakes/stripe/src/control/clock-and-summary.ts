import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import type { StandIn } from '../stand-in.js';

/** `advanceSeconds` moves on from where it is; `now` (unix seconds or ISO 8601) sets it; `real: true` undoes both. */
export function moveClock(standIn: StandIn, fields: Fields): void {
  fields.allowOnly('advanceSeconds', 'now', 'real');
  const { clock } = standIn;
  const now = fields.string('now');
  if (fields.boolean('real')) clock.offsetMs = 0;
  if (now !== null) {
    const ms = /^\d+$/.test(now) ? Number(now) * 1000 : Date.parse(now);
    if (Number.isNaN(ms))
      throw badParameter('now', `now must be unix seconds or an ISO 8601 time, not "${now}".`);
    clock.offsetMs = ms - Date.now();
  }
  clock.offsetMs += (fields.integer('advanceSeconds') ?? 0) * 1000;
}

/** What is in the stand-in, at a glance. */
export function summary(standIn: StandIn) {
  const { state, clock, settings } = standIn;
  const byStatus = (entries: readonly { status?: string | null }[]) => {
    const counts: Record<string, number> = {};
    for (const { status } of entries) counts[status ?? 'none'] = (counts[status ?? 'none'] ?? 0) + 1;
    return counts;
  };
  return {
    clock: {
      now: clock.nowSeconds(),
      iso: new Date(clock.flowingMs()).toISOString(),
      offsetSeconds: clock.offsetMs / 1000,
    },
    sessions: byStatus(state.sessions.oldestFirst()),
    paymentIntents: byStatus(state.paymentIntents.oldestFirst()),
    refunds: byStatus(state.refunds.oldestFirst()),
    disputes: byStatus(state.disputes.oldestFirst()),
    subscriptions: byStatus(state.subscriptions.oldestFirst()),
    invoices: byStatus(state.invoices.oldestFirst()),
    billing: state.billing,
    customers: state.customers.size,
    events: state.events.size,
    webhooks: {
      ...state.switches,
      url: settings.webhookUrl,
      waiting: state.deliveries.size,
      attempts: state.attempts.length,
    },
    api: { latencyMs: settings.latencyMs },
  };
}
