import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';

/** An event as it was written down when it came in. */
export interface StoredPaymentEvent {
  readonly id: string;
  readonly type: string;
  readonly subjectId: string | null;
  readonly payload: unknown;
  readonly receivedAt: Date;
}

export interface PaymentEventHandler {
  readonly name: string;
  /** Rooms with a lower number are asked first. */
  readonly order: number;
  /**
   * May run more than once for one event.
   * @returns what came of it, in a few words; null where the event is not this room's
   * @throws TryLater
   */
  readonly handle: (event: StoredPaymentEvent) => Promise<string | null>;
}

/** Rooms that live on payments register what they do with events; the first that knows an event works on it. */
@Injectable()
export class PaymentEventHandlers {
  private handlers: PaymentEventHandler[] = [];

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly clock: Clock,
  ) {}

  register(handler: PaymentEventHandler): void {
    this.handlers = [...this.handlers.filter((one) => one.name !== handler.name), handler].sort(
      (a, b) => a.order - b.order,
    );
  }

  async handle(event: StoredPaymentEvent): Promise<string> {
    for (const { handle } of this.handlers) {
      const outcome = await handle(event);
      if (outcome !== null) return outcome;
    }
    return 'nothing to do';
  }

  /** For a handler whose effect and mark must stand or fall together. @returns false where it is marked already */
  async markHandled(tx: Tx, eventId: string, outcome: string): Promise<boolean> {
    const marked = await touchRows(
      this.database,
      'UPDATE payment_events SET handled_at = :now, outcome = :outcome WHERE id = :eventId AND handled_at IS NULL',
      { now: this.clock.now(), outcome: outcome.slice(0, 200), eventId },
      tx,
    );
    return marked === 1;
  }
}
