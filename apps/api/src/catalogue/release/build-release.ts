import { Injectable, Logger } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Clearance } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { People, toSignedIn } from '../../accounts/people.js';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Storage, type HashedObject } from '../../adapters/storage/storage.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { HandlesJob, type Finish, type JobHandler } from '../../jobs/job.js';
import { QueueComparisons } from '../comparison/queue-comparisons.js';
import { KitInShopSteps } from '../kits/kit-in-shop-steps.js';
import { Kit } from '../kits/kit.model.js';
import { Licence } from '../kits/licence.model.js';
import { estimatePrint } from '../print/estimate-print.job.js';
import { clearancesOf } from '../revisions/part-files.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { isFinal, Revision } from '../revisions/revision.model.js';
import { buildRelease } from './build-release.job.js';
import { bundleEntries } from './bundle-entries.js';
import { RevisionReleasedSteps } from './revision-released-steps.js';
import { ReleaseProgress } from './release-progress.js';
import { RevisionBundle } from './revision-bundle.model.js';
import { verifyBundle } from './verify-bundle.js';
import { writeBuildBook } from './write-build-book.js';
import { writeBundle } from './write-bundle.js';

/** Writing takes the first part of the progress shown, reading back the rest. */
const WRITTEN_PERCENT = 80;

interface BuiltBundle extends HashedObject {
  /** Left out by the one that holds them all. */
  readonly clearance?: Clearance;
}

/**
 * Builds a revision's bundle, and one of each clearance where parts come in several, reads them back and
 * verifies them; only then one transaction releases the revision. Run again after a crash it starts over: the same files give the same bundle under the same key.
 */
@Injectable()
@HandlesJob(buildRelease)
export class BuildRelease implements JobHandler<typeof buildRelease.payload> {
  private readonly log = new Logger('Release');

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    @InjectModel(RevisionBundle) private readonly bundles: typeof RevisionBundle,
    @InjectConfig() private readonly config: Config,
    private readonly contents: RevisionContents,
    private readonly comparisons: QueueComparisons,
    private readonly storage: Storage,
    private readonly people: People,
    private readonly staffLog: StaffLog,
    private readonly jobs: JobQueue,
    private readonly inShop: KitInShopSteps,
    private readonly released: RevisionReleasedSteps,
    private readonly clock: Clock,
  ) {}

  async handle({ revisionId }: z.output<typeof buildRelease.payload>): Promise<Finish | void> {
    const isMine = await touchRows(
      this.database,
      `UPDATE revisions SET release_state = 'building', release_percent = 0, updated_at = :now
       WHERE id = :revisionId AND state IN ('draft', 'proving') AND release_state IN ('waiting', 'building')`,
      { revisionId, now: this.clock.now() },
    );
    const revision = await this.revisions.findByPk(revisionId);
    if (isMine === 0 || !revision) return;
    try {
      const [bundle, ...others] = await this.build(revision);
      return (tx) => this.release(tx, revisionId, bundle, others);
    } catch (fault) {
      this.log.error(`The bundle of ${revisionId} failed: ${(fault as Error).stack ?? String(fault)}`);
      await touchRows(
        this.database,
        `UPDATE revisions SET release_state = 'failed', release_fault = :fault WHERE id = :revisionId AND release_state = 'building'`,
        {
          revisionId,
          fault: `The bundle could not be built. ${(fault as Error).message} Release it again to retry.`,
        },
      );
    }
  }

  private async build(revision: Revision): Promise<[BuiltBundle, ...BuiltBundle[]]> {
    const kit = await this.kits.findByPk(revision.kitId, { rejectOnEmpty: true });
    const [parts, files, licences] = await Promise.all([
      this.contents.partsOf(revision.id),
      this.contents.filesOf(revision.id),
      this.licences.findAll({ where: { kitId: kit.id, isOffered: true } }),
    ]);
    const buildBook = await writeBuildBook({ workshop: this.config.WORKSHOP_NAME, kit, revision, parts });
    const wanted = [{}, ...clearancesOf(parts).map((clearance) => ({ clearance }))].map((one) => ({
      ...one,
      entries: bundleEntries({ kit, revision, parts, files, licences, buildBook, ...one }),
    }));
    const total = wanted.flatMap(({ entries }) => entries).reduce((sum, entry) => sum + entry.bytes, 1);
    const progress = new ReleaseProgress(this.database, revision.id);
    const built: BuiltBundle[] = [];
    let before = 0;
    for (const { entries, ...one } of wanted) {
      const bundle = await writeBundle(this.storage, entries, (writtenBytes) =>
        progress.show(((before + writtenBytes) / total) * WRITTEN_PERCENT),
      );
      before += bundle.bytes;
      built.push({ ...bundle, ...one });
    }
    progress.show(WRITTEN_PERCENT);
    for (const bundle of built) await verifyBundle(this.storage, bundle);
    await progress.settle();
    return built as [BuiltBundle, ...BuiltBundle[]];
  }

  private async release(
    tx: Tx,
    revisionId: string,
    bundle: BuiltBundle,
    others: readonly BuiltBundle[],
  ): Promise<void> {
    const revision = await this.revisions.findByPk(revisionId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!revision || isFinal(revision) || revision.releaseState !== 'building') return;
    const kit = await this.kits.findByPk(revision.kitId, { transaction: tx, rejectOnEmpty: true });
    const now = this.clock.now();
    // Before the revision is final: then the database takes nothing more.
    await this.bundles.bulkCreate(
      others.map(({ clearance, sha256, bytes }) => ({ revisionId, clearance, sha256, bytes })),
      { transaction: tx },
    );
    await revision.update(
      {
        state: 'released',
        releaseState: 'done',
        releasePercent: 100,
        releaseFault: null,
        releasedAt: now,
        bundleSha256: bundle.sha256,
        bundleBytes: bundle.bytes,
        updatedAt: now,
      },
      { transaction: tx },
    );
    await this.comparisons.ofRelease(tx, revisionId);
    await this.jobs.add(tx, estimatePrint, { revisionId }, { key: `estimate-print:${revisionId}` });
    await kit.update({ newestRevisionId: revision.id, updatedAt: now }, { transaction: tx });
    if (kit.isListed) await this.inShop.run(tx, { kitId: kit.id });
    await this.released.run(tx, {
      revisionId,
      label: revision.label,
      kit: { id: kit.id, slug: kit.slug, name: kit.name },
    });
    const person = revision.releasedBy ? await this.people.byId(revision.releasedBy, tx) : null;
    await this.staffLog.record(tx, person && toSignedIn(person), {
      what: 'released a revision',
      subject: `${kit.name} ${revision.label}`,
      after: { bundleSha256: bundle.sha256, bundleBytes: bundle.bytes },
    });
  }
}
