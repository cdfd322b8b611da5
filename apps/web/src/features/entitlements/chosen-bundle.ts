import type { Clearance, ShelfKit } from '@windchest/contracts';
import type { Wish } from './use-download.js';

export interface ChosenBundle {
  wish: Wish;
  bytes: number;
  /** Null for the bundle that holds all there is. */
  clearance: Clearance | null;
}

/** What a person fetches of a revision: the clearance they print, where it comes in that, else the whole. */
export function chosenBundle(
  kit: Pick<ShelfKit, 'slug' | 'clearance'>,
  revision: ShelfKit['newest'],
): ChosenBundle {
  const own = revision.bundles.find((one) => one.clearance === kit.clearance.chosen);
  const whole = { kitSlug: kit.slug, revisionId: revision.id };
  return own
    ? { wish: { ...whole, clearance: own.clearance }, bytes: own.bytes, clearance: own.clearance }
    : { wish: whole, bytes: revision.bundleBytes, clearance: null };
}
