import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Dispute as DisputeAnswer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { Dispute, type DisputeStand } from './dispute.model.js';

interface HistoryRow {
  readonly disputeId: string;
  readonly at: Date;
  readonly state: DisputeStand;
  readonly detail: string;
}

/** Disputes of an order with their turns, oldest first. */
@Injectable()
export class DisputeView {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Dispute) private readonly disputes: typeof Dispute,
  ) {}

  async ofOrder(orderId: string): Promise<DisputeAnswer[]> {
    const disputes = await this.disputes.findAll({ where: { orderId }, order: [['openedAt', 'ASC']] });
    if (disputes.length === 0) return [];
    const history = await selectRows<HistoryRow>(
      this.database,
      `SELECT dispute_id AS disputeId, at, state, detail FROM dispute_history WHERE dispute_id IN (:ids) ORDER BY id`,
      { ids: disputes.map((one) => one.id) },
    );
    return disputes.map((one) => ({
      id: one.id,
      state: one.state,
      amount: { minor: one.amountMinor, currency: one.currency },
      reason: one.reason,
      answerBy: one.answerBy?.toISOString() ?? null,
      openedAt: one.openedAt.toISOString(),
      closedAt: one.closedAt?.toISOString() ?? null,
      history: history
        .filter((turn) => turn.disputeId === one.id)
        .map(({ at, state, detail }) => ({ at: at.toISOString(), state, detail })),
    }));
  }
}
