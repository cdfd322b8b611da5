import type { EntitlementSource, EntitlementState } from './entitlement.model.js';

/** The time in which a revision must have been released; null is no bound. */
export interface ReleaseBounds {
  readonly releasedFrom: Date | null;
  readonly releasedBefore: Date | null;
}

/** What is known of a person's claim on a file before it is handed out. */
export interface DownloadClaim {
  readonly kitId: string;
  readonly revision: {
    readonly kitId: string;
    readonly releasedAt: Date | null;
    readonly isReleased: boolean;
    readonly isWithdrawn: boolean;
  };
  /** The entitlements of this person, or of the order behind a mailed link; nobody else's. */
  readonly entitlements: readonly (ReleaseBounds & {
    readonly id: string;
    readonly kitId: string;
    readonly source: EntitlementSource;
    readonly state: EntitlementState;
  })[];
}

export type DownloadDecision =
  | { readonly isAllowed: true; readonly entitlementId: string }
  | {
      readonly isAllowed: false;
      readonly why:
        | 'not-entitled'
        | 'suspended'
        | 'pledge-rests'
        | 'ended'
        | 'pledge-ended'
        | 'outside-pledge'
        | 'not-released'
        | 'withdrawn';
    };

/** Whether a revision's release lies within the bounds: what stays after a pledge is told apart by it. */
export const covers = ({ releasedFrom, releasedBefore }: ReleaseBounds, releasedAt: Date | null): boolean =>
  releasedFrom === null && releasedBefore === null
    ? true
    : releasedAt !== null &&
      (releasedFrom === null || releasedAt >= releasedFrom) &&
      (releasedBefore === null || releasedAt < releasedBefore);

/**
 * May this person download this file? Yes, with an active entitlement to the kit, whatever its source,
 * for any released revision of it: later revisions are included. After a pledge only those revisions stay
 * that its bounds cover. A draft or a withdrawn revision goes out to nobody.
 */
export const mayDownload = ({ kitId, revision, entitlements }: DownloadClaim): DownloadDecision => {
  const theirs = entitlements.filter((one) => one.kitId === kitId);
  if (revision.kitId !== kitId || theirs.length === 0) return { isAllowed: false, why: 'not-entitled' };
  const active = theirs.filter((one) => one.state === 'active');
  if (active.length === 0) return { isAllowed: false, why: whyNone(theirs) };
  if (revision.isWithdrawn) return { isAllowed: false, why: 'withdrawn' };
  if (!revision.isReleased) return { isAllowed: false, why: 'not-released' };
  const covering = active.find((one) => covers(one, revision.releasedAt));
  return covering
    ? { isAllowed: true, entitlementId: covering.id }
    : { isAllowed: false, why: 'outside-pledge' };
};

/** What may come back is named before what is over, and what was bought before what was pledged. */
const whyNone = (
  theirs: DownloadClaim['entitlements'],
): Exclude<DownloadDecision, { isAllowed: true }>['why'] => {
  const suspended = theirs.filter((one) => one.state === 'suspended');
  if (suspended.some((one) => one.source !== 'pledge')) return 'suspended';
  if (suspended.length > 0) return 'pledge-rests';
  return theirs.some((one) => one.source !== 'pledge') ? 'ended' : 'pledge-ended';
};
