import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../../adapters/clock/clock.js';
import { PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { PaymentBalance, type BalanceEntry } from '../../adapters/payments/reconciliation.js';
import { touchRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { HandlesJob, TryLater, type Finish, type JobHandler } from '../../jobs/job.js';
import { compareBooks, isDifference, sumsOf, type ComparedRow, type Span } from './compare-books.js';
import { Movements, type Movement } from './movements.js';
import { reconcileBooks } from './reconcile-books.job.js';
import { Reconciliation } from './reconciliation.model.js';
import { WorkProgress } from './work-progress.js';

const dayMs = 86_400_000;
/** How far the two clocks, and an event that is late, may be apart. */
const EDGE_MS = 3 * dayMs;
const AGAIN_SECONDS = 60;
const BATCH = 500;

/** Reads both books over the span and its edges, compares them and keeps every row, whether it agrees or not. */
@Injectable()
@HandlesJob(reconcileBooks)
export class ReconcileBooks implements JobHandler<typeof reconcileBooks.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Reconciliation) private readonly reconciliations: typeof Reconciliation,
    private readonly balance: PaymentBalance,
    private readonly movements: Movements,
    private readonly clock: Clock,
  ) {}

  async handle({ reconciliationId }: z.output<typeof reconcileBooks.payload>): Promise<Finish | void> {
    const asked = await this.reconciliations.findByPk(reconciliationId);
    if (!asked || asked.state === 'done') return;
    await asked.update({ state: 'running', fault: null });
    const progress = new WorkProgress(this.database, 'reconciliations', reconciliationId);
    const span = {
      from: new Date(asked.fromDay),
      until: new Date(Date.parse(asked.toDay) + dayMs),
    };
    try {
      const theirs = await this.readTheirs(widened(span), progress);
      const ours = await this.readOurs(widened(span));
      progress.show(90);
      const rows = compareBooks(ours, theirs, span);
      await progress.settle();
      return (tx) => this.keep(tx, asked, rows);
    } catch (fault) {
      await progress.settle();
      await asked.update({ state: 'failed', fault: (fault as Error).message.slice(0, 500) });
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      throw fault;
    }
  }

  /** Newest first, page by page; how far back a page reaches tells how much is left. */
  private async readTheirs({ from, until }: Span, progress: WorkProgress): Promise<BalanceEntry[]> {
    const entries: BalanceEntry[] = [];
    let after: string | null = null;
    do {
      const page = await this.balance.listBalance(from, until, after);
      entries.push(...page.entries);
      after = page.next;
      const oldest = page.entries.at(-1)?.occurredAt ?? from;
      progress.show((80 * (until.getTime() - oldest.getTime())) / (until.getTime() - from.getTime()));
    } while (after);
    return entries;
  }

  private async readOurs(span: Span): Promise<Movement[]> {
    const movements: Movement[] = [];
    for await (const one of this.movements.all(span)) movements.push(one);
    return movements;
  }

  private async keep(tx: Tx, asked: Reconciliation, rows: readonly ComparedRow[]): Promise<void> {
    await touchRows(
      this.database,
      'DELETE FROM reconciliation_rows WHERE reconciliation_id = :id',
      { id: asked.id },
      tx,
    );
    for (let start = 0; start < rows.length; start += BATCH)
      await this.writeRows(tx, asked.id, rows.slice(start, start + BATCH), start);
    await asked.update(
      {
        state: 'done',
        percent: 100,
        sums: sumsOf(rows),
        differences: rows.filter(isDifference).length,
        finishedAt: this.clock.now(),
      },
      { transaction: tx },
    );
  }

  private async writeRows(tx: Tx, id: string, rows: readonly ComparedRow[], start: number): Promise<void> {
    await this.database.getQueryInterface().bulkInsert(
      'reconciliation_rows',
      rows.map((row, at) => ({
        reconciliation_id: id,
        position: start + at,
        kind: row.kind,
        verdict: row.verdict,
        occurred_at: row.at,
        currency: row.currency,
        here_minor: row.hereMinor,
        there_minor: row.thereMinor,
        fee_minor: row.feeMinor,
        service_id: row.serviceId,
        payment_intent_id: row.paymentIntentId,
        order_id: row.orderId,
        subject: row.subject?.slice(0, 60) ?? null,
      })),
      { transaction: tx },
    );
  }
}

const widened = ({ from, until }: Span): Span => ({
  from: new Date(from.getTime() - EDGE_MS),
  until: new Date(until.getTime() + EDGE_MS),
});
