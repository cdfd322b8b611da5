import { Injectable } from '@nestjs/common';
import type { SqlPart } from '../database/sql-part.js';
import type { EntitlementSource } from './entitlement.model.js';

/** Owners of kits as parts of other rooms' queries. */
@Injectable()
export class ReaderParts {
  /**
   * One row for each person, or for each address that bought without an account: `reader` (which of the two),
   * `person_id`, `email`, `is_active`, `is_suspended`, the revision held (`held`, as the shelf has it: of the
   * entitlement whose files were fetched last), and `order_id` of what gives the right.
   */
  owners({ kitId, sources }: { kitId: string | null; sources: readonly EntitlementSource[] }): SqlPart {
    return {
      // The inner query names the reader first: grouping by an expression with a collation is refused.
      sql: `SELECT e.reader, MAX(e.person_id) AS person_id, MIN(e.email) AS email,
          MAX(e.state = 'active') AS is_active, MAX(e.state = 'suspended') AS is_suspended,
          SUBSTRING(MAX(CASE WHEN e.held_revision_id IS NOT NULL
            THEN CONCAT(e.state = 'active', COALESCE(DATE_FORMAT(e.held_since, '%Y%m%d%H%i%s%f'), REPEAT('0', 20)), e.held_revision_id) END), 22) AS held,
          MAX(CASE WHEN e.state = 'active' THEN e.order_id END) AS order_id
        FROM (SELECT COALESCE(CONVERT(person_id USING utf8mb4) COLLATE utf8mb4_unicode_ci, email) AS reader,
            person_id, email, state, held_revision_id, held_since, order_id
          FROM entitlements
          WHERE ${kitId ? 'kit_id = :ownedKitId' : 'TRUE'} AND ${sources.length > 0 ? 'source IN (:ownedBySources)' : 'TRUE'}) e
        GROUP BY e.reader`,
      values: { ownedKitId: kitId, ownedBySources: sources },
    };
  }
}
