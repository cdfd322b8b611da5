import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../config/config.js';
import { touchRows } from '../database/rows.js';

/** Writes down what becomes of one recipient. Each step asks that the row is still the worker's own. */
@Injectable()
export class RecipientRecord {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly clock: Clock,
  ) {}

  leaseEnd(): Date {
    return this.clock.in(this.config.JOB_LEASE_SECONDS);
  }

  /** Says that a worker still lives; a stalled mail server then costs nobody their turn. */
  async renew(worker: string): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE letter_recipients SET due_at = :until WHERE leased_by = :worker AND state IN ('queued', 'handed-over')`,
      { worker, until: this.leaseEnd() },
    );
  }

  /**
   * The last moment before the mail is the server's. The change waits in an open transaction until the database
   * has granted it; its commit and the mail's last line then leave this process within one turn, the commit
   * first. A process killed before that turn has sent nothing and noted nothing, one killed after it has done
   * both: waiting for the commit's answer would leave a mail noted and unsent for as long as that takes.
   * @throws LeaseLost where another worker took over or the letter was broken off
   */
  async handOver(id: string, worker: string): Promise<HandedOver> {
    const tx = await this.database.transaction();
    try {
      const mine = await touchRows(
        this.database,
        `UPDATE letter_recipients SET state = 'handed-over', due_at = :until
         WHERE id = :id AND state = 'queued' AND leased_by = :worker AND due_at > :now`,
        { id, worker, now: this.clock.now(), until: this.leaseEnd() },
        tx,
      );
      if (mine !== 1) throw new LeaseLost();
    } catch (fault) {
      await tx.rollback();
      throw fault;
    }
    const commit = tx.commit();
    return {
      isNoted: commit.then(
        () => true,
        () => false,
      ),
    };
  }

  async markSent(ids: readonly string[], worker: string): Promise<void> {
    if (ids.length === 0) return;
    await touchRows(
      this.database,
      `UPDATE letter_recipients SET state = 'sent', sent_at = :now, reason = NULL
       WHERE id IN (:ids) AND state IN ('queued', 'handed-over') AND leased_by = :worker`,
      { ids, worker, now: this.clock.now() },
    );
  }

  async markRefused(id: string, worker: string, reason: string): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE letter_recipients SET state = 'refused', reason = :reason
       WHERE id = :id AND state IN ('queued', 'handed-over') AND leased_by = :worker`,
      { id, worker, reason: reason.slice(0, 500) },
    );
  }

  /** The server did not take it, so it may be tried again without anybody getting it twice. */
  async putBack(
    id: string,
    worker: string,
    again: { readonly inSeconds: number; readonly reason: string; readonly countsAsTry: boolean },
  ): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE letter_recipients SET state = 'queued', due_at = :dueAt, reason = :reason, tries = tries + :tries, leased_by = NULL
       WHERE id = :id AND state IN ('queued', 'handed-over') AND leased_by = :worker`,
      {
        id,
        worker,
        dueAt: this.clock.in(again.inSeconds),
        reason: again.reason.slice(0, 500),
        tries: again.countsAsTry ? 1 : 0,
      },
    );
  }
}

export interface HandedOver {
  /** Whether the database took the note; a mail that went out is marked sent either way. */
  readonly isNoted: Promise<boolean>;
}

export class LeaseLost extends Error {
  constructor() {
    super('Another worker took this recipient over, or the letter was broken off.');
  }
}
