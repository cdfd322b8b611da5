import type { Comparison, Gate } from '@windchest/contracts';
import type { Licence } from '../kits/licence.model.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import type { Revision } from '../revisions/revision.model.js';

/** All that the release gates look at. */
export interface GateFacts {
  readonly revision: Pick<
    Revision,
    'assemblyNotes' | 'changeNotes' | 'cautions' | 'buildVolume' | 'declaredCents' | 'room'
  >;
  readonly parts: readonly PartOfRevision[];
  readonly licences: readonly Pick<Licence, 'isOffered' | 'terms'>[];
  /** Against what buyers hold now; null for the first revision. */
  readonly changes: Comparison['rows'] | null;
}

export type GateCheck = (facts: GateFacts) => Gate;

/**
 * What a maker may judge better than the check does: a leak that slicers close, a part cut in two on the
 * bed, a voice trimmed by ear, prints seen elsewhere. The rest is what buyers rely on or the law asks for.
 */
const mayBeWaived: ReadonlySet<Gate['name']> = new Set([
  'watertight',
  'fits-build-volume',
  'voices-in-tune',
  'proof-round',
]);

export const passed = (name: Gate['name'], reason: string): Gate => ({
  name,
  state: 'passed',
  reason,
  mayBeWaived: mayBeWaived.has(name),
  waiver: null,
});
export const open = (name: Gate['name'], reason: string): Gate => ({
  ...passed(name, reason),
  state: 'open',
});
export const notNeeded = (name: Gate['name'], reason: string): Gate => ({
  ...passed(name, reason),
  state: 'not-needed',
});

const MOST_NAMED = 6;
/** A few by name, the rest by number: "J-01, J-02 and 3 more". */
export const listed = (names: readonly string[]): string =>
  names.length <= MOST_NAMED
    ? names.join(', ')
    : `${names.slice(0, MOST_NAMED).join(', ')} and ${names.length - MOST_NAMED} more`;

export const counted = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`;
