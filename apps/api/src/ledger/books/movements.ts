import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectPortions } from '../../database/portions.js';
import { selectRows } from '../../database/rows.js';
import { ORDER_MOVEMENTS } from '../../orders/money-movements.js';

export type MovementKind = 'payment' | 'refund' | 'refund-back' | 'dispute' | 'dispute-back' | 'pledge';

/** One movement of money as the shop's own books have it. */
export interface Movement {
  readonly id: string;
  readonly kind: MovementKind;
  readonly at: Date;
  readonly amountMinor: number;
  readonly currency: string;
  readonly state: string;
  readonly orderId: string | null;
  readonly subject: string;
  readonly email: string;
  readonly intentId: string | null;
  readonly serviceId: string | null;
}

export interface MovementFilter {
  readonly kinds?: readonly MovementKind[] | undefined;
  readonly from?: Date | undefined;
  readonly until?: Date | undefined;
  readonly search?: string | undefined;
}

const ALL = ORDER_MOVEMENTS;
const WHERE = `(:anyKind OR kind IN (:kinds)) AND (:from IS NULL OR at >= :from) AND (:until IS NULL OR at < :until)
  AND (:like IS NULL OR subject LIKE UPPER(:like) OR email LIKE LOWER(:like) OR intentId LIKE :like OR serviceId LIKE :like)`;

/** All money that came and went, of every room that takes money. */
@Injectable()
export class Movements {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** Newest first. */
  async page(
    filter: MovementFilter,
    { page, size }: { page: number; size: number },
  ): Promise<{ items: Movement[]; total: number }> {
    const rows = await selectRows<Movement & { found: number | string }>(
      this.database,
      `SELECT m.*, COUNT(*) OVER () AS found FROM (${ALL}) m WHERE ${WHERE}
       ORDER BY at DESC, id DESC LIMIT :limit OFFSET :offset`,
      { ...valuesOf(filter), limit: size, offset: (page - 1) * size },
    );
    return { items: rows.map(toMovement), total: Number(rows[0]?.found ?? 0) };
  }

  /** Oldest first, in portions. */
  async *all(filter: MovementFilter): AsyncGenerator<Movement> {
    const sql = `SELECT m.* FROM (${ALL}) m WHERE ${WHERE}`;
    for await (const row of selectPortions<Movement>(this.database, sql, valuesOf(filter)))
      yield toMovement(row);
  }
}

const valuesOf = ({ kinds, from, until, search }: MovementFilter) => ({
  anyKind: kinds === undefined,
  kinds: kinds ?? [''],
  from: from ?? null,
  until: until ?? null,
  like: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
});

const toMovement = ({ amountMinor, ...row }: Movement & { found?: number | string }): Movement => {
  const { found: _, ...movement } = row;
  return { ...movement, amountMinor: Number(amountMinor) };
};
