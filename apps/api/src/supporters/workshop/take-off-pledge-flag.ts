import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { PledgeHistory } from '../pledges/pledge-history.js';
import type { PledgeFlag } from '../pledges/pledge-record.js';
import { Pledge } from '../pledges/pledge.model.js';

/** Somebody of the staff has looked at a pledge and takes its flag off. */
@Injectable()
export class TakeOffPledgeFlag {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    private readonly transactions: Transactions,
    private readonly history: PledgeHistory,
    private readonly staffLog: StaffLog,
  ) {}

  takeOff(pledgeId: string, flag: PledgeFlag, person: SignedIn): Promise<void> {
    if (flag === 'location-unclear')
      throw new Refusal(
        'conflict',
        'Which country this pledge is taxed in must be settled with a reason: do so in the ledger, under Locations.',
      );
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!pledge) throw notFound('pledge');
      const before = pledge.flags;
      if (!(await this.history.dropFlag(tx, pledge, flag, `by ${person.name}`))) return;
      await this.staffLog.record(tx, person, {
        what: 'took a flag off a pledge',
        subject: `pledge ${pledge.number}`,
        before,
        after: pledge.flags,
      });
    }, 'read-committed');
  }
}
