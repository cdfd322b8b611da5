import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';

/** A refusal that is about the address and not about the mail (RFC 3463: 5.1.x, and 5.2.1 for a closed mailbox). */
export const isDeadAddressReply = (reply: string): boolean => /\b5\.(1\.\d+|2\.1)\b/.test(reply);

/** Addresses that get no letters since their mail server refused one for good. */
@Injectable()
export class DeadAddresses {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async note(email: string, reason: string, letterId: string | null, tx?: Tx): Promise<void> {
    await touchRows(
      this.database,
      `INSERT INTO dead_addresses (id, email, reason, letter_id, since) VALUES (:id, :email, :reason, :letterId, :now)
       ON DUPLICATE KEY UPDATE id = id`,
      { id: newId(), email, reason: reason.slice(0, 500), letterId, now: this.clock.now() },
      tx,
    );
  }

  async list({
    query,
  }: Handled<'GET /workshop/dead-addresses'>): Promise<Answer<'GET /workshop/dead-addresses'>> {
    const rows = await selectRows<{ id: string; email: string; reason: string; since: Date; total: number }>(
      this.database,
      `SELECT id, email, reason, since, COUNT(*) OVER () AS total FROM dead_addresses
       WHERE :search IS NULL OR email LIKE :search ORDER BY since DESC, id DESC LIMIT :limit OFFSET :offset`,
      {
        search: query.search ? `%${query.search.replace(/[%_\\]/g, '\\$&')}%` : null,
        limit: query.size,
        offset: (query.page - 1) * query.size,
      },
    );
    return {
      items: rows.map(({ id, email, reason, since }) => ({ id, email, reason, since: since.toISOString() })),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }

  async lift(person: SignedIn, addressId: string): Promise<void> {
    await this.transactions.run(async (tx) => {
      const [found] = await selectRows<{ email: string; reason: string }>(
        this.database,
        'SELECT email, reason FROM dead_addresses WHERE id = :addressId FOR UPDATE',
        { addressId },
        tx,
      );
      if (!found) throw notFound('address');
      await touchRows(this.database, 'DELETE FROM dead_addresses WHERE id = :addressId', { addressId }, tx);
      await this.staffLog.record(tx, person, {
        what: 'lets letters go to an address again',
        subject: found.email,
        before: { reason: found.reason },
      });
    });
  }
}
