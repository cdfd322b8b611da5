import type { Clearance } from '@windchest/contracts';
import { keyOf } from '../../adapters/storage/storage.js';

/** A stored file as it may be handed out: what to call it, what it is, where it stands. */
export interface ServableFile {
  readonly sha256: string;
  readonly bytes: number;
  readonly fileName: string;
  readonly storageKey: string;
  readonly contentType: string;
}

export const bundleName = (
  kitSlug: string,
  revision: { mark: number; issue: number },
  clearance?: Clearance | null,
): string =>
  `${kitSlug}-mk-${revision.mark}.${revision.issue}${clearance ? `-clearance-${clearance}` : ''}.zip`;

export const servable = (
  shelf: 'files' | 'bundles',
  file: Omit<ServableFile, 'storageKey'>,
): ServableFile => ({ ...file, storageKey: keyOf(shelf, file.sha256) });
