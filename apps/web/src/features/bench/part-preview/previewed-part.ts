import type { KitPart, Part } from '@windchest/contracts';
import { apiAddress } from '../../../lib/api-address.js';
import type { PreviewedPart } from './part-turner.js';

/** A part of a kit on sale as it can be turned about; null where no likeness was made yet. */
export function previewOfKitPart(slug: string, part: KitPart): PreviewedPart | null {
  const { code, name, sizeMm, drawing, previewBytes, previewSha256 } = part;
  if (previewBytes === null || previewSha256 === null) return null;
  const address = apiAddress('GET /kits/:slug/parts/:code/preview', {
    params: { slug, code },
    query: { v: previewSha256 },
  });
  return { code, name, sizeMm, drawing, bytes: previewBytes, address };
}

/** The same for a part of any revision, in the workshop. */
export function previewOfPart(
  revisionId: string,
  part: Part,
  drawing: PreviewedPart['drawing'],
): PreviewedPart | null {
  const { id, code, name, file, previewBytes, previewSha256 } = part;
  if (previewBytes === null || previewSha256 === null || !file?.measurement) return null;
  const address = apiAddress('GET /workshop/revisions/:revisionId/parts/:partId/preview', {
    params: { revisionId, partId: id },
    query: { v: previewSha256 },
  });
  const { sizeMm } = file.measurement;
  return { code, name, sizeMm, drawing, bytes: previewBytes, address };
}
