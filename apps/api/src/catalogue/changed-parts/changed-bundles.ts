import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { touchRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { Kit } from '../kits/kit.model.js';
import { servable, type ServableFile } from '../release/stored-file-of.js';
import { Revision } from '../revisions/revision.model.js';
import { buildChangedParts } from './build-changed-parts.job.js';
import { ChangedBundle } from './changed-bundle.model.js';
import { hashOfNeed, type ChangedPartsNeed } from './changed-parts-need.js';

export interface ChangedBundleState {
  readonly state: ChangedBundle['state'];
  readonly percent: number;
  readonly fault: string | null;
  readonly file: { readonly sha256: string; readonly bytes: number } | null;
}

/** Bundles of changed parts: asked for, looked at, handed out. */
@Injectable()
export class ChangedBundles {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(ChangedBundle) private readonly bundles: typeof ChangedBundle,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly transactions: Transactions,
    private readonly storage: Storage,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  /** Null where nobody has asked for it yet. */
  async stateOf(need: ChangedPartsNeed): Promise<ChangedBundleState | null> {
    const row = await this.bundles.findByPk(hashOfNeed(need));
    return row && toState(row);
  }

  /** Has it built, unless it is there or on its way; what failed, or went astray, is built again. */
  async ask(kitId: string, need: ChangedPartsNeed): Promise<ChangedBundleState> {
    const needHash = hashOfNeed(need);
    const known = await this.bundles.findByPk(needHash);
    const isThere = known?.sha256
      ? (await this.storage.head(keyOf('bundles', known.sha256))) !== null
      : false;
    const values = {
      needHash,
      kitId,
      revisionId: need.revisionId,
      need: JSON.stringify(need),
      isAstray: known?.state === 'ready' && !isThere,
      now: this.clock.now(),
    };
    await this.transactions.run(async (tx) => {
      const added = await touchRows(
        this.database,
        `INSERT INTO changed_bundles (need_hash, kit_id, revision_id, need, created_at, used_at)
         VALUES (:needHash, :kitId, :revisionId, :need, :now, :now) ON DUPLICATE KEY UPDATE need_hash = need_hash`,
        values,
        tx,
      );
      const again =
        added === 1
          ? 0
          : await touchRows(
              this.database,
              `UPDATE changed_bundles SET state = 'waiting', percent = 0, fault = NULL, sha256 = NULL, bytes = NULL
               WHERE need_hash = :needHash AND (state = 'failed' OR (state = 'ready' AND :isAstray))`,
              values,
              tx,
            );
      if (added + again > 0) await this.jobs.add(tx, buildChangedParts, { needHash });
      await touchRows(
        this.database,
        'UPDATE changed_bundles SET used_at = :now WHERE need_hash = :needHash',
        values,
        tx,
      );
    });
    return toState((await this.bundles.findByPk(needHash, { rejectOnEmpty: true }))!);
  }

  /** A bundle of this revision as it may be handed out; asking for it counts as use. */
  async fileOf(revisionId: string, sha256: string): Promise<ServableFile | null> {
    const row = await this.bundles.findOne({ where: { revisionId, sha256, state: 'ready' } });
    const revision = row && (await this.revisions.findByPk(revisionId));
    const kit = revision && (await this.kits.findByPk(revision.kitId));
    if (!row || !kit) return null;
    await row.update({ usedAt: this.clock.now() });
    return servable('bundles', {
      sha256,
      bytes: row.bytes ?? 0,
      fileName: `${kit.slug}-mk-${revision.mark}.${revision.issue}-changed-parts.zip`,
      contentType: 'application/zip',
    });
  }
}

const toState = ({ state, percent, fault, sha256, bytes }: ChangedBundle): ChangedBundleState => ({
  state,
  percent,
  fault,
  file: state === 'ready' && sha256 !== null && bytes !== null ? { sha256, bytes } : null,
});
