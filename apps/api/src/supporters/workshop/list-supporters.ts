import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled, PledgeState, SupporterRow } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import { locate } from '../../payments/location-evidence.js';
import type { PledgeFlag } from '../pledges/pledge-record.js';

type Query = Handled<'GET /workshop/supporters'>['query'];
export type SupporterFilter = Pick<Query, 'state' | 'planId' | 'flagged' | 'search'>;

interface Row {
  id: string;
  name: string | null;
  email: string | null;
  plan_id: string;
  plan_name: string;
  state: PledgeState;
  amount_minor: number;
  currency: string;
  declared_country: string;
  payment_country: string | null;
  card_country: string | null;
  flags: PledgeFlag[] | string;
  began_at: Date | null;
  next_payment_at: Date | null;
  ends_at: Date | null;
  ended_at: Date | null;
  created_at: Date;
  paid_minor: number | string | null;
  total: number | string;
}

const columns: Record<Query['sort'], string> = {
  beganAt: 'p.began_at',
  amount: 'p.amount_minor',
  nextPaymentAt: 'p.next_payment_at',
};
const PORTION = 500;

/** The workshop's list of supporters: a page of it for the screen, all of it for an export. */
@Injectable()
export class ListSupporters {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async page(query: Query): Promise<Answer<'GET /workshop/supporters'>> {
    const direction = query.order === 'asc' ? 'ASC' : 'DESC';
    const rows = await this.rows(
      query,
      `ORDER BY ${columns[query.sort]} IS NULL, ${columns[query.sort]} ${direction}, p.id ${direction} LIMIT :size OFFSET :from`,
      { size: query.size, from: (query.page - 1) * query.size },
    );
    return {
      items: rows.map(toRow),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }

  /** Newest first, each portion going on below the last row of the one before. */
  async *all(query: SupporterFilter): AsyncGenerator<SupporterRow> {
    let last: Row | undefined;
    do {
      const rows: Row[] = await this.rows(
        query,
        'ORDER BY p.created_at DESC, p.id DESC LIMIT :size',
        { size: PORTION, lastAt: last?.created_at ?? null, lastId: last?.id ?? null },
        'AND (:lastId IS NULL OR p.created_at < :lastAt OR (p.created_at = :lastAt AND p.id < :lastId))',
      );
      for (const row of rows) yield toRow(row);
      last = rows.length === PORTION ? rows.at(-1) : undefined;
    } while (last);
  }

  private rows(
    { state, planId, flagged, search }: SupporterFilter,
    tail: string,
    values: Record<string, unknown>,
    condition = '',
  ): Promise<Row[]> {
    return selectRows<Row>(
      this.database,
      `SELECT p.*, n.name, n.email, l.name AS plan_name, COUNT(*) OVER () AS total,
              (SELECT SUM(m.amount_minor) FROM pledge_payments m WHERE m.pledge_id = p.id) AS paid_minor
       FROM pledges p JOIN pledge_plans l ON l.id = p.plan_id LEFT JOIN people n ON n.id = p.person_id
       WHERE p.began_at IS NOT NULL
         AND (:state IS NULL OR p.state = :state) AND (:planId IS NULL OR p.plan_id = :planId)
         AND (:flagged IS NULL OR JSON_LENGTH(p.flags) > 0)
         AND (:search IS NULL OR n.email LIKE :search OR n.name LIKE :search) ${condition} ${tail}`,
      {
        state: state ?? null,
        planId: planId ?? null,
        flagged: flagged ?? null,
        search: search ? `%${search.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%` : null,
        ...values,
      },
    );
  }
}

const toRow = (row: Row): SupporterRow => {
  const money = (minor: number | string | null) => ({ minor: Number(minor ?? 0), currency: row.currency });
  return {
    id: row.id,
    name: row.name ?? '',
    email: row.email ?? '',
    plan: { id: row.plan_id, name: row.plan_name },
    state: row.state,
    amount: money(row.amount_minor),
    country: locate(row.declared_country, row.payment_country, row.card_country).country,
    flags: typeof row.flags === 'string' ? (JSON.parse(row.flags) as PledgeFlag[]) : row.flags,
    beganAt: row.began_at?.toISOString() ?? null,
    nextPaymentAt: row.next_payment_at?.toISOString() ?? null,
    endsAt: row.ends_at?.toISOString() ?? null,
    endedAt: row.ended_at?.toISOString() ?? null,
    paid: money(row.paid_minor),
  };
};
