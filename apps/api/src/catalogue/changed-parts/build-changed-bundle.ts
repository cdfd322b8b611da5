import { Injectable, Logger } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Storage, type HashedObject } from '../../adapters/storage/storage.js';
import { touchRows } from '../../database/rows.js';
import { HandlesJob, type Finish, type JobHandler } from '../../jobs/job.js';
import { Kit } from '../kits/kit.model.js';
import { Licence } from '../kits/licence.model.js';
import { bundleEntries } from '../release/bundle-entries.js';
import { bundledFiles } from '../release/bundled-files.js';
import { verifyBundle } from '../release/verify-bundle.js';
import { writeBundle } from '../release/write-bundle.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { Revision } from '../revisions/revision.model.js';
import { buildChangedParts } from './build-changed-parts.job.js';
import { ChangedBundle } from './changed-bundle.model.js';

const WRITTEN_PERCENT = 80;

/**
 * Builds a bundle of changed parts as a whole one is built: entries in one order with one date, read back and
 * verified. Run again after a crash it starts over; the same need gives the same bytes under the same key.
 */
@Injectable()
@HandlesJob(buildChangedParts)
export class BuildChangedBundle implements JobHandler<typeof buildChangedParts.payload> {
  private readonly log = new Logger('ChangedParts');

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(ChangedBundle) private readonly bundles: typeof ChangedBundle,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly contents: RevisionContents,
    private readonly storage: Storage,
  ) {}

  async handle({ needHash }: z.output<typeof buildChangedParts.payload>): Promise<Finish | void> {
    const isMine = await touchRows(
      this.database,
      `UPDATE changed_bundles SET state = 'building', percent = 1 WHERE need_hash = :needHash AND state IN ('waiting', 'building')`,
      { needHash },
    );
    const bundle = await this.bundles.findByPk(needHash);
    if (!bundle || (isMine === 0 && bundle.state !== 'building')) return;
    try {
      const { sha256, bytes } = await this.build(bundle);
      return async (tx) => {
        await touchRows(
          this.database,
          `UPDATE changed_bundles SET state = 'ready', percent = 100, sha256 = :sha256, bytes = :bytes
           WHERE need_hash = :needHash AND state = 'building'`,
          { needHash, sha256, bytes },
          tx,
        );
      };
    } catch (fault) {
      this.log.error(`Changed parts ${needHash} failed: ${(fault as Error).stack ?? String(fault)}`);
      await touchRows(
        this.database,
        `UPDATE changed_bundles SET state = 'failed', fault = :fault WHERE need_hash = :needHash AND state = 'building'`,
        { needHash, fault: `The bundle could not be built. ${(fault as Error).message}` },
      );
    }
  }

  private async build({ needHash, need, revisionId, kitId }: ChangedBundle): Promise<HashedObject> {
    const [kit, revision, all, files, licences] = await Promise.all([
      this.kits.findByPk(kitId, { rejectOnEmpty: true }),
      this.revisions.findByPk(revisionId, { rejectOnEmpty: true }),
      this.contents.partsOf(revisionId),
      this.contents.filesOf(revisionId),
      this.licences.findAll({ where: { kitId, isOffered: true } }),
    ]);
    const clearance = need.clearance ?? undefined;
    const wanted = new Map(need.parts.map((one) => [one.code, one]));
    const parts = all.flatMap((part) => {
      const one = wanted.get(part.code);
      return one ? [{ ...part, quantity: one.print + one.optional }] : [];
    });
    const kept = new Set(parts.flatMap((part) => bundledFiles(part, clearance)).map(({ file }) => file.id));
    const entries = bundleEntries({
      kit,
      revision,
      parts,
      files: files.filter(({ id }) => kept.has(id)),
      licences,
      reprintList: need.list,
      ...(clearance && { clearance }),
    });
    const total = entries.reduce((sum, entry) => sum + entry.bytes, 1);
    const progress = new Progress(this.database, needHash);
    const stored = await writeBundle(this.storage, entries, (written) =>
      progress.show((written / total) * WRITTEN_PERCENT),
    );
    await progress.settle();
    await verifyBundle(this.storage, stored);
    return stored;
  }
}

/** A percent at a time, one write at a time; a percent that is not shown does no harm. */
class Progress {
  private shown = 1;
  private writing: Promise<unknown> | null = null;

  constructor(
    private readonly database: Sequelize,
    private readonly needHash: string,
  ) {}

  show(wanted: number): void {
    const percent = Math.min(99, Math.floor(wanted));
    if (this.writing || percent <= this.shown) return;
    this.shown = percent;
    this.writing = touchRows(
      this.database,
      `UPDATE changed_bundles SET percent = :percent WHERE need_hash = :needHash AND state = 'building'`,
      { percent, needHash: this.needHash },
    )
      .catch(() => 0)
      .finally(() => {
        this.writing = null;
      });
  }

  async settle(): Promise<void> {
    await this.writing;
  }
}
