import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { TestApp } from './test-app.js';

/** A released revision with parts that have no files, written straight to the tables. @returns its id */
export const putRevision = async (
  shop: TestApp,
  kitId: string,
  { issue, partCodes }: { issue: number; partCodes: readonly string[] },
): Promise<string> => {
  const id = newId();
  const write = (sql: string, values: Record<string, unknown> = {}) =>
    touchRows(shop.database, sql, { id, kitId, issue, now: shop.clock.now(), ...values });
  await write(
    `INSERT INTO revisions (id, kit_id, mark, issue, state, assembly_notes, change_notes, cautions, print_spec, hardware,
       build_volume, declared_cents, room, created_at, updated_at)
     VALUES (:id, :kitId, 1, :issue, 'draft', '', '', '', '{}', '[]', '{"xMm":220,"yMm":220,"zMm":250}', 10,
       '{"temperatureC":20}', :now, :now)`,
  );
  for (const code of partCodes)
    await write(
      `INSERT INTO parts (id, revision_id, code, name, created_at, updated_at)
       VALUES (:partId, :id, :code, CONCAT('Part ', :code), :now, :now)`,
      { partId: newId(), code },
    );
  await write(
    `UPDATE revisions SET state = 'released', bundle_sha256 = REPEAT('b', 64), bundle_bytes = 1000, released_at = :now
     WHERE id = :id`,
  );
  return id;
};

/** Puts a kit on somebody's shelf. */
export const putOnShelf = (
  shop: TestApp,
  person: { id: string; email: string },
  kitId: string,
  heldRevisionId: string | null = null,
): Promise<number> =>
  touchRows(
    shop.database,
    `INSERT INTO entitlements (id, person_id, email, kit_id, source, held_revision_id, held_since, created_at, updated_at)
     VALUES (:id, :personId, :email, :kitId, 'staff', :heldRevisionId, IF(:heldRevisionId IS NULL, NULL, :now), :now, :now)`,
    {
      id: newId(),
      personId: person.id,
      email: person.email,
      kitId,
      heldRevisionId,
      now: shop.clock.now(),
    },
  );
