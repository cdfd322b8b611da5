import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { MeshComparisons, type MeshPair } from './mesh-comparisons.js';

/** Parts of a revision beside those of the same code in earlier ones, where both are measured and differ. */
const PAIRS = `SELECT DISTINCT old_file.sha256 AS beforeSha, new_file.sha256 AS afterSha
  FROM revisions later
  JOIN parts new_part ON new_part.revision_id = later.id
  JOIN revision_files new_file ON new_file.id = new_part.file_id
  JOIN measurements new_mesh ON new_mesh.sha256 = new_file.sha256 AND new_mesh.state = 'measured'
  JOIN revisions earlier ON earlier.kit_id = later.kit_id AND earlier.state IN ('released', 'withdrawn')
    AND (earlier.mark < later.mark OR (earlier.mark = later.mark AND earlier.issue < later.issue))
  JOIN parts old_part ON old_part.revision_id = earlier.id AND old_part.code = new_part.code
  JOIN revision_files old_file ON old_file.id = old_part.file_id
  JOIN measurements old_mesh ON old_mesh.sha256 = old_file.sha256 AND old_mesh.state = 'measured'
  WHERE old_file.sha256 <> new_file.sha256 AND NOT (old_mesh.geometry_hash <=> new_mesh.geometry_hash)`;

/** What buyers hold when a draft goes out: marks are given against that revision. */
const WITH_THE_LAST = `AND NOT EXISTS (SELECT 1 FROM revisions between_them
  WHERE between_them.kit_id = later.kit_id AND between_them.state IN ('released', 'withdrawn')
    AND (between_them.mark > earlier.mark OR (between_them.mark = earlier.mark AND between_them.issue > earlier.issue))
    AND (between_them.mark < later.mark OR (between_them.mark = later.mark AND between_them.issue < later.issue)))`;

/** Has the meshes compared that somebody is going to ask about. */
@Injectable()
export class QueueComparisons {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly comparisons: MeshComparisons,
  ) {}

  /** A draft has other parts now. */
  async ofDraft(tx: Tx, revisionId: string): Promise<void> {
    const sql = `${PAIRS} ${WITH_THE_LAST} AND later.id = :revisionId`;
    await this.comparisons.want(tx, await this.pairs(tx, sql, { revisionId }));
  }

  /** A file was sent to a draft; what failed with it through no fault of the files is tried again. */
  async ofSentFile(tx: Tx, revisionId: string, sha256: string): Promise<void> {
    const sql = `${PAIRS} ${WITH_THE_LAST} AND later.id = :revisionId AND new_file.sha256 = :sha256`;
    await this.comparisons.want(tx, await this.pairs(tx, sql, { revisionId, sha256 }), { isAnew: true });
  }

  /** A file that drafts hold is measured now. */
  async ofMeasuredFile(tx: Tx, sha256: string): Promise<void> {
    const sql = `${PAIRS} ${WITH_THE_LAST} AND later.state IN ('draft', 'proving') AND new_file.sha256 = :sha256`;
    await this.comparisons.want(tx, await this.pairs(tx, sql, { sha256 }));
  }

  /** A revision goes out: whoever holds an older one reads on the shelf what differs from that one. */
  async ofRelease(tx: Tx, revisionId: string): Promise<void> {
    const sql = `${PAIRS} AND later.id = :revisionId`;
    await this.comparisons.want(tx, await this.pairs(tx, sql, { revisionId }));
  }

  private pairs(tx: Tx, sql: string, values: Record<string, unknown>): Promise<MeshPair[]> {
    return selectRows<MeshPair>(this.database, sql, values, tx);
  }
}
