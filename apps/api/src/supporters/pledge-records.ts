import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectPortions } from '../database/portions.js';
import { selectRows } from '../database/rows.js';

export interface PledgePaymentRow {
  readonly id: string;
  readonly at: Date;
  readonly pledge: string;
  readonly email: string | null;
  readonly plan: string;
  readonly declaredCountry: string;
  readonly billingCountry: string | null;
  readonly cardCountry: string | null;
  readonly country: string;
  readonly currency: string;
  readonly amountMinor: number;
  readonly periodStart: Date;
  readonly periodEnd: Date;
  readonly receipt: string | null;
  readonly invoiceId: string;
  readonly paymentIntentId: string | null;
}

interface Span {
  readonly from: Date;
  /** The first moment after it. */
  readonly until: Date;
}

const PAYMENTS = `
  SELECT m.id, m.paid_at AS at, p.number AS pledge, n.email, l.name AS plan, p.declared_country AS declaredCountry,
    p.payment_country AS billingCountry, p.card_country AS cardCountry, m.country, m.currency,
    m.amount_minor AS amountMinor, m.period_start AS periodStart, m.period_end AS periodEnd,
    m.receipt_number AS receipt, m.invoice_id AS invoiceId, m.payment_intent_id AS paymentIntentId
  FROM pledge_payments m JOIN pledges p ON p.id = m.pledge_id JOIN pledge_plans l ON l.id = m.plan_id
    LEFT JOIN people n ON n.id = p.person_id
  WHERE m.paid_at >= :from AND m.paid_at < :until`;

/** What was paid for pledges in a span of time, for an export: rows as they are read, oldest first. */
@Injectable()
export class PledgeRecords {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  payments({ from, until }: Span): AsyncGenerator<PledgePaymentRow> {
    return selectPortions<PledgePaymentRow>(this.database, PAYMENTS, { from, until });
  }

  async count({ from, until }: Span): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      'SELECT COUNT(*) AS count FROM pledge_payments WHERE paid_at >= :from AND paid_at < :until',
      { from, until },
    );
    return Number(row?.count ?? 0);
  }
}
