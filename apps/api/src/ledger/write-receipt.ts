import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { money, percent, taxFromGross } from '@windchest/money';
import type { Tx } from '../database/transactions.js';
import { OrderPaidSteps, type PaidOrder } from '../orders/order-paid-steps.js';
import { NumberSeries } from './number-series.js';
import { Receipt } from './receipt.model.js';
import { TaxRates } from './tax-rates.js';

export const RECEIPT_SERIES = 'receipt';

/** Numbers a receipt for each paid order, with the tax within its total, in the order's own transaction. */
@Injectable()
export class WriteReceipt implements OnModuleInit {
  constructor(
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    private readonly numbers: NumberSeries,
    private readonly rates: TaxRates,
    private readonly orderPaid: OrderPaidSteps,
  ) {}

  onModuleInit(): void {
    this.orderPaid.register({ name: 'receipt', order: 10, run: (tx, order) => this.write(tx, order) });
  }

  private async write(tx: Tx, order: PaidOrder): Promise<void> {
    // Every line is the same kind of product, so all are of one rate, and the rate's sum is rounded once.
    const ratePercent = await this.rates.rateOn(order.country, 'electronic-service', order.paidAt, tx);
    const split = taxFromGross(money(order.totalMinor, order.currency), percent(ratePercent));
    const line = { ratePercent, netMinor: split.net.minor, taxMinor: split.tax.minor };
    const year = order.paidAt.getUTCFullYear();
    const number = await this.numbers.next(tx, RECEIPT_SERIES, year);
    const label = `${year}-${String(number).padStart(6, '0')}`;
    await this.receipts.create(
      {
        orderId: order.id,
        series: RECEIPT_SERIES,
        year,
        number,
        label,
        currency: order.currency,
        totalMinor: order.totalMinor,
        country: order.country,
        tax: [{ country: order.country, ...line }],
        issuedAt: order.paidAt,
      },
      { transaction: tx },
    );
    order.facts.receiptNumber = label;
    order.facts.tax = [line];
  }
}
