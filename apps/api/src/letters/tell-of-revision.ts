import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { People } from '../accounts/people.js';
import { tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { CatalogueReader, filamentHex } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows } from '../database/rows.js';
import { Holdings } from '../entitlements/holdings.js';
import { HandlesJob, type Finish, type JobHandler } from '../jobs/job.js';
import { JobQueue } from '../jobs/job-queue.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { ReprintBooks } from './reprint-book.js';
import { tellOfRevision } from './tell-of-revision.job.js';

const PORTION = 200;
const IF_IT_TROUBLES = 'Reprint if it troubles you';

/** Each mail with its reader's own reprint list; one for each reader and revision, however often this runs. */
@Injectable()
@HandlesJob(tellOfRevision)
export class TellOfRevision implements JobHandler<typeof tellOfRevision.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
    private readonly holdings: Holdings,
    private readonly people: People,
    private readonly books: ReprintBooks,
    private readonly mails: MailOutbox,
    private readonly jobs: JobQueue,
  ) {}

  async handle({ revisionId, after }: z.output<typeof tellOfRevision.payload>): Promise<Finish | void> {
    const revision = await this.catalogue.revisionById(revisionId);
    const [kit] = revision ? await this.catalogue.kitsByIds([revision.kitId]) : [];
    if (!revision || !kit || revision.isWithdrawn) return;
    const labels = new Map((await this.catalogue.revisionsOf(kit.id)).map((one) => [one.id, one.label]));
    const book = this.books.open(revision.id);
    const watchers = await selectRows<{ id: string; personId: string }>(
      this.database,
      `SELECT w.id, w.person_id AS personId FROM revision_watchers w
       WHERE w.kit_id = :kitId AND w.is_on AND w.id > :after ORDER BY w.id LIMIT :limit`,
      { kitId: kit.id, after, limit: PORTION },
    );
    return async (tx) => {
      for (const watcher of watchers) {
        const holding = await this.holdings.of(watcher.personId, kit.id);
        const person = await this.people.byId(watcher.personId, tx);
        const from = holding?.heldRevisionId ? labels.get(holding.heldRevisionId) : undefined;
        // Who never fetched the files gets the newest revision whenever they do.
        if (!holding || !person?.verifiedAt || !from || holding.heldRevisionId === revision.id) continue;
        const list = await book.listOf({
          personId: watcher.personId,
          heldId: holding.heldRevisionId,
        });
        await this.mails.add(tx, {
          to: person.email,
          key: `revision:${revision.id}:${watcher.id}`,
          message: {
            template: 'revision-released',
            name: person.name,
            kit: kit.name,
            from,
            to: revision.label,
            reprint: list.map(({ code, name, quantity, why, isOnlyIfItTroubles }) => ({
              code,
              name,
              quantity,
              why: isOnlyIfItTroubles ? `${IF_IT_TROUBLES}: ${why}` : why,
            })),
            link: new URL(`/shelf/${kit.slug}`, this.config.BASE_URL).href,
            kitColourHex: filamentHex(kit.colour),
            stopLink: `${this.config.BASE_URL}/unsubscribe/${tokenPlaceholder('stop-revisions', watcher.id)}`,
          },
        });
      }
      const last = watchers.at(-1);
      if (last && watchers.length === PORTION)
        await this.jobs.add(
          tx,
          tellOfRevision,
          { revisionId, after: last.id },
          { key: `tell-of:${revisionId}:${last.id}` },
        );
    };
  }
}
