import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Subscriptions } from '../../adapters/payments/subscriptions.js';
import { Transactions } from '../../database/transactions.js';
import { LookAtPledge } from './look-at-pledge.js';
import { PledgeHistory } from './pledge-history.js';
import { Pledge } from './pledge.model.js';
import { serviceAway } from './service-away.js';

/**
 * Gives up a pledge that was not begun. Its page is closed first, at the payment service; only then can nobody pay
 * any more. Where the supporter was quicker and paid, the pledge has begun instead.
 */
@Injectable()
export class GiveUpPledge {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly transactions: Transactions,
    private readonly subscriptions: Subscriptions,
    private readonly looking: LookAtPledge,
    private readonly history: PledgeHistory,
    private readonly clock: Clock,
  ) {}

  async giveUp(pledge: Pledge): Promise<void> {
    if (!pledge.sessionId) return this.end(pledge.id, 'given up');
    try {
      await this.subscriptions.expirePage(pledge.sessionId);
      await this.looking.look(pledge.id);
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw serviceAway();
      throw fault;
    }
  }

  /** Only one that has no page yet, or whose page was refused. */
  end(pledgeId: string, why: string): Promise<void> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!pledge || pledge.state !== 'opening' || pledge.sessionId) return;
      const now = this.clock.now();
      await pledge.update({ state: 'ended', endedAt: now, updatedAt: now }, { transaction: tx });
      await this.history.add(tx, pledgeId, 'never begun', why);
    }, 'read-committed');
  }
}
