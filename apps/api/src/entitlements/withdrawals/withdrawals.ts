import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { RevisionWithdrawnSteps } from '../../catalogue/release/withdraw-revision.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { HandlesJob, type JobHandler } from '../../jobs/job.js';
import { MailOutbox } from '../../mails/mail-outbox.js';
import { tellHolders } from './tell-holders.job.js';

const CHUNK = 200;

/** Last fetched it, or said they printed of it; each address once, whatever rights it has to the kit. */
const HOLD_IT = `FROM entitlements e WHERE e.kit_id = :kitId AND e.state = 'active' AND (e.held_revision_id = :revisionId
  OR EXISTS (SELECT 1 FROM print_records p WHERE p.person_id = e.person_id AND p.revision_id = :revisionId AND p.quantity > 0))`;

/** Who holds a revision, and that they hear of its withdrawal: each exactly once. */
@Injectable()
@HandlesJob(tellHolders)
export class Withdrawals implements OnModuleInit, JobHandler<typeof tellHolders.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
    private readonly transactions: Transactions,
    private readonly jobs: JobQueue,
    private readonly mails: MailOutbox,
    private readonly withdrawn: RevisionWithdrawnSteps,
  ) {}

  onModuleInit(): void {
    this.withdrawn.register({
      name: 'entitlements',
      order: 20,
      run: (tx, { revisionId }) =>
        this.jobs.add(tx, tellHolders, { revisionId }, { key: `tell-holders:${revisionId}` }),
    });
  }

  async count(revisionId: string): Promise<Answer<'GET /workshop/revisions/:revisionId/withdrawal'>> {
    const revision = await this.catalogue.revisionById(revisionId);
    if (!revision) return { holders: 0, fallsBackTo: null };
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      `SELECT COUNT(DISTINCT e.email) AS count ${HOLD_IT}`,
      { revisionId, kitId: revision.kitId },
    );
    const others = (await this.catalogue.revisionsOf(revision.kitId)).filter(
      (one) => !one.isWithdrawn && one.id !== revisionId,
    );
    return { holders: Number(row?.count ?? 0), fallsBackTo: others[0]?.label ?? null };
  }

  /** A chunk in one transaction; run again it starts over, and a mail's key keeps it from being written twice. */
  async handle({ revisionId }: z.output<typeof tellHolders.payload>): Promise<void> {
    const revision = await this.catalogue.revisionById(revisionId);
    const [kit] = revision ? await this.catalogue.kitsByIds([revision.kitId]) : [];
    if (!revision?.isWithdrawn || !kit) return;
    const newest = (await this.catalogue.revisionsOf(kit.id)).find((one) => !one.isWithdrawn);
    let after = '';
    for (;;) {
      const holders = await selectRows<{ email: string; has_account: number | string }>(
        this.database,
        `SELECT e.email, MAX(e.person_id IS NOT NULL) AS has_account ${HOLD_IT} AND e.email > :after
         GROUP BY e.email ORDER BY e.email LIMIT ${CHUNK}`,
        { revisionId, kitId: kit.id, after },
      );
      if (holders.length === 0) return;
      await this.transactions.run(async (tx) => {
        for (const { email, has_account } of holders)
          await this.mails.add(tx, {
            to: email,
            key: `withdrawn:${revisionId}:${email}`,
            about: `revision:${revisionId}`,
            message: {
              template: 'revision-withdrawn',
              kit: kit.name,
              revision: revision.label,
              reason: revision.withdrawnReason ?? '',
              newest: newest?.label ?? null,
              link: `${this.config.BASE_URL}/shelf${Number(has_account) > 0 ? `/${kit.slug}` : ''}`,
            },
          });
      });
      after = holders.at(-1)!.email;
    }
  }
}
