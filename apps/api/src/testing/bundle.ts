import { createHash, randomBytes } from 'node:crypto';
import { Readable } from 'node:stream';
import { keyOf, Storage } from '../adapters/storage/storage.js';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { KitOnSale } from './kit-on-sale.js';
import type { TestApp } from './test-app.js';

export interface StoredBundle {
  readonly revisionId: string;
  readonly bytes: Buffer;
  readonly sha256: string;
}

/** Releases a further revision of a kit whose bundle, of so many bytes, stands in the store. */
export const releaseWithBundle = async (
  shop: TestApp,
  kit: KitOnSale,
  issue: number,
  length = 200_000,
): Promise<StoredBundle> => {
  const bytes = randomBytes(length);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  await shop.app.get(Storage, { strict: false }).put(keyOf('bundles', sha256), Readable.from([bytes]));
  const values = { revisionId: newId(), kitId: kit.kitId, issue, sha256, length, now: shop.clock.now() };
  await touchRows(
    shop.database,
    `INSERT INTO revisions (id, kit_id, mark, issue, state, assembly_notes, change_notes, cautions, print_spec, hardware,
       build_volume, declared_cents, room, bundle_sha256, bundle_bytes, released_at, created_at, updated_at)
     VALUES (:revisionId, :kitId, 1, :issue, 'released', '', '', '', '{}', '[]', '{"xMm":220,"yMm":220,"zMm":250}', 12,
       '{"temperatureC":20}', :sha256, :length, :now, :now, :now)`,
    values,
  );
  await touchRows(
    shop.database,
    'UPDATE kits SET newest_revision_id = :revisionId WHERE id = :kitId',
    values,
  );
  return { revisionId: values.revisionId, bytes, sha256 };
};
