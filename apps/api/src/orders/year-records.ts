import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectPortions } from '../database/portions.js';
import { selectRows } from '../database/rows.js';

interface Dated {
  readonly id: string;
  readonly at: Date;
  readonly currency: string;
}
export interface OrderRow extends Dated {
  readonly number: string;
  readonly state: string;
  readonly paidAt: Date | null;
  readonly email: string;
  readonly declaredCountry: string;
  readonly billingCountry: string | null;
  readonly cardCountry: string | null;
  readonly settledCountry: string | null;
  readonly treatment: string;
  readonly businessName: string | null;
  readonly vatNumber: string | null;
  readonly isGift: number;
  readonly subtotalMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
  readonly refundedMinor: number;
  readonly couponCode: string | null;
  readonly receiptNumber: string | null;
  readonly paymentIntentId: string | null;
}
export interface LineRow extends Dated {
  readonly order: string;
  readonly position: number;
  readonly kit: string;
  readonly revision: string;
  readonly licence: string;
  readonly priceMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
  readonly refundedMinor: number;
}
export interface RefundRow extends Dated {
  readonly order: string;
  readonly origin: string;
  readonly state: string;
  readonly settledAt: Date | null;
  readonly amountMinor: number;
  readonly reason: string;
  readonly askedBy: string | null;
  readonly creditNote: string | null;
  readonly serviceId: string | null;
}
export interface DisputeRow extends Dated {
  readonly order: string;
  readonly state: string;
  readonly closedAt: Date | null;
  readonly amountMinor: number;
  readonly reason: string;
  readonly serviceId: string;
}

export interface Span {
  readonly from: Date;
  /** The first moment after it. */
  readonly until: Date;
}

const within = (column: string): string => `${column} >= :from AND ${column} < :until`;
const ORDERS = `
  SELECT id, created_at AS at, currency, number, state, paid_at AS paidAt, email, declared_country AS declaredCountry,
    payment_country AS billingCountry, card_country AS cardCountry, settled_country AS settledCountry,
    tax_treatment AS treatment, JSON_VALUE(business, '$.name') AS businessName,
    JSON_VALUE(business, '$.vatNumber') AS vatNumber, gift IS NOT NULL AS isGift, subtotal_minor AS subtotalMinor,
    discount_minor AS discountMinor, total_minor AS totalMinor, refunded_minor AS refundedMinor,
    coupon_code AS couponCode, receipt_number AS receiptNumber, payment_intent_id AS paymentIntentId
  FROM orders WHERE ${within('created_at')}`;
const LINES = `
  SELECT l.id, o.created_at AS at, o.currency, o.number AS \`order\`, l.position, l.kit_name AS kit,
    l.revision_label AS revision, l.licence_name AS licence, l.price_minor AS priceMinor,
    l.discount_minor AS discountMinor, l.total_minor AS totalMinor, l.refunded_minor AS refundedMinor
  FROM order_lines l JOIN orders o ON o.id = l.order_id WHERE ${within('o.created_at')}`;
const REFUNDS = `
  SELECT r.id, r.created_at AS at, r.currency, o.number AS \`order\`, r.origin, r.state, r.settled_at AS settledAt,
    r.amount_minor AS amountMinor, r.reason, r.asked_by AS askedBy, r.credit_note_number AS creditNote,
    r.service_id AS serviceId
  FROM refunds r JOIN orders o ON o.id = r.order_id WHERE ${within('r.created_at')}`;
const DISPUTES = `
  SELECT d.id, d.opened_at AS at, d.currency, o.number AS \`order\`, d.state, d.closed_at AS closedAt,
    d.amount_minor AS amountMinor, d.reason, d.service_id AS serviceId
  FROM disputes d JOIN orders o ON o.id = d.order_id WHERE ${within('d.opened_at')}`;

/** All that is kept about orders in a span of time, for an export: rows as they are read, oldest first. */
@Injectable()
export class YearRecords {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  orders(span: Span): AsyncGenerator<OrderRow> {
    return selectPortions<OrderRow>(this.database, ORDERS, { ...span });
  }

  lines(span: Span): AsyncGenerator<LineRow> {
    return selectPortions<LineRow>(this.database, LINES, { ...span });
  }

  refunds(span: Span): AsyncGenerator<RefundRow> {
    return selectPortions<RefundRow>(this.database, REFUNDS, { ...span });
  }

  disputes(span: Span): AsyncGenerator<DisputeRow> {
    return selectPortions<DisputeRow>(this.database, DISPUTES, { ...span });
  }

  /** How many rows the four have together, to tell how far an export is. */
  async count(span: Span): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      `SELECT (SELECT COUNT(*) FROM orders WHERE ${within('created_at')})
         + (SELECT COUNT(*) FROM order_lines l JOIN orders o ON o.id = l.order_id WHERE ${within('o.created_at')})
         + (SELECT COUNT(*) FROM refunds WHERE ${within('created_at')})
         + (SELECT COUNT(*) FROM disputes WHERE ${within('opened_at')}) AS count`,
      { ...span },
    );
    return Number(row?.count ?? 0);
  }
}
