import type { EntitlementState } from './entitlement.model.js';

/** What is known of a person's claim on a file before it is handed out. */
export interface DownloadClaim {
  readonly kitId: string;
  readonly revision: { readonly kitId: string; readonly isReleased: boolean; readonly isWithdrawn: boolean };
  /** The entitlements of this person, or of the order behind a mailed link; nobody else's. */
  readonly entitlements: readonly {
    readonly id: string;
    readonly kitId: string;
    readonly state: EntitlementState;
  }[];
}

export type DownloadDecision =
  | { readonly isAllowed: true; readonly entitlementId: string }
  | {
      readonly isAllowed: false;
      readonly why: 'not-entitled' | 'suspended' | 'ended' | 'not-released' | 'withdrawn';
    };

/**
 * May this person download this file? Yes, with an active entitlement to the kit, whatever its source,
 * for any released revision of it: later revisions are included. A draft or a withdrawn revision goes
 * out to nobody.
 */
export const mayDownload = ({ kitId, revision, entitlements }: DownloadClaim): DownloadDecision => {
  const theirs = entitlements.filter((one) => one.kitId === kitId);
  if (revision.kitId !== kitId || theirs.length === 0) return { isAllowed: false, why: 'not-entitled' };
  const active = theirs.find((one) => one.state === 'active');
  if (!active)
    return { isAllowed: false, why: theirs.some((one) => one.state === 'suspended') ? 'suspended' : 'ended' };
  if (revision.isWithdrawn) return { isAllowed: false, why: 'withdrawn' };
  if (!revision.isReleased) return { isAllowed: false, why: 'not-released' };
  return { isAllowed: true, entitlementId: active.id };
};
