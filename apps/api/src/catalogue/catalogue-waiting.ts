import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';

export interface WaitingDraft {
  readonly kitId: string;
  readonly revisionId: string;
  /** "Curlew Mk 1.5" */
  readonly label: string;
  readonly refusedFiles: number;
}

/** What of the catalogue waits for staff: drafts, and files in them that could not be measured. */
@Injectable()
export class CatalogueWaiting {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async drafts(limit = 10): Promise<WaitingDraft[]> {
    const rows = await selectRows<WaitingDraft>(
      this.database,
      `SELECT k.id AS kitId, r.id AS revisionId, CONCAT(k.name, ' Mk ', r.mark, '.', r.issue) AS label,
         (SELECT COUNT(*) FROM revision_files f JOIN measurements m ON m.sha256 = f.sha256
          WHERE f.revision_id = r.id AND m.state = 'refused') AS refusedFiles
       FROM revisions r JOIN kits k ON k.id = r.kit_id
       WHERE r.state IN ('draft', 'proving') ORDER BY r.updated_at DESC LIMIT :limit`,
      { limit },
    );
    return rows.map((row) => ({ ...row, refusedFiles: Number(row.refusedFiles) }));
  }
}
