import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/transactions.js';
import { OrderHistory } from './order-history.js';
import type { OrderFlag } from './order-record.js';
import type { Order } from './order.model.js';

/** Marks an order for staff to look at, once for each flag, with a line in its history. */
@Injectable()
export class FlagOrder {
  constructor(private readonly history: OrderHistory) {}

  /** The order's row must be locked by this transaction. */
  async set(tx: Tx, order: Order, flag: OrderFlag, detail: string): Promise<void> {
    if (order.flags.includes(flag)) return;
    await order.update({ flags: [...order.flags, flag] }, { transaction: tx });
    await this.history.add(tx, order.id, `flagged ${flag}`, detail);
  }

  /** What it stood for is over, or somebody has looked. */
  async drop(tx: Tx, order: Order, flag: OrderFlag, detail = ''): Promise<boolean> {
    if (!order.flags.includes(flag)) return false;
    await order.update({ flags: order.flags.filter((one) => one !== flag) }, { transaction: tx });
    await this.history.add(tx, order.id, `no longer flagged ${flag}`, detail);
    return true;
  }
}
