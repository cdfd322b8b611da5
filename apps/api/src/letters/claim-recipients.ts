import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import { RecipientRecord } from './recipient-record.js';

export interface ClaimedRecipient {
  readonly id: string;
  readonly personId: string | null;
  readonly email: string;
  readonly name: string;
  readonly heldId: string | null;
  readonly linkId: string | null;
  readonly tries: number;
  /** When its turn is, by the letter's pace. */
  readonly at: Date;
}
export type Claim =
  | { readonly kind: 'some'; readonly recipients: readonly ClaimedRecipient[] }
  /** Nothing to do now: the pace or others' leases say so. */
  | { readonly kind: 'wait'; readonly seconds: number }
  /** Nobody waits any more, or the letter is no longer going out. */
  | { readonly kind: 'over' };

const MOST = 40;
/** Turns are given out no further ahead than this, so that a pause or a crash leaves little hanging. */
const AHEAD_MS = 1000;

/**
 * Claims the next recipients of a letter. The time a row is due doubles as its lease: whoever claims it
 * puts that time off, and a process that dies leaves the row to be found again. The letter's row gives out
 * the turns, so that all processes together keep one pace.
 */
@Injectable()
export class ClaimRecipients {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly record: RecipientRecord,
    private readonly clock: Clock,
  ) {}

  next(letterId: string, run: number, worker: string): Promise<Claim> {
    return this.transactions.run(async (tx): Promise<Claim> => {
      const [letter] = await selectRows<{ perMinute: number; pacedUntil: Date | null }>(
        this.database,
        `SELECT per_minute AS perMinute, paced_until AS pacedUntil FROM letters
         WHERE id = :letterId AND state = 'sending' AND run = :run FOR UPDATE`,
        { letterId, run },
        tx,
      );
      if (!letter) return { kind: 'over' };
      const now = this.clock.now();
      // Handed over by a process that died before it could say so: delivered.
      await touchRows(
        this.database,
        `UPDATE letter_recipients SET state = 'sent', sent_at = :now, reason = NULL
         WHERE letter_id = :letterId AND state = 'handed-over' AND due_at <= :now`,
        { letterId, now },
        tx,
      );
      const everyMs = 60_000 / letter.perMinute;
      const nextMs = Math.max(letter.pacedUntil?.getTime() ?? 0, now.getTime());
      const turns = Math.min(MOST, Math.ceil((now.getTime() + AHEAD_MS - nextMs) / everyMs));
      if (turns <= 0)
        return { kind: 'wait', seconds: Math.max(0.2, (nextMs - now.getTime() - AHEAD_MS) / 1000) };
      const rows = await selectRows<Omit<ClaimedRecipient, 'at'>>(
        this.database,
        `SELECT id, person_id AS personId, email, name, held_revision_id AS heldId, link_id AS linkId, tries
         FROM letter_recipients WHERE letter_id = :letterId AND state = 'queued' AND due_at <= :now
         ORDER BY due_at, id LIMIT :turns FOR UPDATE SKIP LOCKED`,
        { letterId, now, turns },
        tx,
      );
      if (rows.length === 0) return this.whatIsLeft(letterId, now, tx);
      await touchRows(
        this.database,
        'UPDATE letter_recipients SET due_at = :until, leased_by = :worker WHERE id IN (:ids)',
        { until: this.record.leaseEnd(), worker, ids: rows.map(({ id }) => id) },
        tx,
      );
      await touchRows(
        this.database,
        'UPDATE letters SET paced_until = :until WHERE id = :letterId',
        { until: new Date(nextMs + rows.length * everyMs), letterId },
        tx,
      );
      return {
        kind: 'some',
        recipients: rows.map((row, turn) => ({ ...row, at: new Date(nextMs + turn * everyMs) })),
      };
    }, 'read-committed');
  }

  private async whatIsLeft(letterId: string, now: Date, tx: Tx): Promise<Claim> {
    const [left] = await selectRows<{ dueAt: Date | null }>(
      this.database,
      `SELECT MIN(due_at) AS dueAt FROM letter_recipients WHERE letter_id = :letterId AND state IN ('queued', 'handed-over')`,
      { letterId },
      tx,
    );
    if (left?.dueAt)
      return {
        kind: 'wait',
        seconds: Math.min(15, Math.max(0.5, (left.dueAt.getTime() - now.getTime()) / 1000)),
      };
    await touchRows(
      this.database,
      `UPDATE letters SET state = 'sent', finished_at = :now, updated_at = :now WHERE id = :letterId AND state = 'sending'`,
      { letterId, now },
      tx,
    );
    return { kind: 'over' };
  }
}
