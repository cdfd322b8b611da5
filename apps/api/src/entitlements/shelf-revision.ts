import type { Answer } from '@windchest/contracts';

type ShelfRevision = Answer<'GET /shelf/:slug'>['newest'];

/** A released revision as the catalogue tells of it. */
export interface ReleasedRevision {
  id: string;
  label: string;
  releasedAt: Date;
  bundleSha256: string;
  bundleBytes: number;
  changeNotes: string;
  isWithdrawn: boolean;
}

export const toShelfRevision = (revision: ReleasedRevision): ShelfRevision => ({
  id: revision.id,
  label: revision.label,
  releasedAt: revision.releasedAt.toISOString(),
  bundleBytes: revision.bundleBytes,
  bundleSha256: revision.bundleSha256,
  changeNotes: revision.changeNotes,
  isWithdrawn: revision.isWithdrawn,
});
