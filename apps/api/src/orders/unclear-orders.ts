import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { literal, Op, type Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { notFound, Refusal } from '../http/refusal.js';
import { FlagOrder } from './flag-order.js';
import { OrderHistory } from './order-history.js';
import type { OrderRecord } from './order-record.js';
import { Order } from './order.model.js';

const UNCLEAR = `JSON_CONTAINS(flags, '"location-unclear"')`;

/** Paid orders whose buyer's country no two pieces of evidence agree on, for the ledger to settle. */
@Injectable()
export class UnclearOrders {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly flags: FlagOrder,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  /** Paid from `from` up to, but not including, `until`. */
  async countBetween(from: Date, until: Date, tx?: Tx): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      `SELECT COUNT(*) AS count FROM orders WHERE paid_at >= :from AND paid_at < :until AND ${UNCLEAR}`,
      { from, until },
      tx,
    );
    return Number(row?.count ?? 0);
  }

  /** Oldest first: their quarter is closed first. */
  async page(query: {
    page: number;
    size: number;
    search?: string | undefined;
  }): Promise<{ orders: OrderRecord[]; total: number }> {
    const like = `%${query.search ?? ''}%`;
    const { rows, count } = await this.orders.findAndCountAll({
      where: {
        [Op.and]: [literal(UNCLEAR)],
        paidAt: { [Op.not]: null },
        ...(query.search
          ? {
              [Op.or]: [
                { number: { [Op.like]: like.toUpperCase() } },
                { email: { [Op.like]: like } },
                { receiptNumber: { [Op.like]: like } },
              ],
            }
          : {}),
      },
      order: [
        ['paidAt', 'ASC'],
        ['id', 'ASC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    return { orders: rows, total: count };
  }

  byIds(ids: readonly string[]): Promise<OrderRecord[]> {
    return this.orders.findAll({ where: { id: [...ids] } });
  }

  /**
   * Notes where the buyer is and takes the flag off; once settled it may be settled again.
   * @throws Refusal `not-found`, `conflict` where nothing is unclear
   */
  async settle(
    tx: Tx,
    orderId: string,
    { country, reason, who }: { country: string; reason: string; who: string },
  ): Promise<OrderRecord> {
    const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!order) throw notFound('order');
    if (!order.flags.includes('location-unclear') && !order.settledCountry)
      throw new Refusal(
        'conflict',
        `The evidence of order ${order.number} agrees on a country; nothing is to be settled.`,
      );
    await order.update({ settledCountry: country, updatedAt: this.clock.now() }, { transaction: tx });
    await this.history.add(tx, order.id, 'country settled', `${country}, by ${who}: ${reason}`);
    await this.flags.drop(tx, order, 'location-unclear');
    return order;
  }
}
