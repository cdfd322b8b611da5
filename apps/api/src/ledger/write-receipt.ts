import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { money, parseMoney, percent, taxFromGross } from '@windchest/money';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { OrderPaidSteps, type PaidOrder } from '../orders/order-paid-steps.js';
import { isTaxWithin } from '../orders/tax-treatment.js';
import { NumberSeries } from './number-series.js';
import type { ReceiptBuyer } from './receipt-parties.js';
import { Receipt } from './receipt.model.js';
import { sellerOf } from './seller.js';
import { TaxRates } from './tax-rates.js';

export const RECEIPT_SERIES = 'receipt';

/** Numbers a receipt for each paid order, with the tax within its total, in the order's own transaction. */
@Injectable()
export class WriteReceipt implements OnModuleInit {
  constructor(
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    @InjectConfig() private readonly config: Config,
    private readonly numbers: NumberSeries,
    private readonly rates: TaxRates,
    private readonly orderPaid: OrderPaidSteps,
  ) {}

  onModuleInit(): void {
    this.orderPaid.register({ name: 'receipt', order: 10, run: (tx, order) => this.write(tx, order) });
  }

  private async write(tx: Tx, order: PaidOrder): Promise<void> {
    // Every line is the same kind of product, so all are of one rate, and the rate's sum is rounded once.
    const ratePercent = await this.rateFor(order, tx);
    const split = taxFromGross(money(order.totalMinor, order.currency), percent(ratePercent));
    const line = { ratePercent, netMinor: split.net.minor, taxMinor: split.tax.minor };
    const year = order.paidAt.getUTCFullYear();
    const number = await this.numbers.next(tx, RECEIPT_SERIES, year);
    const label = `${year}-${String(number).padStart(6, '0')}`;
    await this.receipts.create(
      {
        orderId: order.id,
        orderNumber: order.number,
        series: RECEIPT_SERIES,
        year,
        number,
        label,
        currency: order.currency,
        totalMinor: order.totalMinor,
        country: order.country,
        taxTreatment: order.taxTreatment,
        tax: [{ country: order.country, ...line }],
        buyer: this.buyerOf(order),
        seller: sellerOf(this.config),
        lines: order.lines.map((one) => ({
          orderLineId: one.id,
          kit: one.kitName,
          licence: one.licenceName,
          revision: one.revisionLabel,
          priceMinor: one.priceMinor,
          discountMinor: one.discountMinor,
          totalMinor: one.totalMinor,
          ratePercent,
        })),
        issuedAt: order.paidAt,
      },
      { transaction: tx },
    );
    order.facts.receiptNumber = label;
    order.facts.tax = [line];
  }

  /** A business that owes the tax itself pays none here, nor does anybody for what is free. */
  private rateFor({ totalMinor, taxTreatment, country, paidAt }: PaidOrder, tx: Tx): Promise<string> {
    if (totalMinor === 0 || !isTaxWithin(taxTreatment)) return Promise.resolve('0');
    return this.rates.rateOn(country, 'electronic-service', paidAt, tx);
  }

  private buyerOf(order: PaidOrder): ReceiptBuyer {
    const { email, country, business, billing, totalMinor, currency } = order;
    if (business)
      return {
        email,
        country,
        name: business.name,
        address: business.address.split(/\r?\n/).map((line) => line.trim()),
        ...(business.vatNumber ? { vatNumber: business.vatNumber } : {}),
      };
    const limit = parseMoney(String(this.config.SIMPLE_RECEIPT_UP_TO), currency).minor;
    if (totalMinor <= limit || !billing?.name || billing.lines.length === 0) return { email, country };
    return { email, country, name: billing.name, address: billing.lines };
  }
}
