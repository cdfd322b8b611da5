import type { Clearance } from '@windchest/contracts';
import type { Licence } from '../kits/licence.model.js';
import type { FileOfRevision, PartOfRevision } from '../revisions/revision-contents.js';
import type { Revision } from '../revisions/revision.model.js';

/** A file of a bundle: words made here, or contents from the storage. */
export type BundleEntry = { readonly path: string; readonly sha256: string; readonly bytes: number } & (
  { readonly contents: Buffer } | { readonly storageKey: string }
);

export interface BundleSource {
  readonly kit: { readonly slug: string; readonly name: string };
  readonly revision: Revision;
  readonly parts: readonly PartOfRevision[];
  readonly files: readonly FileOfRevision[];
  readonly licences: readonly Licence[];
  /** The typeset build book, a PDF. */
  readonly buildBook?: Buffer;
  /** Of a bundle that holds only what is to print again: what that is, in words. */
  readonly reprintList?: string;
  /** Holds this clearance alone of parts that come in several; left out it holds all of them. */
  readonly clearance?: Clearance;
}
