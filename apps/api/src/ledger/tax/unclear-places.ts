import { Injectable } from '@nestjs/common';
import type { Tx } from '../../database/transactions.js';
import { notFound } from '../../http/refusal.js';
import { UnclearOrders } from '../../orders/unclear-orders.js';
import { UnclearPledges } from '../../supporters/unclear-pledges.js';

interface Settling {
  readonly country: string;
  readonly reason: string;
  readonly who: string;
}

/** Receipts nobody can be sure of the country of, over all rooms that sell. */
@Injectable()
export class UnclearPlaces {
  constructor(
    private readonly orders: UnclearOrders,
    private readonly pledges: UnclearPledges,
  ) {}

  async countBetween(from: Date, until: Date, tx?: Tx): Promise<number> {
    return (
      (await this.orders.countBetween(from, until, tx)) + (await this.pledges.countBetween(from, until, tx))
    );
  }

  /**
   * @returns what was settled, in words
   * @throws Refusal `not-found`, `conflict` where nothing is unclear
   */
  async settle(
    tx: Tx,
    receipt: { readonly orderId: string | null; readonly pledgePaymentId: string | null },
    settling: Settling,
  ): Promise<string> {
    if (receipt.orderId) return `order ${(await this.orders.settle(tx, receipt.orderId, settling)).number}`;
    if (!receipt.pledgePaymentId) throw notFound('order');
    return `pledge ${await this.pledges.settle(tx, receipt.pledgePaymentId, settling)}`;
  }
}
