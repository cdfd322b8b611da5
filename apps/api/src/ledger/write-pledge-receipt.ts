import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { money, percent, taxFromGross } from '@windchest/money';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { PledgePaidSteps, type PaidMonth } from '../supporters/pledges/pledge-steps.js';
import { NumberSeries } from './number-series.js';
import { Receipt } from './receipt.model.js';
import { sellerOf } from './seller.js';
import { TaxRates } from './tax-rates.js';
import { RECEIPT_SERIES } from './write-receipt.js';

/** Numbers a receipt for each month of a pledge, in the series of all receipts and in the payment's transaction. */
@Injectable()
export class WritePledgeReceipt implements OnModuleInit {
  constructor(
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    @InjectConfig() private readonly config: Config,
    private readonly numbers: NumberSeries,
    private readonly rates: TaxRates,
    private readonly pledgePaid: PledgePaidSteps,
  ) {}

  onModuleInit(): void {
    this.pledgePaid.register({ name: 'receipt', order: 10, run: (tx, month) => this.write(tx, month) });
  }

  private async write(tx: Tx, month: PaidMonth): Promise<void> {
    // The rate of the day of payment; the number of the day of writing, or a late one would stand out of order.
    const ratePercent = await this.rates.rateOn(month.country, 'electronic-service', month.paidAt, tx);
    const split = taxFromGross(money(month.amountMinor, month.currency), percent(ratePercent));
    const line = { ratePercent, netMinor: split.net.minor, taxMinor: split.tax.minor };
    const year = month.writtenAt.getUTCFullYear();
    const number = await this.numbers.next(tx, RECEIPT_SERIES, year);
    const label = `${year}-${String(number).padStart(6, '0')}`;
    await this.receipts.create(
      {
        pledgePaymentId: month.paymentId,
        orderNumber: pledgeNumber(month),
        series: RECEIPT_SERIES,
        year,
        number,
        label,
        currency: month.currency,
        totalMinor: month.amountMinor,
        country: month.country,
        taxTreatment: 'consumer',
        tax: [{ country: month.country, ...line }],
        buyer: { email: month.email, country: month.country },
        seller: sellerOf(this.config),
        lines: [
          {
            orderLineId: month.paymentId,
            kit: month.planName,
            licence: 'Monthly pledge',
            revision: `${day(month.periodStart)} to ${day(month.periodEnd)}`,
            priceMinor: month.amountMinor,
            discountMinor: 0,
            totalMinor: month.amountMinor,
            ratePercent,
          },
        ],
        issuedAt: month.writtenAt,
      },
      { transaction: tx },
    );
    month.facts.receiptNumber = label;
    month.facts.tax = [line];
  }
}

/** What a receipt calls the pledge: short, and the same every month. */
const pledgeNumber = ({ pledgeId }: PaidMonth): string => `P-${pledgeId.slice(-8).toUpperCase()}`;

const day = (moment: Date): string => moment.toISOString().slice(0, 10);
