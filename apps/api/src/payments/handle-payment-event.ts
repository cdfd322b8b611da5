import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { selectRows } from '../database/rows.js';
import { HandlesJob, type Finish, type JobHandler } from '../jobs/job.js';
import { handlePaymentEvent } from './handle-payment-event.job.js';
import { PaymentEventHandlers, type StoredPaymentEvent } from './payment-event-handlers.js';

/** Hands one event to the room that knows it, and notes what came of it. */
@Injectable()
@HandlesJob(handlePaymentEvent)
export class HandlePaymentEvent implements JobHandler<typeof handlePaymentEvent.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly handlers: PaymentEventHandlers,
  ) {}

  async handle({ eventId }: z.output<typeof handlePaymentEvent.payload>): Promise<Finish | void> {
    const [event] = await selectRows<StoredPaymentEvent & { readonly handledAt: Date | null }>(
      this.database,
      `SELECT id, type, subject_id AS subjectId, payload, received_at AS receivedAt, handled_at AS handledAt
       FROM payment_events WHERE id = :eventId`,
      { eventId },
    );
    if (!event || event.handledAt) return;
    const outcome = await this.handlers.handle(event);
    return async (tx) => {
      await this.handlers.markHandled(tx, eventId, outcome);
    };
  }
}
