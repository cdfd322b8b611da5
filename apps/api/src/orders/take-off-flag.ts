import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { StaffLog } from '../accounts/staff-log.js';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { FlagOrder } from './flag-order.js';
import type { OrderFlag } from './order-record.js';
import { Order } from './order.model.js';

/** Somebody of the staff has looked at an order and takes its flag off. */
@Injectable()
export class TakeOffFlag {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly transactions: Transactions,
    private readonly flags: FlagOrder,
    private readonly staffLog: StaffLog,
  ) {}

  takeOff(orderId: string, flag: OrderFlag, person: SignedIn): Promise<void> {
    if (flag === 'location-unclear')
      throw new Refusal(
        'conflict',
        'Which country this order is taxed in must be settled with a reason: do so in the ledger, under Locations.',
      );
    return this.transactions.run(async (tx) => {
      const order = await this.orders.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!order) throw notFound('order');
      const before = order.flags;
      if (!(await this.flags.drop(tx, order, flag, `by ${person.name}`))) return;
      await this.staffLog.record(tx, person, {
        what: 'took a flag off an order',
        subject: `order ${order.number}`,
        before,
        after: order.flags,
      });
    }, 'read-committed');
  }
}
