import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, UnclearLocation } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import { ORDER_PLACES } from '../../orders/order-places.js';
import { PLEDGE_PLACES } from '../../supporters/pledge-places.js';
import { Receipt } from '../receipt.model.js';
import { quarterOf } from './quarter-days.js';
import { TaxQuarters } from './tax-quarters.js';

/** A receipt, what is known of where its buyer is, and how that was settled, if it was. */
interface PlaceRow {
  readonly receiptId: string;
  readonly declared: string;
  readonly billing: string | null;
  readonly card: string | null;
  readonly country: string | null;
  readonly ratePercent: string;
  readonly reason: string;
  readonly who: string;
  readonly at: Date;
  readonly found: number | string;
}

type Query = Handled<'GET /workshop/ledger/locations'>['query'];
type Page = Answer<'GET /workshop/ledger/locations'>;

const PLACES = `
  SELECT r.id AS receiptId, p.* FROM receipts r JOIN (${ORDER_PLACES}) p ON p.subjectId = r.order_id
  UNION ALL
  SELECT r.id, p.* FROM receipts r JOIN (${PLEDGE_PLACES}) p ON p.subjectId = r.pledge_payment_id`;

/** Receipts whose buyer's country was or is unclear, with what each piece of evidence says. */
@Injectable()
export class ListLocations {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    private readonly quarters: TaxQuarters,
  ) {}

  async page({ state, page, size, search }: Query): Promise<Page> {
    // Oldest first: their quarter is closed first.
    const rows = await this.rows(
      `${state === 'open' ? 'place.isUnclear' : 's.receipt_id IS NOT NULL'}
       AND (:like IS NULL OR r.label LIKE :like OR r.order_number LIKE UPPER(:like)
         OR JSON_VALUE(r.buyer, '$.email') LIKE :like)
       ORDER BY ${state === 'open' ? 'place.paidAt' : 's.at DESC'}, r.id LIMIT :limit OFFSET :offset`,
      {
        like: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
        limit: size,
        offset: (page - 1) * size,
      },
    );
    const receipts = await this.receipts.findAll({ where: { id: rows.map((row) => row.receiptId) } });
    const items = await Promise.all(
      rows.map((row) => {
        const receipt = receipts.find((one) => one.id === row.receiptId);
        return receipt ? this.show(receipt, row) : null;
      }),
    );
    return { items: items.filter((one) => one !== null), page, size, total: Number(rows[0]?.found ?? 0) };
  }

  async one(receiptId: string): Promise<UnclearLocation> {
    const receipt = await this.receipts.findByPk(receiptId);
    const [row] = await this.rows('r.id = :receiptId', { receiptId });
    if (!receipt || !row) throw notFound('receipt');
    return this.show(receipt, row);
  }

  private rows(condition: string, values: Record<string, unknown>): Promise<PlaceRow[]> {
    return selectRows<PlaceRow>(
      this.database,
      `SELECT place.receiptId, place.declared, place.billing, place.card, s.country, s.rate_percent AS ratePercent,
              s.reason, s.who, s.at, COUNT(*) OVER () AS found
       FROM (${PLACES}) place JOIN receipts r ON r.id = place.receiptId
       LEFT JOIN tax_settlements s ON s.receipt_id = r.id
       WHERE ${condition}`,
      values,
    );
  }

  private async show(receipt: Receipt, row: PlaceRow): Promise<UnclearLocation> {
    const standing = await this.quarters.standing(quarterOf(receipt.issuedAt));
    return {
      receiptId: receipt.id,
      receiptNumber: receipt.label,
      orderId: receipt.orderId,
      pledgeId: receipt.pledgeId,
      orderNumber: receipt.orderNumber,
      email: receipt.buyer.email,
      issuedAt: receipt.issuedAt.toISOString(),
      total: { minor: receipt.totalMinor, currency: receipt.currency },
      declared: row.declared,
      billing: row.billing,
      card: row.card,
      country: row.country ?? receipt.country,
      ratePercent: row.country ? row.ratePercent : (receipt.tax[0]?.ratePercent ?? '0'),
      settled: row.country
        ? { country: row.country, reason: row.reason, who: row.who, at: row.at.toISOString() }
        : null,
      isQuarterClosed: Boolean(standing?.closedAt),
    };
  }
}
