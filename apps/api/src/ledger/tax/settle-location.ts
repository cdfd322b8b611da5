import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Handled, TaxTreatment } from '@windchest/contracts';
import { money, percent, taxFromGross } from '@windchest/money';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound } from '../../http/refusal.js';
import { isTaxWithin } from '../../orders/tax-treatment.js';
import { UnclearOrders } from '../../orders/unclear-orders.js';
import { Receipt } from '../receipt.model.js';
import { TaxRates } from '../tax-rates.js';
import { quarterOf } from './quarter-days.js';
import { TaxQuarters } from './tax-quarters.js';

type Body = Handled<'POST /workshop/ledger/locations/:receiptId'>['body'];

/** Country and tax that a receipt counts with from now on. */
interface Counted {
  readonly treatment: TaxTreatment;
  readonly country: string;
  readonly ratePercent: string;
  readonly netMinor: number;
  readonly taxMinor: number;
}

/**
 * Settles by hand, with a reason, where a receipt is taxed. The receipt itself stays as it was issued; the summary of
 * its quarter counts it where it was settled. What was paid stays what it was, so another rate moves the net.
 */
@Injectable()
export class SettleLocation {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    private readonly transactions: Transactions,
    private readonly quarters: TaxQuarters,
    private readonly rates: TaxRates,
    private readonly unclear: UnclearOrders,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  settle(receiptId: string, { country, reason }: Body, person: SignedIn): Promise<void> {
    const who = `${person.name} (${person.role})`;
    return this.transactions.run(async (tx) => {
      const receipt = await this.receipts.findByPk(receiptId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!receipt?.orderId) throw notFound('receipt of an order');
      const order = await this.unclear.settle(tx, receipt.orderId, { country, reason, who });
      await this.quarters.lockOpen(tx, quarterOf(receipt.issuedAt));
      const counted = await this.countedIn(receipt, country, tx);
      await this.write(tx, receiptId, counted, reason, who);
      await this.staffLog.record(tx, person, {
        what: 'settled the country of an order',
        subject: `order ${order.number}`,
        before: { country: receipt.country, tax: receipt.tax },
        after: { ...counted, reason },
      });
    }, 'read-committed');
  }

  /** A business that turns out to be elsewhere paid a price without tax; what it paid is then taken to contain it. */
  private async countedIn(receipt: Receipt, country: string, tx: Tx): Promise<Counted> {
    const treatment =
      country === receipt.country || isTaxWithin(receipt.taxTreatment) ? receipt.taxTreatment : 'consumer';
    const ratePercent = isTaxWithin(treatment)
      ? await this.rates.rateOn(country, 'electronic-service', receipt.issuedAt, tx)
      : '0';
    const { net, tax } = taxFromGross(money(receipt.totalMinor, receipt.currency), percent(ratePercent));
    return { treatment, country, ratePercent, netMinor: net.minor, taxMinor: tax.minor };
  }

  private async write(
    tx: Tx,
    receiptId: string,
    counted: Counted,
    reason: string,
    who: string,
  ): Promise<void> {
    await touchRows(
      this.database,
      `INSERT INTO tax_settlements
         (receipt_id, country, tax_treatment, rate_percent, net_minor, tax_minor, reason, who, at)
       VALUES (:receiptId, :country, :treatment, :ratePercent, :netMinor, :taxMinor, :reason, :who, :now)
       ON DUPLICATE KEY UPDATE country = :country, tax_treatment = :treatment, rate_percent = :ratePercent,
         net_minor = :netMinor, tax_minor = :taxMinor, reason = :reason, who = :who, at = :now`,
      { receiptId, ...counted, reason, who, now: this.clock.now() },
      tx,
    );
  }
}
