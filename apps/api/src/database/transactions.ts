import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { Transaction, type Sequelize } from 'sequelize';
import { errnoOf } from './errors.js';

/** 1020 record changed since last read (snapshot isolation), 1205 lock wait timeout, 1213 deadlock. */
const RETRIED = new Set([1020, 1205, 1213]);
const ATTEMPTS = 10;

export type Tx = Transaction;

/**
 * Runs work in one transaction and runs it again when the database says that somebody else was
 * quicker. The work must therefore have no effect outside the database; what it causes goes into the
 * outbox through the same transaction.
 */
@Injectable()
export class Transactions {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async run<T>(
    work: (tx: Tx) => Promise<T>,
    isolation: 'read-committed' | 'repeatable-read' = 'repeatable-read',
  ): Promise<T> {
    const isolationLevel =
      isolation === 'read-committed'
        ? Transaction.ISOLATION_LEVELS.READ_COMMITTED
        : Transaction.ISOLATION_LEVELS.REPEATABLE_READ;
    for (let attempt = 1; ; attempt++) {
      try {
        return await this.database.transaction({ isolationLevel }, work);
      } catch (fault) {
        if (attempt >= ATTEMPTS || !RETRIED.has(errnoOf(fault) ?? 0)) throw fault;
        await pause(Math.random() * 10 * 2 ** Math.min(attempt, 6));
      }
    }
  }
}

const pause = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));
