import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, UnclearLocation } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import type { OrderRecord } from '../../orders/order-record.js';
import { UnclearOrders } from '../../orders/unclear-orders.js';
import { Receipt } from '../receipt.model.js';
import { quarterOf } from './quarter-days.js';
import { TaxQuarters } from './tax-quarters.js';

interface Settlement {
  receiptId: string;
  country: string;
  ratePercent: string;
  reason: string;
  who: string;
  at: Date;
}

type Query = Handled<'GET /workshop/ledger/locations'>['query'];
type Page = Answer<'GET /workshop/ledger/locations'>;

/** Receipts whose buyer's country was or is unclear, with what each piece of evidence says. */
@Injectable()
export class ListLocations {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    private readonly unclear: UnclearOrders,
    private readonly quarters: TaxQuarters,
  ) {}

  page(query: Query): Promise<Page> {
    return query.state === 'open' ? this.open(query) : this.settled(query);
  }

  async one(receiptId: string): Promise<UnclearLocation> {
    const receipt = await this.receipts.findByPk(receiptId);
    const [order] = receipt?.orderId ? await this.unclear.byIds([receipt.orderId]) : [];
    if (!receipt || !order) throw notFound('receipt');
    const [settlement] = await this.settlements([receiptId]);
    return this.show(receipt, order, settlement);
  }

  private async open(query: Query): Promise<Page> {
    const { orders, total } = await this.unclear.page(query);
    const receipts = await this.receipts.findAll({ where: { orderId: orders.map((order) => order.id) } });
    const shown = await Promise.all(
      orders.map((order) => {
        const receipt = receipts.find((one) => one.orderId === order.id);
        return receipt ? this.show(receipt, order, undefined) : null;
      }),
    );
    return { items: shown.filter((one) => one !== null), page: query.page, size: query.size, total };
  }

  private async settled({ page, size, search }: Query): Promise<Page> {
    const ids = await selectRows<{ receiptId: string; orderId: string; found: number | string }>(
      this.database,
      `SELECT s.receipt_id AS receiptId, r.order_id AS orderId, COUNT(*) OVER () AS found
       FROM tax_settlements s JOIN receipts r ON r.id = s.receipt_id
       WHERE :like IS NULL OR r.label LIKE :like OR r.order_number LIKE UPPER(:like)
         OR JSON_VALUE(r.buyer, '$.email') LIKE :like
       ORDER BY s.at DESC, s.receipt_id LIMIT :limit OFFSET :offset`,
      {
        like: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
        limit: size,
        offset: (page - 1) * size,
      },
    );
    const receiptIds = ids.map((row) => row.receiptId);
    const [receipts, settlements, orders] = await Promise.all([
      this.receipts.findAll({ where: { id: receiptIds } }),
      this.settlements(receiptIds),
      this.unclear.byIds(ids.map((row) => row.orderId)),
    ]);
    const items = await Promise.all(
      ids.map(({ receiptId, orderId }) => {
        const receipt = receipts.find((one) => one.id === receiptId);
        const order = orders.find((one) => one.id === orderId);
        const settlement = settlements.find((one) => one.receiptId === receiptId);
        return receipt && order ? this.show(receipt, order, settlement) : null;
      }),
    );
    return { items: items.filter((one) => one !== null), page, size, total: Number(ids[0]?.found ?? 0) };
  }

  private async settlements(receiptIds: readonly string[]): Promise<Settlement[]> {
    if (receiptIds.length === 0) return [];
    return selectRows<Settlement>(
      this.database,
      `SELECT receipt_id AS receiptId, country, rate_percent AS ratePercent, reason, who, at
       FROM tax_settlements WHERE receipt_id IN (:receiptIds)`,
      { receiptIds: [...receiptIds] },
    );
  }

  private async show(
    receipt: Receipt,
    order: OrderRecord,
    settlement: Settlement | undefined,
  ): Promise<UnclearLocation> {
    const standing = await this.quarters.standing(quarterOf(receipt.issuedAt));
    return {
      receiptId: receipt.id,
      receiptNumber: receipt.label,
      orderId: order.id,
      orderNumber: order.number,
      email: order.email,
      issuedAt: receipt.issuedAt.toISOString(),
      total: { minor: receipt.totalMinor, currency: receipt.currency },
      declared: order.declaredCountry,
      billing: order.paymentCountry,
      card: order.cardCountry,
      country: settlement?.country ?? receipt.country,
      ratePercent: settlement?.ratePercent ?? receipt.tax[0]?.ratePercent ?? '0',
      settled: settlement
        ? {
            country: settlement.country,
            reason: settlement.reason,
            who: settlement.who,
            at: settlement.at.toISOString(),
          }
        : null,
      isQuarterClosed: Boolean(standing?.closedAt),
    };
  }
}
