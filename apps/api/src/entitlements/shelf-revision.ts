import type { Answer } from '@windchest/contracts';
import type { ReleasedRevision } from '../catalogue/catalogue-reader.js';

type ShelfRevision = Answer<'GET /shelf/:slug'>['newest'];

export const toShelfRevision = (revision: ReleasedRevision): ShelfRevision => ({
  id: revision.id,
  label: revision.label,
  releasedAt: revision.releasedAt.toISOString(),
  bundleBytes: revision.bundleBytes,
  bundleSha256: revision.bundleSha256,
  bundles: [...revision.bundles],
  changeNotes: revision.changeNotes,
  isWithdrawn: revision.isWithdrawn,
  withdrawnReason: revision.withdrawnReason,
});
