import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { formatMoney } from '@windchest/money';
import { Op, type Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import type { PaymentDispute } from '../../adapters/payments/payments.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { newId } from '../../database/columns.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { FlagOrder } from '../flag-order.js';
import { OrderHistory } from '../order-history.js';
import { Order } from '../order.model.js';
import { DisputeMail } from './dispute-mail.js';
import { DisputeSteps } from './dispute-steps.js';
import { isOver, standOf, turnOf } from './dispute-turn.js';
import { Dispute, type DisputeStand } from './dispute.model.js';
import { LoseDispute } from './lose-dispute.js';

/**
 * Brings the shop's record of a dispute to where it stands at the payment service now: rights rest while it is
 * open, go on when it is won, end when it is lost; staff are told and the order is flagged.
 */
@Injectable()
export class FollowDispute {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    @InjectModel(Dispute) private readonly disputes: typeof Dispute,
    @InjectConfig() private readonly config: Config,
    private readonly steps: DisputeSteps,
    private readonly losing: LoseDispute,
    private readonly mail: DisputeMail,
    private readonly transactions: Transactions,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  follow(orderId: string, told: PaymentDispute): Promise<void> {
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) return;
      const known = await this.disputes.findOne({ where: { serviceId: told.id }, transaction: tx });
      const stand = standOf(told.state);
      const turn = turnOf(known?.state ?? null, stand);
      if (turn === 'nothing' || (known && (await this.isNoted(tx, known, stand)))) return;
      const dispute = await this.write(tx, order, known, told, stand, turn === 'look');
      if (turn === 'look')
        return this.flags.set(tx, order, 'dispute-lost', `now ${stand}, after it was lost`);
      await this.mail.queue(tx, order, dispute);
      if (turn === 'lose') await this.losing.lose(tx, order, dispute);
      await this.turn(tx, order, turn);
    }, 'read-committed');
  }

  private async turn(tx: Tx, order: Order, turn: 'rest' | 'go-on' | 'lose' | 'tell'): Promise<void> {
    const others = await this.disputes.findAll({
      where: { orderId: order.id, state: { [Op.in]: ['inquiry', 'open'] satisfies DisputeStand[] } },
      transaction: tx,
    });
    if (others.length > 0) await this.flags.set(tx, order, 'disputed', 'a dispute waits for its end');
    else await this.flags.drop(tx, order, 'disputed');
    if (turn === 'lose') await this.flags.set(tx, order, 'dispute-lost', 'the money is gone');
    // Another dispute of the same payment may still be open.
    const mayGoOn = others.every((one) => one.state !== 'open');
    if (turn === 'rest') await this.steps.run(tx, { orderId: order.id, rights: 'rest' });
    if (turn === 'go-on' && mayGoOn) await this.steps.run(tx, { orderId: order.id, rights: 'go-on' });
  }

  /** What was only noted leaves the state as it was, so the history says whether it is known. */
  private async isNoted(tx: Tx, known: Dispute, stand: DisputeStand): Promise<boolean> {
    const [last] = await selectRows<{ state: DisputeStand }>(
      this.database,
      'SELECT state FROM dispute_history WHERE dispute_id = :id ORDER BY id DESC LIMIT 1',
      { id: known.id },
      tx,
    );
    return last?.state === stand;
  }

  private async write(
    tx: Tx,
    order: Order,
    known: Dispute | null,
    told: PaymentDispute,
    stand: DisputeStand,
    isOnlyNoted: boolean,
  ): Promise<Dispute> {
    const now = this.clock.now();
    const facts = {
      ...(isOnlyNoted ? {} : { state: stand, closedAt: isOver(stand) ? now : null }),
      amountMinor: told.amountMinor,
      currency: told.currency,
      reason: told.reason.slice(0, 80),
      answerBy: told.evidenceDueAt,
      updatedAt: now,
    };
    const dispute = known
      ? await known.update(facts, { transaction: tx })
      : await this.disputes.create(
          {
            id: newId(),
            orderId: order.id,
            serviceId: told.id,
            ...facts,
            openedAt: told.createdAt,
            createdAt: now,
          },
          { transaction: tx },
        );
    const detail = isOnlyNoted ? 'the payment service says so after the loss; nothing was changed here' : '';
    await touchRows(
      this.database,
      'INSERT INTO dispute_history (dispute_id, at, state, detail) VALUES (:id, :now, :stand, :detail)',
      { id: dispute.id, now, stand, detail },
      tx,
    );
    const amount = formatMoney(
      { minor: told.amountMinor, currency: told.currency },
      this.config.WORKSHOP_LOCALE,
    );
    const reason = told.reason.replaceAll('_', ' ');
    await this.history.add(tx, order.id, `dispute ${stand}`, `${amount}, reason given: ${reason}`);
    return dispute;
  }
}
