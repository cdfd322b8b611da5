import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Clearance } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { meshPairsOf, type PartMeshes } from './compare-parts.js';
import { MeshComparisons, type MeshPair } from './mesh-comparisons.js';

interface EarlierRow {
  laterId: string;
  earlierId: string;
}
interface MeshRow {
  revisionId: string;
  code: string;
  clearance: Clearance;
  sha256: string;
  geometryHash: string | null;
  state: string | null;
}

/** Released revisions before some others of their kits, newest first. */
const EARLIER = `SELECT later.id AS laterId, earlier.id AS earlierId
  FROM revisions later JOIN revisions earlier ON earlier.kit_id = later.kit_id AND earlier.state IN ('released', 'withdrawn')
    AND (earlier.mark < later.mark OR (earlier.mark = later.mark AND earlier.issue < later.issue))
  WHERE later.id IN (:ids) ORDER BY earlier.mark DESC, earlier.issue DESC`;

/** The meshes of parts, without what they measure and how they are drawn. */
const MESHES = `SELECT p.revision_id AS revisionId, p.code, 'zero' AS clearance, f.sha256, m.geometry_hash AS geometryHash, m.state
    FROM parts p JOIN revision_files f ON f.id = p.file_id LEFT JOIN measurements m ON m.sha256 = f.sha256
    WHERE p.revision_id IN (:ids)
  UNION ALL
  SELECT v.revision_id, p.code, v.clearance, f.sha256, m.geometry_hash, m.state
    FROM part_variants v JOIN parts p ON p.id = v.part_id
    JOIN revision_files f ON f.id = v.file_id LEFT JOIN measurements m ON m.sha256 = f.sha256
    WHERE v.revision_id IN (:ids)`;

/** Has the meshes compared that somebody is going to ask about. */
@Injectable()
export class QueueComparisons {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly comparisons: MeshComparisons,
  ) {}

  /** A draft has other parts now. Marks are given against what buyers hold: the last released revision. */
  async ofDraft(tx: Tx, revisionId: string): Promise<void> {
    await this.comparisons.want(tx, await this.pairs(tx, [revisionId], 'last'));
  }

  /** A file was sent to a draft; what failed with it through no fault of the files is tried again. */
  async ofSentFile(tx: Tx, revisionId: string, sha256: string): Promise<void> {
    const pairs = await this.pairs(tx, [revisionId], 'last');
    await this.comparisons.want(
      tx,
      pairs.filter((pair) => pair.afterSha === sha256),
      { isAnew: true },
    );
  }

  /** A file that drafts hold is measured now. */
  async ofMeasuredFile(tx: Tx, sha256: string): Promise<void> {
    const drafts = await selectRows<{ id: string }>(
      this.database,
      `SELECT DISTINCT r.id FROM revision_files f JOIN revisions r ON r.id = f.revision_id
       WHERE f.sha256 = :sha256 AND r.state IN ('draft', 'proving')`,
      { sha256 },
      tx,
    );
    const ids = drafts.map((draft) => draft.id);
    const pairs = await this.pairs(tx, ids, 'last');
    await this.comparisons.want(
      tx,
      pairs.filter((pair) => pair.afterSha === sha256),
    );
  }

  /** A revision goes out: whoever holds an older one reads on the shelf what differs from that one. */
  async ofRelease(tx: Tx, revisionId: string): Promise<void> {
    await this.comparisons.want(tx, await this.pairs(tx, [revisionId], 'all'));
  }

  private async pairs(tx: Tx, ids: readonly string[], which: 'last' | 'all'): Promise<MeshPair[]> {
    if (ids.length === 0) return [];
    const rows = await selectRows<EarlierRow>(this.database, EARLIER, { ids }, tx);
    const steps =
      which === 'all' ? rows : rows.filter((row) => rows.find((one) => one.laterId === row.laterId) === row);
    if (steps.length === 0) return [];
    const parts = await this.partsOf(tx, [...ids, ...steps.map((step) => step.earlierId)]);
    const pairs = steps.flatMap(({ laterId, earlierId }) =>
      [...(parts.get(laterId) ?? [])].flatMap(([code, part]) =>
        meshPairsOf(parts.get(earlierId)?.get(code) ?? null, part),
      ),
    );
    return [...new Map(pairs.map((pair) => [`${pair.beforeSha} ${pair.afterSha}`, pair])).values()];
  }

  /** By revision, then by code. */
  private async partsOf(tx: Tx, ids: readonly string[]): Promise<Map<string, Map<string, PartMeshes>>> {
    const revisions = new Map<string, Map<string, PartMeshes>>();
    for (const row of await selectRows<MeshRow>(this.database, MESHES, { ids: [...new Set(ids)] }, tx)) {
      const { revisionId, code, clearance, sha256, geometryHash } = row;
      const parts = revisions.get(revisionId) ?? new Map<string, PartMeshes>();
      const { file, variants } = parts.get(code) ?? { file: null, variants: [] };
      const mesh = { sha256, geometryHash, measured: row.state === 'measured' || null };
      parts.set(
        code,
        clearance === 'zero'
          ? { file: mesh, variants }
          : { file, variants: [...variants, { clearance, file: mesh }] },
      );
      revisions.set(revisionId, parts);
    }
    return revisions;
  }
}
