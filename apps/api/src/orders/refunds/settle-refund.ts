import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { formatMoney } from '@windchest/money';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../../config/config.js';
import { touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { OrderHistory } from '../order-history.js';
import type { OrderRecord } from '../order-record.js';
import type { Order } from '../order.model.js';
import { MoneyBackSteps, type MoneyBack } from './money-back-steps.js';
import { OrderRefundedMail } from './order-refunded-mail.js';
import type { PlannedLine, RefundableOrderLine } from './plan-refund.js';
import { RefundBook } from './refund-book.js';
import type { Refund } from './refund.model.js';

/**
 * Everything that follows from money that went back, in the caller's transaction: the lines and the order know of
 * it, a credit note is numbered, rights end, the buyer is written to.
 */
@Injectable()
export class SettleRefund {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly book: RefundBook,
    private readonly steps: MoneyBackSteps,
    private readonly mail: OrderRefundedMail,
    private readonly history: OrderHistory,
    private readonly clock: Clock,
  ) {}

  /** The order's row must be locked, and the lines still have what is planned for them. */
  async settle(
    tx: Tx,
    order: Order,
    refund: Refund,
    planned: readonly PlannedLine[],
    lines: readonly RefundableOrderLine[],
  ): Promise<void> {
    const now = this.clock.now();
    await this.book.writeLines(tx, refund.id, planned);
    await this.takeFromLines(tx, order, planned, now);
    const back: MoneyBack = {
      order: order.get({ plain: true }) as OrderRecord,
      refundId: refund.id,
      cause: refund.origin === 'dispute' ? 'dispute' : 'refund',
      amountMinor: planned.reduce((sum, line) => sum + line.amountMinor, 0),
      at: now,
      lines: planned.map(({ orderLineId, amountMinor, keepsEntitlement }) => {
        const line = lines.find((one) => one.id === orderLineId);
        return {
          orderLineId,
          kitName: line?.kitName ?? '',
          licenceName: line?.licenceName ?? '',
          amountMinor,
          endsRight: !keepsEntitlement,
        };
      }),
      facts: {},
    };
    await this.steps.run(tx, back);
    const { creditNote } = back.facts;
    await refund.update(
      {
        state: 'succeeded',
        fault: null,
        creditNoteId: creditNote?.id ?? null,
        creditNoteNumber: creditNote?.number ?? null,
        settledAt: now,
        updatedAt: now,
      },
      { transaction: tx },
    );
    await this.tell(tx, back);
  }

  private async takeFromLines(
    tx: Tx,
    order: Order,
    planned: readonly PlannedLine[],
    now: Date,
  ): Promise<void> {
    let refundedMinor = order.refundedMinor;
    for (const { orderLineId, amountMinor } of planned) {
      refundedMinor += amountMinor;
      await touchRows(
        this.database,
        'UPDATE order_lines SET refunded_minor = refunded_minor + :amountMinor WHERE id = :orderLineId',
        { orderLineId, amountMinor },
        tx,
      );
    }
    const isAll = refundedMinor === order.totalMinor;
    await order.update(
      { refundedMinor, updatedAt: now, ...(isAll ? { state: 'refunded' } : {}) },
      { transaction: tx },
    );
  }

  private async tell(tx: Tx, back: MoneyBack): Promise<void> {
    const amount = formatMoney(
      { minor: back.amountMinor, currency: back.order.currency },
      this.config.WORKSHOP_LOCALE,
    );
    const { creditNote, endedKits = [] } = back.facts;
    const ended = endedKits.length > 0 ? `; ended: ${endedKits.join(', ')}` : '';
    const note = creditNote ? `, credit note ${creditNote.number}` : '';
    await this.history.add(
      tx,
      back.order.id,
      back.cause === 'dispute' ? 'lost to the dispute' : 'refunded',
      `${amount}${note}${ended}`,
    );
    if (creditNote) await this.mail.queue(tx, back, creditNote.number);
  }
}
