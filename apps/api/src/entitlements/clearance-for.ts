import type { Clearance } from '@windchest/contracts';

/**
 * The clearance a person prints a kit in: what they said for the kit, else the habit of their main printer's
 * card. Null where neither is known.
 */
export const clearanceFor = (
  entitlement: { readonly clearance: Clearance | null } | null,
  card: { readonly clearance: Clearance | null } | null,
): Clearance | null => entitlement?.clearance ?? card?.clearance ?? null;
