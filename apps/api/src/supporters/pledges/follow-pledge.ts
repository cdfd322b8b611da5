import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { PledgeState } from '@windchest/contracts';
import { Op } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { JobQueue } from '../../jobs/job-queue.js';
import type { AskedView } from './ask-service.js';
import { consequencesOf, type Consequences } from './consequences.js';
import { GiveRights } from './give-rights.js';
import { lookAtPledge } from './look-at-pledge.job.js';
import { PledgeHistory } from './pledge-history.js';
import { PledgeMails } from './pledge-mails.js';
import { PledgePayment } from './pledge-payment.model.js';
import type { PledgeRecord } from './pledge-record.js';
import { Pledge } from './pledge.model.js';
import { RecordPayment } from './record-payment.js';

export const LIVE_STATES: readonly PledgeState[] = ['opening', 'current', 'grace', 'paused'];

/**
 * Everything that follows from how a pledge stands, in one transaction: its state, payments with their receipts,
 * rights, e-mails, the next looks. The locked row and the number of the look make it happen once.
 */
@Injectable()
export class FollowPledge {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly recording: RecordPayment,
    private readonly rights: GiveRights,
    private readonly mails: PledgeMails,
    private readonly history: PledgeHistory,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  follow(pledgeId: string, look: number, view: AskedView): Promise<PledgeState | null> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(pledgeId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!pledge || look <= pledge.followedLook) return pledge?.state ?? null;
      const known = await this.payments.findAll({ where: { pledgeId }, transaction: tx });
      // A copy: the instance's own values change with it.
      const before = { ...(pledge.get({ plain: true }) as PledgeRecord) };
      const found = consequencesOf(before, view, {
        now: this.clock.now(),
        graceDays: this.config.PLEDGE_GRACE_DAYS,
        known: new Set(known.map((payment) => payment.invoiceId)),
      });
      const consequences = await this.unlessAnotherLives(tx, pledge, found);
      await this.write(tx, pledge, look, view, consequences);
      const isDisputeNews = await this.noteDisputes(tx, known, view);
      for (const payment of consequences.payments) await this.recording.record(tx, pledge, payment);
      if (isDisputeNews || consequences.payments.length > 0 || hasChanged(before, pledge))
        await this.rights.give(tx, pledge);
      await this.tell(tx, pledge, consequences);
      return pledge.state;
    }, 'read-committed');
  }

  private async write(
    tx: Tx,
    pledge: Pledge,
    look: number,
    view: AskedView,
    { after }: Consequences,
  ): Promise<void> {
    // Flags and rights have writers of their own.
    const { flags: _flags, rightsUntil: _rightsUntil, ...columns } = after;
    const subscriptionId = pledge.subscriptionId ?? view.subscriptionId;
    await pledge.update(
      { ...columns, subscriptionId, followedLook: look, updatedAt: this.clock.now() },
      { transaction: tx },
    );
  }

  private async tell(tx: Tx, pledge: Pledge, { news, history, flags, looks }: Consequences): Promise<void> {
    for (const { what, detail } of history) await this.history.add(tx, pledge.id, what, detail);
    for (const [flag, detail] of flags) await this.history.flag(tx, pledge, flag, detail);
    for (const one of news) await this.mails.tell(tx, pledge, one);
    for (const runAt of looks)
      await this.jobs.add(
        tx,
        lookAtPledge,
        { pledgeId: pledge.id },
        { runAt, key: `pledge-look:${pledge.id}:${runAt.toISOString()}` },
      );
  }

  /** Money that comes for a pledge that was over does not bring it back beside another of the same person. */
  private async unlessAnotherLives(tx: Tx, pledge: Pledge, found: Consequences): Promise<Consequences> {
    if (LIVE_STATES.includes(pledge.state) || !LIVE_STATES.includes(found.after.state)) return found;
    const other = await this.pledges.findOne({
      where: { personId: pledge.personId, state: [...LIVE_STATES], id: { [Op.ne]: pledge.id } },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    });
    if (!other) return found;
    return {
      ...found,
      after: { ...found.after, state: pledge.state, endedAt: pledge.endedAt },
      news: [],
      history: [],
      flags: [...found.flags, ['paid-after-end', `pledge ${other.id} had begun meanwhile`]],
      looks: [],
    };
  }

  /** @returns whether any changed */
  private async noteDisputes(tx: Tx, known: readonly PledgePayment[], view: AskedView): Promise<boolean> {
    let isNews = false;
    for (const { invoiceId, state } of view.disputes ?? []) {
      const payment = known.find((one) => one.invoiceId === invoiceId);
      if (!payment || payment.disputeState === state) continue;
      await payment.update({ disputeState: state }, { transaction: tx });
      await this.history.add(
        tx,
        payment.pledgeId,
        state ? `payment disputed` : 'dispute settled',
        state ? `${payment.receiptNumber ?? invoiceId}, ${state}` : (payment.receiptNumber ?? invoiceId),
      );
      isNews = true;
    }
    return isNews;
  }
}

const hasChanged = (before: PledgeRecord, after: Pledge): boolean =>
  before.state !== after.state || before.planId !== after.planId;
