import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { newId } from '../database/columns.js';
import type { Tx } from '../database/transactions.js';
import { MoneyBackSteps, type MoneyBack } from '../orders/refunds/money-back-steps.js';
import { CreditNote } from './credit-note.model.js';
import { creditOf } from './credit-tax.js';
import { NumberSeries } from './number-series.js';
import { Receipt } from './receipt.model.js';

const SERIES = 'credit-note';

/**
 * Numbers a credit note for money that went back, in the transaction that notes it: a series of its own for each
 * year, without gaps, each with the receipt that it corrects (Directive 2006/112/EC, art. 219 and 226).
 */
@Injectable()
export class WriteCreditNote implements OnModuleInit {
  constructor(
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    @InjectModel(CreditNote) private readonly notes: typeof CreditNote,
    private readonly numbers: NumberSeries,
    private readonly moneyBack: MoneyBackSteps,
  ) {}

  onModuleInit(): void {
    // After the rights have ended: whoever waits for a number waits from here to the commit.
    this.moneyBack.register({ name: 'credit note', order: 30, run: (tx, back) => this.write(tx, back) });
  }

  private async write(tx: Tx, back: MoneyBack): Promise<void> {
    const { order, at } = back;
    const receipt = await this.receipts.findOne({ where: { orderId: order.id }, transaction: tx });
    if (!receipt || back.amountMinor === 0) return;
    const before = await this.notes.findAll({ where: { receiptId: receipt.id }, transaction: tx });
    const { tax, lines } = creditOf(
      receipt,
      before.flatMap((note) =>
        note.lines.map(({ orderLineId, totalMinor }) => ({ orderLineId, amountMinor: totalMinor })),
      ),
      back.lines,
    );
    const year = at.getUTCFullYear();
    const number = await this.numbers.next(tx, SERIES, year);
    const label = `${year}-C${String(number).padStart(5, '0')}`;
    const id = newId();
    await this.notes.create(
      {
        id,
        refundId: back.refundId,
        orderId: order.id,
        receiptId: receipt.id,
        orderNumber: order.number,
        series: SERIES,
        year,
        number,
        label,
        currency: receipt.currency,
        totalMinor: back.amountMinor,
        country: receipt.country,
        tax,
        lines,
        cause: back.cause,
        issuedAt: at,
      },
      { transaction: tx },
    );
    back.facts.creditNote = { id, number: label };
    back.facts.tax = tax;
  }
}
