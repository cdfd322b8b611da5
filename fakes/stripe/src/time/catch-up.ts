import type { StandIn } from '../stand-in.js';
import { arrive } from '../resources/test-clocks.js';
import { billingDuesOf, duesOf, type Due } from './dues.js';

/**
 * Lets everything happen that fell due since the last look, in its order and each thing at its own moment:
 * time may have been moved on by months.
 */
export function catchUp(standIn: StandIn): void {
  const hasRun = runDue(standIn, () => duesOf(standIn), standIn.clock.flowingMs());
  const hasArrived = advanceClocks(standIn);
  if (hasRun || hasArrived) standIn.save();
}

/** Test clocks that are on their way arrive, by way of all that falls due before. */
function advanceClocks(standIn: StandIn): boolean {
  let hasArrived = false;
  for (const clock of standIn.state.testClocks.oldestFirst()) {
    const target = clock.status_details.advancing?.target_frozen_time;
    if (clock.status !== 'advancing' || target === undefined || !standIn.hasArrived(clock.id)) continue;
    runDue(standIn, () => billingDuesOf(standIn, clock.id), target * 1000);
    arrive(standIn, clock, target);
    hasArrived = true;
  }
  return hasArrived;
}

function runDue(standIn: StandIn, dues: () => Iterable<Due>, untilMs: number): boolean {
  let hasRun = false;
  for (let due = firstOf(dues(), untilMs); due; due = firstOf(dues(), untilMs)) {
    standIn.clock.at(due.atMs, due.run);
    hasRun = true;
  }
  return hasRun;
}

/** The earliest, where one is due by then; among those of one moment, the one that was there first. */
function firstOf(dues: Iterable<Due>, untilMs: number): Due | null {
  let first: Due | null = null;
  for (const due of dues) {
    if (due.atMs <= untilMs && (!first || due.atMs < first.atMs)) first = due;
  }
  return first;
}
