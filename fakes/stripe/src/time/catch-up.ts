import type { StandIn } from '../stand-in.js';
import { duesOf, type Due } from './dues.js';

/**
 * Lets everything happen that fell due since the last look, in its order and each thing at its own moment:
 * time may have been moved on by months.
 */
export function catchUp(standIn: StandIn): void {
  const untilMs = standIn.clock.flowingMs();
  let hasChanged = false;
  for (let due = firstOf(duesOf(standIn), untilMs); due; due = firstOf(duesOf(standIn), untilMs)) {
    standIn.clock.at(due.atMs, due.run);
    hasChanged = true;
  }
  if (hasChanged) standIn.save();
}

/** The earliest, where one is due by then; among those of one moment, the one that was there first. */
export function firstOf(dues: Iterable<Due>, untilMs: number): Due | null {
  let first: Due | null = null;
  for (const due of dues) {
    if (due.atMs <= untilMs && (!first || due.atMs < first.atMs)) first = due;
  }
  return first;
}
