import { createHash } from 'node:crypto';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { TestApp } from './test-app.js';

export interface ShapedPart {
  readonly code: string;
  /** Parts of one code and one shape share their file. */
  readonly shape: string;
  readonly quantity?: number;
  readonly mark?: 'reprint needed' | 'reprint if it troubles you';
  readonly reason?: string;
}

/** A released revision whose parts have files of their own shapes, written straight to the tables. @returns its id */
export const putShapes = async (
  shop: TestApp,
  kitId: string,
  issue: number,
  parts: readonly ShapedPart[],
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
  for (const { code, shape, quantity = 1, mark = null, reason = '' } of parts) {
    const values = {
      sha: createHash('sha256').update(`${kitId} ${code} ${shape}`).digest('hex'),
      fileId: newId(),
      partId: newId(),
      code,
      quantity,
      mark,
      reason,
    };
    await write(
      `INSERT IGNORE INTO stored_files (sha256, bytes, kind, created_at) VALUES (:sha, 100, 'stl', :now)`,
      values,
    );
    await write(
      `INSERT INTO revision_files (id, revision_id, sha256, file_name, created_at) VALUES (:fileId, :id, :sha, CONCAT(:code, '.stl'), :now)`,
      values,
    );
    await write(
      `INSERT INTO parts (id, revision_id, file_id, code, name, quantity, reprint_mark, reprint_reason, created_at, updated_at)
       VALUES (:partId, :id, :fileId, :code, CONCAT('Part ', :code), :quantity, :mark, :reason, :now, :now)`,
      values,
    );
  }
  await write(
    `UPDATE revisions SET state = 'released', bundle_sha256 = REPEAT('b', 64), bundle_bytes = 1000, released_at = :now WHERE id = :id`,
  );
  await write('UPDATE kits SET newest_revision_id = :id WHERE id = :kitId');
  return id;
};
