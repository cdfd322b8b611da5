import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { Payments, SignatureRefused, type PaymentEvent } from '../adapters/payments/payments.js';
import { touchRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { JobQueue } from '../jobs/job-queue.js';
import { handlePaymentEvent } from './handle-payment-event.job.js';

/**
 * Takes a signed event in: written once with the job that works on it, then acknowledged at once. An event
 * that arrives again finds its row and job there.
 */
@Injectable()
export class ReceivePaymentEvent {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly payments: Payments,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  /** @throws Refusal `signature-refused` for what is forged, altered or too old */
  async receive(body: Buffer | undefined, signature: string | undefined): Promise<void> {
    const event = this.read(body, signature);
    await this.transactions.run(async (tx) => {
      await touchRows(
        this.database,
        `INSERT INTO payment_events (id, type, subject_id, payload, occurred_at, received_at)
         VALUES (:id, :type, :subjectId, :payload, :occurredAt, :now) ON DUPLICATE KEY UPDATE id = id`,
        { ...event, payload: JSON.stringify(event.payload), now: this.clock.now() },
        tx,
      );
      await this.jobs.add(
        tx,
        handlePaymentEvent,
        { eventId: event.id },
        { key: `payment-event:${event.id}` },
      );
    }, 'read-committed');
  }

  private read(body: Buffer | undefined, signature: string | undefined): PaymentEvent {
    try {
      return this.payments.readEvent(body ?? Buffer.alloc(0), signature ?? '');
    } catch (fault) {
      if (!(fault instanceof SignatureRefused)) throw fault;
      throw new Refusal('signature-refused', 'The signature of this event is missing, wrong or too old.');
    }
  }
}
