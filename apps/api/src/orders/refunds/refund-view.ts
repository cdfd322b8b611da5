import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Refund as BuyerRefund, WorkshopRefund } from '@windchest/contracts';
import { RefundLine } from './refund-line.model.js';
import { Refund } from './refund.model.js';

/** Refunds as the workshop and as buyers see them, oldest first. */
@Injectable()
export class RefundView {
  constructor(
    @InjectModel(Refund) private readonly refunds: typeof Refund,
    @InjectModel(RefundLine) private readonly lines: typeof RefundLine,
  ) {}

  async one(refund: Refund): Promise<WorkshopRefund> {
    const lines = await this.lines.findAll({ where: { refundId: refund.id } });
    return toWorkshop(refund, lines);
  }

  async ofOrder(orderId: string): Promise<WorkshopRefund[]> {
    return (await this.byOrder([orderId])).get(orderId) ?? [];
  }

  /** Only money that is on its way: what was asked for or failed is the workshop's own affair. */
  async forBuyers(orderIds: readonly string[]): Promise<Map<string, BuyerRefund[]>> {
    const all = await this.byOrder(orderIds);
    return new Map(
      [...all].map(([orderId, refunds]) => [
        orderId,
        refunds
          .filter((one) => one.state === 'succeeded' || one.state === 'returned')
          .map(({ id, cause, amount, at, lines, creditNote }) => ({
            id,
            cause,
            amount,
            at,
            lines,
            creditNote,
          })),
      ]),
    );
  }

  private async byOrder(orderIds: readonly string[]): Promise<Map<string, WorkshopRefund[]>> {
    const refunds = await this.refunds.findAll({
      where: { orderId: [...orderIds] },
      order: [
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    const lines =
      refunds.length === 0
        ? []
        : await this.lines.findAll({ where: { refundId: refunds.map((refund) => refund.id) } });
    const found = new Map<string, WorkshopRefund[]>();
    for (const refund of refunds) {
      const shown = toWorkshop(
        refund,
        lines.filter((line) => line.refundId === refund.id),
      );
      found.set(refund.orderId, [...(found.get(refund.orderId) ?? []), shown]);
    }
    return found;
  }
}

const toWorkshop = (refund: Refund, lines: readonly RefundLine[]): WorkshopRefund => {
  const money = (minor: number) => ({ minor, currency: refund.currency });
  return {
    id: refund.id,
    cause: refund.origin === 'dispute' ? 'dispute' : 'refund',
    origin: refund.origin,
    state: refund.state,
    amount: money(refund.amountMinor),
    at: (refund.settledAt ?? refund.createdAt).toISOString(),
    lines: lines.map(({ orderLineId, amountMinor, keepsEntitlement }) => ({
      orderLineId,
      amount: money(amountMinor),
      keepsEntitlement,
    })),
    creditNote:
      refund.creditNoteId && refund.creditNoteNumber
        ? { id: refund.creditNoteId, number: refund.creditNoteNumber }
        : null,
    reason: refund.reason,
    askedBy: refund.askedBy ?? null,
    fault: refund.fault ?? null,
  };
};
