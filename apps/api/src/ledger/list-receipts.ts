import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { ReceiptTax } from './receipt.model.js';

type Query = Handled<'GET /workshop/receipts'>['query'];
export type ReceiptFilter = Pick<Query, 'kind' | 'year' | 'country' | 'search'>;

/** A receipt or, with `sign` −1, a credit note, as both tables have it. */
export interface WrittenRow {
  readonly id: string;
  readonly kind: 'receipt' | 'credit-note';
  readonly number: string;
  readonly issuedAt: Date;
  readonly orderId: string | null;
  readonly orderNumber: string;
  readonly email: string;
  readonly country: string;
  readonly currency: string;
  readonly sign: 1 | -1;
  readonly totalMinor: number;
  readonly tax: readonly ReceiptTax[];
}

const PORTION = 500;
const BOTH = `
  SELECT id, 'receipt' AS kind, label AS number, issued_at AS issuedAt, order_id AS orderId, order_number AS orderNumber,
         JSON_VALUE(buyer, '$.email') AS email, country, currency, 1 AS sign, total_minor AS totalMinor, tax, year
  FROM receipts
  UNION ALL
  SELECT n.id, 'credit-note', n.label, n.issued_at, n.order_id, n.order_number,
         JSON_VALUE(r.buyer, '$.email'), n.country, n.currency, -1, n.total_minor, n.tax, n.year
  FROM credit_notes n JOIN receipts r ON r.id = n.receipt_id`;
const WHERE = `
  (:kind IS NULL OR kind = :kind) AND (:year IS NULL OR year = :year) AND (:country IS NULL OR country = :country)
  AND (:like IS NULL OR number LIKE UPPER(:like) OR orderNumber LIKE UPPER(:like) OR email LIKE LOWER(:like))`;
const SORTS: Record<Query['sort'], string> = {
  number: 'number',
  issuedAt: 'issuedAt',
  total: 'sign * CAST(totalMinor AS SIGNED)',
};

/** Receipts and credit notes in one list: a page of it for the screen, all of it for an export. */
@Injectable()
export class ListReceipts {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async page(query: Query): Promise<Answer<'GET /workshop/receipts'>> {
    const direction = query.order === 'asc' ? 'ASC' : 'DESC';
    const values = {
      ...filterValues(query),
      limit: query.size,
      offset: (query.page - 1) * query.size,
    };
    const rows = await selectRows<WrittenRow & { found: number | string }>(
      this.database,
      `SELECT both_kinds.*, COUNT(*) OVER () AS found FROM (${BOTH}) both_kinds WHERE ${WHERE}
       ORDER BY ${SORTS[query.sort]} ${direction}, id ${direction} LIMIT :limit OFFSET :offset`,
      values,
    );
    return {
      items: rows.map(toRow),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.found ?? 0),
    };
  }

  /** In the order they were issued, each portion going on after the last row of the one before. */
  async *all(filter: ReceiptFilter): AsyncGenerator<WrittenRow> {
    let last: WrittenRow | undefined;
    do {
      const rows: WrittenRow[] = await selectRows<WrittenRow>(
        this.database,
        `SELECT * FROM (${BOTH}) both_kinds WHERE ${WHERE}
         AND (:after IS NULL OR issuedAt > :after OR (issuedAt = :after AND id > :afterId))
         ORDER BY issuedAt, id LIMIT ${PORTION}`,
        { ...filterValues(filter), after: last?.issuedAt ?? null, afterId: last?.id ?? '' },
      );
      for (const row of rows) yield { ...row, tax: taxOf(row) };
      last = rows.length === PORTION ? rows.at(-1) : undefined;
    } while (last);
  }
}

const filterValues = ({ kind, year, country, search }: ReceiptFilter) => ({
  kind: kind ?? null,
  year: year ?? null,
  country: country ?? null,
  like: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
});

/** A written query gives JSON as text or as objects, after the column's own type was lost in the union. */
const taxOf = ({ tax }: { tax: unknown }): ReceiptTax[] =>
  (typeof tax === 'string' ? JSON.parse(tax) : tax) as ReceiptTax[];

const toRow = (row: WrittenRow): Answer<'GET /workshop/receipts'>['items'][number] => {
  const money = (minor: number) => ({ minor: row.sign * minor + 0, currency: row.currency });
  const tax = taxOf(row);
  return {
    id: row.id,
    kind: row.kind,
    number: row.number,
    issuedAt: row.issuedAt.toISOString(),
    orderId: row.orderId,
    orderNumber: row.orderNumber,
    email: row.email,
    country: row.country,
    net: money(tax.reduce((sum, one) => sum + one.netMinor, 0)),
    tax: money(tax.reduce((sum, one) => sum + one.taxMinor, 0)),
    total: money(row.totalMinor),
  };
};
