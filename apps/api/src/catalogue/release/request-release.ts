import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { Gates } from '../gates/gates.js';
import { Drafts } from '../revisions/drafts.js';
import { isFinal, Revision } from '../revisions/revision.model.js';
import { buildRelease } from './build-release.job.js';
import { TidyDraft } from './tidy-draft.js';

/** Checks the gates and sends a draft to have its bundle built; from then on the draft stands still. */
@Injectable()
export class RequestRelease {
  constructor(
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly gates: Gates,
    private readonly tidyDraft: TidyDraft,
    private readonly queue: JobQueue,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async request(person: SignedIn, revisionId: string): Promise<void> {
    await this.askForComparisons(revisionId);
    await this.transactions.run(async (tx) => {
      const standing = await this.revisions.findByPk(revisionId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!standing) throw notFound('revision');
      // Asked twice, it is built once.
      if (standing.state === 'draft' && ['waiting', 'building'].includes(standing.releaseState)) return;
      const { revision, subject } = await this.drafts.lock(tx, revisionId);
      const gates = await this.gates.of(revision, tx);
      const open = gates.filter((gate) => gate.state === 'open');
      if (open.length > 0)
        throw new Refusal(
          'gates-are-open',
          `${revision.label} cannot be released yet: ${open.map((gate) => `${gate.name}: ${gate.reason}`).join(' ')}`,
        );
      const waived = gates.filter((gate) => gate.state === 'waived');
      await this.tidyDraft.tidy(tx, revision, gates);
      await revision.update(
        {
          releaseState: 'waiting',
          releaseAskedAt: revision.releaseAskedAt ?? this.clock.now(),
          releasePercent: 0,
          releaseFault: null,
          releasedBy: person.id,
          updatedAt: this.clock.now(),
        },
        { transaction: tx },
      );
      await this.queue.add(tx, buildRelease, { revisionId });
      await this.staffLog.record(tx, person, {
        what: 'asked for a release',
        subject,
        after: { waived: waived.map(({ name, waiver }) => ({ gate: name, reason: waiver?.reason })) },
      });
    });
  }

  /** Looking at the gates has shapes compared that nobody asked about; a refusal would take that back. */
  private async askForComparisons(revisionId: string): Promise<void> {
    const revision = await this.revisions.findByPk(revisionId);
    if (revision && !isFinal(revision)) await this.gates.of(revision);
  }
}
