import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Handled } from '@windchest/contracts';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { Steps } from '../../database/steps.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { Kit } from '../kits/kit.model.js';
import { Revision } from '../revisions/revision.model.js';

export interface JustWithdrawn {
  readonly revisionId: string;
  readonly kitId: string;
}

/** Run in the transaction that withdraws a revision, by the rooms that tell those who hold it. */
@Injectable()
export class RevisionWithdrawnSteps extends Steps<JustWithdrawn> {}

/**
 * Takes a released revision back: nobody gets it any more. The shop falls back to the newest one that stands;
 * a kit without one is off sale.
 */
@Injectable()
export class WithdrawRevision {
  constructor(
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly transactions: Transactions,
    private readonly withdrawn: RevisionWithdrawnSteps,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  /** @throws Refusal `not-found`, or `conflict` for one that is not released */
  async withdraw(
    person: SignedIn,
    { params, body }: Handled<'POST /workshop/revisions/:revisionId/withdrawal'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const found = { transaction: tx, lock: tx.LOCK.UPDATE };
      const revision = await this.revisions.findByPk(params.revisionId, found);
      if (!revision) throw notFound('revision');
      if (revision.state !== 'released')
        throw new Refusal(
          'conflict',
          revision.state === 'withdrawn'
            ? `${revision.label} was withdrawn already.`
            : `${revision.label} is not released: there is nothing to withdraw.`,
        );
      const kit = await this.kits.findByPk(revision.kitId, { ...found, rejectOnEmpty: true });
      const now = this.clock.now();
      await revision.update(
        { state: 'withdrawn', withdrawnAt: now, withdrawnReason: body.reason, updatedAt: now },
        { transaction: tx },
      );
      const standing = await this.revisions.findOne({
        where: { kitId: kit.id, state: 'released' },
        order: [
          ['mark', 'DESC'],
          ['issue', 'DESC'],
        ],
        transaction: tx,
      });
      await kit.update({ newestRevisionId: standing?.id ?? null, updatedAt: now }, { transaction: tx });
      await this.withdrawn.run(tx, { revisionId: revision.id, kitId: kit.id });
      await this.staffLog.record(tx, person, {
        what: 'withdrew a revision',
        subject: `${kit.name} ${revision.label}`,
        before: { state: 'released' },
        after: { state: 'withdrawn', reason: body.reason, newest: standing?.label ?? null },
      });
    });
  }
}
