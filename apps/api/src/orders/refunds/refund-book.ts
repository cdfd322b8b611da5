import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import type { PlannedLine, RefundableOrderLine } from './plan-refund.js';
import { RefundLine } from './refund-line.model.js';

/** What refunds have taken from an order's lines. Lock the order's row before you rely on it. */
@Injectable()
export class RefundBook {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(RefundLine) private readonly refundLines: typeof RefundLine,
  ) {}

  /** In the order's own sequence. */
  async refundableLines(tx: Tx, orderId: string): Promise<RefundableOrderLine[]> {
    const rows = await selectRows<RefundableOrderLine & { askedMinor: number | string }>(
      this.database,
      `SELECT l.id, l.kit_name AS kitName, l.licence_name AS licenceName, l.total_minor AS totalMinor, l.refunded_minor AS refundedMinor,
              (SELECT COALESCE(SUM(rl.amount_minor), 0) FROM refund_lines rl JOIN refunds r ON r.id = rl.refund_id
               WHERE rl.order_line_id = l.id AND r.state = 'asked') AS askedMinor
       FROM order_lines l WHERE l.order_id = :orderId ORDER BY l.position`,
      { orderId },
      tx,
    );
    return rows.map((row) => ({ ...row, askedMinor: Number(row.askedMinor) }));
  }

  async plannedLines(tx: Tx, refundId: string): Promise<PlannedLine[]> {
    const rows = await this.refundLines.findAll({ where: { refundId }, transaction: tx });
    return rows.map(({ orderLineId, amountMinor, keepsEntitlement }) => ({
      orderLineId,
      amountMinor,
      keepsEntitlement,
    }));
  }

  /** Takes the place of what was planned before. */
  async writeLines(tx: Tx, refundId: string, lines: readonly PlannedLine[]): Promise<void> {
    await this.refundLines.destroy({ where: { refundId }, transaction: tx });
    await this.refundLines.bulkCreate(
      lines.map((line) => ({ refundId, ...line })),
      { transaction: tx },
    );
  }
}
