import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import type { Tx } from '../database/transactions.js';
import { notFound, Refusal } from '../http/refusal.js';
import { PledgeHistory } from './pledges/pledge-history.js';
import { PledgePayment } from './pledges/pledge-payment.model.js';
import { Pledge } from './pledges/pledge.model.js';

/** Months of pledges whose supporter's country no two pieces of evidence agree on, for the ledger to settle. */
@Injectable()
export class UnclearPledges {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    private readonly history: PledgeHistory,
    private readonly clock: Clock,
  ) {}

  /** Written down, with their receipt, from `from` up to, but not including, `until`. */
  countBetween(from: Date, until: Date, tx?: Tx): Promise<number> {
    return this.payments.count({
      where: { isUnclear: true, createdAt: { [Op.gte]: from, [Op.lt]: until } },
      transaction: tx ?? null,
    });
  }

  /**
   * Notes where the supporter is, for the months to come too, and takes the flag off with the last unclear month;
   * once settled a month may be settled again.
   * @returns the pledge's number
   * @throws Refusal `not-found`, `conflict` where nothing is unclear
   */
  async settle(
    tx: Tx,
    paymentId: string,
    { country, reason, who }: { country: string; reason: string; who: string },
  ): Promise<string> {
    const known = await this.payments.findByPk(paymentId, { transaction: tx });
    const pledge =
      known && (await this.pledges.findByPk(known.pledgeId, { transaction: tx, lock: tx.LOCK.UPDATE }));
    const payment =
      pledge && (await this.payments.findByPk(paymentId, { transaction: tx, lock: tx.LOCK.UPDATE }));
    if (!payment) throw notFound('payment');
    if (!payment.isUnclear && !payment.settledCountry)
      throw new Refusal(
        'conflict',
        `The evidence of this payment of pledge ${pledge.number} agrees on a country; nothing is to be settled.`,
      );
    await payment.update({ settledCountry: country, isUnclear: false }, { transaction: tx });
    await pledge.update({ settledCountry: country, updatedAt: this.clock.now() }, { transaction: tx });
    const receipt = payment.receiptNumber ?? 'none';
    await this.history.add(
      tx,
      pledge.id,
      'country settled',
      `${country}, receipt ${receipt}, by ${who}: ${reason}`,
    );
    const left = await this.payments.count({
      where: { pledgeId: pledge.id, isUnclear: true },
      transaction: tx,
    });
    if (left === 0) await this.history.dropFlag(tx, pledge, 'location-unclear');
    return pledge.number;
  }
}
