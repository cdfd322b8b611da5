import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import type { Tx } from '../../database/transactions.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { Kit } from '../kits/kit.model.js';
import { isFinal, Revision } from './revision.model.js';

/** The one door to changing a revision: what is released never opens again. */
@Injectable()
export class Drafts {
  constructor(
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    private readonly clock: Clock,
  ) {}

  /**
   * Locks a draft for the rest of the transaction; call it first, so that the snapshot starts at the lock.
   * @returns the draft and how the staff log names it
   * @throws Refusal `not-found`, `revision-is-released`, or `conflict` while its bundle is being built
   */
  async lock(tx: Tx, revisionId: string): Promise<{ revision: Revision; kit: Kit; subject: string }> {
    const revision = await this.revisions.findByPk(revisionId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!revision) throw notFound('revision');
    assertChangeable(revision);
    const kit = await this.kits.findByPk(revision.kitId, { transaction: tx });
    if (!kit) throw notFound('kit');
    await revision.update({ updatedAt: this.clock.now() }, { transaction: tx });
    return { revision, kit, subject: `${kit.name} ${revision.label}` };
  }

  /** The same check without a lock, to say no before a long upload. */
  async check(revisionId: string): Promise<Revision> {
    const revision = await this.revisions.findByPk(revisionId);
    if (!revision) throw notFound('revision');
    assertChangeable(revision);
    return revision;
  }
}

const assertChangeable = (revision: Revision): void => {
  if (isFinal(revision))
    throw new Refusal(
      'revision-is-released',
      `${revision.label} is released and never changes. Start a new revision to mend it.`,
    );
  if (revision.releaseState === 'waiting' || revision.releaseState === 'building')
    throw new Refusal('conflict', `${revision.label} is being released. Wait until its bundle is built.`);
};
