import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { DisputeSteps, type DisputeTurn } from '../orders/disputes/dispute-steps.js';
import { OrderFacts, type Right } from '../orders/order-facts.js';
import { LineRightSteps, type LineRight } from '../orders/refunds/line-right-steps.js';
import { MoneyBackSteps, type MoneyBack } from '../orders/refunds/money-back-steps.js';

/**
 * Rights that an order gave end, rest and go on with its money: inside the transactions in which a refund is settled,
 * a dispute turns, or staff decide.
 */
@Injectable()
export class FollowOrderRights implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly moneyBack: MoneyBackSteps,
    private readonly disputes: DisputeSteps,
    private readonly lineRights: LineRightSteps,
    private readonly orderFacts: OrderFacts,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.moneyBack.register({ name: 'entitlements', order: 20, run: (tx, back) => this.endRights(tx, back) });
    this.disputes.register({ name: 'entitlements', order: 20, run: (tx, turn) => this.turn(tx, turn) });
    this.lineRights.register({ name: 'entitlements', order: 20, run: (tx, rights) => this.set(tx, rights) });
    this.orderFacts.registerRights((orderIds) => this.rightsOf(orderIds));
  }

  private async endRights(tx: Tx, back: MoneyBack): Promise<void> {
    const ended: string[] = [];
    for (const { orderLineId, kitName, endsRight } of back.lines) {
      if (!endsRight) continue;
      const changed = await this.change(
        tx,
        'order_line_id = :id',
        orderLineId,
        ['active', 'suspended'],
        'ended',
      );
      if (changed > 0) ended.push(kitName);
    }
    back.facts.endedKits = [...new Set(ended)];
    const rights = await this.rightsOf([back.order.id], tx);
    const kept = back.lines.filter(
      ({ orderLineId, amountMinor }) => amountMinor > 0 && (rights.get(orderLineId) ?? 'ended') !== 'ended',
    );
    back.facts.keptKits = [...new Set(kept.map((line) => line.kitName))];
  }

  private async turn(tx: Tx, { orderId, rights }: DisputeTurn): Promise<void> {
    if (rights === 'rest') await this.change(tx, 'order_id = :id', orderId, ['active'], 'suspended');
    if (rights === 'go-on') await this.change(tx, 'order_id = :id', orderId, ['suspended'], 'active');
    if (rights === 'end') await this.change(tx, 'order_id = :id', orderId, ['active', 'suspended'], 'ended');
  }

  private async set(tx: Tx, rights: readonly LineRight[]): Promise<void> {
    const all: Right[] = ['active', 'suspended', 'ended'];
    for (const { orderLineId, right } of rights)
      await this.change(tx, 'order_line_id = :id', orderLineId, all, right);
  }

  private change(
    tx: Tx,
    where: 'order_line_id = :id' | 'order_id = :id',
    id: string,
    from: readonly Right[],
    to: Right,
  ): Promise<number> {
    return touchRows(
      this.database,
      `UPDATE entitlements SET state = :to, updated_at = :now, ended_at = ${to === 'ended' ? ':now' : 'NULL'}
       WHERE ${where} AND state IN (:from) AND state <> :to`,
      { id, from: [...from], to, now: this.clock.now() },
      tx,
    );
  }

  private async rightsOf(orderIds: readonly string[], tx?: Tx): Promise<ReadonlyMap<string, Right>> {
    if (orderIds.length === 0) return new Map();
    const rows = await selectRows<{ lineId: string; state: Right }>(
      this.database,
      `SELECT order_line_id AS lineId, state FROM entitlements
       WHERE order_id IN (:orderIds) AND order_line_id IS NOT NULL`,
      { orderIds: [...orderIds] },
      tx,
    );
    return new Map(rows.map((row) => [row.lineId, row.state]));
  }
}
