import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, Reconciliation as Shown, ReconciliationRow } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import { selectRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { JobQueue } from '../../jobs/job-queue.js';
import { reconcileBooks } from './reconcile-books.job.js';
import { Reconciliation } from './reconciliation.model.js';

const MOST_DAYS = 366;
const dayMs = 86_400_000;

interface Row extends Omit<ReconciliationRow, 'at' | 'here' | 'there' | 'fee'> {
  at: Date;
  currency: string;
  hereMinor: number | null;
  thereMinor: number | null;
  feeMinor: number | null;
  found: number | string;
}

/** Comparisons with the payment service: asked for, listed, read row by row. */
@Injectable()
export class Reconciliations {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Reconciliation) private readonly reconciliations: typeof Reconciliation,
    private readonly transactions: Transactions,
    private readonly jobs: JobQueue,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async ask({ from, to }: { from: string; to: string }, person: SignedIn): Promise<Shown> {
    if ((Date.parse(to) - Date.parse(from)) / dayMs >= MOST_DAYS)
      throw new Refusal('validation-failed', `At most ${MOST_DAYS} days are compared at once.`, {
        fields: { to: `Choose at most ${MOST_DAYS} days.` },
      });
    const id = newId();
    await this.transactions.run(async (tx) => {
      await this.reconciliations.create(
        {
          id,
          fromDay: from,
          toDay: to,
          state: 'waiting',
          percent: 0,
          askedBy: `${person.name} (${person.role})`,
          createdAt: this.clock.now(),
        },
        { transaction: tx },
      );
      await this.jobs.add(tx, reconcileBooks, { reconciliationId: id });
      await this.staffLog.record(tx, person, {
        what: 'compared the books with the payment service',
        subject: `${from} to ${to}`,
      });
    });
    return this.one(id);
  }

  async page({
    page,
    size,
  }: Handled<'GET /workshop/ledger/reconciliations'>['query']): Promise<
    Answer<'GET /workshop/ledger/reconciliations'>
  > {
    const { rows, count } = await this.reconciliations.findAndCountAll({
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: size,
      offset: (page - 1) * size,
    });
    return { items: rows.map(show), page, size, total: count };
  }

  async one(id: string): Promise<Shown> {
    const found = await this.reconciliations.findByPk(id);
    if (!found) throw notFound('comparison');
    return show(found);
  }

  async rows({
    params,
    query,
  }: Handled<'GET /workshop/ledger/reconciliations/:reconciliationId/rows'>): Promise<
    Answer<'GET /workshop/ledger/reconciliations/:reconciliationId/rows'>
  > {
    const { page, size, verdict, kind, search } = query;
    const rows = await selectRows<Row>(
      this.database,
      `SELECT position, kind, verdict, occurred_at AS at, currency, here_minor AS hereMinor, there_minor AS thereMinor,
              fee_minor AS feeMinor, service_id AS serviceId, payment_intent_id AS paymentIntentId, order_id AS orderId,
              subject, COUNT(*) OVER () AS found
       FROM reconciliation_rows
       WHERE reconciliation_id = :id AND (:verdict IS NULL OR verdict = :verdict) AND (:kind IS NULL OR kind = :kind)
         AND (:like IS NULL OR subject LIKE :like OR service_id LIKE :like OR payment_intent_id LIKE :like)
       ORDER BY position LIMIT :limit OFFSET :offset`,
      {
        id: params.reconciliationId,
        verdict: verdict ?? null,
        kind: kind ?? null,
        like: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
        limit: size,
        offset: (page - 1) * size,
      },
    );
    return { items: rows.map(showRow), page, size, total: Number(rows[0]?.found ?? 0) };
  }
}

const showRow = ({
  found: _,
  at,
  currency,
  hereMinor,
  thereMinor,
  feeMinor,
  ...row
}: Row): ReconciliationRow => {
  const money = (minor: number | null) => (minor === null ? null : { minor, currency });
  return {
    ...row,
    at: at.toISOString(),
    here: money(hereMinor),
    there: money(thereMinor),
    fee: money(feeMinor),
  };
};

const show = (one: Reconciliation): Shown => ({
  id: one.id,
  from: one.fromDay,
  to: one.toDay,
  state: one.state,
  percent: one.percent,
  differences: one.differences,
  sums: one.sums,
  fault: one.fault,
  askedBy: one.askedBy,
  createdAt: one.createdAt.toISOString(),
  finishedAt: one.finishedAt?.toISOString() ?? null,
});
