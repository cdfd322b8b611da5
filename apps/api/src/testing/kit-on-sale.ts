import { randomUUID } from 'node:crypto';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { TestApp } from './test-app.js';

export interface KitOnSale {
  readonly kitId: string;
  readonly slug: string;
  readonly name: string;
  readonly licenceId: string;
  readonly revisionId: string;
}

/** A listed kit with one released revision and one offered licence, written straight to the tables. */
export const putKitOnSale = async (
  shop: TestApp,
  { name = 'Curlew', priceMinor = 2400 }: { name?: string; priceMinor?: number } = {},
): Promise<KitOnSale> => {
  const [kitId, licenceId, revisionId] = [newId(), newId(), newId()];
  const slug = `${name.toLowerCase().replaceAll(/[^a-z]+/g, '-')}-${randomUUID().slice(0, 8)}`;
  const values = { kitId, licenceId, revisionId, slug, name, priceMinor, now: shop.clock.now() };
  const write = (sql: string) => touchRows(shop.database, sql, values);
  await write(
    `INSERT INTO kits (id, slug, name, tagline, description, colour, is_listed, newest_revision_id, created_at, updated_at)
     VALUES (:kitId, :slug, :name, 'A flute of reeds', 'Printed in one evening.', 'teal', TRUE, :revisionId, :now, :now)`,
  );
  await write(
    `INSERT INTO licences (id, kit_id, kind, name, terms, price_minor, created_at, updated_at)
     VALUES (:licenceId, :kitId, 'personal', 'Personal prints', 'Print for yourself.', :priceMinor, :now, :now)`,
  );
  await write(
    `INSERT INTO revisions (id, kit_id, mark, issue, state, assembly_notes, change_notes, cautions, print_spec, hardware,
       build_volume, declared_cents, room, bundle_sha256, bundle_bytes, released_at, created_at, updated_at)
     VALUES (:revisionId, :kitId, 1, 4, 'released', '', '', '', '{}', '[]', '{"xMm":220,"yMm":220,"zMm":250}', 10, '{"temperatureC":20}',
       REPEAT('a', 64), 1000, :now, :now, :now)`,
  );
  return { kitId, slug, name, licenceId, revisionId };
};
