import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { RevisionReleasedSteps } from '../catalogue/release/revision-released-steps.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import { Holdings } from '../entitlements/holdings.js';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';
import { JobQueue } from '../jobs/job-queue.js';
import { tellOfRevision } from './tell-of-revision.job.js';

/** Who wants a mail when a revision of a kit of theirs is out; a job of the release tells them. */
@Injectable()
export class RevisionWatchers implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly holdings: Holdings,
    private readonly tokens: LinkTokens,
    private readonly released: RevisionReleasedSteps,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.released.register({
      name: 'revision-watchers',
      order: 60,
      run: (tx, { revisionId }) =>
        this.jobs.add(tx, tellOfRevision, { revisionId, after: '' }, { key: `tell-of:${revisionId}:` }),
    });
  }

  async stateOf(person: SignedIn, slug: string): Promise<Answer<'GET /shelf/:slug/watching'>> {
    const kitId = await this.kitOf(person, slug);
    const [row] = await selectRows<{ isOn: number }>(
      this.database,
      'SELECT is_on AS isOn FROM revision_watchers WHERE person_id = :personId AND kit_id = :kitId',
      { personId: person.id, kitId },
    );
    return { isOn: Number(row?.isOn ?? 0) === 1 };
  }

  async set(person: SignedIn, slug: string, isOn: boolean): Promise<Answer<'GET /shelf/:slug/watching'>> {
    const kitId = await this.kitOf(person, slug);
    const id = newId();
    await this.transactions.run((tx) =>
      touchRows(
        this.database,
        `INSERT INTO revision_watchers (id, person_id, kit_id, is_on, stop_hash, updated_at) VALUES (:id, :personId, :kitId, :isOn, :stopHash, :now)
         ON DUPLICATE KEY UPDATE is_on = :isOn, updated_at = :now`,
        {
          id,
          personId: person.id,
          kitId,
          isOn,
          stopHash: this.tokens.hashOf(this.tokens.tokenOf('stop-revisions', id)),
          now: this.clock.now(),
        },
        tx,
      ),
    );
    return { isOn };
  }

  async stop(tx: Tx, id: string): Promise<void> {
    await touchRows(
      this.database,
      'UPDATE revision_watchers SET is_on = FALSE, updated_at = :now WHERE id = :id',
      { id, now: this.clock.now() },
      tx,
    );
  }

  private async kitOf(person: SignedIn, slug: string): Promise<string> {
    const kit = await this.catalogue.kitBySlug(slug);
    if (!kit || !(await this.holdings.of(person.id, kit.id))) throw notFound('kit on your shelf');
    return kit.id;
  }
}
